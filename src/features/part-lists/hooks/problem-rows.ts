import type {
  PartField,
  PartListChoices,
  PartListProblem,
  PartListReading,
} from '#shared/domain/part-list/types.ts';
import { PROBLEM_ID } from '#src/features/part-lists/hooks/problem-focus.ts';

/** A row of the file that a person had to look at: still open, or settled and open to be taken back. */
export type ProblemRow = {
  readonly row: number;
  readonly mark: string;
  readonly cells: readonly string[];
  readonly state: 'open' | 'fixed' | 'left-out';
  /** Cells of the file that are still wrong, by column from 0. */
  readonly wrongCells: readonly number[];
  /** What is still wrong; empty when settled. */
  readonly problems: readonly PartListProblem[];
  readonly fixes: readonly { readonly field: PartField; readonly was: string; readonly now: string }[];
};

/** Rows with problems, fixes or left out, in the order of the file. Settled rows keep their place, so nothing jumps. */
export function problemRows(reading: PartListReading, choices: PartListChoices): ProblemRow[] {
  const open = new Map<number, PartListProblem[]>();
  for (const problem of reading.problems) {
    if (problem.row < 1) continue;
    const known = open.get(problem.row);
    if (known) known.push(problem);
    else open.set(problem.row, [problem]);
  }
  const fixed = Object.keys(choices.fixes ?? {}).map(Number);
  const skipped = new Set(choices.skips ?? []);
  const wanted = new Set([...open.keys(), ...fixed, ...skipped]);
  if (wanted.size === 0) return [];
  const cellsOf = new Map<number, readonly string[]>();
  for (const { row, cells } of reading.rows) if (wanted.has(row)) cellsOf.set(row, cells);

  return [...wanted]
    .sort((a, b) => a - b)
    .map((row) => {
      const cells = cellsOf.get(row) ?? [];
      const inFile = (field: PartField) => {
        const index = reading.mapping[field];
        return index === undefined ? '' : (cells[index] ?? '').trim();
      };
      const texts = choices.fixes?.[row] ?? {};
      const problems = skipped.has(row) ? [] : (open.get(row) ?? []);
      return {
        row,
        cells,
        mark: texts.mark ?? inFile('mark'),
        state: skipped.has(row) ? 'left-out' : problems.length > 0 ? 'open' : 'fixed',
        problems,
        wrongCells: problems.flatMap(({ column }) => {
          const index = column === null ? undefined : reading.mapping[column];
          return index === undefined ? [] : [index];
        }),
        fixes: (Object.entries(texts) as [PartField, string][]).map(([field, now]) => ({
          field,
          was: inFile(field),
          now,
        })),
      };
    });
}

/** Two problems are the same when the same words stand in the same column and are wrong in the same way. */
function sameness({ column, code, read }: PartListProblem): string {
  return JSON.stringify([column, code, read.trim()]);
}

/** Which rows share each problem: one answer may settle them all. Marks are left alone, every piece has its own. */
export function rowsBySameness(problems: readonly PartListProblem[]): (problem: PartListProblem) => number[] {
  const rows = new Map<string, number[]>();
  for (const problem of problems) {
    if (problem.row < 1 || problem.column === 'mark') continue;
    const known = rows.get(sameness(problem));
    if (known) known.push(problem.row);
    else rows.set(sameness(problem), [problem.row]);
  }
  return (problem) => rows.get(sameness(problem)) ?? [problem.row];
}

/** The place of one problem on the page; it stays the same while the row is read again. */
export function problemKey(row: number, column: PartField | null): string {
  return `${PROBLEM_ID}${row}-${column ?? 'row'}`;
}

/** The open problem to go to next: after this place in the file, from the top when there is none; null when all is done. */
export function nextProblem(
  rows: readonly ProblemRow[],
  after: { row: number; key: string } | null,
): string | null {
  const keys = rows.flatMap(({ row, problems }) =>
    problems.map(({ column }) => ({ row, key: problemKey(row, column) })),
  );
  const first = keys[0]?.key ?? null;
  if (!after) return first;
  const here = keys.findIndex(({ key }) => key === after.key);
  if (here >= 0) return (keys[here + 1] ?? keys[0])?.key ?? null;
  return keys.find(({ row }) => row >= after.row)?.key ?? first;
}

/** Rows the page can carry at once: so many open and so many settled ones, in the order of the file. */
export function rowsToShow(
  rows: readonly ProblemRow[],
  most: number,
): { shown: ProblemRow[]; hidden: number } {
  let open = 0;
  let settled = 0;
  const shown = rows.filter(({ state }) => (state === 'open' ? (open += 1) : (settled += 1)) <= most);
  return { shown, hidden: rows.length - shown.length };
}
