/** Plans read back from their rows into the shapes of the solver's contract. */
import {
  DropRow,
  OfferRow,
  PlanCutRow,
  PlanGroupRow,
  PlanLayoutRow,
  PlanPieceRow,
  PlanStockRow,
  SupplierRow,
} from '#server/models/index.ts';
import { listBars } from '#server/services/bar-views.ts';
import { listLines, type LineWithCounts } from '#server/services/part-lists.ts';
import { findPlanFacts, type PlanFacts } from '#server/services/plan-facts.ts';
import { netBillionths } from '#server/services/plan-money.ts';
import { listsOf, pieceOf } from '#server/services/planning.ts';
import { groupBy } from '#shared/domain/group-by.ts';
import { billionthsToMinor } from '#shared/domain/layout-cost.ts';
import type { SolveGroup, SolveGroupResult, SolveLayout } from '#shared/domain/solve.ts';
import type { Bar, PlanGroup, PlanPiece, PlanStock } from '#shared/schemas/plans.ts';

export type PlanWhole = { facts: PlanFacts; groups: PlanGroup[]; bars: Bar[] };

type GroupRows = {
  group: PlanGroupRow;
  pieces: readonly PlanPieceRow[];
  stock: readonly PlanStockRow[];
  layouts: readonly PlanLayoutRow[];
  cuts: ReadonlyMap<number, readonly PlanCutRow[]>;
};

async function groupsOf(planId: number): Promise<GroupRows[]> {
  const groups = await PlanGroupRow.findAll({ where: { planId }, order: [['position', 'ASC']] });
  const groupId = groups.map(({ id }) => id);
  const [pieces, stock, layouts] = await Promise.all([
    PlanPieceRow.findAll({ where: { groupId }, order: [['id', 'ASC']] }),
    PlanStockRow.findAll({ where: { groupId }, order: [['position', 'ASC']] }),
    PlanLayoutRow.findAll({ where: { groupId }, order: [['position', 'ASC']] }),
  ]);
  const cuts = groupBy(
    await PlanCutRow.findAll({
      where: { layoutId: layouts.map(({ id }) => id) },
      order: [
        ['layoutId', 'ASC'],
        ['position', 'ASC'],
      ],
    }),
    ({ layoutId }) => layoutId,
  );
  const ofGroup = <T extends { groupId: number }>(rows: readonly T[]) => groupBy(rows, (row) => row.groupId);
  const [pieceRows, stockRows, layoutRows] = [ofGroup(pieces), ofGroup(stock), ofGroup(layouts)];
  return groups.map((group) => ({
    group,
    pieces: pieceRows.get(group.id) ?? [],
    stock: stockRows.get(group.id) ?? [],
    layouts: layoutRows.get(group.id) ?? [],
    cuts,
  }));
}

function requestOf({ group, stock }: GroupRows, pieces: readonly PlanPiece[]): SolveGroup {
  const { kerfNm, headCropNm, tailCropNm, holdDownNm, keepFromNm, creditMinorPerM, scrapMinorPerM } = group;
  return {
    id: group.key,
    kind: 'linear',
    pieces: pieces.map(({ id, mark, lengthNm, quantity }) => ({ id, mark, lengthNm, quantity })),
    stock: stock.map(({ key, source, lengthNm, costMinor, supply }) => ({
      id: key,
      source,
      lengthNm,
      costMinor,
      supply: supply ?? null,
    })),
    cutting: { kerfNm, headCropNm, tailCropNm, holdDownNm },
    drops: { keepFromNm, creditMinorPerM, scrapMinorPerM },
  };
}

