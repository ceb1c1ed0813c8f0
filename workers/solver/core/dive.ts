/**
 * Diving: fix what the relaxation is sure of (whole parts, then the largest fraction), price the residual problem again, repeat. Columns stay
 * proper, so every dive ends in a plan. Randomised dives round other fractions first.
 */
import type { Clock } from '#workers/solver/core/clock.ts';
import { fillGreedily } from '#workers/solver/core/greedy.ts';
import type { Master } from '#workers/solver/core/master.ts';
import type { Use } from '#workers/solver/core/plan-state.ts';
import type { Pool } from '#workers/solver/core/pool.ts';
import type { Pricer } from '#workers/solver/core/pricing.ts';
import { isProper, type Problem } from '#workers/solver/core/problem.ts';

const ROUNDS_OF_PRICING = 12;
const TOLERANCE = 1e-7;

type Parts = {
  problem: Problem;
  master: Master;
  pool: Pool;
  pricer: Pricer;
  clock: Clock;
  random: () => number;
};

/**
 * One dive. Returns null when the plan so far already costs more than `cutoff` or the time is up before a plan stands. `boldness` 0 takes the largest
 * fraction, above it a random one of the larger.
 */
export function dive(
  { problem, master, pool, pricer, clock, random }: Parts,
  cutoff: number,
  boldness: number,
): Use[] | null {
  const residual = Float64Array.from(problem.items, ({ demand }) => demand);
  const supply = Float64Array.from(problem.stocks, (bar) => bar.supply);
  const uses: Use[] = [];
  const largest = Math.max(1, ...problem.stocks.map(({ costMinor }) => costMinor));
  let spent = 0;

  const fix = (p: number, repeat: number) => {
    const column = master.columns[p];
    if (!column || repeat < 1) return;
    let most = Math.min(repeat, supply[column.stock] ?? 0);
    for (let j = 0; j < column.items.length; j++)
      most = Math.min(most, Math.floor((residual[column.items[j] ?? 0] ?? 0) / (column.counts[j] ?? 1)));
    if (most < 1) return;
    for (let j = 0; j < column.items.length; j++) {
      const i = column.items[j] ?? 0;
      residual[i] = (residual[i] ?? 0) - most * (column.counts[j] ?? 0);
    }
    supply[column.stock] = (supply[column.stock] ?? 0) - most;
    spent += most * column.cost;
    uses.push({ column, repeat: most });
  };

  try {
    while (residual.some((left) => left > 0)) {
      if (clock.isUp()) return null;
      master.restrict(residual, supply);
      let lp = master.solve(clock.secondsLeft());
      for (let round = 0; lp && round < ROUNDS_OF_PRICING; round++) {
        const open = pricer
          .findColumns(
            lp.duals,
            lp.stockDuals.map((dual, s) => ((supply[s] ?? 0) > 0 ? dual : largest * 100)),
            residual,
            TOLERANCE * largest,
          )
          .filter(({ column }) => isProper(column, residual));
        const fresh = open.filter(({ column }) => pool.add(column)).length;
        if (fresh === 0 || clock.isUp()) break;
        lp = master.solve(clock.secondsLeft());
      }
      if (!lp) return null;
      if (spent + lp.value > cutoff && !lp.missing) return null;
      const order = [...lp.x.keys()]
        .filter((p) => (lp.x[p] ?? 0) > 1e-6)
        .sort((a, b) => (lp.x[b] ?? 0) - (lp.x[a] ?? 0));
      const whole = order.filter((p) => (lp.x[p] ?? 0) >= 1 - 1e-6);
      if (whole.length > 0) {
        for (const p of whole) fix(p, Math.floor((lp.x[p] ?? 0) + 1e-6));
        continue;
      }
      if (lp.missing || order.length === 0) {
        // Nothing is sure and pieces are missing: the hand method takes what still fits.
        uses.push(...fillGreedily(problem, residual, supply));
        break;
      }
      const pick = Math.min(order.length - 1, Math.floor(random() ** 2 * boldness * order.length));
      fix(order[pick] ?? 0, 1);
    }
    return uses;
  } finally {
    master.restrict(
      Float64Array.from(problem.items, ({ demand }) => demand),
      Float64Array.from(problem.stocks, (bar) => bar.supply),
    );
  }
}
