import Papa from 'papaparse';

type Units = 'imperial' | 'metric';

const HEADINGS: Readonly<Record<Units, readonly string[]>> = {
  imperial: ['Mark', 'Quantity', 'Section', 'Grade', 'Length', 'Width', 'Note', 'Finish', 'Needed by'],
  metric: [
    'Mark',
    'Quantity',
    'Section',
    'Grade',
    'Length (mm)',
    'Width (mm)',
    'Note',
    'Finish',
    'Needed by',
  ],
};

/** An invented stair of an invented job, in the notations a drawing carries. */
const EXAMPLE: Readonly<Record<Units, readonly (readonly string[])[]>> = {
  imperial: [
    ['ST-1', '2', 'C6x8.2', 'A36', `14'-3 1/2"`, '', 'stringer', 'prime', ''],
    ['ST-2', '22', 'L2x2x1/4', 'A36', `3'-0"`, '', 'tread angle', 'prime', ''],
    ['ST-3', '22', 'FB 1/4x2', 'A36', '35 3/4"', '', 'nosing', 'galvanize', ''],
    ['HR-1', '4', 'PIPE 1-1/2 STD', 'A53', `11'-8"`, '', 'rail', 'galvanize', ''],
    ['HR-2', '18', 'HSS2x2x3/16', 'A500', '42"', '', 'post', 'galvanize', ''],
    ['BP-1', '18', 'PL3/8', 'A36', '6"', '4"', 'post base', 'prime', ''],
  ],
  metric: [
    ['ST-1', '2', 'UPN 160', 'S235JR', '4356', '', 'stringer', 'prime', ''],
    ['ST-2', '22', 'L 50x50x5', 'S235JR', '914', '', 'tread angle', 'prime', ''],
    ['ST-3', '22', 'FLT 50x6', 'S235JR', '908', '', 'nosing', 'galvanise', ''],
    ['HR-1', '4', 'RHS 60x40x4', 'S235JRH', '3556', '', 'rail', 'galvanise', ''],
    ['HR-2', '18', 'SHS 50x50x4', 'S235JRH', '1067', '', 'post', 'galvanise', ''],
    ['BP-1', '18', 'PL10', 'S235JR', '150', '100', 'post base', 'prime', ''],
  ],
};

function csv(rows: readonly (readonly string[])[]): string {
  // Spreadsheets take UTF-8 for sure only with a byte order mark.
  return `\ufeff${Papa.unparse(
    rows.map((row) => [...row]),
    { newline: '\r\n' },
  )}\r\n`;
}

export type ListTemplate = { readonly fileName: string; readonly text: string };

/** Only the headings, to be filled. */
export function blankTemplate(units: Units): ListTemplate {
  return { fileName: 'part-list-template.csv', text: csv([HEADINGS[units]]) };
}

/** The same, filled: a stair in the shop's units that reads without a question. */
export function filledExample(units: Units): ListTemplate {
  return { fileName: 'part-list-example.csv', text: csv([HEADINGS[units], ...EXAMPLE[units]]) };
}
