import { parseLength } from '#shared/domain/length.ts';
import { readQuantity } from '#shared/domain/part-list/read-quantity.ts';
import type { ReadSectionCell } from '#shared/domain/part-list/section-cells.ts';
import type { Row } from '#shared/domain/part-list/split-rows.ts';
import { plainMarks } from '#shared/domain/plain-marks.ts';

/** Enough cells to know a column by. */
const SAMPLED = 200;

/** The filled cells of one column, the first few hundred, without blanks. */
export function columnCells(rows: readonly Row[], column: number, most = SAMPLED): string[] {
  const cells: string[] = [];
  for (const { cells: all } of rows) {
    const cell = all[column]?.trim() ?? '';
    if (cell !== '') cells.push(cell);
    if (cells.length === most) break;
  }
  return cells;
}

export function shareOf(cells: readonly string[], test: (cell: string) => boolean): number {
  return cells.length === 0 ? 0 : cells.filter(test).length / cells.length;
}

/** A section that is read, or one that is only short of a word (`C6`, `4x4x3/8`). */
export function isSectionCell(cell: string, readSectionCell: ReadSectionCell): boolean {
  if (!/\d/.test(cell)) return false;
  const reading = readSectionCell(cell);
  return reading.outcome === 'read' || ['section-incomplete', 'section-no-family'].includes(reading.code);
}

export function isQuantityCell(cell: string): boolean {
  return readQuantity(cell).ok;
}

/** Any length that is read; numbers without a mark count. */
export function isLengthCell(cell: string): boolean {
  return parseLength(cell, { unit: 'in' }).ok;
}

/** A length nobody could take for a count: a foot or inch mark, a unit, a fraction, feet-dash-inches. */
export function isWrittenLength(cell: string): boolean {
  const plain = plainMarks(cell);
  return /['"]|\d ?(?:mm|cm|m|in|ft)\.?$|\d+\/\d+|^\d+-\d/.test(plain) && isLengthCell(cell);
}

const GRADE =
  /^(?:astm )?(?:a-?\d{2,4}\b.*|s ?(?:235|275|355|420|460).*|gr\.? ?\d+|st ?\d{2}.*|304l?|316l?|6061.*|ms|hr|crs?)$/;

export function isGradeCell(cell: string): boolean {
  return GRADE.test(plainMarks(cell));
}

/** A piece mark: short, with a letter, no sentence. */
export function isMarkCell(cell: string): boolean {
  return /^[a-z0-9][a-z0-9 ._/-]{0,19}$/i.test(cell) && /[a-z]/i.test(cell) && /\d/.test(cell);
}
