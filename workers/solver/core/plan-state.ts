/** A whole plan as columns with repeats, and which of two plans is better. */
import { columnKey, type Column, type Problem } from '#workers/solver/core/problem.ts';

export type Use = { readonly column: Column; readonly repeat: number };
export type Plan = {
  readonly uses: readonly Use[];
  readonly cost: number;
  readonly bars: number;
  readonly layouts: number;
  readonly longestDrop: number;
};

export function makePlan(problem: Problem, uses: readonly Use[]): Plan {
  const merged = new Map<string, { column: Column; repeat: number }>();
  for (const { column, repeat } of uses) {
    if (repeat < 1) continue;
    const key = columnKey(column);
    const known = merged.get(key);
    if (known) known.repeat += repeat;
    else merged.set(key, { column, repeat });
  }
  const list = [...merged.values()];
  return {
    uses: list,
    cost: list.reduce((sum, { column, repeat }) => sum + repeat * column.cost, 0),
    bars: list.reduce((sum, { repeat }) => sum + repeat, 0),
    layouts: list.length,
    longestDrop: list.reduce(
      (longest, { column }) =>
        column.leftover >= problem.group.drops.keepFromNm ? Math.max(longest, column.leftover) : longest,
      0,
    ),
  };
}

const SAME_COST = 1e-6;

/** Less cost; then fewer bars, fewer distinct layouts, the longest single drop. */
export function isBetter(a: Plan, b: Plan | null): boolean {
  if (!b) return true;
  if (Math.abs(a.cost - b.cost) > SAME_COST) return a.cost < b.cost;
  if (a.bars !== b.bars) return a.bars < b.bars;
  if (a.layouts !== b.layouts) return a.layouts < b.layouts;
  return a.longestDrop > b.longestDrop;
}
