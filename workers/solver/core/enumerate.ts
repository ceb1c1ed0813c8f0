/**
 * Every column whose reduced cost is small enough to stand in a better plan, depth first with a knapsack completion bound. With duals that prove
 * the bound z and a plan of cost z̄, a better plan uses only columns of reduced cost below z̄ − z; the integer program over all of them is exact.
 * Not only maximal ones: a leftover has a value.
 */
import { creditMinor } from '#shared/domain/layout-cost.ts';
import type { Clock } from '#workers/solver/core/clock.ts';
import type { Grid } from '#workers/solver/core/grid.ts';
import { makeColumn, type Column, type Problem } from '#workers/solver/core/problem.ts';

const MOST_TABLE_CELLS = 24_000_000;

/** Null when there are more than `most`, the grid is not exact or the time is up. */
export function enumerateColumns(
  problem: Problem,
  grid: Grid,
  duals: Float64Array,
  stockDuals: Float64Array,
  slack: number,
  most: number,
  clock: Clock,
): { columns: Column[]; visited: number } | null {
  const { items, stocks } = problem;
  const n = items.length;
  const cells = grid.cells + 1;
  if (!grid.exact || (n + 1) * cells > MOST_TABLE_CELLS) return null;
  // best[i][w]: the most that items i… can earn in at most w cells, counted without their demands.
  const best = new Float64Array((n + 1) * cells);
  for (let i = n - 1; i >= 0; i--) {
    const row = i * cells;
    const below = row + cells;
    const weight = grid.weights[i] ?? 1;
    const profit = duals[i] ?? 0;
    for (let w = 0; w < cells; w++) {
      let v = best[below + w] as number;
      if (w >= weight) v = Math.max(v, (best[row + w - weight] as number) + profit);
      best[row + w] = v;
    }
  }
  const { drops } = problem.group;
  const columns: Column[] = [];
  const counts = new Int32Array(n);
  let visited = 0;
  let gaveUp = false;

  for (let s = 0; s < stocks.length && !gaveUp; s++) {
    const bar = stocks[s];
    if (!bar) continue;
    const base = bar.costMinor + (stockDuals[s] ?? 0);
    const capacity = grid.capacities[s] ?? 0;
    // The most a leftover of up to w cells can bring.
    const credit = new Float64Array(capacity + 1);
    for (let w = 1; w <= capacity; w++)
      credit[w] = Math.max(
        credit[w - 1] ?? 0,
        creditMinor(Math.max(0, Math.min(bar.usable, bar.usable - (capacity - w) * grid.cellNm)), drops),
      );

    const visit = (i: number, room: number, earned: number): void => {
      if (gaveUp) return;
      if ((++visited & 4095) === 0 && clock.isUp()) gaveUp = true;
      if (base - earned - (best[i * cells + room] as number) - (credit[room] ?? 0) > slack) return;
      if (i === n) {
        if (room === capacity) return;
        const column = makeColumn(
          problem,
          s,
          new Map([...counts].flatMap((count, item) => (count > 0 ? [[item, count] as const] : []))),
        );
        if (column && column.cost + (stockDuals[s] ?? 0) - earned <= slack) {
          columns.push(column);
          if (columns.length > most) gaveUp = true;
        }
        return;
      }
      const weight = grid.weights[i] ?? 1;
      const fit = Math.min(items[i]?.demand ?? 0, Math.floor(room / weight));
      for (let k = fit; k >= 0; k--) {
        counts[i] = k;
        visit(i + 1, room - k * weight, earned + k * (duals[i] ?? 0));
      }
      counts[i] = 0;
    };
    visit(0, capacity, 0);
  }
  return gaveUp ? null : { columns, visited };
}
