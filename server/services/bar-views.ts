import { BarRow, DropRow, Person, PlanGroupRow, PlanLayoutRow } from '#server/models/index.ts';
import { expectFound } from '#server/policies/version.ts';
import type { Bar } from '#shared/schemas/plans.ts';

async function barViews(bars: readonly BarRow[]): Promise<Bar[]> {
  const [layouts, drops, people] = await Promise.all([
    PlanLayoutRow.findAll({ where: { id: [...new Set(bars.map(({ layoutId }) => layoutId))] } }),
    DropRow.findAll({ where: { fromBarId: bars.map(({ id }) => id) } }),
    Person.findAll(),
  ]);
  const groups = await PlanGroupRow.findAll({
    where: { id: [...new Set(layouts.map(({ groupId }) => groupId))] },
  });
  const layoutById = new Map(layouts.map((layout) => [layout.id, layout]));
  const groupKeys = new Map(groups.map(({ id, key }) => [id, key]));
  const dropOfBar = new Map(drops.map((drop) => [drop.fromBarId, drop]));
  const names = new Map(people.map(({ id, name }) => [id, name]));
  return bars.map((bar) => {
    const layout = layoutById.get(bar.layoutId);
    const drop = dropOfBar.get(bar.id);
    return {
      id: bar.id,
      groupId: groupKeys.get(layout?.groupId ?? 0) ?? '',
      layout: layout?.position ?? 0,
      number: bar.number,
      state: bar.state,
      heat: bar.heat ?? null,
      makesTag: bar.makesTag ?? null,
      madeDrop: drop ? { id: drop.id, tag: drop.tag, slot: drop.slot } : null,
      cutBy: names.get(bar.cutById ?? '') ?? null,
      cutAt: bar.cutAt ?? null,
      version: bar.version,
    };
  });
}

/** Bars of a plan by number; `layout` counts within the group's result. */
export async function listBars(planId: number): Promise<Bar[]> {
  return barViews(await BarRow.findAll({ where: { planId }, order: [['number', 'ASC']] }));
}

export async function findBar(barId: number): Promise<Bar> {
  const [bar] = await barViews([expectFound(await BarRow.findByPk(barId), 'bar')]);
  return expectFound(bar, 'bar');
}
