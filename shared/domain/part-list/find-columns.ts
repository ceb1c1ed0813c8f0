import { assignColumns, type AssignedColumns } from '#shared/domain/part-list/assign-columns.ts';
import { findHeadingRow, findTitleUnit } from '#shared/domain/part-list/find-heading-row.ts';
import { readHeading, type Heading } from '#shared/domain/part-list/headings.ts';
import { inferColumns } from '#shared/domain/part-list/infer-columns.ts';
import type { ReadSectionCell } from '#shared/domain/part-list/section-cells.ts';
import type { Row } from '#shared/domain/part-list/split-rows.ts';
import {
  PART_FIELDS,
  type ColumnMapping,
  type PartField,
  type PartListColumn,
} from '#shared/domain/part-list/types.ts';
import type { LengthUnit } from '#shared/domain/units.ts';

export type FoundColumns = {
  readonly mapping: ColumnMapping;
  readonly sectionSize: number | null;
  readonly lengthUnit: LengthUnit | null;
  readonly widthUnit: LengthUnit | null;
  /** Physical row of the headings, or null. */
  readonly headingRow: number | null;
  /** Physical row of the last line above the parts: titles, headings, units. 0 when there is none. */
  readonly lastTopRow: number;
  readonly headings: readonly Heading[];
  readonly columns: readonly PartListColumn[];
};

const SAMPLES = 3;

/** Words over columns of digits in a language the headings list does not know: still no part. */
function isWordRow(rows: readonly Row[]): boolean {
  const [first, ...rest] = rows;
  const written = first?.cells.filter((cell) => cell.trim() !== '') ?? [];
  if (written.length < 3 || written.some((cell) => /\d/.test(cell))) return false;
  const next = rest.slice(0, 20).filter(({ cells }) => cells.some((cell) => cell.trim() !== ''));
  return next.length > 0 && next.every(({ cells }) => cells.filter((cell) => /\d/.test(cell)).length >= 2);
}

/** Headings with their units row laid over them; `Length` over `ft` | `in` becomes feet and inches. */
function layUnits(headings: readonly Heading[], units: readonly (LengthUnit | null)[]): Heading[] {
  return headings.map((heading, column) => {
    const unit = units[column] ?? null;
    if (unit === null) return heading;
    const left = headings[column - 1];
    if (
      heading.meaning === null &&
      unit === 'in' &&
      left?.meaning === 'length' &&
      units[column - 1] === 'ft'
    ) {
      return { meaning: 'inches', rank: 1, unit };
    }
    return { ...heading, unit: heading.unit ?? unit };
  });
}

/** The unit the length column's own heading names. A length over feet and inches is exact in inches. */
function lengthUnitOf(mapping: ColumnMapping, headings: readonly Heading[]): LengthUnit | null {
  if (mapping.length === undefined) return mapping.feet === undefined ? null : 'in';
  const heading = headings[mapping.length];
  if (heading?.unit) return heading.unit;
  if (heading?.meaning === 'feet') return 'ft';
  return heading?.meaning === 'inches' ? 'in' : null;
}

function describe(
  rows: readonly Row[],
  body: readonly Row[],
  found: { headings: readonly Heading[]; mapping: ColumnMapping; sectionSize: number | null },
  headingCells: readonly string[],
  isSure: (column: number) => boolean,
): PartListColumn[] {
  const width = rows.reduce((most, { cells }) => Math.max(most, cells.length), 0);
  const fieldOf = new Map<number, PartField>();
  for (const field of PART_FIELDS) {
    const column = found.mapping[field];
    if (column !== undefined) fieldOf.set(column, field);
  }
  if (found.sectionSize !== null) fieldOf.set(found.sectionSize, 'section');
  return Array.from({ length: width }, (_none, index) => {
    const samples: string[] = [];
    for (const { cells } of body) {
      const cell = cells[index]?.trim() ?? '';
      if (cell !== '' && !samples.includes(cell)) samples.push(cell);
      if (samples.length === SAMPLES) break;
    }
    return {
      index,
      heading: headingCells[index]?.trim() ?? '',
      field: fieldOf.get(index) ?? null,
      sure: isSure(index),
      samples,
    };
  });
}

/** Finds what each column holds: by the person's mapping, by headings, or by the cells themselves. */
export function findColumns(
  rows: readonly Row[],
  given: ColumnMapping | undefined,
  readSectionCell: ReadSectionCell,
): FoundColumns {
  const heading = findHeadingRow(rows);
  const filled = rows.filter(({ cells }) => cells.some((cell) => cell.trim() !== ''));
  const wordRow = heading === null && isWordRow(filled) ? (filled[0] ?? null) : null;
  const headingRow = heading ? (rows[heading.index] ?? null) : wordRow;
  const bottom = heading && heading.units.length > 0 ? rows[heading.index + 1] : headingRow;
  const lastTopRow = bottom?.row ?? 0;
  const body = rows.filter(({ row }) => row > lastTopRow);
  const headingCells = headingRow?.cells ?? [];
  const headings = heading ? layUnits(heading.headings, heading.units) : headingCells.map(readHeading);
  const width = rows.reduce((most, { cells }) => Math.max(most, cells.length), 0);
  const assigned: AssignedColumns = heading
    ? assignColumns(headings, body, readSectionCell)
    : { mapping: inferColumns(body, width, readSectionCell), sectionSize: null, unsure: new Set() };
  const mapping = given ?? assigned.mapping;
  const halves = [assigned.mapping.section, assigned.sectionSize];
  const joined =
    mapping.section !== undefined && assigned.sectionSize !== null && halves.includes(mapping.section);
  const sectionSize = joined ? assigned.sectionSize : null;
  const effective = joined ? { ...mapping, section: assigned.mapping.section } : mapping;
  const titleUnit = heading ? findTitleUnit(rows.slice(0, heading.index)) : null;
  const taken = new Set(Object.values(effective));
  const isSure = (column: number): boolean => {
    if (given) return true;
    if (!heading) return false;
    if (taken.has(column)) return !assigned.unsure.has(column);
    return (headings[column]?.meaning ?? null) !== null || (headingCells[column]?.trim() ?? '') === '';
  };
  return {
    mapping: effective,
    sectionSize,
    lengthUnit: lengthUnitOf(effective, headings) ?? titleUnit,
    widthUnit: effective.width === undefined ? null : (headings[effective.width]?.unit ?? null),
    headingRow: headingRow?.row ?? null,
    lastTopRow,
    headings,
    columns: describe(rows, body, { headings, mapping: effective, sectionSize }, headingCells, isSure),
  };
}
