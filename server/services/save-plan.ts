/** A draft is checked against the shop's rows, counted again from its layouts, and written row by row. */
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import {
  PlanCutRow,
  PlanGroupRow,
  PlanLayoutRow,
  PlanPieceRow,
  PlanRow,
  PlanStockRow,
  StationRow,
} from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';
import { record } from '#server/services/audit.ts';
import {
  billionthsToMillionths,
  boundToMillionths,
  fitsTheBooks,
  netBillionths,
} from '#server/services/plan-money.ts';
import {
  findPlanSources,
  findSourceFaults,
  stockRef,
  typedPrices,
  type PlanSources,
} from '#server/services/plan-sources.ts';
import { takeNumbers } from '#server/services/tags.ts';
import { checkPlan } from '#shared/domain/check-plan.ts';
import { findMoneyMakers } from '#shared/domain/money-makers.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import type { SolveGroup, SolveGroupResult } from '#shared/domain/solve.ts';
import type { ErrorIssue } from '#shared/errors.ts';
import type { SavePlanInput } from '#shared/schemas/plans.ts';

async function findFaults(input: SavePlanInput, sources: PlanSources): Promise<ErrorIssue[]> {
  const { request, result, stationId } = input;
  const issues = findSourceFaults(request, sources);
  if (stationId !== null && !(await StationRow.findByPk(stationId)))
    issues.push({ path: 'stationId', message: 'there is no such station' });
  issues.push(
    ...findMoneyMakers(request).map(({ path, message }) => ({ path: `request.${path}`, message })),
    ...checkPlan(request, result).map(({ path, message }) => ({ path: `result.${path}`, message })),
  );
  if (issues.length > 0) return issues;
  return request.groups.flatMap((group, i) => {
    const answer = result.groups.find(({ id }) => id === group.id);
    return answer && fitsTheBooks(netBillionths(group, answer.layouts))
      ? []
      : [{ path: `request.groups.${i}`, message: 'costs more than the books can hold' }];
  });
}

async function storeGroup(
  planId: number,
  position: number,
  group: SolveGroup,
  result: SolveGroupResult,
  sources: PlanSources,
): Promise<void> {
  const first = sources.lines.get(group.pieces[0]?.id ?? '')?.line;
  if (!first) throw new Error('a checked group has a piece');
  const section = sectionByName(first.stockKey);
  const netMillionths = billionthsToMillionths(netBillionths(group, result.layouts));
  const { id: groupId } = await PlanGroupRow.create({
    planId,
    position,
    key: group.id,
    section: first.section,
    stockKey: first.stockKey,
    family: first.family,
    grade: first.grade,
    mgPerM: section?.mass.per === 'length' ? section.mass.mgPerM : 0,
    ...group.cutting,
    ...group.drops,
    outcome: result.outcome,
    netMillionths,
    boundMillionths: Math.min(boundToMillionths(result.boundMinor), netMillionths),
    work: JSON.stringify({ ...result.work, elapsedMs: Math.round(result.work.elapsedMs) }),
  });
  const unplaced = new Map(result.unplaced.map((entry) => [entry.pieceId, entry]));
  await PlanPieceRow.bulkCreate(
    group.pieces.map((piece) => ({
      groupId,
      partLineId: Number(piece.id),
      quantity: piece.quantity,
      unplaced: unplaced.get(piece.id)?.quantity ?? 0,
      reason: unplaced.get(piece.id)?.reason ?? '',
    })),
  );
  await PlanStockRow.bulkCreate(
    group.stock.map((stock, i) => {
      const { kind, id } = stockRef(stock.id);
      return {
        groupId,
        position: i,
        key: stock.id,
        source: stock.source,
        offerId: kind === 'offer' ? id : null,
        dropId: kind === 'drop' ? id : null,
        lengthNm: stock.lengthNm,
        costMinor: stock.costMinor,
        supply: stock.supply,
      };
    }),
  );
  await storeLayouts(groupId, result);
}

/** SQLite gives no ids back for rows written in bulk, so they are read again by what is unique in their group. */
async function storeLayouts(groupId: number, { layouts }: SolveGroupResult): Promise<void> {
  const stock = await PlanStockRow.findAll({ where: { groupId }, attributes: ['id', 'key'] });
  const stockIds = new Map(stock.map(({ id, key }) => [key, id]));
  const idOf = <K>(ids: ReadonlyMap<K, number>, key: K) => {
    const id = ids.get(key);
    if (id === undefined) throw new Error(`nothing was stored for ${String(key)}`);
    return id;
  };
  await PlanLayoutRow.bulkCreate(
    layouts.map((layout, position) => ({
      groupId,
      position,
      stockId: idOf(stockIds, layout.stockId),
      repeat: layout.repeat,
      leftoverNm: layout.leftoverNm,
      keeps: layout.keeps ? 1 : 0,
    })),
  );
  const stored = await PlanLayoutRow.findAll({ where: { groupId }, attributes: ['id', 'position'] });
  const layoutIds = new Map(stored.map(({ id, position }) => [position, id]));
  await PlanCutRow.bulkCreate(
    layouts.flatMap((layout, i) =>
      layout.cuts.map((cut, position) => ({
        layoutId: idOf(layoutIds, i),
        position,
        partLineId: Number(cut.pieceId),
        startNm: cut.startNm,
        lengthNm: cut.lengthNm,
      })),
    ),
  );
}

/** Checks and stores a draft. 422 plan-rejected with every fault when it does not hold. Returns the plan's id. */
export function savePlan(input: SavePlanInput, actor: Actor): Promise<number> {
  const { name, stationId, request, result } = input;
  return write(async () => {
    const sources = await findPlanSources(request);
    const issues = await findFaults(input, sources);
    if (issues.length > 0)
      throw new ShopError(
        'plan-rejected',
        'The plan does not agree with the shop’s records. Plan again; nothing was saved.',
        issues,
      );
    const [number = 0] = await takeNumbers('plan', 1);
    const plan = await PlanRow.create({
      number,
      name,
      state: 'draft',
      stationId,
      seed: request.seed,
      timeLimitMs: request.timeLimitMs,
      createdById: actor.id,
      createdAt: new Date().toISOString(),
    });
    for (const [i, group] of request.groups.entries()) {
      const answer = result.groups.find(({ id }) => id === group.id);
      if (answer) await storeGroup(plan.id, i, group, answer, sources);
    }
    const prices = typedPrices(request, sources);
    await record(actor, 'plan:draft', `plan ${number}`, {
      name,
      groups: request.groups.map(({ id }) => id),
      ...(prices.length > 0 ? { prices } : {}),
    });
    return plan.id;
  });
}
