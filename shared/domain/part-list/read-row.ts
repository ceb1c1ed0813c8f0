import type { DecimalMark } from '#shared/domain/exact-number.ts';
import type { GradeReading } from '#shared/domain/grade.ts';
import { formatLengthExact } from '#shared/domain/length.ts';
import { pieceMassMg } from '#shared/domain/mass.ts';
import { readQuantity } from '#shared/domain/part-list/read-quantity.ts';
import {
  lengthTrouble,
  readSplitLength,
  readWholeLength,
  type ReadLengthCell,
  type RowLength,
  type Trouble,
} from '#shared/domain/part-list/read-row-length.ts';
import type { ReadSectionCell } from '#shared/domain/part-list/section-cells.ts';
import type { PartField, PartListLine } from '#shared/domain/part-list/types.ts';
import { plainMarks } from '#shared/domain/plain-marks.ts';
import { PLATE_FAMILIES, type SectionReading } from '#shared/domain/section/types.ts';
import { spreadsheetDamage } from '#shared/domain/spreadsheet-damage.ts';
import type { LengthUnit, Nm } from '#shared/domain/units.ts';

/** What the whole list says about each of its rows. */
export type ListCustom = {
  readonly unit: LengthUnit;
  readonly widthUnit: LengthUnit;
  readonly decimal: DecimalMark | undefined;
  /** The length stands over two columns, feet and inches. */
  readonly splitLength: boolean;
  readonly readSectionCell: ReadSectionCell;
  readonly readLengthCell: ReadLengthCell;
  readonly readGradeCell: (text: string) => GradeReading;
};

export type RowCells = {
  readonly row: number;
  /** A cell's text after fixes, trimmed; '' when the list has no such column. */
  readonly text: (field: PartField) => string;
  /** The customer's own text, fixes left out. */
  readonly original: (field: PartField) => string;
};

export type RowReading =
  | { readonly ok: true; readonly line: PartListLine }
  | { readonly ok: false; readonly troubles: readonly Trouble[] };

/** Longer is a sentence in the wrong column. */
const LONGEST_MARK = 60;

type SectionRead = Extract<SectionReading, { outcome: 'read' }>;

function markTrouble(mark: string): Trouble | null {
  const trouble = (code: string, message: string): Trouble => ({
    column: 'mark',
    read: mark,
    code,
    message,
    choices: [],
  });
  if (mark === '') return trouble('mark-missing', 'No mark is given. Type the mark that goes on the piece.');
  const damage = spreadsheetDamage(plainMarks(mark));
  if (damage === 'scientific' || damage === 'error') {
    return trouble(
      'mark-damaged',
      `Read ${mark}: a spreadsheet has changed this mark. Type it from the drawing.`,
    );
  }
  return mark.length > LONGEST_MARK
    ? trouble(
        'mark-too-long',
        `Read ${mark.slice(0, 30)}…: a mark may have ${LONGEST_MARK} letters. Type a shorter one.`,
      )
    : null;
}

/** What the cell and the designation say of the same measure; different values are asked about. */
function agree(field: 'length' | 'width', text: string, cell: Nm, named: Nm | undefined): Trouble | null {
  if (named === undefined || named === cell) return null;
  const message = `Read ${text}, but the section says ${formatLengthExact(named)}. Pick the ${field} that is right.`;
  return {
    column: field,
    read: text,
    code: `${field}-differs`,
    message,
    choices: [formatLengthExact(named), formatLengthExact(cell)],
  };
}

function readLength(cells: RowCells, custom: ListCustom, section: SectionRead | null): RowLength {
  const whole = cells.text('length');
  const split = whole === '' && custom.splitLength;
  const blank = split ? cells.text('feet') === '' && cells.text('inches') === '' : whole === '';
  if (blank && section?.lengthNm !== undefined) return { nm: section.lengthNm };
  const read = split
    ? readSplitLength(cells.text('feet'), cells.text('inches'), custom.readLengthCell)
    : readWholeLength(whole, custom.unit, custom.readLengthCell);
  return read;
}

