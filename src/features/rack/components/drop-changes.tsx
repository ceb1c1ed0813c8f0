import { useState } from 'react';
import type { Drop, DropPatch } from '#shared/schemas/rack.ts';
import { Button } from '#src/components/button.tsx';
import { ConfirmDialog, Dialog } from '#src/components/dialog.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useToast } from '#src/components/toast.tsx';
import { faultWords } from '#src/lib/api-error.ts';
import { formatTag } from '#src/lib/formats.ts';
import { useChangeDrop } from '#src/features/rack/api/drops.ts';
import { HeatForm } from '#src/features/rack/components/heat-form.tsx';

type Asking = 'slot' | 'heat' | 'note' | 'missing' | 'scrap' | null;

/** What a yard hand does with one drop: move it, mend what is written, lose it, find it, scrap it. */
export function DropChanges({ drop }: { drop: Drop }) {
  const say = useToast();
  const tag = formatTag(drop.tag);
  const [asking, setAsking] = useState<Asking>(null);
  const [text, setText] = useState('');
  const change = useChangeDrop(drop.id);
  const ask = (what: Asking, start = '') => {
    change.reset();
    setText(start);
    setAsking(what);
  };
  const send = (patch: Omit<DropPatch, 'version' | 'reason'> & { reason?: string }, done: string) =>
    change.mutate(
      { reason: '', ...patch, version: drop.version },
      {
        onSuccess: () => {
          setAsking(null);
          say(done);
        },
      },
    );
  const close = (open: boolean) => {
    if (!open) setAsking(null);
  };
  const fault = change.isError
    ? `${faultWords(change.error).title}. ${faultWords(change.error).message}`
    : null;
  const mayWrite = drop.can['drop:edit'] && (drop.state === 'racked' || drop.state === 'held');

  return (
    <div className="flex flex-wrap gap-3">
      {mayWrite && <Button onClick={() => ask('slot', drop.slot)}>Move it</Button>}
      {mayWrite && <Button onClick={() => ask('heat')}>Change the heat</Button>}
      {mayWrite && <Button onClick={() => ask('note', drop.note)}>Change the note</Button>}
      {drop.can['drop:found'] && (
        <Button variant="act" onClick={() => ask('slot', drop.slot)}>
          Found it
        </Button>
      )}
      {drop.can['drop:missing'] && <Button onClick={() => ask('missing')}>It is missing</Button>}
      {drop.can['drop:scrap'] && (
        <Button variant="danger" onClick={() => ask('scrap')}>
          Scrap it
        </Button>
      )}

      <Dialog
        open={asking === 'slot' || asking === 'note'}
        onOpenChange={close}
        title={
          asking === 'note' ? `Note on ${tag}` : drop.state === 'missing' ? `${tag} is found` : `Move ${tag}`
        }
      >
        <form
          noValidate
          className="grid gap-5"
          onSubmit={(event) => {
            event.preventDefault();
            if (asking === 'note') send({ note: text }, `The note on ${tag} is saved.`);
            else if (drop.state === 'missing')
              send({ slot: text, state: 'racked' }, `${tag} is back on the rack in ${text}.`);
            else send({ slot: text }, `${tag} is in ${text} now.`);
          }}
        >
          <TextField
            label={asking === 'note' ? 'Note' : 'Slot'}
            mono={asking !== 'note'}
            look={asking === 'note' ? 'box' : 'line'}
            autoComplete="off"
            value={text}
            onChange={(event) => setText(event.target.value)}
          />
          {fault && (
            <Notice tone="fault" live>
              {fault}
            </Notice>
          )}
          <div>
            <Button
              type="submit"
              variant="act"
              busy={change.isPending}
              disabled={asking === 'slot' && text.trim() === ''}
            >
              Save
            </Button>
          </div>
        </form>
      </Dialog>

      <Dialog open={asking === 'heat'} onOpenChange={close} title={`Heat of ${tag}`}>
        <HeatForm
          drop={drop}
          fault={fault}
          busy={change.isPending}
          onSubmit={(heat, reason) => send({ heat, reason }, `The heat of ${tag} is changed.`)}
        />
      </Dialog>

      <ConfirmDialog
        open={asking === 'missing' || asking === 'scrap'}
        onOpenChange={close}
        title={asking === 'scrap' ? `Scrap ${tag}` : `${tag} is missing`}
        tone={asking === 'scrap' ? 'danger' : 'act'}
        confirmLabel={asking === 'scrap' ? 'Scrap it' : 'It is missing'}
        busy={change.isPending}
        error={fault}
        onConfirm={() =>
          asking === 'scrap'
            ? send({ state: 'scrapped', reason: text }, `${tag} is scrapped.`)
            : send({ state: 'missing', reason: text }, `${tag} is missing. Plans will not count on it.`)
        }
      >
        <p className="mb-4">
          {asking === 'scrap'
            ? 'It leaves the rack for good. Its tag number is never used again.'
            : 'Plans no longer count on it. When it turns up, say so here.'}
        </p>
        <TextField
          label="Why"
          hint="May stay empty."
          autoComplete="off"
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
      </ConfirmDialog>
    </div>
  );
}
