/** A plan comes from a browser and is trusted in nothing: every id is held against its own row, then check-plan re-counts the rest. */
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/middleware/route.ts';
import { DropRow, OfferRow, PlanCutRow, PlanGroupRow, PlanLayoutRow, PlanPieceRow, PlanRow, PlanStockRow, StationRow } from '#server/models/index.ts';
import { record } from '#server/services/audit.ts';
import { listLines, type LineWithCounts } from '#server/services/part-lists.ts';
import { groupKey } from '#server/services/planning.ts';
import { takeNumbers } from '#server/services/tags.ts';
import { checkPlan } from '#shared/domain/check-plan.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import { PLATE_FAMILIES } from '#shared/domain/section/types.ts';
import type { SolveGroup, SolveGroupResult } from '#shared/domain/solve.ts';
import type { ErrorIssue } from '#shared/errors.ts';
import type { SavePlanInput } from '#shared/schemas/plans.ts';

type Sources = { lines: ReadonlyMap<string, LineWithCounts>; offers: ReadonlyMap<string, OfferRow>; drops: ReadonlyMap<string, DropRow> };

function pieceFaults(group: SolveGroup, at: string, { lines }: Sources): ErrorIssue[] {
  return group.pieces.flatMap((piece, i) => {
    const path = `${at}.pieces.${i}`;
    const found = lines.get(piece.id);
    if (!found) return [{ path, message: `there is no part line ${piece.id}` }];
    const { line, planned } = found;
    const open = line.quantity - planned;
    const faults: string[] = [];
    if (PLATE_FAMILIES.includes(line.family)) faults.push(`${line.mark} is plate and is not cut from bars`);
    if (groupKey(line) !== group.id) faults.push(`${line.mark} is ${groupKey(line)}, not ${group.id}`);
    if (line.lengthNm !== piece.lengthNm) faults.push(`${line.mark} has another length now`);
    if (piece.quantity < 1 || piece.quantity > open) faults.push(`${line.mark}: ${piece.quantity} wanted, ${open} open`);
    return faults.map((message) => ({ path, message }));
  });
}

function stockFaults(group: SolveGroup, at: string, { offers, drops }: Sources): ErrorIssue[] {
  return group.stock.flatMap((stock, i) => {
    const path = `${at}.stock.${i}`;
    const [kind, id = ''] = stock.id.split(':');
    const fault = (message: string) => [{ path, message }];
    if (kind === 'length') return stock.source === 'new' && /^\d+$/.test(id) ? [] : fault('a length typed in by hand is stock to buy');
    if (kind === 'offer') {
      const offer = offers.get(id);
      if (!offer || stock.source !== 'new') return fault(`there is no offer ${id}`);
      return groupKey(offer) === group.id && offer.lengthNm === stock.lengthNm ? [] : fault('this offer is of another section, grade or length');
    }
    if (kind === 'drop') {
      const drop = drops.get(id);
      if (!drop || stock.source !== 'drop') return fault(`there is no drop ${id}`);
      if (groupKey(drop) !== group.id || drop.lengthNm !== stock.lengthNm) return fault(`drop ${drop.tag} is of another section, grade or length`);
      if (drop.state !== 'racked') return fault(`drop ${drop.tag} is no longer racked`);
      return stock.supply === 1 ? [] : fault('a drop can be used once');
    }
    return fault(`${stock.id} is no offer, no drop and no typed length`);
  });
}

/** Whole millionths of a minor unit; the bound is rounded down, so that it stays a bound. */
const millionths = (minor: number, round: (x: number) => number) => round(minor * 1e6);

