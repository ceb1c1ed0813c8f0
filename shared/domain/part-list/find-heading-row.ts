import { readHeading, readUnitWord, type Heading } from '#shared/domain/part-list/headings.ts';
import type { Row } from '#shared/domain/part-list/split-rows.ts';
import type { LengthUnit } from '#shared/domain/units.ts';

export type HeadingRow = {
  /** Index into the rows, not a physical line. */
  readonly index: number;
  readonly headings: readonly Heading[];
  /** Units written in a row of their own right below the headings, by column; empty when there is none. */
  readonly units: readonly (LengthUnit | null)[];
};

/** Title lines above the headings that a list may have; a heading lower than this is not looked for. */
const DEEPEST_HEADING = 40;
/** At least two columns a part list cannot do without must be named. */
const LEAST_CORE = 2;

const CORE: Readonly<Record<string, string>> = {
  mark: 'mark',
  quantity: 'quantity',
  section: 'section',
  size: 'section',
  shape: 'section',
  material: 'section',
  length: 'length',
  feet: 'length',
  inches: 'length',
};

/** How much a row looks like headings: named columns a plan needs, then all named columns. */
export function scoreHeadings(headings: readonly Heading[]): { core: number; score: number } {
  const named = headings.filter(({ meaning }) => meaning !== null);
  const cores = (most: number) =>
    new Set(named.flatMap(({ meaning, rank }) => (rank <= most ? (CORE[meaning ?? ''] ?? []) : []))).size;
  // Likely words count only beside one that is certain.
  const core = cores(4) > 0 ? cores(9) : 0;
  const sure = named.filter(({ rank }) => rank < 5).length;
  return { core, score: core * 10 + sure + (named.length - sure) / 2 };
}

function unitsBelow(row: Row | undefined): readonly (LengthUnit | null)[] {
  if (!row) return [];
  const written = row.cells.filter((cell) => cell.trim() !== '');
  const units = row.cells.map(readUnitWord);
  const spoken = /^(?:[-–—#]|pcs?|no|ea|kg|lbs?|kg\/m|lb\/ft|text)\.?$/i;
  const strange = row.cells.some(
    (cell, index) =>
      cell.trim() !== '' && !units[index] && !spoken.test(cell.trim().replace(/^[[(]|[\])]$/g, '')),
  );
  return written.length > 0 && !strange && units.some((unit) => unit !== null) ? units : [];
}

/** A part: `ea` and `L` in its cells are not headings. */
function isMostlyDigits({ cells }: Row): boolean {
  const written = cells.filter((cell) => cell.trim() !== '');
  return written.filter((cell) => /\d/.test(cell)).length * 2 > written.length;
}

/** The row that names the columns, wherever it stands, or null. */
export function findHeadingRow(rows: readonly Row[]): HeadingRow | null {
  let best: { index: number; headings: Heading[]; score: number } | null = null;
  for (const [index, row] of rows.slice(0, DEEPEST_HEADING).entries()) {
    if (isMostlyDigits(row)) continue;
    const headings = row.cells.map(readHeading);
    const { core, score } = scoreHeadings(headings);
    if (core >= LEAST_CORE && (best === null || score > best.score)) best = { index, headings, score };
  }
  return best && { index: best.index, headings: best.headings, units: unitsBelow(rows[best.index + 1]) };
}

/** `All lengths in mm`, `UNITS: INCHES` in the title lines of a list, or null. */
export function findTitleUnit(titles: readonly Row[]): LengthUnit | null {
  for (const { cells } of titles) {
    const said =
      /(?:\bdim(?:ension)?s?|\blengths?|\bunits?|\bma(?:ß|ss)e|\bcotes)\b.*?\b(mm|millimet(?:er|re)s?|inch(?:es)?|cm|feet|met(?:er|re)s)\b/i.exec(
        cells.join(' '),
      );
    const unit = said ? readUnitWord(said[1] ?? '') : null;
    if (unit) return unit;
  }
  return null;
}
