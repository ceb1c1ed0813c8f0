/** A plan comes from a browser and is trusted in nothing: every id of its request is held against the shop's own rows. */
import { DropRow, OfferRow } from '#server/models/index.ts';
import { listLines, type LineWithCounts } from '#server/services/part-lists.ts';
import { groupKey } from '#server/services/planning.ts';
import { tagText } from '#server/services/tags.ts';
import { PLATE_FAMILIES } from '#shared/domain/section/types.ts';
import type { SolveGroup, SolvePiece, SolveRequest, SolveStock } from '#shared/domain/solve.ts';
import type { ErrorIssue } from '#shared/errors.ts';

export type PlanSources = {
  readonly lines: ReadonlyMap<string, LineWithCounts>;
  readonly offers: ReadonlyMap<string, OfferRow>;
  readonly drops: ReadonlyMap<string, DropRow>;
};

/** `offer:12` → kind and row id; an id that is no whole number reads as none. */
export function stockRef(stockId: string): { kind: string; id: number | null } {
  const [, kind = '', digits = ''] = /^([a-z]+):([1-9]\d{0,14})$/.exec(stockId) ?? [];
  return { kind, id: digits === '' ? null : Number(digits) };
}

const lineIdOf = ({ id }: SolvePiece): number[] => (/^[1-9]\d{0,14}$/.test(id) ? [Number(id)] : []);

export async function findPlanSources({ groups }: SolveRequest): Promise<PlanSources> {
  const stock = groups.flatMap((group) => group.stock).map((entry) => stockRef(entry.id));
  const idsOf = (kind: string) =>
    stock.flatMap((ref) => (ref.kind === kind && ref.id !== null ? [ref.id] : []));
  const [lines, offers, drops] = await Promise.all([
    listLines({ partLineIds: groups.flatMap(({ pieces }) => pieces.flatMap(lineIdOf)) }),
    OfferRow.findAll({ where: { id: idsOf('offer') } }),
    DropRow.findAll({ where: { id: idsOf('drop') } }),
  ]);
  return {
    lines: new Map(lines.map((entry) => [String(entry.line.id), entry])),
    offers: new Map(offers.map((offer) => [`offer:${offer.id}`, offer])),
    drops: new Map(drops.map((drop) => [`drop:${drop.id}`, drop])),
  };
}

function pieceFaults(piece: SolvePiece, group: SolveGroup, { lines }: PlanSources): string[] {
  const found = lines.get(piece.id);
  if (!found) return [`there is no part line ${piece.id}`];
  const { line, planned } = found;
  const open = line.quantity - planned;
  const faults: string[] = [];
  if (PLATE_FAMILIES.includes(line.family)) faults.push(`${line.mark} is plate and is not cut from bars`);
  if (groupKey(line) !== group.id)
    faults.push(`${line.mark} belongs to ${groupKey(line)}, not to ${group.id}`);
  if (line.lengthNm !== piece.lengthNm) faults.push(`${line.mark} is not as long as its part line says`);
  if (piece.quantity < 1) faults.push(`${line.mark}: nothing is wanted of it`);
  if (piece.quantity > open)
    faults.push(`${line.mark}: ${piece.quantity} wanted and ${Math.max(0, open)} not planned yet`);
  return faults;
}

function offerFaults(stock: SolveStock, group: SolveGroup, offer: OfferRow | undefined): string[] {
  if (!offer || offer.withdrawn === 1) return [`${stock.id} is not offered any more`];
  const faults: string[] = [];
  if (stock.source !== 'new') faults.push(`${stock.id} is a bar to buy, not a drop`);
  if (groupKey(offer) !== group.id) faults.push(`${stock.id} is ${groupKey(offer)}, not ${group.id}`);
  if (offer.lengthNm !== stock.lengthNm) faults.push(`${stock.id} is of another length`);
  return faults;
}

function dropFaults(stock: SolveStock, group: SolveGroup, drop: DropRow | undefined): string[] {
  if (!drop) return [`there is no drop behind ${stock.id}`];
  const name = tagText(drop.tag);
  const faults: string[] = [];
  if (stock.source !== 'drop') faults.push(`${name} is a drop, not a bar to buy`);
  if (groupKey(drop) !== group.id) faults.push(`${name} is ${groupKey(drop)}, not ${group.id}`);
  if (drop.lengthNm !== stock.lengthNm) faults.push(`${name} is of another length`);
  if (drop.state !== 'racked') faults.push(`${name} is ${drop.state} and no longer free on the rack`);
  if (stock.supply !== 1) faults.push(`${name} can be used once`);
  return faults;
}

function stockFaults(stock: SolveStock, group: SolveGroup, { offers, drops }: PlanSources): string[] {
  const { kind, id } = stockRef(stock.id);
  if (id !== null && kind === 'offer') return offerFaults(stock, group, offers.get(stock.id));
  if (id !== null && kind === 'drop') return dropFaults(stock, group, drops.get(stock.id));
  if (id === null || kind !== 'length') return [`${stock.id} is no offer, no drop and no typed length`];
  const faults: string[] = [];
  if (stock.source !== 'new') faults.push('a length typed in by hand is a bar to buy');
  if (stock.costMinor < 1) faults.push('a length typed in by hand needs its price');
  return faults;
}

/** Everything about the request that is not as the shop's rows say, with its path. */
export function findSourceFaults({ groups }: SolveRequest, sources: PlanSources): ErrorIssue[] {
  if (groups.length === 0) return [{ path: 'request.groups', message: 'the plan is empty' }];
  const planned = new Map<string, string>();
  return groups.flatMap((group, g) => {
    const at = `request.groups.${g}`;
    const issues: ErrorIssue[] =
      group.pieces.length === 0 ? [{ path: at, message: 'no pieces are wanted' }] : [];
    group.pieces.forEach((piece, i) => {
      const path = `${at}.pieces.${i}`;
      const other = planned.get(piece.id);
      if (other !== undefined)
        issues.push({ path, message: `part line ${piece.id} is planned in ${other} too` });
      planned.set(piece.id, group.id);
      issues.push(...pieceFaults(piece, group, sources).map((message) => ({ path, message })));
    });
    group.stock.forEach((stock, i) =>
      issues.push(
        ...stockFaults(stock, group, sources).map((message) => ({ path: `${at}.stock.${i}`, message })),
      ),
    );
    return issues;
  });
}

/** Offers whose price was typed over for this plan: what the supplier asks and what was planned with. */
export function typedPrices({ groups }: SolveRequest, { offers }: PlanSources) {
  return groups
    .flatMap(({ stock }) => stock)
    .flatMap(({ id, costMinor }) => {
      const offer = offers.get(id);
      return offer && offer.priceMinor !== costMinor
        ? [{ offer: offer.id, askedMinor: offer.priceMinor, plannedMinor: costMinor }]
        : [];
    });
}
