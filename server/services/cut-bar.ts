/** A bar is cut: the drop it was is closed, the drop it leaves is racked with its parent and its heat. */
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import { BarRow, DropRow, PlanGroupRow, PlanLayoutRow, PlanRow, PlanStockRow } from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';
import { expectFound, expectVersion } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { tellDrop } from '#server/services/drop-events.ts';
import { tagText } from '#server/services/tags.ts';
import { barMassMg } from '#shared/domain/mass.ts';
import { NM_PER_MM } from '#shared/domain/units.ts';
import type { ErrorIssue } from '#shared/errors.ts';
import type { CutBarInput } from '#shared/schemas/plans.ts';

/** Mills deliver over length, seldom by more than two inches; a drop longer still is a slip of the tape or the pen. */
const OVER_LENGTH_NM = 50 * NM_PER_MM;

type BarWork = {
  bar: BarRow;
  plan: PlanRow;
  group: PlanGroupRow;
  layout: PlanLayoutRow;
  stock: PlanStockRow;
};

/** The bar with all it hangs on, fit to be cut now by somebody who saw this version of it. */
async function findBarWork(barId: number, version: number): Promise<BarWork> {
  const bar = expectFound(await BarRow.findByPk(barId), 'bar');
  const plan = expectFound(await PlanRow.findByPk(bar.planId), 'plan');
  if (bar.state === 'cut')
    throw new ShopError('wrong-state', `Bar ${bar.number} of plan ${plan.number} is cut already.`);
  if (plan.state !== 'issued' && plan.state !== 'cutting')
    throw new ShopError('wrong-state', `Plan ${plan.number} is ${plan.state}; nothing of it is to be cut.`);
  expectVersion(bar, version, `bar ${bar.number}`);
  const layout = expectFound(await PlanLayoutRow.findByPk(bar.layoutId), 'layout');
  const group = expectFound(await PlanGroupRow.findByPk(layout.groupId), 'group');
  const stock = expectFound(await PlanStockRow.findByPk(layout.stockId), 'stock');
  return { bar, plan, group, layout, stock };
}

function findFaults(input: CutBarInput, { layout, stock }: BarWork): ErrorIssue[] {
  const issues: ErrorIssue[] = [];
  if (stock.source === 'drop' && input.heat !== undefined)
    issues.push({ path: 'heat', message: 'a drop keeps the heat it has: leave it out' });
  if (layout.keeps === 1) {
    if (input.slot === undefined)
      issues.push({
        path: 'slot',
        message: 'this bar leaves a drop worth keeping: type where it is put, such as B-3-2',
      });
    if (input.measuredNm !== undefined && input.measuredNm > layout.leftoverNm + OVER_LENGTH_NM)
      issues.push({ path: 'measuredNm', message: 'longer than this bar can leave: measure again' });
  } else {
    for (const field of ['slot', 'measuredNm'] as const)
      if (input[field] !== undefined)
        issues.push({ path: field, message: 'this bar leaves no drop worth keeping: leave it out' });
  }
  return issues;
}

async function closeUsedDrop(dropId: number, { bar, plan }: BarWork, actor: Actor): Promise<DropRow> {
  const drop = expectFound(await DropRow.findByPk(dropId), 'drop');
  const name = tagText(drop.tag);
  if (drop.state !== 'held' || drop.heldByPlanId !== plan.id)
    throw new ShopError('drop-gone', `${name} is ${drop.state} and not held for plan ${plan.number}.`, [
      { path: name, message: `is ${drop.state}` },
    ]);
  await drop.update({ state: 'cut', heldByPlanId: null, version: drop.version + 1 });
  await tellDrop(drop, actor, `cut as bar ${bar.number} of plan ${plan.number}`);
  return drop;
}

async function rackMadeDrop(
  { bar, plan, group, layout }: BarWork,
  { slot, lengthNm, heat }: { slot: string; lengthNm: number; heat: string | null },
  parent: DropRow | null,
  actor: Actor,
): Promise<DropRow> {
  const made = await DropRow.create({
    tag: expectFound(bar.makesTag, 'tag'),
    section: group.section,
    stockKey: group.stockKey,
    family: group.family,
    grade: group.grade,
    lengthNm,
    massMg: barMassMg(group.mgPerM, lengthNm),
    slot,
    heat,
    state: 'racked',
    fromBarId: bar.id,
    parentDropId: parent?.id ?? null,
    loggedById: actor.id,
    loggedAt: new Date().toISOString(),
  });
  const from = parent ? ` from ${tagText(parent.tag)}` : '';
  const measured = lengthNm === layout.leftoverNm ? '' : ', measured';
  await tellDrop(
    made,
    actor,
    `made by bar ${bar.number} of plan ${plan.number}${from}, racked in ${slot}${measured}`,
  );
  return made;
}

/** One bar, once. The heat is the used drop's own; of a new bar it is what was typed, or unknown. */
export function cutBar(
  barId: number,
  input: CutBarInput,
  actor: Actor,
): Promise<{ planId: number; barId: number }> {
  return write(async () => {
    const work = await findBarWork(barId, input.version);
    const { bar, plan, layout, stock } = work;
    const issues = findFaults(input, work);
    if (issues.length > 0)
      throw new ShopError('bad-input', 'The bar is not booked yet; see what is missing or wrong.', issues);
    const parent =
      stock.source === 'drop' ? await closeUsedDrop(expectFound(stock.dropId, 'drop'), work, actor) : null;
    const heat = parent ? (parent.heat ?? null) : (input.heat ?? null);
    const made =
      layout.keeps === 1 && input.slot !== undefined
        ? await rackMadeDrop(
            work,
            { slot: input.slot, lengthNm: input.measuredNm ?? layout.leftoverNm, heat },
            parent,
            actor,
          )
        : null;
    await bar.update({
      state: 'cut',
      heat,
      cutById: actor.id,
      cutAt: new Date().toISOString(),
      version: bar.version + 1,
    });
    const waiting = await BarRow.count({ where: { planId: plan.id, state: 'waiting' } });
    await plan.update({ state: waiting === 0 ? 'finished' : 'cutting', version: plan.version + 1 });
    await record(actor, 'bar:cut', `bar ${bar.number} of plan ${plan.number}`, {
      heat,
      used: parent ? tagText(parent.tag) : null,
      made: made ? { tag: tagText(made.tag), slot: made.slot, lengthNm: made.lengthNm } : null,
    });
    return { planId: plan.id, barId: bar.id };
  });
}
