/**
 * Re-checks a plan against its request, trusting nothing of where it came from: every piece, start, leftover, supply and cost. A bound
 * cannot be verified without solving again; it is checked not to exceed the cost.
 */
import {
  billionthsToMinor,
  canClamp,
  fits,
  keepsDrop,
  layoutCostBillionths,
  leftoverNm,
  usableNm,
} from '#shared/domain/layout-cost.ts';
import type {
  SolveGroup,
  SolveGroupResult,
  SolveLayout,
  SolveRequest,
  SolveResult,
} from '#shared/domain/solve.ts';

export type PlanFault = { readonly path: string; readonly message: string };

const COST_TOLERANCE = 1e-9;
const PROVEN_GAP = 1e-6;
/** The contract's own allowance for the last bits of a double. */
const close = (a: number, b: number) =>
  Math.abs(a - b) <= COST_TOLERANCE * Math.max(1, Math.abs(a), Math.abs(b));

/** Every fault of the result, empty when it holds. */
export function checkPlan(request: SolveRequest, result: SolveResult): PlanFault[] {
  const faults: PlanFault[] = [];
  const tell = (path: string, message: string) => faults.push({ path, message });
  const answers = new Map(result.groups.map((group) => [group.id, group]));
  if (answers.size !== result.groups.length) tell('groups', 'a group is answered twice');
  for (const { id } of request.groups) if (!answers.has(id)) tell('groups', `group ${id} has no answer`);
  const asked = new Map(request.groups.map((group) => [group.id, group]));
  result.groups.forEach((answer, i) => {
    const group = asked.get(answer.id);
    if (group) checkGroup(group, answer, `groups.${i}`, tell);
    else tell(`groups.${i}.id`, `group ${answer.id} was not asked for`);
  });
  return faults;
}

type Tell = (path: string, message: string) => void;

function checkGroup(group: SolveGroup, answer: SolveGroupResult, at: string, tell: Tell): void {
  const stock = new Map(group.stock.map((entry) => [entry.id, entry]));
  const made = new Map(group.pieces.map(({ id }) => [id, 0]));
  const used = new Map<string, number>();
  let net = 0n;
  let bars = 0;
  let dropsUsed = 0;
  answer.layouts.forEach((layout, i) => {
    const path = `${at}.layouts.${i}`;
    const bar = stock.get(layout.stockId);
    if (!bar) return tell(`${path}.stockId`, `there is no stock ${layout.stockId}`);
    if (!Number.isSafeInteger(layout.repeat) || layout.repeat < 1)
      return tell(`${path}.repeat`, 'a layout is cut at least once');
    if (layout.cuts.length === 0) return tell(`${path}.cuts`, 'a layout cuts at least one piece');
    used.set(bar.id, (used.get(bar.id) ?? 0) + layout.repeat);
    bars += layout.repeat;
    if (bar.source === 'drop') dropsUsed += layout.repeat;
    checkLayout(group, layout, bar.lengthNm, path, made, tell);
    net += BigInt(layout.repeat) * layoutCostBillionths(bar, layout.leftoverNm, group.drops);
  });
  for (const [id, count] of used) {
    const supply = stock.get(id)?.supply ?? null;
    if (supply !== null && count > supply)
      tell(
        `${at}.layouts`,
        `${id} is used ${count} times and there ${supply === 1 ? 'is' : 'are'} ${supply}`,
      );
  }
  checkDemand(group, answer, made, used, at, tell);
  checkMoney(group, answer, billionthsToMinor(net), at, tell);
  const { counts } = answer;
  if (
    counts.bars !== bars ||
    counts.dropsUsed !== dropsUsed ||
    counts.newBars !== bars - dropsUsed ||
    counts.layouts !== answer.layouts.length
  )
    tell(`${at}.counts`, 'the counts are not those of the layouts');
}

