import { useEffect, useMemo, useRef, useState } from 'react';
import type { PartListProblem } from '#shared/domain/part-list/types.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { countOf } from '#src/lib/formats.ts';
import { focusNextProblem } from '#src/features/part-lists/hooks/problem-focus.ts';
import {
  nextProblem,
  problemKey,
  problemRows,
  rowsBySameness,
  rowsToShow,
} from '#src/features/part-lists/hooks/problem-rows.ts';
import {
  isCurrent,
  type UploadDraft,
  type UploadEvent,
} from '#src/features/part-lists/hooks/upload-draft.ts';
import { ProblemCard, type ProblemActs } from '#src/features/part-lists/components/problem-card.tsx';

type ProblemListProps = {
  draft: UploadDraft;
  dispatch: (event: UploadEvent) => void;
  /** Every problem is settled: on to what comes next. */
  onSettled: () => void;
};

const SHOWN_AT_ONCE = 100;
/** More rows wrong than right: hardly so many slips, most likely one column or the unit. */
const MOST_WRONG = 0.5;
const MANY_ROWS = 20;

type Place = { row: number; key: string };

/** Every row that needs a person, at once, in the order of the file; settled rows stay in their place. */
export function ProblemList({ draft, dispatch, onSettled }: ProblemListProps) {
  const [limit, setLimit] = useState(SHOWN_AT_ONCE);
  const left = useRef<Place | null>(null);
  const reading = draft.preview?.reading ?? null;
  const of = draft.preview?.of ?? null;
  const current = isCurrent(draft);
  const rows = useMemo(() => (reading && of ? problemRows(reading, of) : []), [reading, of]);
  const sameRows = useMemo(() => rowsBySameness(reading?.problems ?? []), [reading]);
  const { shown, hidden } = useMemo(() => rowsToShow(rows, limit), [rows, limit]);
  const open = useMemo(() => rows.filter(({ state }) => state === 'open').length, [rows]);

  /** The place to type next. A cell that is still wrong keeps its place; else it goes down the file. */
  const goOn = (from: Place, mayStay: boolean) => {
    const stays =
      mayStay &&
      rows.some(({ row, problems }) => problems.some((p) => problemKey(row, p.column) === from.key));
    const next = stays ? from.key : nextProblem(rows, from);
    if (next === null) onSettled();
    else document.getElementById(next)?.focus();
  };
  useEffect(() => {
    if (!current || !left.current) return;
    const from = left.current;
    left.current = null;
    goOn(from, true);
  });

  const acts = useMemo<ProblemActs>(() => {
    const goFrom = ({ row, column }: Pick<PartListProblem, 'row' | 'column'>) => {
      left.current = { row, key: problemKey(row, column) };
    };
    return {
      onFix: (problem, text, rowsToFix) => {
        const { column } = problem;
        if (!column) return;
        goFrom(problem);
        dispatch({ type: 'cells-fixed', cells: rowsToFix.map((row) => ({ row, field: column, text })) });
      },
      onPass: () => focusNextProblem(),
      onLeaveOut: (row, rowsToLeave) => {
        goFrom({ row, column: null });
        dispatch({ type: 'rows-left-out', rows: rowsToLeave });
      },
      onUnfix: (row) => dispatch({ type: 'row-unfixed', row }),
      onTakeBack: (row) => dispatch({ type: 'row-taken-back', row }),
    };
  }, [dispatch]);

  if (!reading) return null;
  const good = reading.lines.length;
  const mostWrong = open >= MANY_ROWS && open > (open + good) * MOST_WRONG;

  return (
    <div aria-busy={!current || undefined} className="mt-5 empty:hidden">
      {mostWrong && (
        <Notice className="mb-4" title="Most rows fail in some way">
          So many slips are rare. Look at the unit and the columns above first: one of them set right may
          settle them all.
        </Notice>
      )}
      {rows.length > 0 && (
        <ol className="m-0 list-none border-t-2 border-ink p-0">
          {shown.map((row) => (
            <ProblemCard key={row.row} row={row} sameRows={sameRows} acts={acts} />
          ))}
        </ol>
      )}
      {hidden > 0 && (
        <div className="mt-3 flex flex-wrap items-center gap-3">
          <p>{countOf(hidden, 'more row', 'more rows')} below.</p>
          <Button size="small" onClick={() => setLimit(limit + SHOWN_AT_ONCE)}>
            Show {Math.min(hidden, SHOWN_AT_ONCE)} more
          </Button>
        </div>
      )}
    </div>
  );
}
