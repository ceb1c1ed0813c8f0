import { useState } from 'react';
import type { Drop } from '#shared/schemas/rack.ts';
import { Button } from '#src/components/button.tsx';
import { ChipField } from '#src/components/chip-field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';

type HeatFormProps = {
  drop: Drop;
  fault: string | null;
  busy: boolean;
  onSubmit: (heat: string | null, reason: string) => void;
};

/** A heat is only ever typed by a person who says where it was read; the history keeps who and why. */
export function HeatForm({ drop, fault, busy, onSubmit }: HeatFormProps) {
  const [known, setKnown] = useState<'read' | 'unknown'>(drop.heat === null ? 'read' : 'unknown');
  const [heat, setHeat] = useState('');
  const [reason, setReason] = useState('');
  const [tried, setTried] = useState(false);
  const heatMissing = known === 'read' && heat.trim() === '';
  const reasonMissing = reason.trim() === '';
  return (
    <form
      noValidate
      className="grid gap-5"
      onSubmit={(event) => {
        event.preventDefault();
        setTried(true);
        if (!heatMissing && !reasonMissing) onSubmit(known === 'read' ? heat.trim() : null, reason.trim());
      }}
    >
      <p>
        Now: <span className="font-mono font-bold">{drop.heat ?? 'unknown'}</span>
      </p>
      <ChipField
        label="New heat"
        value={known}
        onChange={setKnown}
        choices={[
          { value: 'read', label: 'read off the steel or its certificate' },
          { value: 'unknown', label: 'unknown' },
        ]}
      />
      {known === 'read' && (
        <TextField
          label="Heat as it is written there"
          mono
          look="line"
          autoComplete="off"
          autoCapitalize="characters"
          value={heat}
          onChange={(event) => setHeat(event.target.value)}
          error={tried && heatMissing ? 'Type the heat as it stands there.' : undefined}
        />
      )}
      <TextField
        label="Why is it changed"
        autoComplete="off"
        hint="Where it was read, or why it is doubted. The history keeps it with your name."
        value={reason}
        onChange={(event) => setReason(event.target.value)}
        error={tried && reasonMissing ? 'Say why: a heat is never changed without a reason.' : undefined}
      />
      {fault && (
        <Notice tone="fault" live>
          {fault}
        </Notice>
      )}
      <div>
        <Button type="submit" variant="act" busy={busy} busyLabel="Saving">
          Save heat
        </Button>
      </div>
    </form>
  );
}
