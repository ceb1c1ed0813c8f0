/** Month names as spreadsheets write them: English, German, French, Spanish, Italian, Dutch. */
const MONTHS =
  'jan(?:uary|uar|v|vier)?|ene(?:ro)?|gen|feb(?:ruary|ruar|rero|b)?|f[eé]v(?:r|rier)?|mar(?:ch|zo|s)?|m[aä]r(?:z)?|mrz|mrt|' +
  'apr(?:il)?|avr(?:il)?|abr(?:il)?|may|mai|mei|mag|june?|juni|juin|giu|july?|juli|juil(?:let)?|lug|aug(?:ust)?|ao[uû]t|ago(?:sto)?|' +
  'sept?(?:ember)?|set|oct(?:ober)?|okt(?:ober)?|ott|nov(?:ember)?|dec(?:ember)?|d[eé]c|dez(?:ember)?|dic';

const DATES: readonly RegExp[] = [
  new RegExp(`^\\d{1,2}\\.?[-/. ](?:${MONTHS})\\.?(?:[-/. ,]+\\d{2,4})?$`),
  new RegExp(`^(?:${MONTHS})\\.?[-/. ]\\d{1,4}(?:,? \\d{4})?$`),
  /^\d{1,2}([/.-])\d{1,2}\1(?:\d{2}|\d{4})(?: \d{1,2}:\d{2}(?::\d{2})?)?$/,
  /^(?:19|20)\d{2}[-/.]\d{1,2}[-/.]\d{1,2}(?:[ t]\d{1,2}:\d{2}(?::\d{2})?)?$/,
];
const SCIENTIFIC = /^\d+(?:[.,]\d+)?e[+-]?\d+$/;
const ERROR_CELL = /^#(?:ref|n\/a|value|name\?|div\/0|num|null|spill|####*)!?/;

/**
 * What a spreadsheet has done to a cell before it reached us: 3/8 turned into 8-Mar, 1250 into 1.25E+03.
 * The number is gone and is never put back by guess. Expects plain marks (plain-marks.ts).
 */
export function spreadsheetDamage(text: string): 'date' | 'scientific' | 'error' | null {
  if (DATES.some((date) => date.test(text))) return 'date';
  if (SCIENTIFIC.test(text)) return 'scientific';
  return ERROR_CELL.test(text) ? 'error' : null;
}
