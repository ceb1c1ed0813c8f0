/**
 * Units live in types. Lengths are whole nanometres: 1/64 in is 396 875 nm exactly, and 60 ft
 * (1.8288e10 nm) fits the 53 bits of a double with room to spare. No bitwise operators on them.
 */
declare const nm: unique symbol;
declare const milligram: unique symbol;

/** A length in whole nanometres. */
export type Nm = number & { readonly [nm]: true };
/** A mass in whole milligrams. */
export type Mg = number & { readonly [milligram]: true };

/** The unit a bare number of a part list is read in. */
export type LengthUnit = 'in' | 'mm' | 'ft' | 'm' | 'cm';
export const LENGTH_UNITS = ['in', 'mm', 'ft', 'm', 'cm'] as const satisfies readonly LengthUnit[];

/** Exact by the international yard and pound agreement of 1959: 1 in = 25.4 mm. */
export const NM_PER_INCH = 25_400_000;
export const NM_PER_FOOT = 304_800_000;
export const NM_PER_MM = 1_000_000;
export const NM_PER_CM = 10_000_000;
export const NM_PER_M = 1_000_000_000;
/** Exact by the same agreement: 1 lb = 0.453 592 37 kg. */
export const MG_PER_LB = 453_592.37;
export const MG_PER_KG = 1_000_000;

export const NM_PER_UNIT: Readonly<Record<LengthUnit, number>> = {
  in: NM_PER_INCH,
  mm: NM_PER_MM,
  ft: NM_PER_FOOT,
  m: NM_PER_M,
  cm: NM_PER_CM,
};

/** Brands a number as nanometres. Throws RangeError when it is not a safe integer. */
export function asNm(value: number): Nm {
  if (!Number.isSafeInteger(value)) throw new RangeError(`not a whole number of nanometres: ${value}`);
  return value as Nm;
}

/** Brands a number as milligrams, rounded to the nearest. Throws RangeError when out of range. */
export function asMg(value: number): Mg {
  const rounded = Math.round(value);
  if (!Number.isSafeInteger(rounded)) throw new RangeError(`not a mass in milligrams: ${value}`);
  return rounded as Mg;
}