/** The net cost is summed again from the layouts, so that it is exact; the bound comes as it was kept, rounded down. */
function resultOf({ group, pieces, stock, layouts, cuts }: GroupRows, request: SolveGroup): SolveGroupResult {
  const stockById = new Map(stock.map((entry) => [entry.id, entry]));
  const found = layouts.map((layout): SolveLayout & { source: 'new' | 'drop' } => {
    const bar = stockById.get(layout.stockId);
    if (!bar) throw new Error(`layout ${layout.id} has no stock in its group`);
    return {
      stockId: bar.key,
      source: bar.source,
      repeat: layout.repeat,
      cuts: (cuts.get(layout.id) ?? []).map(({ partLineId, startNm, lengthNm }) => ({
        pieceId: String(partLineId),
        startNm,
        lengthNm,
      })),
      leftoverNm: layout.leftoverNm,
      keeps: layout.keeps === 1,
    };
  });
  const net = billionthsToMinor(netBillionths(request, found));
  const bound = Math.min(group.boundMillionths / 1e6, net);
  const count = (source: 'new' | 'drop') =>
    found.reduce((bars, layout) => bars + (layout.source === source ? layout.repeat : 0), 0);
  const [newBars, dropsUsed] = [count('new'), count('drop')];
  return {
    id: group.key,
    outcome: group.outcome,
    netCostMinor: net,
    boundMinor: bound,
    gap: net > 0 ? (net - bound) / net : 0,
    layouts: found.map(({ source: _source, ...layout }) => layout),
    unplaced: pieces
      .filter(({ unplaced }) => unplaced > 0)
      .map(({ partLineId, unplaced, reason }) => ({
        pieceId: String(partLineId),
        quantity: unplaced,
        reason,
      })),
    counts: { bars: newBars + dropsUsed, newBars, dropsUsed, layouts: layouts.length },
    work: JSON.parse(group.work) as SolveGroupResult['work'],
  };
}

/** What each stock row is, in the shop's words. */
async function stockViews(rows: readonly PlanStockRow[]): Promise<Map<number, PlanStock>> {
  const [offers, suppliers, drops] = await Promise.all([
    OfferRow.findAll({ where: { id: rows.flatMap(({ offerId }) => offerId ?? []) } }),
    SupplierRow.findAll(),
    DropRow.findAll({ where: { id: rows.flatMap(({ dropId }) => dropId ?? []) } }),
  ]);
  const supplierNames = new Map(suppliers.map(({ id, name }) => [id, name]));
  const supplierOfOffer = new Map(offers.map(({ id, supplierId }) => [id, supplierNames.get(supplierId)]));
  const dropById = new Map(drops.map((drop) => [drop.id, drop]));
  return new Map(
    rows.map((row) => {
      const drop = dropById.get(row.dropId ?? 0);
      const view: PlanStock = {
        stockId: row.key,
        source: row.source,
        lengthNm: row.lengthNm,
        costMinor: row.costMinor,
        supplierName: supplierOfOffer.get(row.offerId ?? 0) ?? null,
        drop: drop ? { id: drop.id, tag: drop.tag, slot: drop.slot, heat: drop.heat ?? null } : null,
      };
      return [row.id, view];
    }),
  );
}

export async function findPlanWhole(planId: number): Promise<PlanWhole> {
  const facts = await findPlanFacts(planId);
  const rows = await groupsOf(planId);
  const [stock, lines, bars] = await Promise.all([
    stockViews(rows.flatMap((group) => group.stock)),
    listLines({ partLineIds: rows.flatMap(({ pieces }) => pieces.map(({ partLineId }) => partLineId)) }),
    listBars(planId),
  ]);
  const lists = await listsOf(lines);
  const lineById = new Map(lines.map((entry): [number, LineWithCounts] => [entry.line.id, entry]));
  const groups = rows.map((entry): PlanGroup => {
    const { group } = entry;
    const pieces = entry.pieces.flatMap(({ partLineId, quantity }) => {
      const line = lineById.get(partLineId);
      return line ? [pieceOf(line, lists, quantity)] : [];
    });
    const request = requestOf(entry, pieces);
    return {
      id: group.key,
      section: group.section,
      stockKey: group.stockKey,
      family: group.family,
      grade: group.grade,
      mgPerM: group.mgPerM,
      pieces,
      stock: entry.stock.flatMap(({ id }) => stock.get(id) ?? []),
      request,
      result: resultOf(entry, request),
    };
  });
  return { facts, groups, bars };
}
