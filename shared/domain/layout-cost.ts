/**
 * The rule of one layout (SOLVER contract): what fits, what is left, what may be clamped, what it costs. Lengths in whole nanometres;
 * costs exact in billionths of a minor unit, because a credit is minor units a metre times nanometres.
 */
import type { SolveCutting, SolveDropRule, SolveStock } from '#shared/domain/solve.ts';

/** Length between the crops; negative when the crops eat the bar. */
export const usableNm = (stockNm: number, { headCropNm, tailCropNm }: SolveCutting): number =>
  stockNm - headCropNm - tailCropNm;

/** True when pieces of this total length fit: the last kerf may run off the end. */
export const fits = (usable: number, totalNm: number, pieces: number, { kerfNm }: SolveCutting): boolean =>
  pieces > 0 && totalNm + (pieces - 1) * kerfNm <= usable;

/** What is left after the last kerf. */
export const leftoverNm = (
  usable: number,
  totalNm: number,
  pieces: number,
  { kerfNm }: SolveCutting,
): number => Math.max(0, usable - totalNm - pieces * kerfNm);

/** The last cut must leave something to clamp: nothing at all, a leftover under the hold-down, or a last piece that reaches it. */
export const canClamp = (leftover: number, lastPieceNm: number, { holdDownNm }: SolveCutting): boolean =>
  leftover === 0 || leftover >= holdDownNm || lastPieceNm >= holdDownNm;

/** A leftover of nothing keeps nothing. */
export const keepsDrop = (leftover: number, { keepFromNm }: SolveDropRule): boolean =>
  leftover > 0 && leftover >= keepFromNm;

/** Credit a metre for a leftover, in minor units. */
export const creditRate = (leftover: number, drops: SolveDropRule): number =>
  keepsDrop(leftover, drops) ? drops.creditMinorPerM : drops.scrapMinorPerM;

/** Credit in minor units, as a double: for searching. */
export const creditMinor = (leftover: number, drops: SolveDropRule): number =>
  (creditRate(leftover, drops) * leftover) / 1e9;

/** Net cost of one bar, exact, in billionths of a minor unit: for stating and checking. */
export const layoutCostBillionths = (
  stock: Pick<SolveStock, 'costMinor'>,
  leftover: number,
  drops: SolveDropRule,
): bigint =>
  BigInt(stock.costMinor) * 1_000_000_000n - BigInt(creditRate(leftover, drops)) * BigInt(leftover);

/** Exact billionths as minor units. */
export const billionthsToMinor = (billionths: bigint): number => {
  const whole = billionths / 1_000_000_000n;
  return Number(whole) + Number(billionths - whole * 1_000_000_000n) / 1e9;
};
