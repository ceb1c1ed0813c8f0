/** Plan costs as they are kept: whole millionths of a minor unit, because credits are fractions and no float reaches the database. */
import { layoutCostBillionths } from '#shared/domain/layout-cost.ts';
import type { SolveGroup, SolveLayout } from '#shared/domain/solve.ts';

/** Exact net cost of the layouts in billionths of a minor unit. Every layout's stock must be in the group. */
export function netBillionths(
  { stock, drops }: Pick<SolveGroup, 'stock' | 'drops'>,
  layouts: readonly Pick<SolveLayout, 'stockId' | 'repeat' | 'leftoverNm'>[],
): bigint {
  const byId = new Map(stock.map((entry) => [entry.id, entry]));
  return layouts.reduce((net, { stockId, repeat, leftoverNm }) => {
    const bar = byId.get(stockId);
    if (!bar) throw new Error(`a layout uses ${stockId}, which its group does not have`);
    return net + BigInt(repeat) * layoutCostBillionths(bar, leftoverNm, drops);
  }, 0n);
}

/** To the nearest whole millionth. */
export const billionthsToMillionths = (billionths: bigint): number => Number((billionths + 500n) / 1000n);

/** Rounded down, so that a bound stays a bound. */
export const boundToMillionths = (minor: number): number => Math.floor(minor * 1e6);

/** Millionths are kept in 53 bits: about nine thousand million minor units a group. */
export const fitsTheBooks = (billionths: bigint): boolean =>
  Number.isSafeInteger(billionthsToMillionths(billionths));
