import { Check, X } from 'lucide-react';
import type { PartListProblem } from '#shared/domain/part-list/types.ts';
import { Button } from '#src/components/button.tsx';
import { classNames } from '#src/components/class-names.ts';
import { FIELD_WORDS, columnLetter } from '#src/features/part-lists/hooks/list-words.ts';
import { problemKey, type ProblemRow } from '#src/features/part-lists/hooks/problem-rows.ts';
import { ProblemLine } from '#src/features/part-lists/components/problem-line.tsx';

export type ProblemActs = {
  onFix: (problem: PartListProblem, text: string, rows: readonly number[]) => void;
  onPass: () => void;
  onLeaveOut: (row: number, rows: readonly number[]) => void;
  onUnfix: (row: number) => void;
  onTakeBack: (row: number) => void;
};

type ProblemCardProps = {
  row: ProblemRow;
  sameRows: (problem: PartListProblem) => readonly number[];
  acts: ProblemActs;
};

/** The row as it stands in the file, cell by cell; what is wrong is boxed, blank or not. */
function RowAsRead({ cells, wrongCells }: Pick<ProblemRow, 'cells' | 'wrongCells'>) {
  const filled = cells.flatMap((cell, index) =>
    cell.trim() || wrongCells.includes(index) ? [{ index, text: cell.trim() }] : [],
  );
  if (filled.length === 0) return null;
  return (
    <p className="mb-2 flex flex-wrap gap-x-3 gap-y-1 font-mono text-[0.875rem] text-muted">
      {filled.map(({ index, text }) => (
        <span key={index} className="break-all">
          <span aria-hidden className="select-none">
            {columnLetter(index)}{' '}
          </span>
          <span
            className={classNames(
              'text-ink',
              wrongCells.includes(index) && 'border border-oxide bg-chalk px-1',
            )}
          >
            {text || <span className="font-sans text-muted">blank</span>}
          </span>
        </span>
      ))}
    </p>
  );
}

function Settled({ row }: { row: ProblemRow }) {
  if (row.state === 'left-out')
    return (
      <p className="flex gap-1.5">
        <X aria-hidden size={18} className="mt-0.5 shrink-0" />
        left out; it will not be on the list
      </p>
    );
  return (
    <p className="flex gap-1.5">
      <Check aria-hidden size={18} className="mt-0.5 shrink-0" />
      <span>
        {row.fixes.map(({ field, was, now }, index) => (
          <span key={field}>
            {index > 0 && ', '}
            {FIELD_WORDS[field]}{' '}
            {was ? (
              <>
                <s className="font-mono text-muted">{was}</s> is now
              </>
            ) : (
              'is'
            )}{' '}
            <span className="font-mono font-medium">{now || 'blank'}</span>
          </span>
        ))}
      </span>
    </p>
  );
}

/** One row of the file that needs, or needed, a person. */
export function ProblemCard({ row, sameRows, acts }: ProblemCardProps) {
  const open = row.state === 'open';
  const name = row.mark ? `row ${row.row}, mark ${row.mark}` : `row ${row.row}`;
  return (
    <li
      className={classNames(
        'grid gap-x-5 gap-y-2 border-b border-line py-3 sm:grid-cols-[9rem_minmax(0,1fr)_auto]',
        open ? 'border-l-4 border-l-oxide pl-3' : 'border-l-4 border-l-line pl-3',
      )}
    >
      <h3 className="font-sans text-base leading-snug font-normal">
        <span className="text-muted">Row</span>{' '}
        <span className="font-mono text-[1.125rem] font-bold">{row.row}</span>
        <span className="block font-mono font-medium break-all max-sm:ml-3 max-sm:inline">
          {row.mark || <span className="font-sans text-muted">no mark</span>}
        </span>
      </h3>
      <div className="min-w-0">
        {open ? (
          <>
            <RowAsRead cells={row.cells} wrongCells={row.wrongCells} />
            <div className="grid gap-4">
              {row.problems.map((problem) => (
                <ProblemLine
                  key={`${problem.column ?? 'row'} ${problem.code}`}
                  id={problemKey(row.row, problem.column)}
                  problem={problem}
                  sameRows={sameRows(problem)}
                  onFix={(text, rows) => acts.onFix(problem, text, rows)}
                  onLeaveOut={(rows) => acts.onLeaveOut(row.row, rows)}
                  onPass={acts.onPass}
                />
              ))}
            </div>
          </>
        ) : (
          <Settled row={row} />
        )}
      </div>
      <div className="flex items-start gap-2 sm:justify-end">
        {open && row.fixes.length > 0 && (
          <Button
            size="small"
            variant="quiet"
            onClick={() => acts.onUnfix(row.row)}
            aria-label={`Undo ${name}`}
          >
            Undo
          </Button>
        )}
        {open ? (
          <Button
            size="small"
            onClick={() => acts.onLeaveOut(row.row, [row.row])}
            aria-label={`Leave out ${name}`}
          >
            Leave out
          </Button>
        ) : (
          <Button
            size="small"
            variant="quiet"
            className="sm:-mt-1.5"
            onClick={() => (row.state === 'fixed' ? acts.onUnfix(row.row) : acts.onTakeBack(row.row))}
            aria-label={`${row.state === 'fixed' ? 'Undo' : 'Take back'} ${name}`}
          >
            {row.state === 'fixed' ? 'Undo' : 'Take back'}
          </Button>
        )}
      </div>
    </li>
  );
}
