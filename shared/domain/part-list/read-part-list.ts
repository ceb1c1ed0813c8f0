import { readGrade, type GradeReading } from '#shared/domain/grade.ts';
import { columnCells } from '#shared/domain/part-list/column-cells.ts';
import { decodeFile } from '#shared/domain/part-list/decode-file.ts';
import { findColumns, type FoundColumns } from '#shared/domain/part-list/find-columns.ts';
import { findSeparator } from '#shared/domain/part-list/find-separator.ts';
import { findDecimalMark, findListUnit, type ListUnit } from '#shared/domain/part-list/list-unit.ts';
import { createLengthCells } from '#shared/domain/part-list/read-row-length.ts';
import { readRow, type ListCustom, type RowCells } from '#shared/domain/part-list/read-row.ts';
import { remarkRepeatedMarks } from '#shared/domain/part-list/repeated-marks.ts';
import { rowKind } from '#shared/domain/part-list/row-kind.ts';
import { createSectionCells, type ReadSectionCell } from '#shared/domain/part-list/section-cells.ts';
import { splitRows, type Row, type Separator } from '#shared/domain/part-list/split-rows.ts';
import type {
  PartField,
  PartListChoices,
  PartListLine,
  PartListProblem,
  PartListReading,
} from '#shared/domain/part-list/types.ts';
import type { System } from '#shared/domain/section/types.ts';
import type { LengthUnit } from '#shared/domain/units.ts';

type Fatal = { readonly code: string; readonly message: string };

/** Enough numbers of a list to see which decimal mark it uses. */
const NUMBERS_LOOKED_AT = 5000;

function unreadFile(fatal: Fatal, choices: PartListChoices): PartListReading {
  return {
    lines: [],
    problems: [],
    mapping: {},
    unit: choices.unit ?? 'in',
    unitFrom: choices.unit ? 'given' : 'default',
    headingRow: null,
    columns: [],
    ignored: [],
    rows: [],
    encoding: '',
    separator: ',',
    fatal,
  };
}

/** A cell without the wrapping that keeps a spreadsheet from changing it: `="12-6"`. */
function cleanCell(cell: string | undefined): string {
  const text = (cell ?? '').trim();
  return /^="([^"]*)"$/.exec(text)?.[1]?.trim() ?? text;
}

function joinSection(cells: readonly string[], found: FoundColumns): string {
  const shape = found.mapping.section === undefined ? '' : cleanCell(cells[found.mapping.section]);
  const size = found.sectionSize === null ? '' : cleanCell(cells[found.sectionSize]);
  return `${shape} ${size}`.trim();
}

function cellsOf({ row, cells }: Row, found: FoundColumns, choices: PartListChoices): RowCells {
  const fixes = choices.fixes?.[row];
  const original = (field: PartField): string => {
    if (field === 'section') return joinSection(cells, found);
    const column = found.mapping[field];
    return column === undefined ? '' : cleanCell(cells[column]);
  };
  return { row, original, text: (field) => fixes?.[field]?.trim() ?? original(field) };
}

/** Lengths as the list writes them, over one column or two, for its unit and its decimal mark. */
function lengthCells(body: readonly Row[], { mapping }: FoundColumns): string[] {
  const columns = [mapping.length, mapping.width].filter((column) => column !== undefined);
  return columns.flatMap((column) => columnCells(body, column, NUMBERS_LOOKED_AT).map(cleanCell));
}

function systemsOf(body: readonly Row[], found: FoundColumns, readSectionCell: ReadSectionCell): System[] {
  return body.slice(0, 500).flatMap(({ cells }) => {
    const text = joinSection(cells, found);
    const reading = text === '' ? null : readSectionCell(text);
    return reading?.outcome === 'read' ? [reading.section.system] : [];
  });
}

/** A width without unit on a list in feet is inches, on one in metres millimetres: plate is sized so. */
function widthUnitOf(found: FoundColumns, unit: LengthUnit): LengthUnit {
  if (found.widthUnit) return found.widthUnit;
  if (unit === 'ft') return 'in';
  return unit === 'm' ? 'mm' : unit;
}

function missingColumns(
  found: FoundColumns,
  body: readonly Row[],
  readSectionCell: ReadSectionCell,
): Fatal | null {
  const { mapping } = found;
  const missing = (['mark', 'quantity', 'section'] as const).filter(
    (field) => mapping[field] === undefined,
  ) as string[];
  const hasLength =
    mapping.length !== undefined || mapping.feet !== undefined || mapping.inches !== undefined;
  const namesLength = ({ cells }: Row) => {
    const reading = readSectionCell(joinSection(cells, found));
    return reading.outcome === 'read' && reading.lengthNm !== undefined;
  };
  if (!hasLength && (mapping.section === undefined || !body.some(namesLength))) missing.push('length');
  if (missing.length === 0) return null;
  const columns = missing.join(', ');
  const message =
    missing.length === 1
      ? `No column for ${columns} was found. Say which column holds it, or add one to the file.`
      : `No columns for ${columns} were found. Say which columns hold them, or add them to the file.`;
  return { code: 'columns-unknown', message };
}

