import Papa from 'papaparse';
import type { PartListReading } from '#shared/domain/part-list/types.ts';

export type Separator = PartListReading['separator'];
export const SEPARATORS = [',', ';', '\t', '|'] as const satisfies readonly Separator[];

export type Row = {
  /** Physical line of the file on which the row starts, from 1. */
  readonly row: number;
  readonly cells: readonly string[];
};

/** A note of more lines than this is a quote mark that nobody closed. */
const MOST_LINES_OF_A_CELL = 40;
function splitQuoted(text: string, separator: Separator): string[] | null {
  const { data, errors } = Papa.parse<string[]>(text, { delimiter: separator, newline: '\n' });
  const cells = data[0];
  return errors.some(({ type }) => type === 'Quotes') || data.length !== 1 || !cells ? null : cells;
}

/** Quote marks taken as they stand; those that wrap a whole cell come off. */
function splitLiterally(line: string, separator: Separator): string[] {
  return line.split(separator).map((cell) => {
    const trimmed = cell.trim();
    return trimmed.length > 1 && trimmed.startsWith('"') && trimmed.endsWith('"')
      ? trimmed.slice(1, -1)
      : cell;
  });
}

function countSeparators(line: string, separator: Separator): number {
  return line.split(separator).length - 1;
}

/** The separator count most lines have; a line with that many stands on its own. */
function usualSeparators(lines: readonly string[], separator: Separator): number {
  const counts = new Map<number, number>();
  for (const line of lines.slice(0, 500)) {
    if (line.trim() === '') continue;
    const count = countSeparators(line, separator);
    counts.set(count, (counts.get(count) ?? 0) + 1);
  }
  return [...counts].reduce((best, each) => (each[1] > best[1] ? each : best), [0, 0])[0];
}

/** A cell that holds as many separators as a row, and a line that could be one: a row was swallowed. */
function hasSwallowed(
  lines: readonly string[],
  cells: readonly string[],
  separator: Separator,
  usual: number,
) {
  const inside = lines.reduce((sum, line) => sum + countSeparators(line, separator), 0) - (cells.length - 1);
  return (
    usual > 1 && inside >= usual && lines.slice(1).some((line) => countSeparators(line, separator) >= usual)
  );
}

/** The row that starts at `index` and runs over the next lines, or null when its quote is never closed. */
function joinLines(
  lines: readonly string[],
  index: number,
  separator: Separator,
  usual: number,
): { cells: string[]; extra: number } | null {
  let full = 0;
  for (let extra = 1; extra < MOST_LINES_OF_A_CELL; extra += 1) {
    const next = lines[index + extra];
    if (next === undefined) return null;
    const joined = lines.slice(index, index + extra + 1);
    const cells = next.includes('"') ? splitQuoted(joined.join('\n'), separator) : null;
    if (cells) return hasSwallowed(joined, cells, separator, usual) ? null : { cells, extra };
    // One row may break in its first and in its last cell; a second full line is another row.
    if (usual > 1 && countSeparators(next, separator) >= usual) full += 1;
    if (full > 1) return null;
  }
  return null;
}

/**
 * Splits text into rows, each with the physical line it starts on; blank lines are rows of one empty cell.
 * Quoted cells may run over lines. A line whose quotes do not close is read on its own as it stands, so
 * that one unescaped inch mark cannot swallow the rows below it.
 */
export function splitRows(text: string, separator: Separator): Row[] {
  const lines = text.split(/\r\n|\n|\r/);
  if (lines.at(-1) === '') lines.pop();
  const usual = usualSeparators(lines, separator);
  const rows: Row[] = [];
  for (let index = 0; index < lines.length; index += 1) {
    const line = lines[index] ?? '';
    const row = index + 1;
    if (!line.includes('"')) {
      rows.push({ row, cells: line.split(separator) });
      continue;
    }
    const alone = splitQuoted(line, separator);
    const joined = alone ? null : joinLines(lines, index, separator, usual);
    rows.push({ row, cells: alone ?? joined?.cells ?? splitLiterally(line, separator) });
    index += joined?.extra ?? 0;
  }
  return rows;
}
