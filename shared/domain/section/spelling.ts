/** Brings the shop's many ways of writing a section into one alphabet, before anything is understood. */

const VULGAR = /[\u00bc-\u00be\u2150-\u215e]/g;

/** Single-glyph fractions become ` n/d`; crosses, primes and slashes become plain; letters upper case. */
export function plainSpelling(text: string): string {
  return text
    .replace(VULGAR, (glyph) => ` ${glyph.normalize('NFKC').replace('\u2044', '/')}`)
    .replaceAll('\u2044', '/')
    .replace(/[\u00d7\u2715\u2716*]/g, 'X')
    .replace(/[\u2010-\u2015\u2212]/g, '-')
    .replace(/[\u2033\u201d\u201c]|''/g, '"')
    .replace(/[\u2032\u2019\u2018`]/g, "'")
    .replace(/[\u00d8\u00f8\u2300]/g, ' DIA ')
    .replace(/[\u00a0\u2007\u2009\u202f]/g, ' ')
    .toUpperCase()
    .replace(/(\d"?)\s+BY\s+(?=[\d.])/g, '$1X')
    .replace(/\s+/g, ' ')
    .trim();
}

const MONTHS = 'JAN|FEB|MAR|APR|MAY|JUN|JUL|AUG|SEP|OCT|NOV|DEC';
const DAMAGED = [
  new RegExp(`^\\d{1,2}[-/ .](${MONTHS})[A-Z]*([-/ .]\\d{2,4})?$`),
  new RegExp(`^(${MONTHS})[A-Z]*[-/ .]\\d{1,4}$`),
  /^\d{1,2}[/.-]\d{1,2}[/.-]\d{2,4}$/,
  /^\d{4}-\d{2}-\d{2}/,
  /^[34]\d{4}$/,
  /^\d(\.\d+)?E[+-]?\d+$/,
];

/** A date or a serial in a size cell is a fraction that a spreadsheet damaged: never repaired, always asked. */
export const looksLikeDate = (plain: string): boolean => DAMAGED.some((pattern) => pattern.test(plain));

/** `11/2` is five and a half or a lost space: nobody can tell. */
export function improperFraction(plain: string): string | null {
  for (const match of plain.matchAll(/(?<![\d/-])(\d+)\/(\d+)(?![\d/])/g)) {
    const [whole, n, d] = match;
    if (Number(n) >= Number(d) && Number(d) !== 0) return whole;
  }
  return null;
}