function checkLayout(
  group: SolveGroup,
  layout: SolveLayout,
  stockNm: number,
  path: string,
  made: Map<string, number>,
  tell: Tell,
): void {
  const { cutting, drops } = group;
  const pieces = new Map(group.pieces.map((piece) => [piece.id, piece]));
  let start = cutting.headCropNm;
  let total = 0;
  layout.cuts.forEach((cut, i) => {
    const piece = pieces.get(cut.pieceId);
    if (!piece) return tell(`${path}.cuts.${i}.pieceId`, `there is no piece ${cut.pieceId}`);
    if (cut.lengthNm !== piece.lengthNm)
      tell(`${path}.cuts.${i}.lengthNm`, `${cut.pieceId} is ${piece.lengthNm} nm long, not ${cut.lengthNm}`);
    if (cut.startNm !== start)
      tell(`${path}.cuts.${i}.startNm`, `the cut starts at ${cut.startNm} nm where ${start} nm is due`);
    start += piece.lengthNm + cutting.kerfNm;
    total += piece.lengthNm;
    made.set(piece.id, (made.get(piece.id) ?? 0) + layout.repeat);
  });
  const usable = usableNm(stockNm, cutting);
  if (!fits(usable, total, layout.cuts.length, cutting))
    tell(path, `the pieces need more than the ${usable} nm between the crops`);
  const left = leftoverNm(usable, total, layout.cuts.length, cutting);
  if (layout.leftoverNm !== left) tell(`${path}.leftoverNm`, `${left} nm are left, not ${layout.leftoverNm}`);
  if (layout.keeps !== keepsDrop(left, drops))
    tell(`${path}.keeps`, `a leftover of ${left} nm ${keepsDrop(left, drops) ? 'is kept' : 'is scrap'}`);
  if (!canClamp(left, layout.cuts.at(-1)?.lengthNm ?? 0, cutting))
    tell(path, 'the last cut leaves nothing the hold-down can grip');
}

function checkDemand(
  group: SolveGroup,
  answer: SolveGroupResult,
  made: ReadonlyMap<string, number>,
  used: ReadonlyMap<string, number>,
  at: string,
  tell: Tell,
): void {
  const missing = new Map<string, number>();
  answer.unplaced.forEach((entry, i) => {
    const path = `${at}.unplaced.${i}`;
    if (!made.has(entry.pieceId)) return tell(path, `there is no piece ${entry.pieceId}`);
    if (missing.has(entry.pieceId)) tell(path, `${entry.pieceId} is listed twice`);
    if (!Number.isSafeInteger(entry.quantity) || entry.quantity < 1)
      tell(path, 'an unplaced quantity is at least 1');
    missing.set(entry.pieceId, entry.quantity);
  });
  for (const { id, lengthNm, quantity } of group.pieces) {
    const placed = made.get(id) ?? 0;
    const left = missing.get(id) ?? 0;
    if (placed + left !== quantity)
      tell(`${at}.layouts`, `${id}: ${quantity} wanted, ${placed} cut, ${left} unplaced`);
    if (
      left > 0 &&
      group.stock.some(
        (bar) =>
          hasRoom(group, bar.lengthNm, lengthNm) &&
          (bar.supply === null || (used.get(bar.id) ?? 0) < bar.supply),
      )
    )
      tell(`${at}.unplaced`, `${id} is called unplaceable and a bar of it is to be had`);
  }
  if ((answer.outcome === 'unplaceable') !== answer.unplaced.length > 0)
    tell(`${at}.outcome`, '"unplaceable" is said when pieces are left over, and only then');
}

/** A piece alone on a bar of this length. */
function hasRoom({ cutting }: SolveGroup, stockNm: number, pieceNm: number): boolean {
  const usable = usableNm(stockNm, cutting);
  return (
    fits(usable, pieceNm, 1, cutting) && canClamp(leftoverNm(usable, pieceNm, 1, cutting), pieceNm, cutting)
  );
}

/** With one price and no credits a plan's cost is a whole number of bars, so the bound may be rounded up to one. */
export function costsAreWholeBars({ stock, drops }: SolveGroup): boolean {
  return (
    stock.every(({ costMinor }) => costMinor === stock[0]?.costMinor) &&
    drops.creditMinorPerM === 0 &&
    drops.scrapMinorPerM === 0
  );
}

function checkMoney(group: SolveGroup, answer: SolveGroupResult, net: number, at: string, tell: Tell): void {
  const { netCostMinor, boundMinor, gap, outcome } = answer;
  if (!close(netCostMinor, net)) tell(`${at}.netCostMinor`, `the layouts cost ${net}, not ${netCostMinor}`);
  if (!Number.isFinite(boundMinor) || boundMinor < 0) tell(`${at}.boundMinor`, 'the bound is no cost');
  if (boundMinor > net && !close(boundMinor, net))
    tell(`${at}.boundMinor`, `the bound ${boundMinor} is above the cost ${net}`);
  const due = net > 0 ? (net - boundMinor) / net : 0;
  if (Math.abs(gap - due) > COST_TOLERANCE * 10) tell(`${at}.gap`, `the gap is ${due}, not ${gap}`);
  if (outcome === 'proven') {
    const unit = group.stock[0]?.costMinor ?? 0;
    const rounded =
      costsAreWholeBars(group) &&
      unit > 0 &&
      Math.ceil(boundMinor / unit - PROVEN_GAP) * unit >= net - PROVEN_GAP;
    if (!(due < PROVEN_GAP) && !rounded)
      tell(`${at}.outcome`, 'the plan is called proven and its bound does not prove it');
  }
}
