import {
  columnCells,
  isGradeCell,
  isMarkCell,
  isQuantityCell,
  isSectionCell,
  isWrittenLength,
  shareOf,
} from '#shared/domain/part-list/column-cells.ts';
import { readQuantity } from '#shared/domain/part-list/read-quantity.ts';
import type { ReadSectionCell } from '#shared/domain/part-list/section-cells.ts';
import type { Row } from '#shared/domain/part-list/split-rows.ts';
import type { ColumnMapping, PartField } from '#shared/domain/part-list/types.ts';

/** This share of the filled cells must say the same before a column without heading is taken for it. */
const NEARLY_ALL = 0.8;
/** Bare numbers are lengths beside counts only when none of them could be a count and no count a length. */
const MOST_COUNT = 99;
const LEAST_BARE_LENGTH = 100;

function bareNumbers(cells: readonly string[]): number[] | null {
  const numbers = cells.map((cell) =>
    /^\d+(?:[.,]\d+)?$/.test(cell) ? Number(cell.replace(',', '.')) : NaN,
  );
  return numbers.length > 0 && numbers.every((number) => !Number.isNaN(number)) ? numbers : null;
}

function countsOf(cell: string): number[] {
  const reading = readQuantity(cell);
  return reading.ok ? [reading.quantity] : [];
}

/** Takes a column for a field only where exactly one column can be it. */
function only(columns: readonly number[]): number | undefined {
  return columns.length === 1 ? columns[0] : undefined;
}

/** Columns of a list without headings, told by their cells; a field two columns could be is left open. */
export function inferColumns(
  rows: readonly Row[],
  width: number,
  readSectionCell: ReadSectionCell,
): ColumnMapping {
  const mapping: ColumnMapping = {};
  const cells = Array.from({ length: width }, (_none, column) => columnCells(rows, column));
  const open = new Set(cells.flatMap((column, index) => (column.length > 0 ? [index] : [])));
  const among = (test: (column: readonly string[]) => boolean) =>
    [...open].filter((index) => test(cells[index] ?? []));
  const take = (field: PartField, columns: readonly number[]) => {
    const column = only(columns);
    if (column === undefined) return;
    mapping[field] = column;
    open.delete(column);
  };
  take(
    'section',
    among((column) => shareOf(column, (cell) => isSectionCell(cell, readSectionCell)) >= NEARLY_ALL),
  );
  take(
    'grade',
    among((column) => shareOf(column, isGradeCell) >= NEARLY_ALL),
  );
  take(
    'length',
    among((column) => shareOf(column, isWrittenLength) >= NEARLY_ALL / 2 && !bareNumbers(column)),
  );
  const numeric = among((column) => bareNumbers(column) !== null);
  if (mapping.length === undefined) {
    take(
      'length',
      numeric.filter((index) => Math.min(...(bareNumbers(cells[index] ?? []) ?? [0])) >= LEAST_BARE_LENGTH),
    );
  }
  take(
    'quantity',
    among(
      (column) =>
        shareOf(column, isQuantityCell) >= NEARLY_ALL &&
        column.flatMap(countsOf).every((count) => count <= MOST_COUNT),
    ),
  );
  take(
    'mark',
    among((column) => shareOf(column, isMarkCell) >= NEARLY_ALL),
  );
  return mapping;
}
