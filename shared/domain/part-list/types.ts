import type { Family } from '#shared/domain/section/types.ts';
import type { LengthUnit, Mg, Nm } from '#shared/domain/units.ts';

/** What a column of a part list can be. `feet` and `inches` together make a length split over two columns. */
export const PART_FIELDS = [
  'mark',
  'quantity',
  'section',
  'grade',
  'length',
  'feet',
  'inches',
  'width',
  'note',
  'finish',
  'heat',
  'neededBy',
] as const;
export type PartField = (typeof PART_FIELDS)[number];

/** Field → column index from 0. */
export type ColumnMapping = Partial<Record<PartField, number>>;

/** What the person decided about a file; the same file and the same choices always read the same. */
export type PartListChoices = {
  /** List-wide unit of bare numbers; when absent it is taken from heading, cells or sections. */
  readonly unit?: LengthUnit;
  readonly mapping?: ColumnMapping;
  /** Replaced cell texts by physical row (from 1), then field. */
  readonly fixes?: Readonly<Record<number, Partial<Record<PartField, string>>>>;
  /** Physical rows the person chose to leave out. */
  readonly skips?: readonly number[];
};

export type PartListLine = {
  /** Physical line of the file, from 1. */
  readonly row: number;
  readonly mark: string;
  readonly quantity: number;
  /** Canonical spelling. */
  readonly section: string;
  /** What stock must match; equals `section` for bars. */
  readonly stockKey: string;
  readonly family: Family;
  /** The customer's own words, kept beside the canonical form. */
  readonly sectionText: string;
  /** Canonical grade, or '' when the list gives none. */
  readonly grade: string;
  readonly lengthNm: Nm;
  readonly lengthText: string;
  readonly widthNm?: Nm;
  readonly note?: string;
  readonly finish?: string;
  readonly neededBy?: string;
  /** Mass of one piece. */
  readonly pieceMassMg: Mg;
  /** Plain remarks that do not stop the row, e.g. `MS is not a grade for certified work`. */
  readonly remarks: readonly string[];
};

export type PartListProblem = {
  /** Physical line of the file, from 1; 0 when the whole file is meant. */
  readonly row: number;
  readonly column: PartField | null;
  /** What was read, verbatim. */
  readonly read: string;
  /** kebab-case. */
  readonly code: string;
  /** What was read, what is wrong, what to do: one plain sentence or two. */
  readonly message: string;
  /** Texts that would fix it, best first. */
  readonly choices: readonly string[];
};

export type PartListColumn = {
  readonly index: number;
  readonly heading: string;
  readonly field: PartField | null;
  /** False when the heading was not recognised for certain and a person should look. */
  readonly sure: boolean;
  readonly samples: readonly string[];
};

export type PartListReading = {
  readonly lines: readonly PartListLine[];
  readonly problems: readonly PartListProblem[];
  readonly mapping: ColumnMapping;
  readonly unit: LengthUnit;
  readonly unitFrom: 'given' | 'heading' | 'cells' | 'sections' | 'default';
  /** Physical row of the headings, or null when the file has none. */
  readonly headingRow: number | null;
  readonly columns: readonly PartListColumn[];
  /** Rows that are neither line nor problem. */
  readonly ignored: readonly {
    readonly row: number;
    readonly kind: 'blank' | 'heading' | 'total' | 'skipped';
  }[];
  /** Every physical row as read, for the preview and for fixing in place. */
  readonly rows: readonly { readonly row: number; readonly cells: readonly string[] }[];
  readonly encoding: string;
  readonly separator: ',' | ';' | '\t' | '|';
  /** Set when nothing could be read at all: too large, a spreadsheet renamed, binary, empty, no columns found. */
  readonly fatal: { readonly code: string; readonly message: string } | null;
};