function createGradeCells(): (text: string) => GradeReading {
  const read = new Map<string, GradeReading>();
  return (text) => {
    const known = read.get(text) ?? readGrade(text);
    read.set(text, known);
    return known;
  };
}

function customOf(
  found: FoundColumns,
  body: readonly Row[],
  unit: LengthUnit,
  separator: Separator,
): ListCustom {
  const decimal = findDecimalMark(lengthCells(body, found), separator);
  return {
    unit,
    widthUnit: widthUnitOf(found, unit),
    decimal,
    splitLength: found.mapping.feet !== undefined || found.mapping.inches !== undefined,
    readSectionCell: createSectionCells({
      hasQuantityColumn: found.mapping.quantity !== undefined,
      unitHint: unit === 'in' || unit === 'ft' ? 'in' : 'mm',
    }),
    readLengthCell: createLengthCells(decimal),
    readGradeCell: createGradeCells(),
  };
}

function readRows(
  rows: readonly Row[],
  found: FoundColumns,
  custom: ListCustom,
  choices: PartListChoices,
): Pick<PartListReading, 'lines' | 'problems' | 'ignored'> {
  const lines: PartListLine[] = [];
  const problems: PartListProblem[] = [];
  const ignored: { row: number; kind: PartListReading['ignored'][number]['kind'] }[] = [];
  const skips = new Set(choices.skips);
  for (const row of rows) {
    const cells = cellsOf(row, found, choices);
    const length = cells.text('length') || cells.text('feet') || cells.text('inches');
    const kind = rowKind({
      mark: cells.text('mark'),
      quantity: cells.text('quantity'),
      section: cells.text('section'),
      length,
      all: choices.fixes?.[row.row]
        ? [...row.cells, ...Object.values(choices.fixes[row.row] ?? {})]
        : row.cells,
    });
    if (row.row <= found.lastTopRow)
      ignored.push({ row: row.row, kind: kind === 'blank' ? 'blank' : 'heading' });
    else if (skips.has(row.row)) ignored.push({ row: row.row, kind: 'skipped' });
    else if (kind !== 'part') ignored.push({ row: row.row, kind });
    else {
      const reading = readRow(cells, custom);
      if (reading.ok) lines.push(reading.line);
      else problems.push(...reading.troubles.map((trouble) => ({ row: row.row, ...trouble })));
    }
  }
  return { lines: remarkRepeatedMarks(lines), problems, ignored };
}

/**
 * Reads a part list from the bytes of a CSV file or from pasted text. Every row becomes a line, or its
 * problems all at once, or is named as ignored; nothing is guessed and nothing is lost. Pure: the same
 * input and choices give the same reading, so that the page may show what the server will store.
 * Lengths in nanometres, masses in milligrams.
 */
export function readPartList(input: Uint8Array | string, choices: PartListChoices): PartListReading {
  const decoded = decodeFile(input);
  if (!decoded.ok) return unreadFile({ code: decoded.code, message: decoded.message }, choices);
  const separator = findSeparator(decoded.text);
  const all = splitRows(decoded.text, separator);
  const said = /^sep=/i.test(all[0]?.cells.join('') ?? '') ? 1 : 0;
  const rows = all.slice(said);
  const firstLook = createSectionCells({ hasQuantityColumn: true });
  const found = findColumns(rows, choices.mapping, firstLook);
  const body = rows.filter(({ row }) => row > found.lastTopRow);
  const listUnit: ListUnit = findListUnit({
    given: choices.unit,
    heading: found.lengthUnit,
    lengthCells: lengthCells(body, found),
    systems: systemsOf(body, found, firstLook),
  });
  const reading: Omit<PartListReading, 'lines' | 'problems' | 'ignored' | 'fatal'> = {
    mapping: found.mapping,
    unit: listUnit.unit,
    unitFrom: listUnit.from,
    headingRow: found.headingRow,
    columns: found.columns,
    rows: all.map(({ row, cells }) => ({ row, cells })),
    encoding: decoded.encoding,
    separator,
  };
  const unknown = missingColumns(found, body, firstLook);
  if (unknown) return { ...reading, lines: [], problems: [], ignored: [], fatal: unknown };
  const custom = customOf(found, body, listUnit.unit, separator);
  const read = readRows(rows, found, custom, choices);
  const empty = read.lines.length === 0 && read.problems.length === 0;
  const skippedAll = read.ignored.some(({ kind }) => kind === 'skipped');
  const fatal =
    empty && !skippedAll
      ? {
          code: 'no-rows',
          message: 'The file has headings but no parts under them. Choose the file with the part list.',
        }
      : null;
  const separatorRow = said === 1 ? [{ row: 1, kind: 'heading' as const }] : [];
  return { ...reading, ...read, ignored: [...separatorRow, ...read.ignored], fatal };
}
