/** The integer program over a set of columns in HiGHS. Over all columns that can be part of a better plan its answer is exact. */
import type { Highs } from 'highs';
import type { Column, Problem } from '#workers/solver/core/problem.ts';
import type { Use } from '#workers/solver/core/plan-state.ts';

export type IntegerAnswer = {
  /** Better than `cutoff`, or null. */
  readonly uses: Use[] | null;
  /** The search ended by itself: nothing better than `uses` (or than `cutoff`) is in these columns. */
  readonly complete: boolean;
  /** No plan over these columns that is better than `cutoff` costs less than this, also when the search was cut short. */
  readonly bound: number;
};

/** Every demand exactly, no supply exceeded, cost below `cutoff` (minor units). */
export function solveInteger(
  highs: Highs,
  problem: Problem,
  columns: readonly Column[],
  cutoff: number,
  seconds: number,
): IntegerAnswer {
  const { items, stocks } = problem;
  const n = items.length;
  const limited = stocks.flatMap(({ supply }, s) => (Number.isFinite(supply) ? [s] : []));
  const rowOfStock = new Map(limited.map((s, k) => [s, n + k]));
  const starts: number[] = [0];
  const indices: number[] = [];
  const values: number[] = [];
  for (const { items: list, counts, stock } of columns) {
    for (let j = 0; j < list.length; j++) {
      indices.push(list[j] ?? 0);
      values.push(counts[j] ?? 0);
    }
    const row = rowOfStock.get(stock);
    if (row !== undefined) {
      indices.push(row);
      values.push(1);
    }
    starts.push(indices.length);
  }
  const mostOf = ({ items: list, counts, stock }: Column) => {
    let most = stocks[stock]?.supply ?? 0;
    for (let j = 0; j < list.length; j++)
      most = Math.min(most, Math.floor((items[list[j] ?? 0]?.demand ?? 0) / (counts[j] ?? 1)));
    return most;
  };
  return highs.withModel(
    {
      numCols: columns.length,
      numRows: n + limited.length,
      colCost: columns.map(({ cost }) => cost),
      colLower: columns.map(() => 0),
      colUpper: columns.map(mostOf),
      rowLower: [...items.map(({ demand }) => demand), ...limited.map(() => -highs.infinity)],
      rowUpper: [...items.map(({ demand }) => demand), ...limited.map((s) => stocks[s]?.supply ?? 0)],
      matrix: {
        format: 'csc',
        numRows: n + limited.length,
        numCols: columns.length,
        starts,
        indices,
        values,
      },
      integrality: columns.map(() => highs.constants.variableType.integer),
    },
    (model) => {
      model.options.set({
        output_flag: false,
        time_limit: Math.max(0.05, seconds),
        objective_bound: cutoff,
        mip_rel_gap: 0,
        mip_abs_gap: 1e-7,
        random_seed: 1,
      });
      model.run();
      const { modelStatus } = highs.constants;
      const status = model.getModelStatus();
      const complete =
        status === modelStatus.optimal ||
        status === modelStatus.infeasible ||
        status === modelStatus.objectiveBound;
      const { colValue } = model.getSolution();
      const value = model.getObjectiveValue();
      const dual = Number(model.info.get('mip_dual_bound'));
      const bound = complete ? cutoff : Number.isFinite(dual) ? Math.min(dual, cutoff) : 0;
      if (
        status === modelStatus.infeasible ||
        status === modelStatus.objectiveBound ||
        colValue.length !== columns.length ||
        !(value < cutoff)
      )
        return { uses: null, complete, bound };
      const uses = columns.flatMap((column, p): Use[] => {
        const repeat = Math.round(colValue[p] ?? 0);
        return repeat > 0 ? [{ column, repeat }] : [];
      });
      return { uses: makesExactly(problem, uses) ? uses : null, complete, bound };
    },
  );
}

/** HiGHS works in doubles; what it calls feasible is counted again in whole pieces. */
function makesExactly(problem: Problem, uses: readonly Use[]): boolean {
  const left = problem.items.map(({ demand }) => demand);
  const supply = problem.stocks.map((bar) => bar.supply);
  for (const { column, repeat } of uses) {
    for (let j = 0; j < column.items.length; j++) {
      const i = column.items[j] ?? 0;
      left[i] = (left[i] ?? 0) - repeat * (column.counts[j] ?? 0);
    }
    supply[column.stock] = (supply[column.stock] ?? 0) - repeat;
  }
  return left.every((n) => n === 0) && supply.every((n) => n >= 0);
}
