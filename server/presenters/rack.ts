import type { DropEventRow, DropRow } from '#server/models/index.ts';
import type { DropWithFacts } from '#server/services/drops.ts';
import { roleMay, type Role } from '#shared/permissions.ts';
import type { Drop, DropView } from '#shared/schemas/rack.ts';

export function presentDrop({ drop, heldByPlan, from, loggedBy }: DropWithFacts, role: Role): Drop {
  const edit = roleMay(role, 'drop:edit');
  return {
    id: drop.id,
    tag: drop.tag,
    section: drop.section,
    stockKey: drop.stockKey,
    family: drop.family,
    grade: drop.grade,
    lengthNm: drop.lengthNm,
    widthNm: drop.widthNm ?? null,
    massMg: drop.massMg,
    slot: drop.slot,
    heat: drop.heat ?? null,
    note: drop.note,
    state: drop.state,
    heldByPlan: heldByPlan ? { id: heldByPlan.id, number: heldByPlan.number, name: heldByPlan.name } : null,
    from: from
      ? { planId: from.plan.id, planNumber: from.plan.number, barId: from.barId, parentTag: from.parentTag }
      : null,
    loggedBy,
    loggedAt: drop.loggedAt,
    version: drop.version,
    can: {
      'drop:edit': edit && drop.state !== 'cut',
      'drop:scrap': edit && drop.state === 'racked',
      'drop:missing': edit && drop.state === 'racked',
      'drop:found': edit && drop.state === 'missing',
      'drop:restore': edit && drop.state === 'scrapped',
    },
  };
}

export const presentDropView = (
  found: DropWithFacts,
  events: DropEventRow[],
  children: DropRow[],
  role: Role,
): DropView => ({
  drop: presentDrop(found, role),
  events: events.map(({ at, who, what, why }) => ({ at, who, what, why })),
  children: children.map(({ id, tag }) => ({ id, tag })),
});
