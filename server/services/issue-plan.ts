/** A plan's way from draft to the station and back. */
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/middleware/route.ts';
import { BarRow, DropRow, PlanGroupRow, PlanLayoutRow, PlanRow, PlanStockRow, StationRow } from '#server/models/index.ts';
import { expectFound, expectVersion } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { tellDrop } from '#server/services/drop-events.ts';
import { tagText, takeNumbers } from '#server/services/tags.ts';

/** The drops a plan's layouts use. */
async function dropsUsed(planId: number): Promise<{ layouts: PlanLayoutRow[]; drops: DropRow[] }> {
  const groups = await PlanGroupRow.findAll({ where: { planId }, order: [['position', 'ASC']] });
  const layouts = (await PlanLayoutRow.findAll({ where: { groupId: groups.map(({ id }) => id) }, order: [['position', 'ASC']] })).sort(
    (a, b) => groups.findIndex(({ id }) => id === a.groupId) - groups.findIndex(({ id }) => id === b.groupId) || a.position - b.position,
  );
  const stock = await PlanStockRow.findAll({ where: { id: layouts.map(({ stockId }) => stockId), source: 'drop' } });
  return { layouts, drops: await DropRow.findAll({ where: { id: stock.flatMap(({ dropId }) => dropId ?? []) } }) };
}

/** Holds every drop or none, writes a bar for every repeat, and reserves the tags of the drops to come. */
export function issuePlan(planId: number, input: { stationId: number; version: number }, actor: Actor): Promise<void> {
  return write(async () => {
    const plan = expectFound(await PlanRow.findByPk(planId), 'plan');
    if (plan.state !== 'draft') throw new ShopError('wrong-state', `Plan ${plan.number} is ${plan.state}; only a draft can be issued.`);
    expectVersion(plan, input.version, `plan ${plan.number}`);
    const station = expectFound(await StationRow.findByPk(input.stationId), 'station');
    const { layouts, drops } = await dropsUsed(planId);
    const gone = drops.filter(({ state }) => state !== 'racked');
    if (gone.length > 0)
      throw new ShopError(
        'drop-gone',
        `${gone.map(({ tag }) => tagText(tag)).join(', ')} ${gone.length === 1 ? 'is' : 'are'} no longer on the rack. Plan again with what is there.`,
        gone.map(({ tag, state }) => ({ path: tagText(tag), message: `is ${state}` })),
      );
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
    await plan.update({ state: 'issued', stationId: station.id, issuedAt: new Date().toISOString(), version: plan.version + 1 });
    await record(actor, 'plan:issue', `plan ${plan.number}`, { station: station.name, bars: repeats.length, drops: drops.map(({ tag }) => tag) });
  });
}

/** Takes a plan back before its first cut; held drops return to the rack and the quantities are open again. */
export function withdrawPlan(planId: number, input: { reason: string; version: number }, actor: Actor): Promise<void> {
  return write(async () => {
    const plan = expectFound(await PlanRow.findByPk(planId), 'plan');
    if (plan.state !== 'draft' && plan.state !== 'issued')
      throw new ShopError('wrong-state', `Plan ${plan.number} is ${plan.state}; cutting has begun, so it cannot be withdrawn.`);
    expectVersion(plan, input.version, `plan ${plan.number}`);
    for (const drop of await DropRow.findAll({ where: { heldByPlanId: plan.id } })) {
      await drop.update({ state: 'racked', heldByPlanId: null, version: drop.version + 1 });
      await tellDrop(drop, actor, `given back by plan ${plan.number}`, input.reason);
    }
    await plan.update({ state: 'withdrawn', version: plan.version + 1 });
    await record(actor, 'plan:withdraw', `plan ${plan.number}`, { reason: input.reason });
  });
}

/** A draft nobody wants leaves no trace but the audit entry. */
export function removeDraft(planId: number, actor: Actor): Promise<void> {
  return write(async () => {
    const plan = expectFound(await PlanRow.findByPk(planId), 'plan');
    if (plan.state !== 'draft') throw new ShopError('wrong-state', `Plan ${plan.number} is ${plan.state}; only a draft can be deleted.`);
    await plan.destroy();
    await record(actor, 'plan:remove', `plan ${plan.number}`, { name: plan.name });
  });
}
