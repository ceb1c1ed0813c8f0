/** The planner's defaults for chosen part lines: everything the shop knows about stock for them, nothing decided. */
import { groupBy } from '#shared/domain/group-by.ts';
import { Op } from 'sequelize';
import { DropRow, type PartLineRow, PartListRow } from '#server/models/index.ts';
import { findShop } from '#server/services/shop.ts';
import { listLines, type LineWithCounts } from '#server/services/part-lists.ts';
import { listDropRules, listOffers, listStations } from '#server/services/yard.ts';
import { creditMinorPerM, dropCostMinor, scrapMinorPerM, usualKeepFromNm, USUAL_CREDIT_PERCENT } from '#shared/domain/drop-rule.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import { PLATE_FAMILIES, type Family } from '#shared/domain/section/types.ts';
import { usualLengthsNm } from '#shared/domain/section/usual-lengths.ts';
import type { PlanningView, PlanPiece } from '#shared/schemas/plans.ts';

export const groupKey = ({ stockKey, grade }: Pick<PartLineRow, 'stockKey' | 'grade'>): string => `${stockKey}|${grade}`;

/** A line as a piece of a plan, with where it came from. */
export function pieceOf({ line, jobNumber }: LineWithCounts, lists: ReadonlyMap<number, PartListRow>, quantity: number): PlanPiece {
  const list = lists.get(line.partListId);
  return {
    id: String(line.id),
    partLineId: line.id,
    mark: line.mark,
    jobNumber,
    partListName: list?.name ?? '',
    revision: list?.revision ?? '',
    row: line.row,
    lengthNm: line.lengthNm,
    quantity,
    pieceMassMg: line.pieceMassMg,
  };
}

export async function listsOf(lines: readonly LineWithCounts[]): Promise<Map<number, PartListRow>> {
  const ids = [...new Set(lines.map(({ line }) => line.partListId))];
  const lists = await PartListRow.findAll({ where: { id: ids }, attributes: { exclude: ['file'] } });
  return new Map(lists.map((list) => [list.id, list]));
}

export async function describePlanning(partLineIds: readonly number[]): Promise<PlanningView> {
  const lines = await listLines({ partLineIds, open: true });
  const [lists, offers, rules, stations, shop] = await Promise.all([listsOf(lines), listOffers(), listDropRules(), listStations(), findShop()]);
  const bars = lines.filter(({ line }) => !PLATE_FAMILIES.includes(line.family));
  const byGroup = groupBy(bars, ({ line }) => groupKey(line));
  const racked = await DropRow.findAll({
    where: { state: 'racked', stockKey: { [Op.in]: [...new Set(bars.map(({ line }) => line.stockKey))] } },
    order: [['lengthNm', 'DESC']],
  });

  const groups = [...byGroup].map(([id, members]): PlanningView['groups'][number] => {
    const { stockKey, section: name, family, grade } = members[0]?.line ?? { stockKey: '', section: '', family: 'flat' as Family, grade: '' };
    const section = sectionByName(stockKey);
    const mgPerM = section?.mass.per === 'length' ? section.mass.mgPerM : 0;
    const shortest = Math.min(...members.map(({ line }) => line.lengthNm));
    const own = offers
      .filter(({ offer }) => offer.stockKey === stockKey && offer.grade === grade)
      .map(({ offer, supplierName }) => ({ stockId: `offer:${offer.id}`, supplierName, lengthNm: offer.lengthNm, costMinor: offer.priceMinor }));
    const rule = rules.find((entry) => entry.family === family);
    const credit = creditMinorPerM(own, rule?.creditPercent ?? USUAL_CREDIT_PERCENT);
    const station = stations.find((entry) => (JSON.parse(entry.families) as Family[]).includes(family));
    return {
      id,
      stockKey,
      section: name,
      family,
      grade,
      mgPerM,
      pieces: members.map((entry) => pieceOf(entry, lists, entry.line.quantity - entry.planned)),
      offers: own,
      drops: racked
        .filter((drop) => drop.stockKey === stockKey && drop.grade === grade && drop.lengthNm >= shortest)
        .map(({ id: dropId, tag, slot, heat, lengthNm }) => ({
          stockId: `drop:${dropId}`,
          id: dropId,
          tag,
          slot,
          heat: heat ?? null,
          lengthNm,
          costMinor: dropCostMinor(lengthNm, credit),
        })),
      usualLengthsNm: section ? usualLengthsNm(section) : [],
      stationId: station?.id ?? null,
      cutting: {
        kerfNm: station?.kerfNm ?? 0,
        headCropNm: station?.headCropNm ?? 0,
        tailCropNm: station?.tailCropNm ?? 0,
        holdDownNm: station?.holdDownNm ?? 0,
      },
      rule: {
        keepFromNm: rule?.keepFromNm ?? usualKeepFromNm(family),
        creditMinorPerM: credit,
        scrapMinorPerM: scrapMinorPerM(shop?.scrapMinorPerTonne ?? 0, mgPerM, credit),
      },
    };
  });
  const left = lines
    .filter(({ line }) => PLATE_FAMILIES.includes(line.family))
    .map(({ line }) => ({
      partLineId: line.id,
      mark: line.mark,
      section: line.section,
      reason: 'Sheared plate is planned by area, not by bar; this plan leaves it out.',
    }));
  return { groups, left };
}
