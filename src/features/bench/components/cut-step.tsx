import { Button } from '#src/components/button.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { BigPanel } from '#src/features/bench/components/big-panel.tsx';
import type { BenchStep } from '#src/features/bench/hooks/bench-steps.ts';

type CutStepProps = {
  step: BenchStep;
  /** Position among the bar's settings, from 1. */
  position: number;
  positions: number;
  /** Of this mark: the piece at work and all the plan makes. */
  ofMark: { number: number; all: number } | null;
  longestStopNm: number | null;
  onDone: () => void;
  onBack: () => void;
  onWholeBar: () => void;
};

export function CutStep({
  step,
  position,
  positions,
  ofMark,
  longestStopNm,
  onDone,
  onBack,
  onWholeBar,
}: CutStepProps) {
  const { setting, mass } = useFormats();
  const byTape = longestStopNm !== null && step.stopNm > longestStopNm;
  const where = `Cut ${position} of ${positions}`;
  return (
    <>
      {step.kind === 'piece' ? (
        <BigPanel
          readings={[
            {
              label: byTape
                ? 'Longer than the stop: measure'
                : step.sameStop
                  ? 'Stop stays at'
                  : 'Set stop to',
              text: setting(step.stopNm),
              below: step.parts
                ? `Tape from the datum ${setting(step.tapeNm)} · piece weighs ${mass(step.piece.pieceMassMg)}`
                : `The piece ends with the bar: no cut. It weighs ${mass(step.piece.pieceMassMg)}`,
            },
            {
              label: 'Write on the piece',
              text: step.piece.mark,
              below: `${where}${ofMark ? ` · ${ofMark.number} of ${ofMark.all} of this mark` : ''} · job ${step.piece.jobNumber}`,
            },
          ]}
        />
      ) : (
        <BigPanel
          readings={[
            {
              label: step.kind === 'crop' ? 'Square the end, take off' : 'Square the far end, take off',
              text: setting(step.stopNm),
              below: `Tape from the datum ${setting(step.tapeNm)}`,
            },
            { label: 'Crop', text: 'scrap', below: where },
          ]}
        />
      )}
      <div className="mt-4 grid grid-cols-2 gap-3 sm:grid-cols-[2fr_1fr_1fr]">
        <Button variant="act" size="bench" className="max-sm:col-span-2" autoFocus onClick={onDone}>
          {step.kind === 'piece' && !step.parts ? 'Piece done' : 'Cut done'}
        </Button>
        <Button size="bench" onClick={onBack}>
          Back
        </Button>
        <Button size="bench" className="!text-xl" onClick={onWholeBar}>
          All cuts are done
        </Button>
      </div>
    </>
  );
}
