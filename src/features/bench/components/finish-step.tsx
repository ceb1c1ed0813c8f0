import type { Bar } from '#shared/schemas/plans.ts';
import { Button } from '#src/components/button.tsx';
import { DropTag } from '#src/components/drop-tag.tsx';
import { LengthField } from '#src/components/length-field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { formatTag, useFormats } from '#src/lib/formats.ts';
import type { BenchBar } from '#src/features/bench/hooks/bench-steps.ts';
import type { BarProgress } from '#src/features/bench/hooks/use-bar-progress.ts';

type FinishStepProps = {
  bar: Bar;
  layout: BenchBar;
  heat: string | null;
  progress: BarProgress;
  onChange: (changes: Partial<BarProgress>) => void;
  onCut: () => void;
  onBack: () => void;
  busy: boolean;
  fault: string | null;
};

/** What is left of the bar: a drop with its tag and slot, or scrap. Only here the bar is told as cut. */
export function FinishStep({
  bar,
  layout,
  heat,
  progress,
  onChange,
  onCut,
  onBack,
  busy,
  fault,
}: FinishStepProps) {
  const { length, lengthStyle } = useFormats();
  const slotMissing = layout.keeps && progress.slot.trim() === '';
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (!slotMissing) onCut();
      }}
    >
      {layout.keeps ? (
        <div className="grid gap-6 md:grid-cols-[minmax(0,3fr)_2fr]">
          <DropTag>
            <p className="font-head text-xl font-semibold text-muted">Write on the drop</p>
            <p className="font-mono text-[clamp(2.75rem,8vw,5rem)] leading-none font-bold">
              {bar.makesTag === null ? 'a new tag' : formatTag(bar.makesTag)}
            </p>
            <p className="mt-2 font-mono text-xl">
              {length(layout.leftoverNm)} · {heat === null ? 'heat unknown' : `heat ${heat}`}
            </p>
          </DropTag>
          <div className="grid content-start gap-5">
            <TextField
              label="Slot it goes to"
              look="line"
              mono
              autoComplete="off"
              autoCapitalize="characters"
              placeholder="B-3-2"
              autoFocus
              value={progress.slot}
              onChange={(event) => onChange({ slot: event.target.value })}
            />
            <LengthField
              label="Measured length, if it differs"
              hint={`The plan says ${length(layout.leftoverNm)}.`}
              lengthStyle={lengthStyle}
              value={progress.measuredNm}
              onChange={(measuredNm) => onChange({ measuredNm })}
            />
          </div>
        </div>
      ) : (
        <div className="border-[1.5px] border-ink px-5 py-4">
          <p className="font-head text-2xl font-semibold">
            {layout.leftoverNm === 0 ? 'Nothing is left of this bar.' : 'What is left goes to scrap.'}
          </p>
          {layout.leftoverNm > 0 && (
            <p className="mt-1 font-mono text-3xl font-bold">{length(layout.leftoverNm)}</p>
          )}
        </div>
      )}
      {fault && (
        <Notice tone="fault" live className="mt-4">
          {fault}
        </Notice>
      )}
      <div className="mt-5 grid gap-3 sm:grid-cols-[2fr_1fr]">
        <Button
          type="submit"
          variant="act"
          size="bench"
          busy={busy}
          busyLabel="Writing it down"
          disabled={slotMissing}
        >
          Bar is cut
        </Button>
        <Button size="bench" onClick={onBack}>
          Back
        </Button>
      </div>
      {slotMissing && <p className="mt-2 text-lg text-muted">First type the slot the drop goes to.</p>}
    </form>
  );
}
