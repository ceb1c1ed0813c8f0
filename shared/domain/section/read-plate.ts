/** Plate, floor plate and sheet: stock goes by thickness, width and length belong to the piece. */
import { NM_PER_FOOT, NM_PER_INCH, asNm, type Nm } from '#shared/domain/units.ts';
import { flat, floorPlate, plate, sheet } from '#shared/domain/section/build.ts';
import {
  inchText,
  inchesToNm,
  mmText,
  mmToNm,
  readSize,
  valueOf,
  type Size,
} from '#shared/domain/section/size.ts';
import type { SectionReading, System } from '#shared/domain/section/types.ts';
import type { Kind } from '#shared/domain/section/words.ts';

const ask = (code: string, message: string, choices: readonly string[] = []): SectionReading => ({
  outcome: 'asked',
  code,
  message,
  choices,
});

/** Up to this width bar mills roll it, and lists that say PL mean flat bar (common practice, no published source). */
const WIDEST_FLAT_NM = 8 * NM_PER_INCH;

/** `20'-0"` or `20'` inside a designation. */
function feetInches(text: string): Nm | null {
  const match = /^(\d+)'(?:\s*-?\s*(\d+)?(?:[\s-]*(\d+)\/(\d+))?"?)?$/.exec(text.trim());
  if (!match) return null;
  const [, feet = '0', inches = '0', n = '0', d = '1'] = match;
  return asNm(
    Number(feet) * NM_PER_FOOT +
      Number(inches) * NM_PER_INCH +
      Math.round((Number(n) * NM_PER_INCH) / Number(d)),
  );
}

const footText = (nm: number): string => {
  const feet = Math.floor(nm / NM_PER_FOOT);
  const inches = inchText(nm - feet * NM_PER_FOOT).replace('-', ' ');
  return `${feet}'-${inches}"`;
};

/** Null when the words do not say plate or sheet. */
export function readPlate(
  kind: Kind | null,
  sizes: readonly string[],
  context: { unitHint?: 'in' | 'mm' },
): SectionReading | null {
  if (kind === 'sheet') return readSheet(sizes);
  if (kind !== 'plate' && kind !== 'floor-plate' && kind !== 'p') return null;
  const gauge = sizes.find((size) => size.endsWith('GA'));
  if (gauge) return readSheet(sizes);
  const feet = sizes.map(feetInches);
  const plain = sizes.filter((_, i) => feet[i] === null).map(readSize);
  const longNm = feet.find((nm) => nm !== null) ?? null;
  if (plain.length === 0 || plain.length > 3 || plain.some((size) => size === null))
    return ask('section-incomplete', 'Plate needs its thickness, such as PL 1/4.');
  const given = plain as Size[];
  const [first, second, third] = given;
  if (!first) return null;
  const system = systemOf(given, longNm !== null, context.unitHint);
  if (system === null)
    return ask('section-ambiguous', `PL ${sizes.join('x')} may be inches or millimetres. Say which.`, [
      `PL${first.text}`,
      `PL ${first.text} mm`,
    ]);
  const toNm = system === 'US' ? inchesToNm : mmToNm;
  let thickness = toNm(first);
  let widthNm = second ? toNm(second) : undefined;
  if (widthNm !== undefined && widthNm < thickness && !third && longNm === null)
    [thickness, widthNm] = [widthNm, thickness];
  const lengthNm = longNm ?? (third ? toNm(third) : undefined);
  if (kind === 'floor-plate') {
    const section = floorPlate(thickness);
    if (!section)
      return ask(
        'section-unknown',
        `Floor plate ${inchText(thickness)} is not listed; its pattern adds mass, so plain plate will not do.`,
        ['FLOOR PL 1/8', 'FLOOR PL 3/16', 'FLOOR PL 1/4', 'FLOOR PL 5/16', 'FLOOR PL 3/8'],
      );
    return {
      outcome: 'read',
      section,
      notes: [],
      ...(widthNm === undefined ? {} : { widthNm }),
      ...(lengthNm === undefined ? {} : { lengthNm }),
    };
  }
  if (
    system === 'US' &&
    kind === 'plate' &&
    widthNm !== undefined &&
    lengthNm === undefined &&
    widthNm <= WIDEST_FLAT_NM
  )
    return {
      outcome: 'read',
      section: flat('US', thickness, widthNm),
      notes: ['a plate this narrow is read as flat bar'],
    };
  const base = plate(system, thickness);
  const number = system === 'US' ? inchText : mmText;
  const name = [
    base.name,
    ...(widthNm === undefined ? [] : [number(widthNm)]),
    ...(lengthNm === undefined ? [] : [system === 'US' ? footText(lengthNm) : number(lengthNm)]),
  ].join('x');
  return {
    outcome: 'read',
    section: { ...base, name },
    notes: [],
    ...(widthNm === undefined ? {} : { widthNm }),
    ...(lengthNm === undefined ? {} : { lengthNm }),
  };
}

/** Inches where a fraction or a foot mark says so or the thickness is under 3; millimetres where it cannot be inches. */
function systemOf(sizes: readonly Size[], feet: boolean, hint: 'in' | 'mm' | undefined): System | null {
  const [thickness] = sizes;
  if (!thickness) return null;
  if (feet || sizes.some(({ fraction }) => fraction) || thickness.text.startsWith('.')) return 'US';
  if (hint) return hint === 'in' ? 'US' : 'EN';
  if (valueOf(thickness) > 4) return valueOf(thickness) === 6.35 ? null : 'EN';
  return valueOf(thickness) < 1 ? 'US' : null;
}

function readSheet(sizes: readonly string[]): SectionReading {
  const gauge = sizes.find((size) => size.endsWith('GA'))?.slice(0, -2) ?? sizes[0] ?? '';
  const section = sheet(gauge);
  return section
    ? { outcome: 'read', section, notes: ['sheet gauge, not tube gauge'] }
    : ask('section-unknown', `Sheet needs its gauge from 7 to 18, such as SHEET 10 GA.`, [
        'SHEET 10 GA',
        'SHEET 12 GA',
        'SHEET 14 GA',
        'SHEET 16 GA',
      ]);
}
