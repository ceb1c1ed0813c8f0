import type { DecimalMark } from '#shared/domain/exact-number.ts';
import { parseLength, type LengthReading } from '#shared/domain/length.ts';
import type { PartField, PartListProblem } from '#shared/domain/part-list/types.ts';
import { NM_PER_FOOT, asNm, type LengthUnit, type Nm } from '#shared/domain/units.ts';

export type Trouble = Omit<PartListProblem, 'row'>;
export type RowLength = { readonly nm: Nm } | { readonly troubles: readonly Trouble[] };
export type ReadLengthCell = (text: string, unit: LengthUnit) => LengthReading;

/** Reads each distinct length text of a list once per unit. */
export function createLengthCells(decimal: DecimalMark | undefined): ReadLengthCell {
  const read = new Map<string, LengthReading>();
  return (text, unit) => {
    const key = `${unit} ${text}`;
    const known = read.get(key);
    if (known) return known;
    const reading = parseLength(text, decimal ? { unit, decimal } : { unit });
    read.set(key, reading);
    return reading;
  };
}

const NOTHING = /^(?:0+(?:[.,]0+)?|-)? ?(?:'|"|ft|in)?$/i;

export function lengthTrouble(
  column: PartField,
  text: string,
  reading: LengthReading & { ok: false },
): Trouble {
  return { column, read: text, code: reading.code, message: reading.message, choices: reading.choices };
}

/** A length in one cell. */
export function readWholeLength(text: string, unit: LengthUnit, read: ReadLengthCell): RowLength {
  const reading = read(text, unit);
  return reading.ok ? { nm: reading.nm } : { troubles: [lengthTrouble('length', text, reading)] };
}

/** A length over two cells, `12` | `6 1/2`; either may be blank or nought, not both. Exact. */
export function readSplitLength(feet: string, inches: string, read: ReadLengthCell): RowLength {
  const feetText = NOTHING.test(feet) ? '' : feet;
  const inchText = NOTHING.test(inches) ? '' : inches;
  if (feetText === '' && inchText === '') {
    const given = `${feet} ${inches}`.trim();
    const reading = read(given === '' ? '' : '0', 'in');
    return reading.ok ? { nm: reading.nm } : { troubles: [lengthTrouble('feet', given, reading)] };
  }
  const feetRead = feetText === '' ? null : read(feetText, 'ft');
  const inchesRead = inchText === '' ? null : read(inchText, 'in');
  const troubles: Trouble[] = [];
  if (feetRead && !feetRead.ok) troubles.push(lengthTrouble('feet', feet, feetRead));
  if (inchesRead && !inchesRead.ok) troubles.push(lengthTrouble('inches', inches, inchesRead));
  if ((feetRead && !feetRead.ok) || (inchesRead && !inchesRead.ok)) return { troubles };
  const [feetNm, inchNm] = [feetRead?.nm ?? 0, inchesRead?.nm ?? 0];
  if (inchNm > 0 && feetNm % NM_PER_FOOT !== 0) {
    return {
      troubles: [
        {
          column: 'feet',
          read: feet,
          code: 'length-feet-not-whole',
          message: `Read ${feet} feet and ${inches} inches: the feet are not whole. Type whole feet, or the length alone.`,
          choices: [],
        },
      ],
    };
  }
  if (feetNm > 0 && inchNm >= NM_PER_FOOT) {
    return {
      troubles: [
        {
          column: 'inches',
          read: inches,
          code: 'length-inches-over',
          message: `Read ${feet} feet and ${inches} inches: the inches run past a foot. Check the drawing and type them again.`,
          choices: [],
        },
      ],
    };
  }
  return { nm: asNm(feetNm + inchNm) };
}
