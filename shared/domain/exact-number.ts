/** An exact fraction; the denominator is above zero. Never a float between the drawing and the blade. */
export type Ratio = { readonly numerator: bigint; readonly denominator: bigint };

/** Which mark stands before the decimals of a list; the other one, if it stands at all, groups thousands. */
export type DecimalMark = '.' | ',';

type NumberForm = 'whole' | 'decimal' | 'fraction';

export type NumberReading =
  | { readonly outcome: 'read'; readonly value: Ratio; readonly form: NumberForm }
  | {
      readonly outcome: 'open';
      /** `lost-space`: 11/2 is 5.5 or 1 1/2. `thousands`: 3,823 is 3.823 or 3823. */
      readonly code: 'lost-space' | 'thousands';
      readonly readings: readonly Ratio[];
    }
  | { readonly outcome: 'unreadable' };

const UNREADABLE: NumberReading = { outcome: 'unreadable' };
/** Longer than any number a list carries; keeps a pasted paragraph from becoming a thousand-digit integer. */
const MOST_DIGITS = 24;

const WHOLE = /^\d+$/;
const FRACTION = /^(\d+)\/(\d+)$/;
const MIXED = /^(\d+)[ -](\d+)\/(\d+)$/;
const SPACED = /^\d{1,3}(?: \d{3})+(?=[.,]|$)/;
const GROUPED: Readonly<Record<DecimalMark, RegExp>> = {
  ',': /^\d{1,3}(?:,\d{3})+(?:\.\d+)?$/,
  '.': /^\d{1,3}(?:\.\d{3})+(?:,\d+)?$/,
};
const DECIMAL = /^(\d*)[.,](\d*)$/;

export function ratioOf(numerator: bigint, denominator = 1n): Ratio {
  return { numerator, denominator };
}

/** value × factor as a whole number, halves up; `factor` a whole number, both not negative. */
export function timesWhole(value: Ratio, factor: number): bigint {
  const twice = value.numerator * BigInt(factor) * 2n;
  return (twice + value.denominator) / (value.denominator * 2n);
}

export function isWhole(value: Ratio): boolean {
  return value.numerator % value.denominator === 0n;
}

function read(value: Ratio, form: NumberForm): NumberReading {
  return { outcome: 'read', value, form };
}

function decimalValue(whole: string, places: string): Ratio {
  return ratioOf(BigInt(`${whole}${places}` || '0'), 10n ** BigInt(places.length));
}

/** 11/2 → 1 1/2; 111/16 → 1 11/16 and 11 1/16: every place where the space may have been. */
function lostSpaces(numerator: string, denominator: bigint): Ratio[] {
  const readings: Ratio[] = [];
  for (let cut = 1; cut < numerator.length; cut += 1) {
    const over = BigInt(numerator.slice(cut));
    if (numerator[cut] === '0' || over >= denominator) continue;
    readings.push(ratioOf(BigInt(numerator.slice(0, cut)) * denominator + over, denominator));
  }
  return readings;
}

function readFraction(numerator: string, below: string): NumberReading {
  const denominator = BigInt(below);
  if (denominator === 0n) return UNREADABLE;
  const value = ratioOf(BigInt(numerator), denominator);
  if (value.numerator < denominator) return read(value, 'fraction');
  const other = lostSpaces(numerator, denominator);
  return other.length === 0
    ? read(value, 'fraction')
    : { outcome: 'open', code: 'lost-space', readings: [...other, value] };
}

function readMixed(whole: string, above: string, below: string): NumberReading {
  const [over, denominator] = [BigInt(above), BigInt(below)];
  if (denominator === 0n || over >= denominator) return UNREADABLE;
  return read(ratioOf(BigInt(whole) * denominator + over, denominator), 'fraction');
}

/** One mark only, three digits behind it and one to three before: thousands or decimals. */
function readLoneMark(text: string, mark: DecimalMark, decimal: DecimalMark | undefined): NumberReading {
  const [whole = '', places = ''] = text.split(mark);
  const asDecimal = decimalValue(whole, places);
  const asThousands = ratioOf(BigInt(whole + places));
  if (decimal === mark) return read(asDecimal, 'decimal');
  if (decimal !== undefined) return read(asThousands, 'whole');
  // A list that has not shown its custom: a lone point is a decimal point, a lone comma is open.
  return mark === '.'
    ? read(asDecimal, 'decimal')
    : { outcome: 'open', code: 'thousands', readings: [asDecimal, asThousands] };
}

function readGrouped(text: string, mark: DecimalMark): NumberReading {
  const decimal: DecimalMark = mark === ',' ? '.' : ',';
  const [wholes = '', places = ''] = text.split(decimal);
  const whole = wholes.replaceAll(mark, '');
  return places === '' ? read(ratioOf(BigInt(whole)), 'whole') : read(decimalValue(whole, places), 'decimal');
}

/**
 * Reads one number without unit: `42`, `1 1/2`, `1-1/2`, `3 823,5`, `1,234.5`, `.375`. Expects plain marks
 * (plain-marks.ts) and no sign. `decimal` is the list's custom when it is known; a mark that cannot be
 * grouping (`1,5`) is the decimal mark whatever the custom. Exact; states `open` instead of guessing.
 */
export function readNumber(text: string, decimal?: DecimalMark): NumberReading {
  if (text.replace(/\D/g, '').length > MOST_DIGITS) return UNREADABLE;
  if (WHOLE.test(text)) return read(ratioOf(BigInt(text)), 'whole');
  const fraction = FRACTION.exec(text);
  if (fraction) return readFraction(fraction[1] ?? '', fraction[2] ?? '0');
  const mixed = MIXED.exec(text);
  if (mixed) return readMixed(mixed[1] ?? '', mixed[2] ?? '', mixed[3] ?? '0');
  if (SPACED.test(text)) {
    const closed = text.replaceAll(' ', '');
    const [whole = '', places = '', ...rest] = closed.split(/[.,]/);
    if (rest.length > 0 || !/^\d+$/.test(whole) || !/^\d*$/.test(places)) return UNREADABLE;
    return places === ''
      ? read(ratioOf(BigInt(whole)), 'whole')
      : read(decimalValue(whole, places), 'decimal');
  }
  const lone = /^[1-9]\d{0,2}([.,])\d{3}$/.exec(text);
  if (lone) return readLoneMark(text, lone[1] === ',' ? ',' : '.', decimal);
  const plain = DECIMAL.exec(text);
  if (plain && text.length > 1) return read(decimalValue(plain[1] ?? '', plain[2] ?? ''), 'decimal');
  if (GROUPED[','].test(text)) return readGrouped(text, ',');
  if (GROUPED['.'].test(text)) return readGrouped(text, '.');
  return UNREADABLE;
}
