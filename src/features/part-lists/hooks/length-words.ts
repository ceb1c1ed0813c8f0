import { NM_PER_INCH, NM_PER_MM } from '#shared/domain/units.ts';
import type { LengthStyle } from '#shared/domain/length.ts';

/** Whether the shop's writing says this length to the nanometre; a list in the other system seldom does. */
export function isExactIn(nm: number, style: LengthStyle): boolean {
  return nm % (style.units === 'imperial' ? NM_PER_INCH / style.denominator : NM_PER_MM / 10) === 0;
}
