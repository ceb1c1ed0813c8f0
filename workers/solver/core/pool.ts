/** Columns known so far, each once. */
import { columnKey, makeColumn, type Column, type Problem } from '#workers/solver/core/problem.ts';
import type { Master } from '#workers/solver/core/master.ts';

export type Pool = { add(column: Column): boolean };

export function makePool(master: Master): Pool {
  const seen = new Set<string>();
  return {
    add(column) {
      const key = columnKey(column);
      if (seen.has(key)) return false;
      seen.add(key);
      master.add(column);
      return true;
    },
  };
}

/** One piece alone on every stock, and each bar as full of one piece as it goes: the master can always start. */
export function addStartingColumns(problem: Problem, pool: Pool): void {
  problem.stocks.forEach((bar, s) =>
    problem.items.forEach(({ lengthNm, demand }, i) => {
      const most = Math.min(demand, Math.floor((bar.usable + problem.kerf) / (lengthNm + problem.kerf)));
      for (const n of most > 1 ? [most, 1] : most === 1 ? [1] : []) {
        const column = makeColumn(problem, s, new Map([[i, n]]));
        if (column) pool.add(column);
      }
    }),
  );
}
