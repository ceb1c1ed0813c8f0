/** The search: first plan at once, bound by column generation, better plans by dives and an integer master, proof by enumeration. */
import type { Highs } from 'highs';
import type { SolveGroup, SolveGroupResult, SolveUnplaced } from '#shared/domain/solve.ts';
import type { SolveOptions, SolveProgress } from '#workers/solver/api.ts';
import { makeClock, shorterClock, type Clock } from '#workers/solver/core/clock.ts';
import { dive } from '#workers/solver/core/dive.ts';
import { enumerateColumns } from '#workers/solver/core/enumerate.ts';
import { generateColumns, type Relaxation } from '#workers/solver/core/generate-columns.ts';
import { bestFitDecreasing, fillGreedily } from '#workers/solver/core/greedy.ts';
import { makeGrids } from '#workers/solver/core/grid.ts';
import { solveInteger } from '#workers/solver/core/integer-master.ts';
import { makeMaster } from '#workers/solver/core/master.ts';
import { isBetter, makePlan, type Plan, type Use } from '#workers/solver/core/plan-state.ts';
import { addStartingColumns, makePool } from '#workers/solver/core/pool.ts';
import { makePricer } from '#workers/solver/core/pricing.ts';
import { hopelessItems, makeProblem, type Column, type Problem } from '#workers/solver/core/problem.ts';
import { makeRandom } from '#workers/solver/core/random.ts';
import { statePlan } from '#workers/solver/core/state-plan.ts';

export type SolveHooks = {
  readonly highs: Highs;
  readonly now: () => number;
  readonly onProgress?: (progress: SolveProgress) => void;
};

const DIVES = 12;
/** After so many dives a group with few columns left is solved whole at once. */
const FEW_DIVES = 3;
const FEW_COLUMNS = 3_000;
const MOST_ENUMERATED = 40_000;
const MOST_MASTER_COLUMNS = 4_000;
/** Part of the limit kept back for stating the plan. */
const RESERVE = 0.97;

type Work = { columns: number; lpRuns: number; dives: number; enumerated: number };
type Found = { problem: Problem; plan: Plan | null; bound: number; placed: boolean };

/** Best plan of one group within the time. Pieces no bar can take are reported and never stop the rest. */
export function solveGroup(group: SolveGroup, options: SolveOptions, hooks: SolveHooks): SolveGroupResult {
  const clock = makeClock(hooks.now, options.timeLimitMs * RESERVE);
  const work: Work = { columns: 0, lpRuns: 0, dives: 0, enumerated: 0 };
  const unplaced: SolveUnplaced[] = [];
  const without = new Map<string, number>();
  const leaveOut = (pieceId: string, quantity: number, reason: string) => {
    unplaced.push({ pieceId, quantity, reason });
    without.set(pieceId, (without.get(pieceId) ?? 0) + quantity);
  };

  const whole = makeProblem(group);
  for (const i of hopelessItems(whole))
    for (const { id, quantity } of whole.items[i]?.pieces ?? [])
      leaveOut(id, quantity, whole.stocks.length === 0 ? 'no stock is given' : 'longer than any stock');

  let found = search(makeProblem(group, without), options, hooks, clock, work);
  // Supplies that run out, or a hold-down no bar satisfies: what is left over is named, and the rest is planned and bounded for itself.
  if (found.plan && !found.placed) {
    const made = new Map<number, number>();
    for (const { column, repeat } of found.plan.uses)
      for (let j = 0; j < column.items.length; j++)
        made.set(
          column.items[j] ?? 0,
          (made.get(column.items[j] ?? 0) ?? 0) + repeat * (column.counts[j] ?? 0),
        );
    found.problem.items.forEach(({ demand, pieces }, i) => {
      let left = demand - (made.get(i) ?? 0);
      for (const { id, quantity } of [...pieces].reverse()) {
        const n = Math.min(left, quantity);
        if (n > 0) leaveOut(id, n, 'the stock runs out, or no bar can hold it for the last cut');
        left -= n;
      }
    });
    const kept = found.plan;
    found = search(makeProblem(group, without), options, hooks, clock, work);
    if (!found.placed) found = { ...found, plan: kept, bound: 0 };
  }
  const { problem, plan, bound } = found;
  hooks.onProgress?.({
    groupId: group.id,
    phase: 'done',
    netCostMinor: plan?.cost ?? 0,
    boundMinor: bound,
    bars: plan?.bars ?? 0,
    elapsedMs: clock.elapsedMs(),
  });
  const merged = mergeUnplaced(unplaced);
  return statePlan(group, problem, plan ?? makePlan(problem, []), bound, merged, {
    ...work,
    elapsedMs: clock.elapsedMs(),
  });
}

function mergeUnplaced(list: readonly SolveUnplaced[]): SolveUnplaced[] {
  const byPiece = new Map<string, SolveUnplaced>();
  for (const entry of list) {
    const known = byPiece.get(entry.pieceId);
    byPiece.set(entry.pieceId, known ? { ...known, quantity: known.quantity + entry.quantity } : entry);
  }
  return [...byPiece.values()];
}

const residualOf = (problem: Problem) => Float64Array.from(problem.items, ({ demand }) => demand);
const supplyOf = (problem: Problem) => Float64Array.from(problem.stocks, ({ supply }) => supply);

function makesAll(problem: Problem, uses: readonly Use[]): boolean {
  const left = residualOf(problem);
  for (const { column, repeat } of uses)
    for (let j = 0; j < column.items.length; j++)
      left[column.items[j] ?? 0] = (left[column.items[j] ?? 0] ?? 0) - repeat * (column.counts[j] ?? 0);
  return left.every((n) => n === 0);
}

