/** A bar is cut: the drop it was is closed, the drop it leaves is racked with its parent and its heat. */
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/middleware/route.ts';
import { BarRow, DropRow, PlanGroupRow, PlanLayoutRow, PlanRow, PlanStockRow } from '#server/models/index.ts';
import { expectFound, expectVersion } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { tellDrop } from '#server/services/drop-events.ts';
import { tagText } from '#server/services/tags.ts';
import { barMassMg } from '#shared/domain/mass.ts';
import { NM_PER_MM } from '#shared/domain/units.ts';
import type { CutBarInput } from '#shared/schemas/plans.ts';

/** Mills deliver over length, usually by an inch or two; a drop longer than that by more is a slip of the pen. */
const OVER_LENGTH_NM = 150 * NM_PER_MM;

async function closeUsedDrop(dropId: number, bar: BarRow, plan: PlanRow, actor: Actor): Promise<DropRow> {
  const drop = expectFound(await DropRow.findByPk(dropId), 'drop');
  if (drop.state !== 'held' || drop.heldByPlanId !== plan.id)
    throw new ShopError('drop-gone', `${tagText(drop.tag)} is ${drop.state} and not held for plan ${plan.number}. Ask the yard.`, [
      { path: tagText(drop.tag), message: `is ${drop.state}` },
    ]);
  await drop.update({ state: 'cut', heldByPlanId: null, version: drop.version + 1 });
  await tellDrop(drop, actor, `cut as bar ${bar.number} of plan ${plan.number}`);
  return drop;
}

export function cutBar(barId: number, input: CutBarInput, actor: Actor): Promise<{ planId: number; barId: number }> {
  return write(async () => {
    const bar = expectFound(await BarRow.findByPk(barId), 'bar');
    const plan = expectFound(await PlanRow.findByPk(bar.planId), 'plan');
    if (bar.state === 'cut') throw new ShopError('wrong-state', `Bar ${bar.number} of plan ${plan.number} is cut already.`);
    if (plan.state !== 'issued' && plan.state !== 'cutting') throw new ShopError('wrong-state', `Plan ${plan.number} is ${plan.state}; nothing of it is cut now.`);
    expectVersion(bar, input.version, `bar ${bar.number}`);
    const layout = expectFound(await PlanLayoutRow.findByPk(bar.layoutId), 'layout');
    const group = expectFound(await PlanGroupRow.findByPk(layout.groupId), 'group');
    const stock = expectFound(await PlanStockRow.findByPk(layout.stockId), 'stock');

    if (stock.dropId !== null && input.heat !== undefined)
      throw new ShopError('bad-input', 'A drop keeps the heat it has.', [{ path: 'heat', message: 'inherited from the drop; leave it out' }]);
    const parent = stock.dropId === null ? null : await closeUsedDrop(stock.dropId ?? 0, bar, plan, actor);
    const heat = parent ? (parent.heat ?? null) : (input.heat ?? null);

    let made: DropRow | null = null;
    if (layout.keeps === 1) {
      if (input.slot === undefined)
        throw new ShopError('bad-input', 'This bar leaves a drop worth keeping. Say which slot it goes to.', [{ path: 'slot', message: 'type the slot, such as B-3-2' }]);
      const lengthNm = input.measuredNm ?? layout.leftoverNm;
      if (lengthNm > layout.leftoverNm + OVER_LENGTH_NM)
        throw new ShopError('bad-input', 'The drop cannot be that long.', [{ path: 'measuredNm', message: 'longer than this bar can leave; measure again' }]);
      made = await DropRow.create({
        tag: expectFound(bar.makesTag, 'tag'),
        section: group.section,
        stockKey: group.stockKey,
        family: group.family,
        grade: group.grade,
        lengthNm,
        massMg: barMassMg(group.mgPerM, lengthNm),
        slot: input.slot,
        heat,
        state: 'racked',
        fromBarId: bar.id,
        parentDropId: parent?.id ?? null,
        loggedById: actor.id,
        loggedAt: new Date().toISOString(),
      });
      await tellDrop(made, actor, `made by bar ${bar.number} of plan ${plan.number}${parent ? ` from ${tagText(parent.tag)}` : ''}, racked in ${input.slot}`);
    }
    await bar.update({ state: 'cut', heat, cutById: actor.id, cutAt: new Date().toISOString(), version: bar.version + 1 });
    const waiting = await BarRow.count({ where: { planId: plan.id, state: 'waiting' } });
    await plan.update({ state: waiting === 0 ? 'finished' : 'cutting', version: plan.version + 1 });
    await record(actor, 'bar:cut', `bar ${bar.number} of plan ${plan.number}`, { used: parent?.tag ?? null, made: made?.tag ?? null, slot: made?.slot ?? null });
    return { planId: plan.id, barId: bar.id };
  });
}
