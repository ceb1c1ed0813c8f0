/**
 * Column generation (Gilmore and Gomory 1961, 1963) with Farley's bound at every step, so that a search stopped early still states a bound that holds.
 */
import type { Master } from '#workers/solver/core/master.ts';
import type { Pool } from '#workers/solver/core/pool.ts';
import type { Pricer } from '#workers/solver/core/pricing.ts';
import type { Problem } from '#workers/solver/core/problem.ts';
import type { Clock } from '#workers/solver/core/clock.ts';

export type Relaxation = {
  /** No plan costs less; 0 when nothing is known. */
  readonly bound: number;
  /** Duals that prove it: no column has negative reduced cost under them. */
  readonly duals: Float64Array;
  readonly stockDuals: Float64Array;
  readonly x: Float64Array;
  /** The master can only be met by leaving pieces out. */
  readonly missing: boolean;
};

const TOLERANCE = 1e-7;

/** Runs until no column prices out or the time is up. `onBound` is told of every better bound. */
export function generateColumns(
  problem: Problem,
  master: Master,
  pool: Pool,
  pricer: Pricer,
  clock: Clock,
  onBound: (bound: number) => void,
): Relaxation | null {
  const limit = problem.items.map(({ demand }) => demand);
  const largest = Math.max(1, ...problem.stocks.map(({ costMinor }) => costMinor));
  let best = null as Relaxation | null;
  for (;;) {
    const lp = master.solve(clock.secondsLeft());
    if (!lp) return best;
    const found = pricer.findColumns(lp.duals, lp.stockDuals, limit, TOLERANCE * largest);
    const fresh = found.filter(({ column }) => pool.add(column)).length;
    const ratio = Math.max(1, pricer.worstRatio(lp.duals, lp.stockDuals, limit));
    let value = 0;
    problem.items.forEach(({ demand }, i) => (value += demand * (lp.duals[i] ?? 0)));
    problem.stocks.forEach(({ supply }, s) => {
      if (Number.isFinite(supply)) value -= supply * (lp.stockDuals[s] ?? 0);
    });
    const bound = Number.isFinite(ratio) && !lp.missing ? Math.max(0, value / ratio) : 0;
    const converged = fresh === 0;
    const previous: Relaxation | null = best;
    const better = Number.isFinite(ratio) && (previous === null || bound > previous.bound);
    best = {
      bound: better ? bound : (previous?.bound ?? 0),
      duals: better ? lp.duals.map((dual) => dual / ratio) : (previous?.duals ?? lp.duals),
      stockDuals: better
        ? lp.stockDuals.map((dual) => dual / ratio)
        : (previous?.stockDuals ?? lp.stockDuals),
      x: lp.x,
      missing: lp.missing,
    };
    if (better) onBound(best.bound);
    if (converged || clock.isUp()) return best;
  }
}
