/** Plans read back from their rows into the shapes of the solver's contract. */
import { groupBy } from '#shared/domain/group-by.ts';
import { BarRow, DropRow, JobRow, OfferRow, Person, PlanCutRow, PlanGroupRow, PlanLayoutRow, PlanPieceRow, PlanRow, PlanStockRow, StationRow, SupplierRow } from '#server/models/index.ts';
import { expectFound } from '#server/policies/version.ts';
import { listLines } from '#server/services/part-lists.ts';
import { listsOf, pieceOf } from '#server/services/planning.ts';
import type { SolveGroupResult } from '#shared/domain/solve.ts';
import type { Bar, PlanGroup, PlanStock } from '#shared/schemas/plans.ts';

export type PlanFacts = {
  plan: PlanRow;
  jobs: { id: number; number: string; name: string }[];
  stationName: string | null;
  createdBy: string;
  groups: number;
  pieces: number;
  bars: number;
  barsCut: number;
  newBars: number;
  dropsUsed: number;
  netMillionths: number;
  boundMillionths: number;
};
export type PlanWhole = { facts: PlanFacts; groups: PlanGroup[]; bars: Bar[] };

type Rows = { groups: PlanGroupRow[]; pieces: PlanPieceRow[]; stock: PlanStockRow[]; layouts: PlanLayoutRow[] };

async function rowsOf(planIds: readonly number[]): Promise<Rows> {
  const groups = await PlanGroupRow.findAll({ where: { planId: [...planIds] }, order: [['position', 'ASC']] });
  const groupId = groups.map(({ id }) => id);
  const [pieces, stock, layouts] = await Promise.all([
    PlanPieceRow.findAll({ where: { groupId }, order: [['id', 'ASC']] }),
    PlanStockRow.findAll({ where: { groupId }, order: [['position', 'ASC']] }),
    PlanLayoutRow.findAll({ where: { groupId }, order: [['position', 'ASC']] }),
  ]);
  return { groups, pieces, stock, layouts };
}

const sum = <T>(rows: readonly T[], of: (row: T) => number) => rows.reduce((total, row) => total + of(row), 0);

async function factsOf(plans: readonly PlanRow[], rows: Rows): Promise<Map<number, PlanFacts>> {
  const [people, stations, jobs, bars, lines] = await Promise.all([
    Person.findAll(),
    StationRow.findAll(),
    JobRow.findAll(),
    BarRow.findAll({ where: { planId: plans.map(({ id }) => id) }, attributes: ['planId', 'state'] }),
    listLines({ partLineIds: [...new Set(rows.pieces.map(({ partLineId }) => partLineId))] }),
  ]);
  const jobOfLine = new Map(lines.map(({ line, jobId }) => [line.id, jobId]));
  return new Map(
    plans.map((plan) => {
      const groups = rows.groups.filter(({ planId }) => planId === plan.id);
      const own = new Set(groups.map(({ id }) => id));
      const pieces = rows.pieces.filter(({ groupId }) => own.has(groupId));
      const layouts = rows.layouts.filter(({ groupId }) => own.has(groupId));
      const dropStock = new Set(rows.stock.filter(({ source }) => source === 'drop').map(({ id }) => id));
      const dropsUsed = sum(layouts.filter(({ stockId }) => dropStock.has(stockId)), ({ repeat }) => repeat);
      const allBars = sum(layouts, ({ repeat }) => repeat);
      const jobIds = new Set(pieces.map(({ partLineId }) => jobOfLine.get(partLineId)));
      const facts: PlanFacts = {
        plan,
        jobs: jobs.filter(({ id }) => jobIds.has(id)).map(({ id, number, name }) => ({ id, number, name })),
        stationName: stations.find(({ id }) => id === plan.stationId)?.name ?? null,
        createdBy: people.find(({ id }) => id === plan.createdById)?.name ?? '',
        groups: groups.length,
        pieces: sum(pieces, ({ quantity, unplaced }) => quantity - unplaced),
        bars: allBars,
        barsCut: bars.filter((bar) => bar.planId === plan.id && bar.state === 'cut').length,
        newBars: allBars - dropsUsed,
        dropsUsed,
        netMillionths: sum(groups, ({ netMillionths }) => netMillionths),
        boundMillionths: sum(groups, ({ boundMillionths }) => boundMillionths),
      };
      return [plan.id, facts];
    }),
  );
}

export async function listPlans(): Promise<PlanFacts[]> {
  const plans = await PlanRow.findAll({ order: [['number', 'DESC']] });
  const facts = await factsOf(plans, await rowsOf(plans.map(({ id }) => id)));
  return plans.flatMap(({ id }) => facts.get(id) ?? []);
}

export async function findPlanFacts(planId: number): Promise<PlanFacts> {
  const plan = expectFound(await PlanRow.findByPk(planId), 'plan');
  return expectFound((await factsOf([plan], await rowsOf([planId]))).get(planId), 'plan');
}

async function stockViews(rows: Rows): Promise<Map<number, PlanStock>> {
  const [offers, suppliers, drops] = await Promise.all([
    OfferRow.findAll({ where: { id: rows.stock.flatMap(({ offerId }) => offerId ?? []) } }),
    SupplierRow.findAll(),
    DropRow.findAll({ where: { id: rows.stock.flatMap(({ dropId }) => dropId ?? []) } }),
  ]);
  return new Map(
    rows.stock.map((stock) => {
      const offer = offers.find(({ id }) => id === stock.offerId);
      const drop = drops.find(({ id }) => id === stock.dropId);
      return [
        stock.id,
        {
          stockId: stock.key,
          source: stock.source,
          lengthNm: stock.lengthNm,
          costMinor: stock.costMinor,
          supplierName: suppliers.find(({ id }) => id === offer?.supplierId)?.name ?? null,
          drop: drop ? { id: drop.id, tag: drop.tag, slot: drop.slot, heat: drop.heat ?? null } : null,
        },
      ];
    }),
  );
}

