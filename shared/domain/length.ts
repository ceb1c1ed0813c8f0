import {
  isWhole,
  ratioOf,
  readNumber,
  timesWhole,
  type DecimalMark,
  type NumberReading,
  type Ratio,
} from '#shared/domain/exact-number.ts';
import { lengthNotation, type LengthNotation } from '#shared/domain/length-notation.ts';
import { countTicks, writeInches } from '#shared/domain/length-ticks.ts';
import { plainMarks } from '#shared/domain/plain-marks.ts';
import { spreadsheetDamage } from '#shared/domain/spreadsheet-damage.ts';
import {
  NM_PER_INCH,
  NM_PER_M,
  NM_PER_MM,
  NM_PER_UNIT,
  asNm,
  type LengthUnit,
  type Nm,
} from '#shared/domain/units.ts';

export type LengthOptions = {
  /** What a number without unit means on this list. */
  readonly unit: LengthUnit;
  /** The list's decimal mark, when the list has shown it. */
  readonly decimal?: DecimalMark;
};

export type LengthReading =
  | { readonly ok: true; readonly nm: Nm; readonly unitGiven: boolean }
  | {
      readonly ok: false;
      /** kebab-case, e.g. `length-blank`, `length-date`, `length-lost-space`. */
      readonly code: string;
      readonly message: string;
      /** Texts that this function reads and that the written one may have meant, best first. */
      readonly choices: string[];
    };

type Fault = Extract<LengthReading, { ok: false }>;
/** A value in one unit, the several values it may have, or the fault that stops it. */
type Readings = { readonly values: readonly Ratio[]; readonly open: string | null } | Fault;

/** Longer than any stock; a slip of the unit. */
const LONGEST_NM = 1000 * NM_PER_M;
const HOW = `Type it as 12'-6 1/2", 150.5" or 3823 mm.`;

function fault(code: string, message: string, choices: readonly string[] = []): Fault {
  return { ok: false, code, message, choices: [...choices] };
}

function isImperial(unit: LengthUnit): boolean {
  return unit === 'in' || unit === 'ft';
}

/** In inches and feet a point is always the decimal point and a comma before three digits groups, unless the list says otherwise. */
function markFor(unit: LengthUnit, decimal: DecimalMark | undefined, text: string): DecimalMark | undefined {
  if (isImperial(unit)) return decimal === ',' && text.includes(',') ? ',' : '.';
  // A piece of 3.8 mm is nobody's part: 3,823 mm is thousands.
  return decimal ?? (unit === 'mm' && text.includes(',') ? '.' : undefined);
}

function unreadable(read: string): Fault {
  return fault('length-unreadable', `Read ${read}: this is not a length. ${HOW}`);
}

function readingsOf(reading: NumberReading, read: string): Readings {
  if (reading.outcome === 'unreadable') return unreadable(read);
  if (reading.outcome === 'read') return { values: [reading.value], open: null };
  return { values: reading.readings, open: reading.code };
}

function writeReading(value: Ratio, unit: LengthUnit): string {
  if (isImperial(unit)) return formatLengthExact(Number(timesWhole(value, NM_PER_UNIT[unit])));
  return `${Number(value.numerator) / Number(value.denominator)} ${unit}`;
}

function fits(nm: bigint): boolean {
  return nm > 0n && nm <= BigInt(LONGEST_NM);
}

function settle(read: string, readings: Readings, unit: LengthUnit, unitGiven: boolean): LengthReading {
  if ('ok' in readings) return readings;
  const [value, ...others] = readings.values;
  if (value === undefined) return unreadable(read);
  if (others.length > 0) {
    const choices = readings.values
      .filter((each) => fits(timesWhole(each, NM_PER_UNIT[unit])))
      .map((each) => writeReading(each, unit));
    return readings.open === 'lost-space'
      ? fault(
          'length-lost-space',
          `Read ${read}: a space may be lost. Pick the length that was meant.`,
          choices,
        )
      : fault(
          'length-thousands',
          `Read ${read}: the comma may stand for decimals or for thousands. Pick the length that was meant.`,
          choices,
        );
  }
  const nm = timesWhole(value, NM_PER_UNIT[unit]);
  if (nm === 0n) return fault('length-zero', `Read ${read}: a piece has no length of zero. Type the length.`);
  if (!fits(nm)) {
    return fault(
      'length-absurd',
      `Read ${read}: that is longer than 1 km. Check the unit of the list or type the length again.`,
    );
  }
  return { ok: true, nm: asNm(Number(nm)), unitGiven };
}

