/** From columns back to the contract: which bar, which piece, in which order, at which start. */
import { billionthsToMinor, canClamp, keepsDrop, layoutCostBillionths } from '#shared/domain/layout-cost.ts';
import type { SolveGroup, SolveGroupResult, SolveLayout, SolveUnplaced } from '#shared/domain/solve.ts';
import type { Plan } from '#workers/solver/core/plan-state.ts';
import type { Column, Problem } from '#workers/solver/core/problem.ts';

/** Pieces of the column, longest first, equal ones together; the last must be one the hold-down can grip. */
function orderCuts(
  problem: Problem,
  { items, counts, leftover }: Column,
  take: (item: number) => string,
): { pieceId: string; lengthNm: number }[] {
  const cuts: { pieceId: string; lengthNm: number }[] = [];
  for (let j = 0; j < items.length; j++) {
    const item = items[j] ?? 0;
    const lengthNm = problem.items[item]?.lengthNm ?? 0;
    const ids = Array.from({ length: counts[j] ?? 0 }, () => take(item)).sort();
    cuts.push(...ids.map((pieceId) => ({ pieceId, lengthNm })));
  }
  const { cutting } = problem.group;
  if (canClamp(leftover, cuts.at(-1)?.lengthNm ?? 0, cutting)) return cuts;
  // The shortest piece that reaches goes last, the rest keep their order.
  const last = cuts.findLastIndex(({ lengthNm }) => lengthNm >= cutting.holdDownNm);
  const [moved] = cuts.splice(last, 1);
  return moved ? [...cuts, moved] : cuts;
}

/** Gives every bar its pieces by name and merges bars that turn out alike. */
function makeLayouts(problem: Problem, plan: Plan): SolveLayout[] {
  const { cutting, drops } = problem.group;
  const left = problem.items.map(({ pieces }) => pieces.map(({ id, quantity }) => ({ id, quantity })));
  const take = (item: number) => {
    const entry = left[item]?.find(({ quantity }) => quantity > 0);
    if (!entry) throw new Error('a plan makes no more than is wanted');
    entry.quantity--;
    return entry.id;
  };
  const bars = problem.stocks.map(({ bars: list }) =>
    list.map(({ id, supply }) => ({ id, supply: supply ?? Infinity })),
  );
  const takeBar = (stock: number) => {
    const entry = bars[stock]?.find(({ supply }) => supply > 0);
    if (!entry) throw new Error('a plan uses no more than there is');
    entry.supply--;
    return entry.id;
  };
  const layouts = new Map<string, SolveLayout>();
  const uses = [...plan.uses].sort(
    (a, b) => a.column.stock - b.column.stock || b.repeat - a.repeat || a.column.leftover - b.column.leftover,
  );
  for (const { column, repeat } of uses)
    for (let k = 0; k < repeat; k++) {
      const stockId = takeBar(column.stock);
      let startNm = cutting.headCropNm;
      const cuts = orderCuts(problem, column, take).map(({ pieceId, lengthNm }) => {
        const cut = { pieceId, startNm, lengthNm };
        startNm += lengthNm + cutting.kerfNm;
        return cut;
      });
      const key = `${stockId}|${cuts.map(({ pieceId }) => pieceId).join('|')}`;
      const known = layouts.get(key);
      if (known) known.repeat++;
      else
        layouts.set(key, {
          stockId,
          repeat: 1,
          cuts,
          leftoverNm: column.leftover,
          keeps: keepsDrop(column.leftover, drops),
        });
    }
  return [...layouts.values()];
}

const PROVEN_GAP = 1e-6;

/** The answer of the contract. The cost is added up exactly; the bound never exceeds it. */
export function statePlan(
  group: SolveGroup,
  problem: Problem,
  plan: Plan,
  bound: number,
  unplaced: SolveUnplaced[],
  work: SolveGroupResult['work'],
): SolveGroupResult {
  const layouts = makeLayouts(problem, plan);
  const stock = new Map(group.stock.map((entry) => [entry.id, entry]));
  let net = 0n;
  let bars = 0;
  let dropsUsed = 0;
  for (const { stockId, repeat, leftoverNm } of layouts) {
    const bar = stock.get(stockId);
    if (!bar) continue;
    net += BigInt(repeat) * layoutCostBillionths(bar, leftoverNm, group.drops);
    bars += repeat;
    if (bar.source === 'drop') dropsUsed += repeat;
  }
  const netCostMinor = billionthsToMinor(net);
  const boundMinor = Math.min(
    netCostMinor,
    netCostMinor - bound <= PROVEN_GAP * 0.1 * Math.max(1, netCostMinor) ? netCostMinor : Math.max(0, bound),
  );
  const gap = netCostMinor > 0 ? (netCostMinor - boundMinor) / netCostMinor : 0;
  return {
    id: group.id,
    outcome: unplaced.length > 0 ? 'unplaceable' : gap < PROVEN_GAP ? 'proven' : 'bounded',
    netCostMinor,
    boundMinor,
    gap,
    layouts,
    unplaced,
    counts: { bars, newBars: bars - dropsUsed, dropsUsed, layouts: layouts.length },
    work,
  };
}
