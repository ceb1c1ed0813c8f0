/** From the shop's defaults and the planner's edits to a solve request; pure, so that the page and the demo shop ask alike. */
import type {
  SolveCutting,
  SolveDropRule,
  SolveGroup,
  SolveRequest,
  SolveStock,
} from '#shared/domain/solve.ts';

/** What the planner may tick and change for one group. Keys are stock ids; lengths typed by hand have ids `length:<n>`. */
export type GroupEdits = {
  readonly leftOut: boolean;
  readonly stock: readonly {
    readonly stockId: string;
    readonly lengthNm: number;
    readonly costMinor: number;
    readonly used: boolean;
  }[];
  readonly drops: readonly {
    readonly stockId: string;
    readonly lengthNm: number;
    readonly costMinor: number;
    readonly used: boolean;
  }[];
  readonly cutting: SolveCutting;
  readonly rule: SolveDropRule;
};
export type PlanEdits = Readonly<Record<string, GroupEdits>>;

/** As much of the planning answer as a request needs. */
export type PlanningGroup = {
  readonly id: string;
  readonly pieces: readonly {
    readonly id: string;
    readonly mark: string;
    readonly lengthNm: number;
    readonly quantity: number;
  }[];
  readonly offers: readonly {
    readonly stockId: string;
    readonly lengthNm: number;
    readonly costMinor: number;
  }[];
  readonly drops: readonly {
    readonly stockId: string;
    readonly lengthNm: number;
    readonly costMinor: number;
  }[];
  readonly cutting: SolveCutting;
  readonly rule: SolveDropRule;
};

/** Everything the shop knows, ticked. */
export function defaultEdits(view: { readonly groups: readonly PlanningGroup[] }): PlanEdits {
  return Object.fromEntries(
    view.groups.map((group) => [
      group.id,
      {
        leftOut: false,
        stock: group.offers.map(({ stockId, lengthNm, costMinor }) => ({
          stockId,
          lengthNm,
          costMinor,
          used: true,
        })),
        drops: group.drops.map(({ stockId, lengthNm, costMinor }) => ({
          stockId,
          lengthNm,
          costMinor,
          used: true,
        })),
        cutting: group.cutting,
        rule: group.rule,
      },
    ]),
  );
}

function groupRequest(group: PlanningGroup, edits: GroupEdits): SolveGroup {
  const stockOf =
    (source: SolveStock['source'], supply: number | null) =>
    (entry: { stockId: string; lengthNm: number; costMinor: number }): SolveStock => ({
      id: entry.stockId,
      source,
      lengthNm: entry.lengthNm,
      costMinor: entry.costMinor,
      supply,
    });
  return {
    id: group.id,
    kind: 'linear',
    pieces: group.pieces.map(({ id, mark, lengthNm, quantity }) => ({ id, mark, lengthNm, quantity })),
    stock: [
      ...edits.stock.filter(({ used }) => used).map(stockOf('new', null)),
      ...edits.drops.filter(({ used }) => used).map(stockOf('drop', 1)),
    ],
    cutting: { ...edits.cutting },
    drops: { ...edits.rule },
  };
}

/** Groups left out are not asked for. */
export function planRequest(
  view: { readonly groups: readonly PlanningGroup[] },
  edits: PlanEdits,
  options: { seed: number; timeLimitMs: number },
): SolveRequest {
  return {
    version: 1,
    ...options,
    groups: view.groups.flatMap((group) => {
      const own = edits[group.id];
      return own && !own.leftOut ? [groupRequest(group, own)] : [];
    }),
  };
}
