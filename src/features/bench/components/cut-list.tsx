import { classNames } from '#src/components/class-names.ts';
import { useFormats } from '#src/lib/formats.ts';
import type { BenchStep } from '#src/features/bench/hooks/bench-steps.ts';

type CutListProps = {
  steps: readonly BenchStep[];
  /** Index of the step at work; steps before it are done. */
  active: number;
  onChoose: (index: number) => void;
};

/** All settings of the bar in order; a touch goes to one of them. */
export function CutList({ steps, active, onChoose }: CutListProps) {
  const { setting } = useFormats();
  return (
    <ol aria-label="Cuts of this bar" className="m-0 list-none p-0">
      {steps.map((step, i) => (
        <li key={i} className="border-b border-line first:border-t">
          <button
            type="button"
            onClick={() => onChoose(i)}
            aria-current={i === active ? 'step' : undefined}
            className={classNames(
              'grid min-h-16 w-full grid-cols-[3.5rem_1fr_auto] items-center gap-x-4 border-l-[6px] px-3 text-left',
              i === active ? 'border-oxide bg-soap' : 'border-transparent hover:bg-soap/60',
            )}
          >
            <span className="font-head text-lg font-medium text-muted">{i < active ? 'done' : i + 1}</span>
            <span
              className={classNames(
                'min-w-0 font-mono text-xl font-bold break-words',
                i < active && 'text-muted',
              )}
            >
              {step.kind === 'piece' ? step.piece.mark : step.kind === 'crop' ? 'crop' : 'far end crop'}
            </span>
            <span className="text-right font-mono">
              <span className={classNames('block text-xl font-bold', i < active && 'text-muted')}>
                {setting(step.stopNm)}
              </span>
              <span className="block text-[0.9375rem] text-muted">tape {setting(step.tapeNm)}</span>
            </span>
          </button>
        </li>
      ))}
    </ol>
  );
}
