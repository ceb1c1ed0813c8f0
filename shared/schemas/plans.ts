import { z } from 'zod';
import { Can, FamilyName, Instant, LengthNm, OptionalText, Text, Version } from '#shared/schemas/common.ts';
import { Heat, Slot } from '#shared/schemas/rack.ts';
import { SolveGroupResult, SolveRequest, SolveResult } from '#shared/schemas/solve.ts';

export const PLAN_STATES = ['draft', 'issued', 'cutting', 'finished', 'withdrawn'] as const;
export const PlanState = z.enum(PLAN_STATES);

/**
 * Saving a plan. Piece ids of the request are part line ids written as text. Stock ids are
 * `offer:<offerId>` (a bar to buy), `length:<n>` (a length typed in by hand with its price) or `drop:<dropId>`.
 * Group ids are `<stockKey>|<grade>`. The server checks every one of them against its own rows, then runs check-plan.
 */
export const SavePlanInput = z.strictObject({
  name: Text(80),
  stationId: z.int().min(1).nullable(),
  request: SolveRequest,
  result: SolveResult,
});

export const PlanSummary = z.object({
  id: z.int(),
  number: z.int(),
  name: z.string(),
  state: PlanState,
  jobs: z.array(z.object({ id: z.int(), number: z.string(), name: z.string() })),
  stationId: z.int().nullable(),
  stationName: z.string().nullable(),
  groups: z.int(),
  pieces: z.int(),
  bars: z.int(),
  barsCut: z.int(),
  newBars: z.int(),
  dropsUsed: z.int(),
  /** Minor units, rounded to whole ones; the exact figure is in the groups. */
  netMinor: z.int(),
  boundMinor: z.int(),
  createdBy: z.string(),
  createdAt: Instant,
  issuedAt: Instant.nullable(),
  version: z.int(),
  can: Can,
});

/** What a layout's stock is, in the shop's words. */
export const PlanStock = z.object({
  stockId: z.string(),
  source: z.enum(['new', 'drop']),
  lengthNm: z.int(),
  costMinor: z.int(),
  supplierName: z.string().nullable(),
  drop: z.object({ id: z.int(), tag: z.int(), slot: z.string(), heat: z.string().nullable() }).nullable(),
});
export const PlanPiece = z.object({
  /** Part line id as text: the pieceId of request and result. */
  id: z.string(),
  partLineId: z.int(),
  mark: z.string(),
  jobNumber: z.string(),
  partListName: z.string(),
  revision: z.string(),
  row: z.int(),
  lengthNm: z.int(),
  quantity: z.int(),
  pieceMassMg: z.int(),
});
export const Bar = z.object({
  id: z.int(),
  groupId: z.string(),
  /** Position of its layout in the group's result, from 0. */
  layout: z.int(),
  /** Number of this bar in the plan, from 1. */
  number: z.int(),
  state: z.enum(['waiting', 'cut']),
  heat: z.string().nullable(),
  /** Tag reserved for the drop this bar will make, when it makes one worth keeping. */
  makesTag: z.int().nullable(),
  madeDrop: z.object({ id: z.int(), tag: z.int(), slot: z.string() }).nullable(),
  cutBy: z.string().nullable(),
  cutAt: Instant.nullable(),
  version: z.int(),
});
export const PlanGroup = z.object({
  id: z.string(),
  section: z.string(),
  stockKey: z.string(),
  family: FamilyName,
  grade: z.string(),
  mgPerM: z.int(),
  pieces: z.array(PlanPiece),
  stock: z.array(PlanStock),
  request: SolveRequest.shape.groups.element,
  result: SolveGroupResult,
});
export const PlanView = z.object({
  plan: PlanSummary,
  groups: z.array(PlanGroup),
  /** Empty while the plan is a draft or withdrawn. */
  bars: z.array(Bar),
});
export const PlanList = z.object({ plans: z.array(PlanSummary), can: Can });

export const IssuePlanInput = z.strictObject({ stationId: z.int().min(1), version: Version });
export const WithdrawPlanInput = z.strictObject({ reason: OptionalText(200), version: Version });

/**
 * One bar is cut: the drop used is closed, the drop made is racked with parent and heat.
 * `heat` is the new bar's own (null: unknown); a racked drop's heat is inherited and may not be sent.
 */
export const CutBarInput = z.strictObject({
  heat: Heat.optional(),
  /** Where the drop made goes; wanted when the layout keeps one. */
  slot: Slot.optional(),
  /** Measured length of the drop made; as computed when absent. */
  measuredNm: LengthNm.optional(),
  version: Version,
});
export const CutBarAnswer = z.object({ bar: Bar, plan: PlanSummary });

/** The planner's defaults for one group of open part lines. */
export const PlanningView = z.object({
  groups: z.array(
    z.object({
      id: z.string(),
      stockKey: z.string(),
      section: z.string(),
      family: FamilyName,
      grade: z.string(),
      mgPerM: z.int(),
      pieces: z.array(PlanPiece),
      /** Offers of exactly this section and grade. */
      offers: z.array(
        z.object({ stockId: z.string(), supplierName: z.string(), lengthNm: z.int(), costMinor: z.int() }),
      ),
      /** Racked drops of exactly this section and grade at least as long as the shortest piece. */
      drops: z.array(
        z.object({
          stockId: z.string(),
          id: z.int(),
          tag: z.int(),
          slot: z.string(),
          heat: z.string().nullable(),
          lengthNm: z.int(),
          costMinor: z.int(),
        }),
      ),
      /** Lengths usual in the trade, offered when the shop has no offer; a price must be typed. */
      usualLengthsNm: z.array(z.int()),
      stationId: z.int().nullable(),
      cutting: z.object({ kerfNm: z.int(), headCropNm: z.int(), tailCropNm: z.int(), holdDownNm: z.int() }),
      rule: z.object({ keepFromNm: z.int(), creditMinorPerM: z.int(), scrapMinorPerM: z.int() }),
    }),
  ),
  /** Lines that cannot be planned as bars, with the reason. */
  left: z.array(z.object({ partLineId: z.int(), mark: z.string(), section: z.string(), reason: z.string() })),
});
export const PlanningInput = z.strictObject({ partLineIds: z.array(z.int().min(1)).min(1).max(50_000) });

export type PlanSummary = z.infer<typeof PlanSummary>;
export type PlanView = z.infer<typeof PlanView>;
export type PlanGroup = z.infer<typeof PlanGroup>;
export type PlanStock = z.infer<typeof PlanStock>;
export type PlanPiece = z.infer<typeof PlanPiece>;
export type PlanningView = z.infer<typeof PlanningView>;
export type Bar = z.infer<typeof Bar>;
export type SavePlanInput = z.infer<typeof SavePlanInput>;
export type IssuePlanInput = z.infer<typeof IssuePlanInput>;
export type CutBarInput = z.infer<typeof CutBarInput>;
