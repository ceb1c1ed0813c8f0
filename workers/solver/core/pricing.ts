/**
 * Pricing by one exact-use bounded knapsack over the grid (Gilmore and Gomory 1961, 1963): value[W] is the best sum of duals of pieces that take
 * exactly W cells. One table serves every stock and every drop of the group, credits of the leftover included. Bounded items go through a sliding
 * window maximum (monotone queue), so an item costs one pass whatever its demand.
 */
import { creditMinor } from '#shared/domain/layout-cost.ts';
import type { Grid } from '#workers/solver/core/grid.ts';
import { makeColumn, type Column, type Problem } from '#workers/solver/core/problem.ts';

const NEVER = -1e300;

export type Priced = { readonly column: Column; readonly reducedCost: number };

export type Pricer = {
  /** Columns of negative reduced cost, the best few of each stock. `limit` bounds each item (residual demand). */
  findColumns(
    duals: Float64Array,
    stockDuals: Float64Array,
    limit: ArrayLike<number>,
    tolerance: number,
  ): Priced[];
  /**
   * The factor by which duals must shrink so that no column at all has negative reduced cost (Farley 1990): at most 1 on an optimal master.
   * Infinity when a free bar would earn something.
   */
  worstRatio(duals: Float64Array, stockDuals: Float64Array, limit: ArrayLike<number>): number;
};

type Table = { value: Float64Array; choice: Uint16Array; cells: number };

export function makePricer(problem: Problem, search: Grid, bound: Grid): Pricer {
  const n = problem.items.length;
  const most = Math.max(search.cells, bound.cells) + 1;
  const table: Table = { value: new Float64Array(most), choice: new Uint16Array(most * n), cells: most };
  const before = new Float64Array(most);
  const queueAt = new Int32Array(most);
  const queueValue = new Float64Array(most);
  // With a hold-down a piece worth nothing may still make a bar clampable, so none is left out.
  const takesWorthless = problem.holdDown > 0;

  function fill(grid: Grid, duals: Float64Array, limit: ArrayLike<number>): void {
    const { value, choice } = table;
    const size = grid.cells + 1;
    value.fill(NEVER, 0, size);
    value[0] = 0;
    for (let i = 0; i < n; i++) {
      const row = i * most;
      choice.fill(0, row, row + size);
      const weight = grid.weights[i] ?? 1;
      const profit = duals[i] ?? 0;
      const b = Math.min(limit[i] ?? 0, Math.floor(grid.cells / weight), 65_535);
      if (b < 1 || profit < 0 || (profit === 0 && !takesWorthless)) continue;
      if (b === 1) {
        for (let w = size - 1; w >= weight; w--) {
          const candidate = (value[w - weight] as number) + profit;
          if (candidate > (value[w] as number)) {
            value[w] = candidate;
            choice[row + w] = 1;
          }
        }
        continue;
      }
      before.set(value.subarray(0, size));
      for (let residue = 0; residue < weight && residue < size; residue++) {
        let head = 0;
        let tail = 0;
        for (let j = 0, w = residue; w < size; j++, w += weight) {
          const normal = (before[w] as number) - j * profit;
          while (tail > head && (queueValue[tail - 1] as number) <= normal) tail--;
          queueAt[tail] = j;
          queueValue[tail++] = normal;
          while (j - (queueAt[head] as number) > b) head++;
          const best = (queueValue[head] as number) + j * profit;
          if (best > (value[w] as number)) {
            value[w] = best;
            choice[row + w] = j - (queueAt[head] as number);
          }
        }
      }
    }
  }

  function columnAt(grid: Grid, stock: number, cells: number): Column | null {
    const counts = new Map<number, number>();
    let w = cells;
    for (let i = n - 1; i >= 0 && w > 0; i--) {
      const count = table.choice[i * most + w] as number;
      if (count > 0) {
        counts.set(i, count);
        w -= count * (grid.weights[i] ?? 1);
      }
    }
    return w === 0 && counts.size > 0 ? makeColumn(problem, stock, counts) : null;
  }

  const KEPT = 4;

  return {
    findColumns(duals, stockDuals, limit, tolerance) {
      fill(search, duals, limit);
      const found: Priced[] = [];
      const { drops } = problem.group;
      problem.stocks.forEach((bar, s) => {
        const capacity = search.capacities[s] ?? 0;
        const base = bar.costMinor + (stockDuals[s] ?? 0);
        const best: { w: number; gain: number }[] = [];
        for (let w = 1; w <= capacity; w++) {
          const v = table.value[w] as number;
          if (v < 0) continue;
          const gain = v - base + creditMinor(Math.max(0, bar.usable - w * search.cellNm), drops);
          if (gain <= tolerance) continue;
          if (best.length < KEPT || gain > (best.at(-1)?.gain ?? NEVER)) {
            best.push({ w, gain });
            best.sort((a, b) => b.gain - a.gain);
            if (best.length > KEPT) best.pop();
          }
        }
        for (const { w } of best) {
          const column = columnAt(search, s, w);
          if (!column) continue;
          let reducedCost = column.cost + (stockDuals[s] ?? 0);
          for (let j = 0; j < column.items.length; j++)
            reducedCost -= (column.counts[j] ?? 0) * (duals[column.items[j] ?? 0] ?? 0);
          if (reducedCost < -tolerance) found.push({ column, reducedCost });
        }
      });
      return found.sort((a, b) => a.reducedCost - b.reducedCost);
    },
    worstRatio(duals, stockDuals, limit) {
      fill(bound, duals, limit);
      const { drops } = problem.group;
      // Credits may fall where scrap begins to be a drop; a bound needs the best of every shorter leftover.
      let worst = 0;
      problem.stocks.forEach((bar, s) => {
        const capacity = bound.capacities[s] ?? 0;
        const dual = stockDuals[s] ?? 0;
        let bestCredit = 0;
        for (let w = capacity; w >= 1; w--) {
          bestCredit = Math.max(bestCredit, creditMinor(Math.max(0, bar.usable - w * bound.cellNm), drops));
          const value = (table.value[w] as number) - dual;
          if (value <= 0) continue;
          const cost = bar.costMinor - bestCredit;
          const ratio = cost > 1e-9 ? value / cost : value > 1e-7 ? Infinity : 0;
          if (ratio > worst) worst = ratio;
        }
      });
      return worst;
    },
  };
}
