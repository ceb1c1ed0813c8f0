import type { Job } from '#shared/schemas/jobs.ts';
import { Figure, FigureRow } from '#src/components/figure-row.tsx';
import { progressWords } from '#src/lib/progress-words.ts';
import { wholeNumber } from '#src/lib/whole-number.ts';

/** What a job asks for and how far it has come. */
export function JobFigures({ job }: { job: Job }) {
  const { partLists, pieces, piecesPlanned: planned, piecesCut: cut } = job;
  if (partLists === 0) return null;
  return (
    <FigureRow>
      <Figure value={partLists} label={partLists === 1 ? 'part list' : 'part lists'} />
      <Figure value={wholeNumber(pieces)} label={pieces === 1 ? 'piece' : 'pieces'} />
      <Figure value={wholeNumber(planned)} label="in plans" />
      <Figure value={wholeNumber(cut)} label="cut" note={progressWords({ pieces, planned, cut })} />
    </FigureRow>
  );
}