function readWidth(
  cells: RowCells,
  custom: ListCustom,
  section: SectionRead,
): { nm: Nm } | { trouble: Trouble } {
  const text = cells.text('width');
  if (text === '') {
    if (section.widthNm !== undefined) return { nm: section.widthNm };
    const message = `${section.section.name} is plate and has no width. Type the width of the piece.`;
    return { trouble: { column: 'width', read: '', code: 'width-missing', message, choices: [] } };
  }
  const reading = custom.readLengthCell(text, custom.widthUnit);
  if (!reading.ok) {
    const said = lengthTrouble('width', text, reading);
    const [read, ...rest] = said.message.split(': ');
    const message = [read, ...rest.map((part) => part.replaceAll('length', 'width'))].join(': ');
    return { trouble: { ...said, code: reading.code.replace('length', 'width'), message } };
  }
  const differs = agree('width', text, reading.nm, section.widthNm);
  return differs ? { trouble: differs } : { nm: reading.nm };
}

function lengthText(cells: RowCells, custom: ListCustom, section: SectionRead): string {
  const split = custom.splitLength ? `${cells.original('feet')} | ${cells.original('inches')}` : '';
  const written = cells.original('length') || (split === ' | ' ? '' : split) || cells.text('length');
  return written || (section.lengthNm === undefined ? '' : cells.original('section'));
}

function rowRemarks(cells: RowCells, section: SectionRead, grade: GradeReading): string[] {
  const heat = cells.text('heat');
  const mark = cells.text('mark');
  return [
    ...section.notes,
    ...grade.remarks,
    ...(spreadsheetDamage(plainMarks(mark)) === 'date'
      ? [`The mark ${mark} looks like a date that a spreadsheet made`]
      : []),
    ...(heat === '' ? [] : [`The list names heat ${heat}`]),
  ];
}

function optional(
  cells: RowCells,
  field: 'note' | 'finish' | 'neededBy',
): Partial<Record<typeof field, string>> {
  const text = cells.text(field);
  return text === '' ? {} : { [field]: text };
}

function readGradeText(text: string, custom: ListCustom): GradeReading {
  return /^(?:-+|n\/?a|none|\?)?$/i.test(text) ? { grade: '', remarks: [] } : custom.readGradeCell(text);
}

/** Reads one row of a part list: a line, or everything that is wrong with it at once. */
export function readRow(cells: RowCells, custom: ListCustom): RowReading {
  const troubles: Trouble[] = [];
  const mark = cells.text('mark');
  const badMark = markTrouble(mark);
  if (badMark) troubles.push(badMark);

  const quantityText = cells.text('quantity');
  const quantity = readQuantity(quantityText, custom.decimal);
  if (!quantity.ok) {
    const { code, message, choices } = quantity;
    troubles.push({ column: 'quantity', read: quantityText, code, message, choices });
  }

  const sectionText = cells.text('section');
  const reading = custom.readSectionCell(sectionText);
  const section = reading.outcome === 'read' ? reading : null;
  if (reading.outcome === 'asked') {
    const { code, message, choices } = reading;
    troubles.push({ column: 'section', read: sectionText, code, message, choices });
  }

  const length = readLength(cells, custom, section);
  if ('troubles' in length) troubles.push(...length.troubles);
  else {
    const text = cells.text('length') || `${cells.text('feet')} ${cells.text('inches')}`.trim();
    const differs = text === '' ? null : agree('length', text, length.nm, section?.lengthNm);
    if (differs) troubles.push(differs);
  }

  let widthNm: Nm | null = null;
  if (section && PLATE_FAMILIES.includes(section.section.family)) {
    const width = readWidth(cells, custom, section);
    if ('trouble' in width) troubles.push(width.trouble);
    else widthNm = width.nm;
  }

  if (troubles.length > 0 || !quantity.ok || !section || 'troubles' in length) return { ok: false, troubles };
  const grade = readGradeText(cells.text('grade'), custom);
  const { name, stockKey, family } = section.section;
  return {
    ok: true,
    line: {
      row: cells.row,
      mark,
      quantity: quantity.quantity,
      section: name,
      stockKey,
      family,
      sectionText: cells.original('section') || sectionText,
      grade: grade.grade,
      lengthNm: length.nm,
      lengthText: lengthText(cells, custom, section),
      ...(widthNm === null ? {} : { widthNm }),
      ...optional(cells, 'note'),
      ...optional(cells, 'finish'),
      ...optional(cells, 'neededBy'),
      pieceMassMg: pieceMassMg(section.section, length.nm, widthNm ?? undefined),
      remarks: rowRemarks(cells, section, grade),
    },
  };
}