function resultOf(group: PlanGroupRow, rows: Rows, cuts: ReadonlyMap<number, PlanCutRow[]>, keys: ReadonlyMap<number, string>): SolveGroupResult {
  const layouts = rows.layouts.filter(({ groupId }) => groupId === group.id);
  const sources = new Map(rows.stock.map(({ id, source }) => [id, source]));
  const dropsUsed = sum(layouts.filter(({ stockId }) => sources.get(stockId) === 'drop'), ({ repeat }) => repeat);
  const bars = sum(layouts, ({ repeat }) => repeat);
  const net = group.netMillionths / 1e6;
  const bound = group.boundMillionths / 1e6;
  return {
    id: group.key,
    outcome: group.outcome,
    netCostMinor: net,
    boundMinor: bound,
    gap: net > 0 ? (net - bound) / net : 0,
    layouts: layouts.map((layout) => ({
      stockId: keys.get(layout.stockId) ?? '',
      repeat: layout.repeat,
      cuts: (cuts.get(layout.id) ?? []).map(({ partLineId, startNm, lengthNm }) => ({ pieceId: String(partLineId), startNm, lengthNm })),
      leftoverNm: layout.leftoverNm,
      keeps: layout.keeps === 1,
    })),
    unplaced: rows.pieces
      .filter(({ groupId, unplaced }) => groupId === group.id && unplaced > 0)
      .map(({ partLineId, unplaced, reason }) => ({ pieceId: String(partLineId), quantity: unplaced, reason })),
    counts: { bars, newBars: bars - dropsUsed, dropsUsed, layouts: layouts.length },
    work: JSON.parse(group.work) as SolveGroupResult['work'],
  };
}

/** Bars in the words of the contract; `layout` counts within the group's result. */
export async function barViews(planId: number, rows: Rows): Promise<Bar[]> {
  const [bars, people] = await Promise.all([BarRow.findAll({ where: { planId }, order: [['number', 'ASC']] }), Person.findAll()]);
  const made = await DropRow.findAll({ where: { fromBarId: bars.map(({ id }) => id) } });
  const groups = new Map(rows.groups.map((group) => [group.id, group]));
  const layouts = new Map(rows.layouts.map((layout) => [layout.id, layout]));
  return bars.map((bar) => {
    const layout = layouts.get(bar.layoutId);
    const drop = made.find(({ fromBarId }) => fromBarId === bar.id);
    return {
      id: bar.id,
      groupId: groups.get(layout?.groupId ?? 0)?.key ?? '',
      layout: layout?.position ?? 0,
      number: bar.number,
      state: bar.state,
      heat: bar.heat ?? null,
      makesTag: bar.makesTag ?? null,
      madeDrop: drop ? { id: drop.id, tag: drop.tag, slot: drop.slot } : null,
      cutBy: people.find(({ id }) => id === bar.cutById)?.name ?? null,
      cutAt: bar.cutAt ?? null,
      version: bar.version,
    };
  });
}

export async function findPlanWhole(planId: number): Promise<PlanWhole> {
  const plan = expectFound(await PlanRow.findByPk(planId), 'plan');
  const rows = await rowsOf([planId]);
  const [facts, stock, cutRows, lines, bars] = await Promise.all([
    factsOf([plan], rows),
    stockViews(rows),
    PlanCutRow.findAll({ where: { layoutId: rows.layouts.map(({ id }) => id) }, order: [['position', 'ASC']] }),
    listLines({ partLineIds: rows.pieces.map(({ partLineId }) => partLineId) }),
    barViews(planId, rows),
  ]);
  const lists = await listsOf(lines);
  const linesById = new Map(lines.map((entry) => [entry.line.id, entry]));
  const cuts = groupBy(cutRows, ({ layoutId }) => layoutId);
  const keys = new Map(rows.stock.map(({ id, key }) => [id, key]));
  const groups = rows.groups.map((group): PlanGroup => {
    const pieces = rows.pieces
      .filter(({ groupId }) => groupId === group.id)
      .flatMap(({ partLineId, quantity }) => {
        const entry = linesById.get(partLineId);
        return entry ? [pieceOf(entry, lists, quantity)] : [];
      });
    const own = rows.stock.filter(({ groupId }) => groupId === group.id);
    return {
      id: group.key,
      section: group.section,
      stockKey: group.stockKey,
      family: group.family,
      grade: group.grade,
      mgPerM: group.mgPerM,
      pieces,
      stock: own.flatMap(({ id }) => stock.get(id) ?? []),
      request: {
        id: group.key,
        kind: 'linear',
        pieces: pieces.map(({ id, mark, lengthNm, quantity }) => ({ id, mark, lengthNm, quantity })),
        stock: own.map(({ key, source, lengthNm, costMinor, supply }) => ({ id: key, source, lengthNm, costMinor, supply: supply ?? null })),
        cutting: { kerfNm: group.kerfNm, headCropNm: group.headCropNm, tailCropNm: group.tailCropNm, holdDownNm: group.holdDownNm },
        drops: { keepFromNm: group.keepFromNm, creditMinorPerM: group.creditMinorPerM, scrapMinorPerM: group.scrapMinorPerM },
      },
      result: resultOf(group, rows, cuts, keys),
    };
  });
  return { facts: expectFound(facts.get(planId), 'plan'), groups, bars };
}
