import type { PartField, PartListColumn, PartListReading } from '#shared/domain/part-list/types.ts';
import type { LengthUnit } from '#shared/domain/units.ts';

/** What a column of a part list is called on the page. */
export const FIELD_WORDS: Readonly<Record<PartField, string>> = {
  mark: 'mark',
  quantity: 'quantity',
  section: 'section',
  grade: 'grade',
  length: 'length',
  feet: 'feet of the length',
  inches: 'inches of the length',
  width: 'width of plate',
  note: 'note',
  finish: 'finish',
  heat: 'heat',
  neededBy: 'needed by',
};

export const UNIT_WORDS: Readonly<Record<LengthUnit, string>> = {
  in: 'inches',
  ft: 'feet',
  mm: 'millimetres',
  cm: 'centimetres',
  m: 'metres',
};

/** Why bare lengths are read in this unit, as a sentence. */
export function unitReason({ unit, unitFrom }: Pick<PartListReading, 'unit' | 'unitFrom'>): string {
  switch (unitFrom) {
    case 'given':
      return 'You chose it.';
    case 'heading':
      return 'The headings of the list say so.';
    case 'cells':
      return 'Lengths on the list that carry a unit are written so.';
    case 'sections':
      return `The sections of the list are ${unit === 'in' || unit === 'ft' ? 'US' : 'EN'} sizes.`;
    case 'default':
      return 'Nothing in the file says which unit. Look at a drawing before you go on.';
  }
}

export const SEPARATOR_WORDS: Readonly<Record<PartListReading['separator'], string>> = {
  ',': 'comma',
  ';': 'semicolon',
  '\t': 'tab',
  '|': 'bar |',
};

export const IGNORED_WORDS: Readonly<Record<PartListReading['ignored'][number]['kind'], string>> = {
  blank: 'blank',
  heading: 'titles and headings',
  total: 'totals',
  skipped: 'left out by you',
};

/** A column by the letter a spreadsheet shows above it: 0 is A, 26 is AA. */
export function columnLetter(index: number): string {
  const rest = index % 26;
  const letter = String.fromCharCode(65 + rest);
  return index < 26 ? letter : columnLetter((index - rest) / 26 - 1) + letter;
}

/** `A mark, B quantity, C section`: which columns are used, and as what. */
export function columnsInWords(columns: readonly PartListColumn[]): string {
  const used = columns.flatMap(({ index, field }) =>
    field === null ? [] : [`${columnLetter(index)} ${FIELD_WORDS[field]}`],
  );
  return used.length === 0 ? 'none known yet' : used.join(', ');
}

/** `3, 8, 21 and 40 more`: enough rows to find them by, never a wall of numbers. */
export function rowNumbers(rows: readonly number[], most = 12): string {
  const shown = rows.slice(0, most).join(', ');
  return rows.length > most ? `${shown} and ${rows.length - most} more` : shown;
}

const KB = 1024;
const SHORT_OF_MB = 1000 * KB;

/** Size of a file as a person says it. */
export function fileSize(bytes: number): string {
  if (bytes < KB) return `${bytes} bytes`;
  if (bytes < SHORT_OF_MB) return `${Math.round(bytes / KB)} kB`;
  return `${(bytes / (KB * KB)).toFixed(1).replace(/\.0$/, '')} MB`;
}
