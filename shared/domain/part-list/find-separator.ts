import Papa from 'papaparse';
import { findHeadingRow, scoreHeadings } from '#shared/domain/part-list/find-heading-row.ts';
import { SEPARATORS, splitRows, type Separator } from '#shared/domain/part-list/split-rows.ts';

/** Enough lines to see titles, headings and some parts. */
const LOOKED_AT = 60;

function isSeparator(text: string): text is Separator {
  return SEPARATORS.some((separator) => separator === text);
}

/**
 * The separator of a list: what its first line says (`sep=;`), else the one under which headings appear,
 * else the one that gives rows of equal width.
 */
export function findSeparator(text: string): Separator {
  const said = /^sep=(.)\r?\n/i.exec(text)?.[1];
  if (said && isSeparator(said)) return said;
  const head = text.split(/\r\n|\n|\r/, LOOKED_AT).join('\n');
  let best: { separator: Separator; score: number } | null = null;
  for (const separator of SEPARATORS) {
    const found = findHeadingRow(splitRows(head, separator));
    const score = found ? scoreHeadings(found.headings).score : 0;
    if (score > (best?.score ?? 0)) best = { separator, score };
  }
  if (best) return best.separator;
  // The comma last: in `1;2,5;3,5` it stands as often as the semicolon, and for decimals.
  const delimitersToGuess = [...SEPARATORS.filter((separator) => separator !== ','), ','];
  const guess = Papa.parse(head, { delimitersToGuess, preview: LOOKED_AT }).meta.delimiter;
  return isSeparator(guess) ? guess : ',';
}
