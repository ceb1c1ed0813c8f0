/**
 * First plans by hand methods. `fillGreedily` opens, bar after bar, the stock whose longest-first filling costs least for the steel it uses;
 * it completes what a dive has left and gives the first plan at once.
 */
import { canClamp, creditMinor, fits, leftoverNm } from '#shared/domain/layout-cost.ts';
import { makeColumn, type Column, type Problem } from '#workers/solver/core/problem.ts';
import type { Use } from '#workers/solver/core/plan-state.ts';

/** Longest first, as many as fit; for a hold-down the last ones come off again until the bar can be clamped. */
function fillBar(problem: Problem, stock: number, residual: ArrayLike<number>): Map<number, number> | null {
  const bar = problem.stocks[stock];
  if (!bar) return null;
  const { cutting } = problem.group;
  const counts = new Map<number, number>();
  let total = 0;
  let pieces = 0;
  let longest = 0;
  problem.items.forEach(({ lengthNm }, i) => {
    const room = bar.usable + cutting.kerfNm - total - pieces * cutting.kerfNm;
    const n = Math.min(residual[i] ?? 0, Math.floor(room / (lengthNm + cutting.kerfNm)));
    if (n < 1) return;
    counts.set(i, n);
    total += n * lengthNm;
    pieces += n;
    longest = Math.max(longest, lengthNm);
  });
  const order = [...counts.keys()].reverse();
  while (pieces > 0) {
    if (
      fits(bar.usable, total, pieces, cutting) &&
      canClamp(leftoverNm(bar.usable, total, pieces, cutting), longest, cutting)
    )
      return counts;
    const i = order.find((item) => (counts.get(item) ?? 0) > 0);
    if (i === undefined) return null;
    counts.set(i, (counts.get(i) ?? 0) - 1);
    total -= problem.items[i]?.lengthNm ?? 0;
    pieces--;
  }
  return null;
}

/** Completes a plan for the residual demand, changing `residual` and `supply`. What no bar can take stays in `residual`. */
export function fillGreedily(problem: Problem, residual: Float64Array, supply: Float64Array): Use[] {
  const uses: Use[] = [];
  for (;;) {
    let best: { column: Column; score: number } | null = null;
    for (let s = 0; s < problem.stocks.length; s++) {
      if ((supply[s] ?? 0) < 1) continue;
      const counts = fillBar(problem, s, residual);
      const column = counts ? makeColumn(problem, s, counts) : null;
      if (!column) continue;
      let made = 0;
      for (let j = 0; j < column.items.length; j++)
        made += (column.counts[j] ?? 0) * (problem.items[column.items[j] ?? 0]?.lengthNm ?? 0);
      const score = column.cost / made;
      if (!best || score < best.score) best = { column, score };
    }
    if (!best) return uses;
    const { column } = best;
    let repeat = supply[column.stock] ?? 0;
    for (let j = 0; j < column.items.length; j++)
      repeat = Math.min(repeat, Math.floor((residual[column.items[j] ?? 0] ?? 0) / (column.counts[j] ?? 1)));
    for (let j = 0; j < column.items.length; j++) {
      const i = column.items[j] ?? 0;
      residual[i] = (residual[i] ?? 0) - repeat * (column.counts[j] ?? 0);
    }
    supply[column.stock] = (supply[column.stock] ?? 0) - repeat;
    uses.push({ column, repeat });
  }
}

/** Best-fit decreasing bar by bar: each piece goes where least is left over, or opens the bar that is cheapest for its length. */
export function bestFitDecreasing(problem: Problem): Use[] {
  type Open = { stock: number; room: number; counts: Map<number, number> };
  const { cutting, drops } = problem.group;
  const supply = problem.stocks.map(({ supply: have }) => have);
  const open: Open[] = [];
  problem.items.forEach(({ lengthNm, demand }, i) => {
    const step = lengthNm + cutting.kerfNm;
    for (let k = 0; k < demand; k++) {
      let best: Open | null = null;
      for (const bar of open) if (bar.room >= step && (!best || bar.room < best.room)) best = bar;
      if (!best) {
        let cheapest = Infinity;
        let chosen = -1;
        problem.stocks.forEach((bar, s) => {
          if ((supply[s] ?? 0) < 1 || bar.usable < lengthNm) return;
          const cost =
            (bar.costMinor - creditMinor(Math.max(0, bar.usable - step), drops)) /
            Math.min(bar.usable, Math.max(lengthNm, bar.usable * 0.9));
          if (cost < cheapest) [cheapest, chosen] = [cost, s];
        });
        const bar = problem.stocks[chosen];
        if (!bar) return;
        supply[chosen] = (supply[chosen] ?? 0) - 1;
        best = { stock: chosen, room: bar.usable + cutting.kerfNm, counts: new Map() };
        open.push(best);
      }
      best.room -= step;
      best.counts.set(i, (best.counts.get(i) ?? 0) + 1);
    }
  });
  return open.flatMap(({ stock, counts }) => {
    const column = makeColumn(problem, stock, counts);
    return column ? [{ column, repeat: 1 }] : [];
  });
}
