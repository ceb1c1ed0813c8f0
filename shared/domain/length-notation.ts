import type { LengthUnit } from '#shared/domain/units.ts';

/** How a length is written, before any number of it is read. */
export type LengthNotation =
  | {
      readonly kind: 'feet-inches';
      readonly feet: string;
      /** null for whole feet, `12'`. */
      readonly inches: string | null;
      /** A foot or inch mark stands in the text; `12-6 1/2` has none and leans on the list. */
      readonly marked: boolean;
    }
  | { readonly kind: 'number'; readonly number: string; readonly unit: LengthUnit | null }
  /** `12 6`, `12 6 1/2`: two numbers with nothing between them to say what they are. */
  | { readonly kind: 'two-numbers'; readonly feet: string; readonly inches: string };

const INCH_WORD = `(?:"|inch(?:es)?|ins?\\.?)`;
const FOOT_WORD = `(?:'|feet|foot|ft\\.?)`;
const FEET = new RegExp(`^(.+?) ?${FOOT_WORD}(?: ?-? ?(\\d.*?|\\.\\d+) ?${INCH_WORD}?)?$`);
const INCHES = new RegExp(`^(.+?) ?${INCH_WORD}$`);
const METRIC =
  /^(.+?) ?(mm|millimet(?:er|re)s?|cm|centimet(?:er|re)s?|m|mtrs?|met(?:er|re)s?|m[eè]tres?)\.?$/;
/** `3-6`, `12-6 1/2`, `12-6-1/2`, `12-6.5`: feet, dash, inches. `3-1/2` is a mixed number and stays out. */
const DASHED = /^(\d+)-(\d+(?:[.,]\d+)?|\d+[ -]\d+\/\d+)$/;
const TWO_NUMBERS = /^(\d+) (\d{1,2}(?:[ -]\d+\/\d+)?)$/;
/** Words a list puts round a length: `L=1250`, `12'-6" LG`. */
const BEFORE = /^(?:l|lg|len|length) ?[=:] ?/;
const AFTER = / ?(?:lg|long|lng)\.?$/;

function metricUnit(word: string): LengthUnit {
  if (word.startsWith('mm') || word.startsWith('mil')) return 'mm';
  return word.startsWith('c') ? 'cm' : 'm';
}

/** Takes a length in plain marks (plain-marks.ts) apart into its numbers and its units; judges no number. */
export function lengthNotation(plain: string): LengthNotation {
  const text = plain
    .replace(/^'(?=[\d.])/, '')
    .replace(BEFORE, '')
    .replace(AFTER, '')
    .replace(/ ?([-/]) ?/g, '$1')
    .replace(/(\d)"(?=\d+\/\d+"?$)/, '$1 ')
    .trim();
  const feet = FEET.exec(text);
  if (feet?.[1]) return { kind: 'feet-inches', feet: feet[1], inches: feet[2] ?? null, marked: true };
  const inches = INCHES.exec(text);
  const body = inches?.[1] ?? text;
  const dashed = DASHED.exec(body);
  if (dashed?.[1] && dashed[2]) {
    return { kind: 'feet-inches', feet: dashed[1], inches: dashed[2], marked: inches !== null };
  }
  if (inches) return { kind: 'number', number: body, unit: 'in' };
  const metric = METRIC.exec(text);
  if (metric?.[1] && metric[2]) return { kind: 'number', number: metric[1], unit: metricUnit(metric[2]) };
  const two = TWO_NUMBERS.exec(text);
  if (two?.[1] && two[2]) return { kind: 'two-numbers', feet: two[1], inches: two[2] };
  return { kind: 'number', number: text, unit: null };
}
