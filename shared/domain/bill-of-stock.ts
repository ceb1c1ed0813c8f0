/** What a plan buys, pulls, uses, leaves and scraps: lengths exact in nanometres, so that stock in is pieces and crops and kerf and drops and scrap. */
import { usableNm } from '#shared/domain/layout-cost.ts';
import { barMassMg } from '#shared/domain/mass.ts';
import type { SolveGroup, SolveGroupResult } from '#shared/domain/solve.ts';

/** As much of a plan's group as the bill needs. */
export type BillGroup = {
  readonly id: string;
  readonly stockKey: string;
  readonly section: string;
  readonly grade: string;
  readonly mgPerM: number;
  readonly request: SolveGroup;
  readonly result: SolveGroupResult;
};

export type BillLine = {
  readonly groupId: string;
  readonly section: string;
  readonly grade: string;
  readonly stockId: string;
  readonly source: 'new' | 'drop';
  readonly lengthNm: number;
  readonly bars: number;
  readonly massMg: number;
  readonly costMinor: number;
};

/** Lengths in nanometres; `stock` is the sum of the others. */
export type Ledger = {
  readonly stock: number;
  readonly bought: number;
  readonly fromRack: number;
  readonly pieces: number;
  readonly crops: number;
  readonly kerf: number;
  readonly drops: number;
  readonly scrap: number;
};

export const NO_LENGTH: Ledger = {
  stock: 0,
  bought: 0,
  fromRack: 0,
  pieces: 0,
  crops: 0,
  kerf: 0,
  drops: 0,
  scrap: 0,
};

const add = (a: Ledger, b: Ledger): Ledger => ({
  stock: a.stock + b.stock,
  bought: a.bought + b.bought,
  fromRack: a.fromRack + b.fromRack,
  pieces: a.pieces + b.pieces,
  crops: a.crops + b.crops,
  kerf: a.kerf + b.kerf,
  drops: a.drops + b.drops,
  scrap: a.scrap + b.scrap,
});

/** Where every nanometre of a group's bars goes. */
export function ledgerOf({ request, result }: Pick<BillGroup, 'request' | 'result'>): Ledger {
  const stock = new Map(request.stock.map((entry) => [entry.id, entry]));
  return result.layouts.reduce((sum, layout) => {
    const bar = stock.get(layout.stockId);
    if (!bar) return sum;
    const pieces = layout.cuts.reduce((total, { lengthNm }) => total + lengthNm, 0);
    const usable = usableNm(bar.lengthNm, request.cutting);
    const one: Ledger = {
      stock: bar.lengthNm,
      bought: bar.source === 'new' ? bar.lengthNm : 0,
      fromRack: bar.source === 'drop' ? bar.lengthNm : 0,
      pieces,
      crops: bar.lengthNm - usable,
      kerf: usable - pieces - layout.leftoverNm,
      drops: layout.keeps ? layout.leftoverNm : 0,
      scrap: layout.keeps ? 0 : layout.leftoverNm,
    };
    const times = (nm: number) => nm * layout.repeat;
    return add(sum, {
      stock: times(one.stock),
      bought: times(one.bought),
      fromRack: times(one.fromRack),
      pieces: times(one.pieces),
      crops: times(one.crops),
      kerf: times(one.kerf),
      drops: times(one.drops),
      scrap: times(one.scrap),
    });
  }, NO_LENGTH);
}

/** One line a section, grade and length to buy, one a drop to pull. */
export function billOf(groups: readonly BillGroup[]): BillLine[] {
  return groups.flatMap(({ id, section, grade, mgPerM, request, result }) =>
    request.stock.flatMap((stock): BillLine[] => {
      const bars = result.layouts
        .filter(({ stockId }) => stockId === stock.id)
        .reduce((sum, { repeat }) => sum + repeat, 0);
      if (bars === 0) return [];
      return [
        {
          groupId: id,
          section,
          grade,
          stockId: stock.id,
          source: stock.source,
          lengthNm: stock.lengthNm,
          bars,
          massMg: bars * barMassMg(mgPerM, stock.lengthNm),
          costMinor: bars * stock.costMinor,
        },
      ];
    }),
  );
}

/** Masses of the whole plan in milligrams, and the share of it that becomes pieces. Yield null without any bar. */
export function massesOf(
  groups: readonly BillGroup[],
): { readonly [K in keyof Ledger]: number } & { readonly yield: number | null } {
  const total = groups.reduce((sum, group) => {
    const ledger = ledgerOf(group);
    const mass = (nm: number) => barMassMg(group.mgPerM, nm);
    return add(sum, {
      stock: mass(ledger.stock),
      bought: mass(ledger.bought),
      fromRack: mass(ledger.fromRack),
      pieces: mass(ledger.pieces),
      crops: mass(ledger.crops),
      kerf: mass(ledger.kerf),
      drops: mass(ledger.drops),
      scrap: mass(ledger.scrap),
    });
  }, NO_LENGTH);
  return { ...total, yield: total.stock > 0 ? total.pieces / total.stock : null };
}
