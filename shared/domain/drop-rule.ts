/** Which leftovers are worth keeping and what a kept one is worth. */
import { asNm, NM_PER_FOOT, NM_PER_M, type Nm } from '#shared/domain/units.ts';
import type { Family } from '#shared/domain/section/types.ts';

/**
 * Lengths worth tagging and finding again, by family (common practice, no published source): bars of an inch or less from 2 ft, angle,
 * channel, pipe and tube from 3 ft, beams from 5 ft, plate from a foot square. A shop sets its own.
 */
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

const METRE = BigInt(NM_PER_M);
const least = (values: readonly bigint[]) => values.reduce((a, b) => (b < a ? b : a));

/**
 * Credit of a kept drop in whole minor units a metre: a share of the cheapest price a metre, rounded down, so that no bar is ever
 * credited more than it cost. 0 when nothing has a price. Exact: a credit a hair too high would let a plan earn money by cutting.
 */
export function creditMinorPerM(prices: readonly Price[], creditPercent: number): number {
  if (prices.length === 0) return 0;
  const shares = prices.map(
    ({ lengthNm, costMinor }) =>
      (BigInt(costMinor) * BigInt(creditPercent) * METRE) / (BigInt(lengthNm) * 100n),
  );
  return Number(least(shares));
}

/**
 * Credit of scrap in whole minor units a metre, from the dealer's price for 1000 kg and the section's milligrams a metre; never above
 * the drop's credit, because scrap must not look better than keeping.
 */
export function scrapMinorPerM(scrapMinorPerTonne: number, mgPerM: number, credit: number): number {
  return Math.min(credit, Number((BigInt(scrapMinorPerTonne) * BigInt(mgPerM)) / 1_000_000_000n));
}

/** What a racked drop costs a plan, in whole minor units: the credit a drop of its length is given, rounded up. */
export function dropCostMinor(lengthNm: number, credit: number): number {
  return Number((BigInt(lengthNm) * BigInt(credit) + METRE - 1n) / METRE);
}
