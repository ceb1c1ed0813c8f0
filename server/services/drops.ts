/** The rack as it stands: what lies where, where it came from and what was said of it. */
import { Op } from 'sequelize';
import { BarRow, DropEventRow, DropRow, Person, PlanRow } from '#server/models/index.ts';
import { expectFound } from '#server/policies/version.ts';
import { tagText } from '#server/services/tags.ts';
import { DROP_STATES, type DropState } from '#shared/schemas/rack.ts';

export type DropWithFacts = {
  drop: DropRow;
  heldByPlan: PlanRow | null;
  from: { plan: PlanRow; barId: number; parentTag: number | null } | null;
  loggedBy: string;
};

const byId = <K, T extends { id: K }>(rows: readonly T[]): Map<K, T> =>
  new Map(rows.map((row) => [row.id, row]));

async function withFacts(drops: readonly DropRow[]): Promise<DropWithFacts[]> {
  const bars = byId(
    await BarRow.findAll({ where: { id: drops.flatMap(({ fromBarId }) => fromBarId ?? []) } }),
  );
  const planIds = new Set([
    ...[...bars.values()].map(({ planId }) => planId),
    ...drops.flatMap(({ heldByPlanId }) => heldByPlanId ?? []),
  ]);
  const [planRows, personRows, parentRows] = await Promise.all([
    PlanRow.findAll({ where: { id: [...planIds] } }),
    Person.findAll(),
    DropRow.findAll({ where: { id: drops.flatMap(({ parentDropId }) => parentDropId ?? []) } }),
  ]);
  const [plans, people, parents] = [byId(planRows), byId(personRows), byId(parentRows)];
  return drops.map((drop) => {
    const bar = bars.get(drop.fromBarId ?? 0);
    const plan = plans.get(bar?.planId ?? 0);
    const parentTag = parents.get(drop.parentDropId ?? 0)?.tag ?? null;
    return {
      drop,
      heldByPlan: plans.get(drop.heldByPlanId ?? 0) ?? null,
      from: bar && plan ? { plan, barId: bar.id, parentTag } : null,
      loggedBy: people.get(drop.loggedById)?.name ?? '',
    };
  });
}

export type DropQuery = {
  state?: DropState | 'all' | undefined;
  section?: string | undefined;
  minLengthNm?: number | undefined;
  text?: string | undefined;
};

/** As somebody types it with gloves on: no blanks, no capitals, any sign for "by". */
const plain = (words: string) => words.toLowerCase().replaceAll('×', 'x').replace(/\s+/g, '');

/** Racked and held ones unless a state is asked for; text looks at tag, slot, heat, section, grade and note. */
export async function listDrops({ state, section, minLengthNm, text }: DropQuery): Promise<DropWithFacts[]> {
  const drops = await DropRow.findAll({
    where: {
      state: state === undefined ? ['racked', 'held'] : state === 'all' ? [...DROP_STATES] : state,
      ...(minLengthNm === undefined ? {} : { lengthNm: { [Op.gte]: minLengthNm } }),
    },
    order: [
      ['stockKey', 'ASC'],
      ['grade', 'ASC'],
      ['lengthNm', 'DESC'],
      ['tag', 'ASC'],
    ],
  });
  const [wanted, sought] = [plain(section ?? ''), plain(text ?? '')];
  const words = (drop: DropRow) => [
    tagText(drop.tag),
    String(drop.tag),
    drop.slot,
    drop.heat ?? 'heat unknown',
    drop.section,
    drop.grade,
    drop.note,
  ];
  return withFacts(
    drops.filter(
      (drop) =>
        plain(drop.section).includes(wanted) && words(drop).some((part) => plain(part).includes(sought)),
    ),
  );
}

export async function findDrop(dropId: number): Promise<DropWithFacts> {
  const [found] = await withFacts([expectFound(await DropRow.findByPk(dropId), 'drop')]);
  return expectFound(found, 'drop');
}

/** The newest first. */
export const listDropEvents = (dropId: number): Promise<DropEventRow[]> =>
  DropEventRow.findAll({ where: { dropId }, order: [['id', 'DESC']] });

export const listChildren = (dropId: number): Promise<DropRow[]> =>
  DropRow.findAll({ where: { parentDropId: dropId }, order: [['tag', 'ASC']] });
