import { asMg, MG_PER_KG, MG_PER_LB, NM_PER_M, type Mg } from '#shared/domain/units.ts';
import type { Section } from '#shared/domain/section/types.ts';

/** Nominal mass of a bar of a length, to the nearest milligram. */
export const barMassMg = (mgPerM: number, lengthNm: number): Mg => asMg((mgPerM * lengthNm) / NM_PER_M);

/** Nominal mass of one piece. Plate families want a width; without one RangeError. */
export function pieceMassMg(section: Section, lengthNm: number, widthNm?: number): Mg {
  if (section.mass.per === 'length') return barMassMg(section.mass.mgPerM, lengthNm);
  if (widthNm === undefined)
    throw new RangeError(`${section.name} is cut from plate: its mass needs a width`);
  return asMg(section.mass.mgPerM2 * (lengthNm / NM_PER_M) * (widthNm / NM_PER_M));
}

/** Pounds or kilograms with as many digits as a yard needs: one decimal under 100, none above. */
export function formatMass(mg: number, units: 'imperial' | 'metric'): string {
  const value = units === 'imperial' ? mg / MG_PER_LB : mg / MG_PER_KG;
  const digits = value !== 0 && Math.abs(value) < 100 ? 1 : 0;
  const [whole = '', part] = value.toFixed(digits).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, '\u2009');
  return `${grouped}${part ? `.${part}` : ''} ${units === 'imperial' ? 'lb' : 'kg'}`;
}
