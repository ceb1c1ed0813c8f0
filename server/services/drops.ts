/** The rack: log, find, move, scrap. Every change is one event in the drop's history. */
import { Op } from 'sequelize';
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/middleware/route.ts';
import { BarRow, DropEventRow, DropRow, Person, PlanRow } from '#server/models/index.ts';
import { expectFound, expectVersion } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { tellDrop } from '#server/services/drop-events.ts';
import { gradeTyped, sectionTyped } from '#server/services/sections.ts';
import { tagText, takeNumbers } from '#server/services/tags.ts';
import { pieceMassMg } from '#shared/domain/mass.ts';
import { PLATE_FAMILIES } from '#shared/domain/section/types.ts';
import { DROP_STATES, type DropPatch, type DropState, type LogDropInput } from '#shared/schemas/rack.ts';

export type DropWithFacts = {
  drop: DropRow;
  heldByPlan: PlanRow | null;
  from: { plan: PlanRow; barId: number; parentTag: number | null } | null;
  loggedBy: string;
};

async function withFacts(drops: DropRow[]): Promise<DropWithFacts[]> {
  const bars = await BarRow.findAll({ where: { id: drops.flatMap(({ fromBarId }) => fromBarId ?? []) } });
  const planIds = new Set([...bars.map(({ planId }) => planId), ...drops.flatMap(({ heldByPlanId }) => heldByPlanId ?? [])]);
  const [plans, people, parents] = await Promise.all([
    PlanRow.findAll({ where: { id: [...planIds] } }),
    Person.findAll(),
    DropRow.findAll({ where: { id: drops.flatMap(({ parentDropId }) => parentDropId ?? []) } }),
  ]);
  const planById = new Map(plans.map((plan) => [plan.id, plan]));
  return drops.map((drop) => {
    const bar = bars.find(({ id }) => id === drop.fromBarId);
    const plan = bar ? planById.get(bar.planId) : undefined;
    return {
      drop,
      heldByPlan: planById.get(drop.heldByPlanId ?? 0) ?? null,
      from: bar && plan ? { plan, barId: bar.id, parentTag: parents.find(({ id }) => id === drop.parentDropId)?.tag ?? null } : null,
      loggedBy: people.find(({ id }) => id === drop.loggedById)?.name ?? '',
    };
  });
}

export type DropQuery = { state?: DropState | 'all'; section?: string; minLengthNm?: number; text?: string };

/** Racked and held ones unless a state is asked for; text looks at tag, slot, heat, section and grade. */
export async function listDrops({ state, section, minLengthNm, text }: DropQuery): Promise<DropWithFacts[]> {
  const drops = await DropRow.findAll({
    where: {
      state: state === undefined ? ['racked', 'held'] : state === 'all' ? [...DROP_STATES] : state,
      ...(minLengthNm === undefined ? {} : { lengthNm: { [Op.gte]: minLengthNm } }),
    },
    order: [['stockKey', 'ASC'], ['grade', 'ASC'], ['lengthNm', 'DESC']],
  });
  const has = (drop: DropRow, words: string) =>
    [tagText(drop.tag), String(drop.tag), drop.slot, drop.heat ?? 'unknown', drop.section, drop.grade, drop.note].some((part) =>
      part.toLowerCase().replaceAll(' ', '').includes(words),
    );
  const plain = (words: string | undefined) => words?.toLowerCase().replaceAll('×', 'x').replaceAll(' ', '') ?? '';
  return withFacts(
    drops.filter(
      (drop) => has(drop, plain(text)) && drop.section.toLowerCase().replaceAll(' ', '').includes(plain(section)),
    ),
  );
}

export async function findDrop(dropId: number): Promise<DropWithFacts> {
  const [found] = await withFacts([expectFound(await DropRow.findByPk(dropId), 'drop')]);
  return expectFound(found, 'drop');
}

export const listDropEvents = (dropId: number): Promise<DropEventRow[]> => DropEventRow.findAll({ where: { dropId }, order: [['id', 'DESC']] });
export const listChildren = (dropId: number): Promise<DropRow[]> => DropRow.findAll({ where: { parentDropId: dropId }, order: [['tag', 'ASC']] });

/** Logs a drop by hand; it gets the next tag, which is never used again. Returns its id. */
export function logDrop(input: LogDropInput, actor: Actor): Promise<number> {
  return write(async () => {
    const section = sectionTyped(input.section, { plate: true });
    const isPlate = PLATE_FAMILIES.includes(section.family);
    if (isPlate && input.widthNm === null)
      throw new ShopError('bad-input', 'A plate drop needs its width.', [{ path: 'widthNm', message: 'type the width' }]);
    const [tag = 0] = await takeNumbers('tag', 1);
    const drop = await DropRow.create({
      tag,
      section: isPlate ? section.stockKey : section.name,
      stockKey: section.stockKey,
      family: section.family,
      grade: gradeTyped(input.grade),
      lengthNm: input.lengthNm,
      widthNm: isPlate ? input.widthNm : null,
      massMg: pieceMassMg(section, input.lengthNm, input.widthNm ?? undefined),
      slot: input.slot,
      heat: input.heat,
      note: input.note,
      state: 'racked',
      loggedById: actor.id,
      loggedAt: new Date().toISOString(),
    });
    await tellDrop(drop, actor, `logged by hand, racked in ${input.slot}`, input.note);
    await record(actor, 'drop:log', tagText(tag), input);
    return drop.id;
  });
}

/** From which states a person may put a drop into another by hand; held and cut ones move with their plan. */
const MOVES: Readonly<Record<'racked' | 'scrapped' | 'missing', readonly DropState[]>> = {
  racked: ['missing', 'scrapped'],
  scrapped: ['racked', 'missing'],
  missing: ['racked'],
};

export function changeDrop(dropId: number, patch: DropPatch, actor: Actor): Promise<void> {
  return write(async () => {
    const drop = expectFound(await DropRow.findByPk(dropId), 'drop');
    const name = tagText(drop.tag);
    expectVersion(drop, patch.version, name);
    if (patch.state !== undefined && patch.state !== drop.state && !MOVES[patch.state].includes(drop.state))
      throw new ShopError('wrong-state', drop.state === 'held' ? `${name} is held for a plan; withdraw the plan first.` : `${name} is ${drop.state} and stays so.`);
    const heatChanges = patch.heat !== undefined && patch.heat !== (drop.heat ?? null);
    if (heatChanges && patch.reason === '')
      throw new ShopError('bad-input', 'A heat is never typed over without a reason.', [{ path: 'reason', message: 'say how you know, such as "stamped on the end"' }]);
    const said = [
      patch.state !== undefined && patch.state !== drop.state ? patch.state : null,
      patch.slot !== undefined && patch.slot !== drop.slot ? `moved from ${drop.slot} to ${patch.slot}` : null,
      heatChanges ? `heat ${drop.heat ?? 'unknown'} → ${patch.heat ?? 'unknown'}` : null,
      patch.note !== undefined && patch.note !== drop.note ? 'note changed' : null,
    ].filter((part) => part !== null);
    if (said.length === 0) return;
    await drop.update({
      state: patch.state ?? drop.state,
      slot: patch.slot ?? drop.slot,
      heat: patch.heat === undefined ? (drop.heat ?? null) : patch.heat,
      note: patch.note ?? drop.note,
      version: drop.version + 1,
    });
    await tellDrop(drop, actor, said.join(', '), patch.reason);
    await record(actor, 'drop:edit', name, patch);
  });
}