async function storeGroup(planId: number, position: number, group: SolveGroup, result: SolveGroupResult, sources: Sources): Promise<void> {
  const first = sources.lines.get(group.pieces[0]?.id ?? '')?.line;
  if (!first) throw new Error('a checked group has a piece');
  const section = sectionByName(first.stockKey);
  const row = await PlanGroupRow.create({
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
    netMillionths: millionths(result.netCostMinor, Math.round),
    boundMillionths: Math.min(millionths(result.boundMinor, Math.floor), millionths(result.netCostMinor, Math.round)),
    work: JSON.stringify({ ...result.work, elapsedMs: Math.round(result.work.elapsedMs) }),
  });
  const unplaced = new Map(result.unplaced.map((entry) => [entry.pieceId, entry]));
  await PlanPieceRow.bulkCreate(
    group.pieces.map((piece) => ({
      groupId: row.id,
      partLineId: Number(piece.id),
      quantity: piece.quantity,
      unplaced: unplaced.get(piece.id)?.quantity ?? 0,
      reason: unplaced.get(piece.id)?.reason ?? '',
    })),
  );
  const stockRows = new Map<string, number>();
  for (const [i, stock] of group.stock.entries()) {
    const [kind, id] = stock.id.split(':');
    const made = await PlanStockRow.create({
      groupId: row.id,
      position: i,
      key: stock.id,
      source: stock.source,
      offerId: kind === 'offer' ? Number(id) : null,
      dropId: kind === 'drop' ? Number(id) : null,
      lengthNm: stock.lengthNm,
      costMinor: stock.costMinor,
      supply: stock.supply,
    });
    stockRows.set(stock.id, made.id);
  }
  for (const [i, layout] of result.layouts.entries()) {
    const stockId = stockRows.get(layout.stockId);
    if (stockId === undefined) throw new Error('a checked layout has its stock');
    const made = await PlanLayoutRow.create({
      groupId: row.id,
      position: i,
      stockId,
      repeat: layout.repeat,
      leftoverNm: layout.leftoverNm,
      keeps: layout.keeps ? 1 : 0,
    });
    await PlanCutRow.bulkCreate(
      layout.cuts.map((cut, position) => ({ layoutId: made.id, position, partLineId: Number(cut.pieceId), startNm: cut.startNm, lengthNm: cut.lengthNm })),
    );
  }
}

/** Checks and stores a draft. 422 plan-rejected with every fault when it does not hold. Returns the plan's id. */
export function savePlan({ name, stationId, request, result }: SavePlanInput, actor: Actor): Promise<number> {
  return write(async () => {
    const ids = (kind: string) =>
      request.groups.flatMap(({ stock }) => stock.filter((entry) => entry.id.startsWith(`${kind}:`)).map((entry) => Number(entry.id.split(':')[1])));
    const lineIds = request.groups.flatMap(({ pieces }) => pieces.map(({ id }) => Number(id))).filter(Number.isSafeInteger);
    const [lines, offers, drops, station] = await Promise.all([
      listLines({ partLineIds: lineIds }),
      OfferRow.findAll({ where: { id: ids('offer') } }),
      DropRow.findAll({ where: { id: ids('drop') } }),
      stationId === null ? null : StationRow.findByPk(stationId),
    ]);
    const sources: Sources = {
      lines: new Map(lines.map((entry) => [String(entry.line.id), entry])),
      offers: new Map(offers.map((offer) => [String(offer.id), offer])),
      drops: new Map(drops.map((drop) => [String(drop.id), drop])),
    };
    const issues: ErrorIssue[] = request.groups.flatMap((group, i) => {
      const at = `request.groups.${i}`;
      const empty = group.pieces.length === 0 ? [{ path: at, message: 'the group has no pieces' }] : [];
      return [...empty, ...pieceFaults(group, at, sources), ...stockFaults(group, at, sources)];
    });
    if (request.groups.length === 0) issues.push({ path: 'request.groups', message: 'the plan is empty' });
    if (stationId !== null && !station) issues.push({ path: 'stationId', message: 'there is no such station' });
    issues.push(...checkPlan(request, result).map(({ path, message }) => ({ path: `result.${path}`, message })));
    if (issues.length > 0)
      throw new ShopError('plan-rejected', 'The plan does not hold against the shop’s records. Plan again; nothing was saved.', issues);

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
    await record(actor, 'plan:draft', `plan ${number}`, { name, groups: request.groups.map(({ id }) => id) });
    return plan.id;
  });
}
