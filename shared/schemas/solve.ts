/** The solver's contract: what the command line, the worker and the server exchange. Version 1. */
import { z } from 'zod';
import type * as domain from '#shared/domain/solve.ts';

const nm = z.int().min(0).max(Number.MAX_SAFE_INTEGER);
const positiveNm = z.int().min(1).max(1_000_000_000_000);
const minor = z.int().min(0).max(1_000_000_000_000);

export const SolvePiece = z.strictObject({
  id: z.string().min(1),
  mark: z.string().optional(),
  lengthNm: positiveNm,
  quantity: z.int().min(0).max(1_000_000),
});

export const SolveStock = z.strictObject({
  id: z.string().min(1),
  source: z.enum(['new', 'drop']),
  lengthNm: positiveNm,
  costMinor: minor,
  /** null: as many as wanted. */
  supply: z.int().min(0).max(1_000_000).nullable(),
});

export const SolveCutting = z.strictObject({
  kerfNm: nm,
  headCropNm: nm,
  tailCropNm: nm,
  holdDownNm: nm,
});

export const SolveDropRule = z.strictObject({
  keepFromNm: nm,
  creditMinorPerM: minor,
  scrapMinorPerM: minor,
});

export const SolveGroup = z.strictObject({
  id: z.string().min(1),
  kind: z.literal('linear'),
  pieces: z.array(SolvePiece),
  stock: z.array(SolveStock),
  cutting: SolveCutting,
  drops: SolveDropRule,
});

export const SolveRequest = z
  .strictObject({
    version: z.literal(1),
    seed: z.int().min(0).max(4_294_967_295),
    timeLimitMs: z.int().min(1).max(3_600_000),
    groups: z.array(SolveGroup),
  })
  .superRefine((request, ctx) => {
    const groupIds = new Set<string>();
    request.groups.forEach((group, g) => {
      if (groupIds.has(group.id))
        ctx.addIssue({
          code: 'custom',
          path: ['groups', g, 'id'],
          message: `two groups are called "${group.id}"`,
        });
      groupIds.add(group.id);
      for (const list of ['pieces', 'stock'] as const) {
        const seen = new Set<string>();
        group[list].forEach((entry, i) => {
          if (seen.has(entry.id))
            ctx.addIssue({
              code: 'custom',
              path: ['groups', g, list, i, 'id'],
              message: `two entries of ${list} are called "${entry.id}"`,
            });
          seen.add(entry.id);
        });
      }
    });
  });

export const SolveCut = z.strictObject({ pieceId: z.string(), startNm: nm, lengthNm: positiveNm });

export const SolveLayout = z.strictObject({
  stockId: z.string(),
  repeat: z.int().min(1),
  cuts: z.array(SolveCut).min(1),
  leftoverNm: nm,
  keeps: z.boolean(),
});

export const SolveUnplaced = z.strictObject({
  pieceId: z.string(),
  quantity: z.int().min(1),
  reason: z.string(),
});

export const SolveGroupResult = z.strictObject({
  id: z.string(),
  outcome: z.enum(['proven', 'bounded', 'unplaceable']),
  /** Minor units before rounding, over the placed pieces. */
  netCostMinor: z.number(),
  boundMinor: z.number(),
  gap: z.number(),
  layouts: z.array(SolveLayout),
  unplaced: z.array(SolveUnplaced),
  counts: z.strictObject({
    bars: z.int(),
    newBars: z.int(),
    dropsUsed: z.int(),
    layouts: z.int(),
  }),
  work: z.strictObject({
    columns: z.int(),
    lpRuns: z.int(),
    dives: z.int(),
    enumerated: z.int(),
    elapsedMs: z.number(),
  }),
});

export const SolveResult = z.strictObject({ version: z.literal(1), groups: z.array(SolveGroupResult) });

export type SolveRequest = z.infer<typeof SolveRequest>;
export type SolveResult = z.infer<typeof SolveResult>;
export type SolveGroupResult = z.infer<typeof SolveGroupResult>;

/* The schemas and the plain types of the domain must not part; either line fails to compile when they do. */
type Same<A, B> = [A] extends [B] ? ([B] extends [A] ? true : never) : never;
/** @public */
export const REQUEST_IS_THE_DOMAIN_TYPE: Same<z.infer<typeof SolveRequest>, domain.SolveRequest> = true;
/** @public */
export const RESULT_IS_THE_DOMAIN_TYPE: Same<z.infer<typeof SolveResult>, domain.SolveResult> = true;
