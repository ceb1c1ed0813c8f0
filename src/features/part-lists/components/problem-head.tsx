import { ArrowDown } from 'lucide-react';
import { Button } from '#src/components/button.tsx';
import { readyWords } from '#src/features/part-lists/components/row-tape.tsx';

type ProblemHeadProps = {
  good: number;
  open: number;
  /** False while the list is being read again. */
  current: boolean;
  onNext: () => void;
};

/** How many rows still need a person; stays in sight while they are worked through. */
export function ProblemHead({ good, open, current, onNext }: ProblemHeadProps) {
  return (
    <div className="sticky top-0 z-10 -mx-1 flex min-h-15 flex-wrap items-center justify-between gap-x-4 gap-y-1 bg-paper px-1 py-2">
      <div>
        <h2>{open === 0 ? 'Nothing needs you' : 'These rows need you'}</h2>
        <p role="status" className="text-muted">
          {current ? readyWords(good, open) : 'Reading again.'}
        </p>
      </div>
      {open > 0 && (
        <Button size="small" icon={<ArrowDown aria-hidden size={17} />} onClick={onNext}>
          Next row
        </Button>
      )}
    </div>
  );
}
