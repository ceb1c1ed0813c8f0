import { isWhole, readNumber, type DecimalMark } from '#shared/domain/exact-number.ts';
import { plainMarks } from '#shared/domain/plain-marks.ts';
import { spreadsheetDamage } from '#shared/domain/spreadsheet-damage.ts';

export type QuantityReading =
  | { readonly ok: true; readonly quantity: number }
  | {
      readonly ok: false;
      readonly code: string;
      readonly message: string;
      readonly choices: readonly string[];
    };

/** More pieces of one mark than any shop cuts; a slipped column. */
const MOST_PIECES = 1_000_000;
const COUNT_WORDS =
  /^(?:qty|no)\.?[ :=]*| ?(?:pcs?|pces?|pieces?|ea|each|off|nos?|req'?d|x|stk|st|stuck|stück)\.?$/g;
const DO = 'Type a whole number of pieces, 1 or more.';

function fault(code: string, message: string, choices: readonly string[] = []): QuantityReading {
  return { ok: false, code, message, choices };
}

/** Reads a count of pieces: `12`, `12.0`, `12 pcs`, `(12)`, `x12`. Whole, 1 to 1 000 000; nothing is rounded. */
export function readQuantity(text: string, decimal?: DecimalMark): QuantityReading {
  const read = text.trim();
  const plain = plainMarks(text);
  if (plain === '') return fault('quantity-missing', `No quantity is given. ${DO}`);
  if (spreadsheetDamage(plain) !== null) {
    return fault('quantity-unreadable', `Read ${read}: a spreadsheet has changed this cell. ${DO}`);
  }
  const bare = plain
    .replace(/^\((.*)\)$/, '$1')
    .replace(/^x ?(?=\d)/, '')
    .replace(COUNT_WORDS, '')
    .trim();
  if (/^-\s*\d/.test(bare))
    return fault('quantity-negative', `Read ${read}: a quantity cannot be below zero. ${DO}`);
  const number = readNumber(bare, decimal);
  if (number.outcome === 'unreadable') {
    return fault('quantity-unreadable', `Read ${read}: this is not a quantity. ${DO}`);
  }
  // 1,200 is 1.2 or 1200; only one of them can be counted.
  const wholes = (number.outcome === 'read' ? [number.value] : number.readings).filter(isWhole);
  const whole = wholes[0];
  if (whole === undefined || wholes.length > 1) {
    return fault('quantity-not-whole', `Read ${read}: pieces are counted whole. ${DO}`);
  }
  const count = whole.numerator / whole.denominator;
  if (count === 0n) {
    return fault('quantity-zero', `Read ${read}: no piece to cut. Type the quantity or leave the row out.`);
  }
  if (count > BigInt(MOST_PIECES)) {
    return fault('quantity-too-large', `Read ${read}: that is more than 1 000 000 pieces of one mark. ${DO}`);
  }
  return { ok: true, quantity: Number(count) };
}
