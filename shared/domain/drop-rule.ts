/** Which leftovers are worth keeping and what a kept one is worth. */
import { asNm, NM_PER_FOOT, NM_PER_M, type Nm } from '#shared/domain/units.ts';
import type { Family } from '#shared/domain/section/types.ts';

/** Floors of the trade by family (common practice, no published source); a shop sets its own. */
const KEEP_FROM_FEET: Readonly<Record<Family, number>> = {
  angle: 3,
  flat: 2,
  round: 2,
  square: 2,
  channel: 3,
  beam: 5,
  tube: 3,
  'round-tube': 3,
  pipe: 3,
  'gauge-tube': 2,
  plate: 1,
  'floor-plate': 1,
  sheet: 1,
};

export const usualKeepFromNm = (family: Family): Nm => asNm(KEEP_FROM_FEET[family] * NM_PER_FOOT);
/** A kept drop is often carried at half of what it cost (common practice, no published source). */
export const USUAL_CREDIT_PERCENT = 50;

type Price = { readonly lengthNm: number; readonly costMinor: number };

/**
 * Credit a metre of a kept drop: a share of the cheapest price a metre, rounded down to whole minor units, so that no bar is ever
 * credited more than it cost. 0 when nothing has a price.
 */
export function creditMinorPerM(prices: readonly Price[], creditPercent: number): number {
  const cheapest = Math.min(...prices.map(({ lengthNm, costMinor }) => costMinor / (lengthNm / NM_PER_M)));
  return Number.isFinite(cheapest) ? Math.floor((cheapest * creditPercent) / 100) : 0;
}

/** Scrap credit a metre from the dealer's price for 1000 kg, never above the drop's credit: scrap must not look better than keeping. */
export function scrapMinorPerM(scrapMinorPerTonne: number, mgPerM: number, credit: number): number {
  return Math.min(credit, Math.floor((scrapMinorPerTonne * mgPerM) / 1e9));
}

/** What a racked drop costs a plan: the credit it was given when it was racked. */
export const dropCostMinor = (lengthNm: number, credit: number): number =>
  Math.ceil((lengthNm / NM_PER_M) * credit);