function addFeet(feet: Ratio, inches: readonly Ratio[]): Ratio[] {
  return inches.map((each) =>
    ratioOf(
      feet.numerator * 12n * each.denominator + each.numerator * feet.denominator,
      feet.denominator * each.denominator,
    ),
  );
}

function settleFeetInches(
  read: string,
  notation: Extract<LengthNotation, { kind: 'feet-inches' }>,
  { unit, decimal }: LengthOptions,
): LengthReading {
  const feet = readNumber(notation.feet, markFor('ft', decimal, notation.feet));
  if (notation.inches === null) return settle(read, readingsOf(feet, read), 'ft', true);
  if (feet.outcome !== 'read' || !isWhole(feet.value)) return unreadable(read);
  const inches = readingsOf(readNumber(notation.inches, markFor('in', decimal, notation.inches)), read);
  if ('ok' in inches) return inches;
  const summed: Readings = { values: addFeet(feet.value, inches.values), open: inches.open };
  const choices = summed.values.map((each) => writeReading(each, 'in'));
  if (!notation.marked && !isImperial(unit)) {
    return fault(
      'length-feet-inches',
      `Read ${read}: feet and inches, or a range, on a list in ${unit}. Pick the length or type it with its unit.`,
      choices,
    );
  }
  if (inches.values.every((each) => each.numerator >= 12n * each.denominator)) {
    return fault(
      'length-inches-over',
      `Read ${read}: the inches run past a foot. Check the drawing, then pick or type the length.`,
      choices,
    );
  }
  return settle(read, summed, 'in', notation.marked);
}

function settleNumber(
  read: string,
  { number, unit: written }: Extract<LengthNotation, { kind: 'number' }>,
  options: LengthOptions,
): LengthReading {
  const unit = written ?? options.unit;
  const reading = readNumber(number, markFor(unit, options.decimal, number));
  if (written === null && reading.outcome === 'read' && reading.form === 'fraction') {
    if (!isImperial(unit)) {
      return fault(
        'length-fraction-metric',
        `Read ${read}: a fraction on a list in ${unit}. Pick inches or type the length with its unit.`,
        [writeReading(reading.value, 'in'), writeReading(reading.value, unit)],
      );
    }
    if (unit === 'ft' && number.includes('-')) {
      const [feet = '', inches = ''] = number.split('-');
      return fault(
        'length-feet-fraction',
        `Read ${read}: a fraction of a foot, or feet and a fraction of an inch. Pick the length that was meant.`,
        [writeReading(reading.value, 'ft'), `${feet}'-0 ${inches}"`],
      );
    }
  }
  return settle(read, readingsOf(reading, read), unit, written !== null);
}

/**
 * Reads one length in any notation of the trade, exactly: `12'-6 1/2"`, `12-6 1/2` and `3-6` on a list in
 * inches or feet, `150.5"`, `1½`, `3823`, `3 823,5 mm`, `1.067m`. Whole nanometres; a value between two of
 * them goes to the nearest. What has two meanings (`11/2`, a date, `3,823 m`) is asked, never decided here.
 */
