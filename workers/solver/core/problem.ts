/** A group as the search sees it: pieces of one length together, equal bars together, lengths in nanometres. */
import { groupBy } from '#shared/domain/group-by.ts';
import { canClamp, creditRate, fits, leftoverNm, usableNm } from '#shared/domain/layout-cost.ts';
import type { SolveGroup, SolvePiece, SolveStock } from '#shared/domain/solve.ts';

/** All pieces of one length, longest first in `Problem.items`. */
export type Item = {
  readonly lengthNm: number;
  readonly demand: number;
  readonly pieces: readonly SolvePiece[];
};

/** Bars of one length, cost and source. `supply` Infinity: as many as wanted. */
export type Stock = {
  readonly lengthNm: number;
  readonly usable: number;
  readonly costMinor: number;
  readonly supply: number;
  readonly bars: readonly SolveStock[];
};

export type Problem = {
  readonly group: SolveGroup;
  readonly items: readonly Item[];
  readonly stocks: readonly Stock[];
  readonly kerf: number;
  readonly holdDown: number;
  /** Every bar costs the same and nothing is credited: cost is a whole number of bars. */
  readonly wholeBars: boolean;
};

/** A way to cut a bar: how many of each item, by index. Immutable. */
export type Column = {
  readonly stock: number;
  readonly items: Int32Array;
  readonly counts: Int32Array;
  readonly cost: number;
  readonly leftover: number;
};

/** Merges equal pieces and equal bars. Pieces in `without` (by id) are left out. */
export function makeProblem(group: SolveGroup, without: ReadonlyMap<string, number> = new Map()): Problem {
  const wanted = group.pieces
    .map((piece) => ({ piece, left: piece.quantity - (without.get(piece.id) ?? 0) }))
    .filter(({ left }) => left > 0);
  const byLength = groupBy(wanted, ({ piece }) => piece.lengthNm);
  const items = [...byLength]
    .map(([lengthNm, members]) => ({
      lengthNm,
      demand: members.reduce((sum, { left }) => sum + left, 0),
      pieces: members.map(({ piece, left }) => ({ ...piece, quantity: left })),
    }))
    .sort((a, b) => b.lengthNm - a.lengthNm);
  const byKind = groupBy(
    group.stock.filter(({ supply }) => supply !== 0),
    ({ lengthNm, costMinor, supply }) => `${lengthNm}/${costMinor}/${supply === null}`,
  );
  const stocks = [...byKind.values()].map((bars): Stock => {
    const [first] = bars;
    if (!first) throw new Error('a kind of stock has a bar');
    return {
      lengthNm: first.lengthNm,
      usable: usableNm(first.lengthNm, group.cutting),
      costMinor: first.costMinor,
      supply: bars.reduce((sum, { supply }) => sum + (supply ?? Infinity), 0),
      bars,
    };
  });
  const { creditMinorPerM, scrapMinorPerM } = group.drops;
  return {
    group,
    items,
    stocks,
    kerf: group.cutting.kerfNm,
    holdDown: group.cutting.holdDownNm,
    wholeBars:
      creditMinorPerM === 0 &&
      scrapMinorPerM === 0 &&
      stocks.every(({ costMinor }) => costMinor === stocks[0]?.costMinor) &&
      (stocks[0]?.costMinor ?? 0) > 0,
  };
}

/** The column of these counts on this stock, or null when it is no layout. */
export function makeColumn(
  problem: Problem,
  stock: number,
  counts: ReadonlyMap<number, number>,
): Column | null {
  const bar = problem.stocks[stock];
  if (!bar) return null;
  const { cutting, drops } = problem.group;
  const entries = [...counts].filter(([, n]) => n > 0).sort(([a], [b]) => a - b);
  let total = 0;
  let pieces = 0;
  let longest = 0;
  for (const [i, n] of entries) {
    const length = problem.items[i]?.lengthNm ?? 0;
    total += n * length;
    pieces += n;
    longest = Math.max(longest, length);
  }
  if (!fits(bar.usable, total, pieces, cutting)) return null;
  const leftover = leftoverNm(bar.usable, total, pieces, cutting);
  if (!canClamp(leftover, longest, cutting)) return null;
  return {
    stock,
    items: Int32Array.from(entries, ([i]) => i),
    counts: Int32Array.from(entries, ([, n]) => n),
    cost: bar.costMinor - (creditRate(leftover, drops) * leftover) / 1e9,
    leftover,
  };
}

/** Tells two columns apart: same stock, same pieces. */
export const columnKey = ({ stock, items, counts }: Column): string =>
  `${stock}:${items.join(',')}:${counts.join(',')}`;

/** True when the column makes no more of anything than is still wanted. */
export function isProper({ items, counts }: Column, residual: ArrayLike<number>): boolean {
  for (let j = 0; j < items.length; j++) if ((counts[j] ?? 0) > (residual[items[j] ?? 0] ?? 0)) return false;
  return true;
}

/** Items no bar can take even alone, by index. With a hold-down a short piece may still ride with a longer one. */
export function hopelessItems(problem: Problem): number[] {
  const { cutting } = problem.group;
  return problem.items.flatMap(({ lengthNm }, i) =>
    problem.stocks.some((bar) => fits(bar.usable, lengthNm, 1, cutting)) ? [] : [i],
  );
}
