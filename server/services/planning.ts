/** The planner's defaults for chosen part lines: everything the shop knows about stock for them, nothing decided. */
import { ShopError } from '#server/errors.ts';
import {
  DropRow,
  PartListRow,
  type DropRuleRow,
  type PartLineRow,
  type StationRow,
} from '#server/models/index.ts';
import { findShop } from '#server/services/shop.ts';
import { listLines, type LineWithCounts } from '#server/services/part-lists.ts';
import { listOffers, type OfferWithSupplier } from '#server/services/offers.ts';
import { listDropRules, listStations } from '#server/services/yard.ts';
import { groupBy } from '#shared/domain/group-by.ts';
import {
  creditMinorPerM,
  dropCostMinor,
  scrapMinorPerM,
  usualKeepFromNm,
  USUAL_CREDIT_PERCENT,
} from '#shared/domain/drop-rule.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import { PLATE_FAMILIES, type Family } from '#shared/domain/section/types.ts';
import { usualLengthsNm } from '#shared/domain/section/usual-lengths.ts';
import type { PlanningView, PlanPiece } from '#shared/schemas/plans.ts';

export const groupKey = ({ stockKey, grade }: Pick<PartLineRow, 'stockKey' | 'grade'>): string =>
  `${stockKey}|${grade}`;

/** A line as a piece of a plan, with where it came from. */
export function pieceOf(
  { line, jobNumber }: LineWithCounts,
  lists: ReadonlyMap<number, PartListRow>,
  quantity: number,
): PlanPiece {
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

function expectLines(partLineIds: readonly number[], lines: readonly LineWithCounts[]): void {
  const known = new Set(lines.map(({ line }) => line.id));
  const unknown = partLineIds.flatMap((id, i) =>
    known.has(id) ? [] : [{ path: `partLineIds.${i}`, message: `there is no part line ${id}` }],
  );
  if (unknown.length > 0)
    throw new ShopError(
      'bad-input',
      'Some of the lines are not there any more. Load the job again and choose anew.',
      unknown,
    );
}

type ShopDefaults = {
  lists: ReadonlyMap<number, PartListRow>;
  offers: readonly OfferWithSupplier[];
  racked: readonly DropRow[];
  rules: readonly DropRuleRow[];
  stations: readonly { station: StationRow; families: readonly Family[] }[];
  scrapMinorPerTonne: number;
};

/** A group is planned at the first station, by name, that takes its family. */
const stationFor = ({ stations }: ShopDefaults, family: Family) =>
  stations.find(({ families }) => families.includes(family))?.station;

function groupDefaults(
  members: readonly [LineWithCounts, ...LineWithCounts[]],
  shop: ShopDefaults,
): PlanningView['groups'][number] {
  const { stockKey, section: name, family, grade } = members[0].line;
  const id = groupKey(members[0].line);
  const section = sectionByName(stockKey);
  const mgPerM = section?.mass.per === 'length' ? section.mass.mgPerM : 0;
  const shortest = members.reduce((least, { line }) => Math.min(least, line.lengthNm), Infinity);
  const offers = shop.offers
    .filter(({ offer }) => groupKey(offer) === id)
    .map(({ offer, supplierName }) => ({
      stockId: `offer:${offer.id}`,
      supplierName,
      lengthNm: offer.lengthNm,
      costMinor: offer.priceMinor,
    }));
  const rule = shop.rules.find((entry) => entry.family === family);
  const credit = creditMinorPerM(offers, rule?.creditPercent ?? USUAL_CREDIT_PERCENT);
  const station = stationFor(shop, family);
  return {
    id,
    stockKey,
    section: name,
    family,
    grade,
    mgPerM,
    pieces: members.map((entry) => pieceOf(entry, shop.lists, entry.line.quantity - entry.planned)),
    offers,
    drops: shop.racked
      .filter((drop) => groupKey(drop) === id && drop.lengthNm >= shortest)
      .map((drop) => ({
        stockId: `drop:${drop.id}`,
        id: drop.id,
        tag: drop.tag,
        slot: drop.slot,
        heat: drop.heat ?? null,
        lengthNm: drop.lengthNm,
        costMinor: dropCostMinor(drop.lengthNm, credit),
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
      scrapMinorPerM: scrapMinorPerM(shop.scrapMinorPerTonne, mgPerM, credit),
    },
  };
}

/** Open quantities of the lines in groups of one section and grade, each with the stock, station and rule the shop would use. */
export async function describePlanning(partLineIds: readonly number[]): Promise<PlanningView> {
  const chosen = await listLines({ partLineIds });
  expectLines(partLineIds, chosen);
  const open = chosen.filter(({ line, planned }) => planned < line.quantity);
  const isPlate = ({ line }: LineWithCounts) => PLATE_FAMILIES.includes(line.family);
  const bars = open.filter((entry) => !isPlate(entry));
  const [lists, offers, rules, stations, shop, racked] = await Promise.all([
    listsOf(bars),
    listOffers(),
    listDropRules(),
    listStations(),
    findShop(),
    DropRow.findAll({
      where: { state: 'racked', stockKey: [...new Set(bars.map(({ line }) => line.stockKey))] },
      order: [
        ['lengthNm', 'DESC'],
        ['tag', 'ASC'],
      ],
    }),
  ]);
  const defaults: ShopDefaults = {
    lists,
    offers,
    racked,
    rules,
    stations: stations.map((station) => ({ station, families: JSON.parse(station.families) as Family[] })),
    scrapMinorPerTonne: shop?.scrapMinorPerTonne ?? 0,
  };
  const groups = [...groupBy(bars, ({ line }) => groupKey(line)).values()].flatMap(([first, ...rest]) =>
    first ? [groupDefaults([first, ...rest], defaults)] : [],
  );
  const left = open.filter(isPlate).map(({ line }) => ({
    partLineId: line.id,
    mark: line.mark,
    section: line.section,
    reason: 'Sheared plate is planned by area, not by bar; this plan leaves it out.',
  }));
  return { groups, left };
}