export function parseLength(text: string, options: LengthOptions): LengthReading {
  const read = text.trim();
  const plain = plainMarks(text);
  if (plain === '') return fault('length-blank', `No length is given. ${HOW}`);
  const damage = spreadsheetDamage(plain);
  if (damage === 'date') {
    return fault(
      'length-date',
      `Read ${read}: a date, most likely a length that a spreadsheet changed. Type the length from the drawing.`,
    );
  }
  if (damage === 'scientific') {
    return fault(
      'length-scientific',
      `Read ${read}: a spreadsheet has shortened the number. Type the length from the drawing.`,
    );
  }
  if (/^[-(]/.test(plain)) {
    return fault('length-negative', `Read ${read}: a length cannot be below zero. Type the length.`);
  }
  const notation = lengthNotation(plain);
  switch (notation.kind) {
    case 'number':
      return settleNumber(read, notation, options);
    case 'feet-inches':
      return settleFeetInches(read, notation, options);
    case 'two-numbers': {
      const choice = `${notation.feet}'-${notation.inches.replace('-', ' ')}"`;
      const meant = parseLength(choice, options);
      return fault(
        'length-two-numbers',
        `Read ${read}: two numbers with nothing between them. Pick the length or type it with its units.`,
        meant.ok ? [choice] : [],
      );
    }
  }
}

export type LengthStyle = {
  readonly units: 'imperial' | 'metric';
  /** Smallest inch fraction shown. */
  readonly denominator: 16 | 32 | 64;
  /** Nearest unless said; stock lengths go down, never up. */
  readonly rounding?: 'nearest' | 'down' | 'up';
};

/** Metric lengths are shown to a tenth of a millimetre. */
const METRIC_TICK_NM = NM_PER_MM / 10;
/** What the shop's stops hold, 1/32 in or 0.8 mm: common practice, no published source. */
const HALF_STOP_TOLERANCE_NM = { imperial: NM_PER_INCH / 64, metric: (8 * NM_PER_MM) / 20 } as const;

function tickOf(style: LengthStyle): number {
  return style.units === 'imperial' ? NM_PER_INCH / style.denominator : METRIC_TICK_NM;
}

function writeTicks(ticks: number, style: LengthStyle): string {
  if (style.units === 'imperial') return writeInches(ticks, style.denominator);
  const tenths = ticks % 10;
  const whole = (ticks - tenths) / 10;
  return tenths === 0 ? `${whole} mm` : `${whole}.${tenths} mm`;
}

const MIRRORED = { nearest: 'nearest', down: 'up', up: 'down' } as const;

/**
 * A length in whole nanometres in the shop's own writing: `7 7/8"`, `12'-6 1/2"`, `3823 mm`, `3823.5 mm`.
 * Twelve inches carry into the foot. Stock is shown with `rounding: 'down'` (handbook: never up).
 */
export function formatLength(nm: number, style: LengthStyle): string {
  const rounding = style.rounding ?? 'nearest';
  const ticks = countTicks(Math.abs(nm), tickOf(style), nm < 0 ? MIRRORED[rounding] : rounding);
  const text = writeTicks(ticks, style);
  return nm < 0 && ticks > 0 ? `-${text}` : text;
}

/** The length to the last nanometre: inches where 64ths say it whole, millimetres with decimals otherwise. */
export function formatLengthExact(nm: number): string {
  const whole = Math.abs(nm);
  const sign = nm < 0 ? '-' : '';
  if (whole % (NM_PER_INCH / 64) === 0)
    return sign + formatLength(whole, { units: 'imperial', denominator: 64 });
  const rest = whole % NM_PER_MM;
  const places = String(rest).padStart(6, '0').replace(/0+$/, '');
  return `${sign}${(whole - rest) / NM_PER_MM}${places === '' ? '' : `.${places}`} mm`;
}

/**
 * A stop setting. Nearest, but never less than the piece minus half of what a stop holds: a piece cut
 * short cannot be lengthened (common practice, no published source).
 */
export function formatSetting(nm: number, style: LengthStyle): string {
  const tick = tickOf(style);
  const nearest = countTicks(nm, tick, 'nearest');
  const short = nm - nearest * tick > HALF_STOP_TOLERANCE_NM[style.units];
  return writeTicks(short ? nearest + 1 : nearest, style);
}
