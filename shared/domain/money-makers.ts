import { creditMinor, fits, leftoverNm, usableNm } from '#shared/domain/layout-cost.ts';
import type { SolveRequest } from '#shared/domain/solve.ts';
import type { PlanFault } from '#shared/domain/check-plan.ts';

/**
 * Stock whose leftover would be credited with more than the bar cost, even after the shortest piece is cut from it: a plan would earn money by
 * cutting, so such a request is refused.
 */
export function findMoneyMakers(request: SolveRequest): PlanFault[] {
  return request.groups.flatMap((group, g) => {
    const shortest = Math.min(
      ...group.pieces.filter(({ quantity }) => quantity > 0).map(({ lengthNm }) => lengthNm),
    );
    if (!Number.isFinite(shortest)) return [];
    return group.stock.flatMap((stock, s) => {
      const usable = usableNm(stock.lengthNm, group.cutting);
      if (stock.supply === 0 || !fits(usable, shortest, 1, group.cutting)) return [];
      const left = leftoverNm(usable, shortest, 1, group.cutting);
      const credit = Math.max(
        creditMinor(left, group.drops),
        (group.drops.scrapMinorPerM * Math.min(left, group.drops.keepFromNm)) / 1e9,
      );
      return credit > stock.costMinor
        ? [
            {
              path: `groups.${g}.stock.${s}.costMinor`,
              message: `${stock.id} costs ${stock.costMinor} and its leftover would be credited with ${credit.toFixed(2)}: lower the credit or raise the cost`,
            },
          ]
        : [];
    });
  });
}
