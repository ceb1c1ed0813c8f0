import { scoreHeadings } from '#shared/domain/part-list/find-heading-row.ts';
import { readHeading } from '#shared/domain/part-list/headings.ts';

export type RowKind = 'part' | 'blank' | 'heading' | 'total';

/** The cells of a row that tell a part from the rest, after fixes. */
export type TellingCells = {
  readonly mark: string;
  readonly quantity: string;
  readonly section: string;
  readonly length: string;
  readonly all: readonly string[];
};

const TOTAL =
  /^(?:grand[ -]|list[ -]|page[ -]|job[ -])?(?:sub[ -]?totals?|totals?|sum|sums|summe|zwischensumme|gesamt\w*|sous[ -]total|totaal|totale|total g[eé]n[eé]ral|suma|insgesamt)\b/i;
const RULE = /^[-=_*.·\s]*$/;
const PAGE_WORDS =
  /^(?:page|seite|sheet|end of|phase|sequence|assembly|area|zone|lot|issued|revision|rev|date|checked|drawn|project|job|note)\b/i;
const LONGEST_MARK_ALONE = 20;

/**
 * What a row below the headings is. Blank rows, repeated headings, group titles and sums are no parts;
 * whatever might be a part is one, so that a bad row is shown and not lost.
 */
export function rowKind({ mark, quantity, section, length, all }: TellingCells): RowKind {
  const written = all.filter((cell) => cell.trim() !== '');
  if (written.every((cell) => RULE.test(cell.trim()))) return 'blank';
  if (section === '') {
    if (TOTAL.test(mark) || (mark === '' && written.some((cell) => TOTAL.test(cell.trim())))) return 'total';
    if (mark === '' && length === '') return loneRow(quantity, written);
    if (written.length === 1 && mark !== '' && !isMarkAlone(mark)) return 'heading';
  }
  if (!/\d/.test(quantity) && !/\d/.test(length) && scoreHeadings(all.map(readHeading)).core >= 2)
    return 'heading';
  const onlySection = written.length === 1 && section !== '';
  return onlySection && !/\d/.test(section) ? 'heading' : 'part';
}

/** No mark, no section, no length: a line of words, a sum of counts and masses, or the rest of a part. */
function loneRow(quantity: string, written: readonly string[]): RowKind {
  if (!written.some((cell) => /\p{L}/u.test(cell))) return 'total';
  return quantity === '' ? 'heading' : 'part';
}

function isMarkAlone(mark: string): boolean {
  return /\d/.test(mark) && mark.length <= LONGEST_MARK_ALONE && !PAGE_WORDS.test(mark);
}
