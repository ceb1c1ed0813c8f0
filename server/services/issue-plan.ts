/** A plan's way from draft to the station and back. */
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import {
  BarRow,
  DropRow,
  PartLineRow,
  PlanGroupRow,
  PlanLayoutRow,
  PlanPieceRow,
  PlanRow,
  PlanStockRow,
  StationRow,
} from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';
import { expectFound, expectVersion } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { tellDrop } from '#server/services/drop-events.ts';
import { countPlanned } from '#server/services/line-counts.ts';
import { tagText, takeNumbers } from '#server/services/tags.ts';

/** Layouts in the order of the groups, then as the plan has them: bars are numbered along this order. */
async function layoutsOf(groups: readonly PlanGroupRow[]): Promise<PlanLayoutRow[]> {
  const place = new Map(groups.map(({ id, position }) => [id, position]));
  const layouts = await PlanLayoutRow.findAll({ where: { groupId: groups.map(({ id }) => id) } });
  return layouts.sort(
    (a, b) => (place.get(a.groupId) ?? 0) - (place.get(b.groupId) ?? 0) || a.position - b.position,
  );
}

/** The drops the layouts cut up, and their refusal when one is not free on the rack any more. */
async function freeDrops(layouts: readonly PlanLayoutRow[]): Promise<DropRow[]> {
  const stock = await PlanStockRow.findAll({
    where: { id: [...new Set(layouts.map(({ stockId }) => stockId))], source: 'drop' },
  });
  const drops = await DropRow.findAll({
    where: { id: stock.flatMap(({ dropId }) => dropId ?? []) },
    order: [['tag', 'ASC']],
  });
  const gone = drops.filter(({ state }) => state !== 'racked');
  if (gone.length > 0)
    throw new ShopError(
      'drop-gone',
      `${gone.map(({ tag }) => tagText(tag)).join(', ')} ${gone.length === 1 ? 'is' : 'are'} not free on the rack any more. Plan again with what is there.`,
      gone.map(({ tag, state }) => ({ path: tagText(tag), message: `is ${state}` })),
    );
  return drops;
}

/** No line is cut more often than the list wants it, whatever was drafted meanwhile. */
async function expectOpenQuantities(groups: readonly PlanGroupRow[]): Promise<void> {
  const pieces = await PlanPieceRow.findAll({ where: { groupId: groups.map(({ id }) => id) } });
  const lineIds = pieces.map(({ partLineId }) => partLineId);
  const [lines, planned] = await Promise.all([
    PartLineRow.findAll({ where: { id: lineIds } }),
    countPlanned(lineIds),
  ]);
  const over = lines.filter(({ id, quantity }) => (planned.get(id) ?? 0) > quantity);
  if (over.length > 0)
    throw new ShopError(
      'wrong-state',
      'Some pieces are planned more often than their list wants them. Plan again.',
      over.map(({ id, mark, quantity }) => ({
        path: mark,
        message: `${planned.get(id) ?? 0} planned, ${quantity} wanted`,
      })),
    );
}

/** Holds every drop or none, writes a bar for every repeat, and reserves the tags of the drops to come. */
export function issuePlan(
  planId: number,
  input: { stationId: number; version: number },
  actor: Actor,
): Promise<void> {
  return write(async () => {
    const plan = expectFound(await PlanRow.findByPk(planId), 'plan');
    if (plan.state !== 'draft')
      throw new ShopError(
        'wrong-state',
        `Plan ${plan.number} is ${plan.state} already; only a draft can be issued.`,
      );
    expectVersion(plan, input.version, `plan ${plan.number}`);
    const station = await StationRow.findByPk(input.stationId);
    if (!station)
      throw new ShopError('bad-input', 'The station is not there any more. Choose another.', [
        { path: 'stationId', message: 'there is no such station' },
      ]);
    const groups = await PlanGroupRow.findAll({ where: { planId } });
    await expectOpenQuantities(groups);
    const layouts = await layoutsOf(groups);
    const drops = await freeDrops(layouts);
    for (const drop of drops) {
      await drop.update({ state: 'held', heldByPlanId: plan.id, version: drop.version + 1 });
      await tellDrop(drop, actor, `held for plan ${plan.number}`);
    }
    const repeats = layouts.flatMap((layout) => Array.from({ length: layout.repeat }, () => layout));
    const tags = await takeNumbers('tag', repeats.filter(({ keeps }) => keeps === 1).length);
    await BarRow.bulkCreate(
      repeats.map((layout, i) => ({
        planId: plan.id,
        layoutId: layout.id,
        number: i + 1,
        state: 'waiting' as const,
        makesTag: layout.keeps === 1 ? (tags.shift() ?? null) : null,
      })),
    );
    await plan.update({
      state: 'issued',
      stationId: station.id,
      issuedAt: new Date().toISOString(),
      version: plan.version + 1,
    });
    await record(actor, 'plan:issue', `plan ${plan.number}`, {
      station: station.name,
      bars: repeats.length,
      held: drops.map(({ tag }) => tagText(tag)),
    });
  });
}

/** Takes a plan back before its first cut; held drops return to the rack and the quantities are open again. */
export function withdrawPlan(
  planId: number,
  input: { reason: string; version: number },
  actor: Actor,
): Promise<void> {
  return write(async () => {
    const plan = expectFound(await PlanRow.findByPk(planId), 'plan');
    if (plan.state === 'withdrawn')
      throw new ShopError('wrong-state', `Plan ${plan.number} is withdrawn already.`);
    if (plan.state !== 'draft' && plan.state !== 'issued')
      throw new ShopError(
        'wrong-state',
        `Plan ${plan.number} is ${plan.state}: cutting has begun, so it cannot be withdrawn.`,
      );
    expectVersion(plan, input.version, `plan ${plan.number}`);
    const held = await DropRow.findAll({ where: { heldByPlanId: plan.id }, order: [['tag', 'ASC']] });
    for (const drop of held) {
      await drop.update({ state: 'racked', heldByPlanId: null, version: drop.version + 1 });
      await tellDrop(drop, actor, `given back by plan ${plan.number}`, input.reason);
    }
    await plan.update({ state: 'withdrawn', version: plan.version + 1 });
    await record(actor, 'plan:withdraw', `plan ${plan.number}`, {
      reason: input.reason,
      givenBack: held.map(({ tag }) => tagText(tag)),
    });
  });
}

/** A draft nobody wants leaves no trace but the audit entry. */
export function removeDraft(planId: number, actor: Actor): Promise<void> {
  return write(async () => {
    const plan = expectFound(await PlanRow.findByPk(planId), 'plan');
    if (plan.state !== 'draft')
      throw new ShopError(
        'wrong-state',
        `Plan ${plan.number} is ${plan.state}; only a draft can be deleted.`,
      );
    await plan.destroy();
    await record(actor, 'plan:remove', `plan ${plan.number}`, { name: plan.name });
  });
}
