import { Tape } from '#src/components/tape.tsx';
import { wholeNumber } from '#src/lib/whole-number.ts';
import { rowTicks } from '#src/features/part-lists/hooks/row-tape.ts';

type RowTapeProps = { good: number; open: number };

export function readyWords(good: number, open: number): string {
  if (open === 0) return good === 1 ? 'The one row is good.' : `All ${wholeNumber(good)} rows are good.`;
  const needs = open === 1 ? '1 row needs you' : `${wholeNumber(open)} rows need you`;
  return `${needs}; ${good === 1 ? '1 is' : `${wholeNumber(good)} are`} good.`;
}

/** How far the list is from being saved, on the tape: rows that are good of all rows that hold a part. */
export function RowTape({ good, open }: RowTapeProps) {
  const all = good + open;
  if (all === 0) return null;
  return (
    <Tape
      label={readyWords(good, open)}
      to={all}
      {...rowTicks(all)}
      majorLabel={wholeNumber}
      marks={[
        {
          key: 'good',
          at: good,
          kind: 'bound',
          label:
            open === 0 ? `all ${wholeNumber(all)} good` : `${wholeNumber(good)} good of ${wholeNumber(all)}`,
          side: 'left',
        },
      ]}
    />
  );
}