/** The step below which no cheaper plan exists: costs are whole minor units when nothing is credited. */
function costStep(problem: Problem): number {
  const { creditMinorPerM, scrapMinorPerM } = problem.group.drops;
  if (creditMinorPerM !== 0 || scrapMinorPerM !== 0) return 0;
  const gcd = (a: number, b: number): number => (b === 0 ? a : gcd(b, a % b));
  return problem.stocks.reduce((g, { costMinor }) => gcd(costMinor, g), 0);
}

function search(problem: Problem, options: SolveOptions, hooks: SolveHooks, clock: Clock, work: Work): Found {
  if (problem.items.length === 0) return { problem, plan: makePlan(problem, []), bound: 0, placed: true };
  const step = costStep(problem);
  let plan: Plan | null = null;
  let bound = 0;
  let placed = false;
  const tell = (phase: SolveProgress['phase']) =>
    hooks.onProgress?.({
      groupId: problem.group.id,
      phase,
      netCostMinor: placed ? (plan?.cost ?? null) : null,
      boundMinor: bound,
      bars: plan?.bars ?? null,
      elapsedMs: clock.elapsedMs(),
    });
  const raise = (value: number) => {
    const whole = step > 0 ? Math.ceil(value / step - 1e-6) * step : value;
    if (whole > bound) bound = whole;
  };
  const isProven = () => placed && plan !== null && plan.cost - bound <= 1e-7 * Math.max(1, plan.cost);
  const offer = (uses: readonly Use[], phase: SolveProgress['phase']) => {
    const all = makesAll(problem, uses);
    const candidate = makePlan(problem, uses);
    if ((all && !placed) || (all === placed && isBetter(candidate, plan))) {
      plan = candidate;
      placed = all;
      tell(phase);
    } else if (!plan) plan = candidate;
  };

  const bestFit = bestFitDecreasing(problem);
  if (makesAll(problem, bestFit)) offer(bestFit, 'start');
  offer(fillGreedily(problem, residualOf(problem), supplyOf(problem)), 'start');

  const { search: grid, bound: boundGrid } = makeGrids(problem);
  const pricer = makePricer(problem, grid, boundGrid);
  const master = makeMaster(hooks.highs, problem);
  try {
    const pool = makePool(master);
    addStartingColumns(problem, pool);
    for (const { column } of (plan as Plan | null)?.uses ?? []) pool.add(column);
    const relaxation = generateColumns(problem, master, pool, pricer, clock, (value) => {
      raise(value);
      tell('bound');
    });
    if (relaxation?.missing || !relaxation) return { problem, plan, bound, placed };

    const random = makeRandom(options.seed);
    for (let k = 0; k < DIVES && !clock.isUp() && !isProven(); k++) {
      const cutoff = placed && plan ? (plan as Plan).cost - Math.max(step, 1e-6) + 1e-7 : Infinity;
      const uses = dive(
        { problem, master, pool, pricer, clock, random },
        cutoff,
        k === 0 ? 0 : 0.25 + 0.05 * k,
      );
      work.dives++;
      if (uses) offer(uses, 'dive');
      tell('dive');
      if (k === FEW_DIVES - 1 && !isProven()) tryProof(relaxation, FEW_COLUMNS, 1);
    }
    if (!isProven() && !clock.isUp()) tryProof(relaxation, MOST_ENUMERATED, 0.6);
    if (!isProven() && !clock.isUp() && placed) {
      const { columns } = trimmed(master.columns, relaxation, MOST_MASTER_COLUMNS);
      const answer = solveInteger(
        hooks.highs,
        problem,
        columns,
        (plan as Plan | null)?.cost ?? Infinity,
        clock.secondsLeft(),
      );
      if (answer.uses) offer(answer.uses, 'master');
      if (!isProven() && !clock.isUp()) tryProof(relaxation, MOST_ENUMERATED, 1);
    }
    return { problem, plan, bound, placed };
  } finally {
    work.columns += master.columns.length;
    work.lpRuns += master.lpRuns();
    master.dispose();
  }

  /** Enumerates what could still be better, at most `most` columns, and solves it whole within a share of the time left. */
  function tryProof(relaxation: Relaxation, most: number, share: number): void {
    if (!placed || !plan) return;
    const incumbent: Plan = plan;
    const slack = incumbent.cost - step - relaxation.bound + 1e-6;
    const part = shorterClock(clock, clock.secondsLeft() * 1000 * share);
    const all = enumerateColumns(problem, grid, relaxation.duals, relaxation.stockDuals, slack, most, part);
    if (!all) return;
    work.enumerated = Math.max(work.enumerated, all.columns.length);
    if (all.columns.length === 0) return raise(incumbent.cost);
    const cutoff = incumbent.cost - Math.max(step * 0.5, 1e-6);
    const answer = solveInteger(hooks.highs, problem, all.columns, cutoff, part.secondsLeft());
    if (answer.uses) offer(answer.uses, 'proof');
    raise(answer.complete && plan ? plan.cost : Math.min(answer.bound, incumbent.cost));
    tell('proof');
  }
}

/** The columns of least reduced cost. */
function trimmed(
  columns: readonly Column[],
  { duals, stockDuals }: Relaxation,
  most: number,
): { columns: Column[] } {
  const priced = columns.map((column) => {
    let reduced = column.cost + (stockDuals[column.stock] ?? 0);
    for (let j = 0; j < column.items.length; j++)
      reduced -= (column.counts[j] ?? 0) * (duals[column.items[j] ?? 0] ?? 0);
    return { column, reduced };
  });
  priced.sort((a, b) => a.reduced - b.reduced);
  return { columns: priced.slice(0, most).map(({ column }) => column) };
}
