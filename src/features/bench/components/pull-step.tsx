import type { PlanGroup } from '#shared/schemas/plans.ts';
import { Button } from '#src/components/button.tsx';
import { ChipField } from '#src/components/chip-field.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { formatHeat, formatTag, useFormats } from '#src/lib/formats.ts';
import { BigPanel } from '#src/features/bench/components/big-panel.tsx';
import type { BenchBar } from '#src/features/bench/hooks/bench-steps.ts';
import type { BarProgress } from '#src/features/bench/hooks/use-bar-progress.ts';

type PullStepProps = {
  group: PlanGroup;
  bar: BenchBar;
  barMass: string;
  progress: BarProgress;
  onChange: (changes: Partial<BarProgress>) => void;
  onPulled: () => void;
};

export function heatIsAnswered(bar: BenchBar, progress: BarProgress): boolean {
  return (
    bar.stock.source === 'drop' ||
    progress.heatKnown === 'unknown' ||
    (progress.heatKnown === 'read' && progress.heat.trim() !== '')
  );
}

/** What to bring, from where, and the heat that stands on it before it is cut up. */
export function PullStep({ group, bar, barMass, progress, onChange, onPulled }: PullStepProps) {
  const { length } = useFormats();
  const { drop } = bar.stock;
  return (
    <>
      <BigPanel
        readings={
          drop
            ? [
                {
                  label: 'Pull the drop',
                  text: formatTag(drop.tag),
                  below: `${group.section} ${group.grade} · ${length(bar.stock.lengthNm)} · ${formatHeat(drop.heat)}`,
                },
                { label: 'From slot', text: drop.slot, below: barMass },
              ]
            : [
                {
                  label: 'Pull a new bar',
                  text: length(bar.stock.lengthNm),
                  below: `${barMass}${bar.stock.supplierName ? ` · from ${bar.stock.supplierName}` : ''}`,
                },
                { label: 'Section and grade', text: group.section, below: group.grade || 'no grade named' },
              ]
        }
      />
      {!drop && (
        <div className="mt-5 grid gap-4">
          <ChipField
            label="Heat on the bar"
            size="bench"
            value={progress.heatKnown}
            onChange={(heatKnown) => onChange({ heatKnown })}
            choices={[
              { value: 'read', label: 'read off the bar' },
              { value: 'unknown', label: 'unknown' },
            ]}
          />
          {progress.heatKnown === 'read' && (
            <TextField
              className="max-w-xl"
              label="Heat as it stands on the bar"
              look="line"
              mono
              autoComplete="off"
              autoCapitalize="characters"
              value={progress.heat}
              onChange={(event) => onChange({ heat: event.target.value })}
            />
          )}
        </div>
      )}
      <div className="mt-5">
        <Button
          variant="act"
          size="bench"
          className="w-full"
          disabled={!heatIsAnswered(bar, progress)}
          onClick={onPulled}
        >
          It is on the machine
        </Button>
        {!heatIsAnswered(bar, progress) && (
          <p className="mt-2 text-lg text-muted">First say which heat the bar has, or that it is unknown.</p>
        )}
      </div>
    </>
  );
}
