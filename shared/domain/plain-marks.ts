/** One glyph for each of the many that word processors, spreadsheets and phones put in a size or a length. */
const VULGAR: Readonly<Record<string, string>> = {
  '½': '1/2',
  '⅓': '1/3',
  '⅔': '2/3',
  '¼': '1/4',
  '¾': '3/4',
  '⅕': '1/5',
  '⅖': '2/5',
  '⅗': '3/5',
  '⅘': '4/5',
  '⅙': '1/6',
  '⅚': '5/6',
  '⅛': '1/8',
  '⅜': '3/8',
  '⅝': '5/8',
  '⅞': '7/8',
};

const SPACES = /[\s\u00a0\u1680\u2000-\u200a\u202f\u205f\u3000]+/g;
const INVISIBLE = /[\u200b-\u200f\u2060\ufeff]/g;
const DASHES = /[\u2010-\u2015\u2212\ufe58\ufe63\uff0d]/g;
const SLASHES = /[\u2044\u2215\uff0f]/g;
const DOUBLE_PRIMES = /[\u2033\u02ba\u201c\u201d\u201e\u201f\u301e\uff02]|'{2}/g;
const PRIMES = /[\u2032\u02b9\u2018\u2019\u201a\u201b\u00b4`\uff07]/g;
const VULGAR_GLYPH = new RegExp(`(\\d)?\\s*([${Object.keys(VULGAR).join('')}])`, 'g');

/**
 * The same words in plain ASCII marks: `'` feet, `"` inches, `-`, `/`, single spaces, `1½` as `1 1/2`.
 * Lower case, trimmed. Nothing is judged here.
 */
export function plainMarks(text: string): string {
  return text
    .replace(INVISIBLE, '')
    .replace(SPACES, ' ')
    .replace(DASHES, '-')
    .replace(SLASHES, '/')
    .replace(PRIMES, "'")
    .replace(DOUBLE_PRIMES, '"')
    .replace(VULGAR_GLYPH, (_all, before: string | undefined, glyph: string) =>
      before === undefined ? (VULGAR[glyph] ?? glyph) : `${before} ${VULGAR[glyph] ?? glyph}`,
    )
    .trim()
    .toLowerCase();
}
