/** The restricted master in HiGHS: a row an item, a row a limited stock, a column a layout. The model lives on between solves (warm start). */
import type { Highs } from 'highs';
import type { Column, Problem } from '#workers/solver/core/problem.ts';

export type Master = {
  /** Adds a column, or lets it in again; returns its position in `columns`. */
  add(column: Column): void;
  readonly columns: readonly Column[];
  solve(secondsLeft: number): {
    value: number;
    x: Float64Array;
    duals: Float64Array;
    stockDuals: Float64Array;
    missing: boolean;
  } | null;
  /** What is still wanted and to be had; columns that would make too much are shut. */
  restrict(residual: Float64Array, supply: Float64Array): void;
  lpRuns(): number;
  dispose(): void;
};

/** Dearer than any bar: a plan uses it only when pieces cannot be placed. */
const MISSING_FACTOR = 100;

export function makeMaster(highs: Highs, problem: Problem): Master {
  const { items, stocks } = problem;
  const n = items.length;
  const limited = stocks.flatMap(({ supply }, s) => (Number.isFinite(supply) ? [s] : []));
  const rowOfStock = new Map(limited.map((s, k) => [s, n + k]));
  const missingCost = MISSING_FACTOR * Math.max(1, ...stocks.map(({ costMinor }) => costMinor));
  const model = highs.createModel();
  model.options.set({ output_flag: false });
  for (const { demand } of items) model.addRow(demand, highs.infinity, { indices: [], values: [] });
  for (const s of limited) model.addRow(-highs.infinity, stocks[s]?.supply ?? 0, { indices: [], values: [] });
  for (let i = 0; i < n; i++) model.addCol(missingCost, 0, highs.infinity, { indices: [i], values: [1] });
  const columns: Column[] = [];
  const open: boolean[] = [];
  let runs = 0;

  return {
    columns,
    add(column) {
      const row = rowOfStock.get(column.stock);
      const indices = [...column.items, ...(row === undefined ? [] : [row])];
      const values = [...column.counts, ...(row === undefined ? [] : [1])];
      model.addCol(column.cost, 0, highs.infinity, { indices, values });
      columns.push(column);
      open.push(true);
    },
    solve(secondsLeft) {
      runs++;
      model.options.set({ time_limit: model.getRunTime() + Math.max(0.05, secondsLeft) });
      model.run();
      if (model.getModelStatus() !== highs.constants.modelStatus.optimal) return null;
      const { colValue, rowDual } = model.getSolution();
      const duals = new Float64Array(n);
      for (let i = 0; i < n; i++) duals[i] = Math.max(0, rowDual[i] ?? 0);
      const stockDuals = new Float64Array(stocks.length);
      for (const [s, row] of rowOfStock) stockDuals[s] = Math.max(0, -(rowDual[row] ?? 0));
      let missing = false;
      for (let i = 0; i < n; i++) if ((colValue[i] ?? 0) > 1e-7) missing = true;
      return { value: model.getObjectiveValue(), x: colValue.slice(n), duals, stockDuals, missing };
    },
    restrict(residual, supply) {
      for (let i = 0; i < n; i++) model.changeRowBounds(i, residual[i] ?? 0, highs.infinity);
      for (const [s, row] of rowOfStock) model.changeRowBounds(row, -highs.infinity, supply[s] ?? 0);
      columns.forEach((column, p) => {
        let proper = true;
        for (let j = 0; j < column.items.length; j++)
          if ((column.counts[j] ?? 0) > (residual[column.items[j] ?? 0] ?? 0)) proper = false;
        if (proper !== open[p]) {
          model.changeColBounds(n + p, 0, proper ? highs.infinity : 0);
          open[p] = proper;
        }
      });
    },
    lpRuns: () => runs,
    dispose: () => model.dispose(),
  };
}
