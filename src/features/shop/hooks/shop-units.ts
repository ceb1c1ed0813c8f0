import { MG_PER_KG, MG_PER_LB } from '#shared/domain/units.ts';

type Units = 'imperial' | 'metric';

/** Pounds or kilograms, whole: nobody weighs by hand what stands on a handling rule. */
export const MASS_UNIT: Readonly<Record<Units, string>> = { imperial: 'lb', metric: 'kg' };
const MG_PER_UNIT: Readonly<Record<Units, number>> = { imperial: MG_PER_LB, metric: MG_PER_KG };

export function massToUnits(massMg: number, units: Units): number {
  return Math.round(massMg / MG_PER_UNIT[units]);
}

/** Whole milligrams of a whole number of pounds or kilograms. */
export function unitsToMass(whole: number, units: Units): number {
  return Math.round(whole * MG_PER_UNIT[units]);
}

/** Scrap dealers pay by the hundredweight of 100 lb or by the tonne; the shop keeps minor units a tonne. */
export const SCRAP_UNIT: Readonly<Record<Units, string>> = { imperial: 'per 100 lb', metric: 'per 1000 kg' };
const KG_PER_SCRAP_UNIT: Readonly<Record<Units, number>> = {
  imperial: (100 * MG_PER_LB) / MG_PER_KG,
  metric: 1000,
};

export function scrapPerTonne(minor: number, units: Units): number {
  return Math.round((minor * 1000) / KG_PER_SCRAP_UNIT[units]);
}

export function scrapPerUnit(minorPerTonne: number, units: Units): number {
  return Math.round((minorPerTonne * KG_PER_SCRAP_UNIT[units]) / 1000);
}
