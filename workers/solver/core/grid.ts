/**
 * The length grid of pricing. Pieces with their kerf are whole multiples of a greatest common divisor, which is exact as long as it leaves at
 * most CELLS cells; beyond that pieces round up to a coarser grid, and a second grid that rounds them down gives bounds that stay valid.
 */
import type { Problem } from '#workers/solver/core/problem.ts';

const CELLS = 65_000;

export type Grid = {
  readonly cellNm: number;
  /** Cells an item takes, kerf included, by item. */
  readonly weights: Int32Array;
  /** Cells a stock offers, one kerf more than usable because the last may run off the end; by stock. */
  readonly capacities: Int32Array;
  readonly cells: number;
  readonly exact: boolean;
};

const gcd = (a: number, b: number): number => {
  while (b !== 0) [a, b] = [b, a % b];
  return a;
};

function gridOf(problem: Problem, cellNm: number, round: (x: number) => number, exact: boolean): Grid {
  const weights = Int32Array.from(problem.items, ({ lengthNm }) =>
    Math.max(1, round((lengthNm + problem.kerf) / cellNm)),
  );
  const capacities = Int32Array.from(problem.stocks, ({ usable }) =>
    Math.max(0, Math.floor((usable + problem.kerf) / cellNm)),
  );
  return { cellNm, weights, capacities, cells: Math.max(0, ...capacities), exact };
}

/** The grid to search on and the one to state bounds on; the same when exact. */
export function makeGrids(problem: Problem): { search: Grid; bound: Grid } {
  const longest = Math.max(0, ...problem.stocks.map(({ usable }) => usable + problem.kerf));
  const divisor = problem.items.reduce((g, { lengthNm }) => gcd(lengthNm + problem.kerf, g), 0) || 1;
  if (longest / divisor <= CELLS) {
    const exact = gridOf(problem, divisor, Math.round, true);
    return { search: exact, bound: exact };
  }
  const cell = Math.ceil(longest / CELLS);
  return { search: gridOf(problem, cell, Math.ceil, false), bound: gridOf(problem, cell, Math.floor, false) };
}
