import type { PlanGroup, PlanPiece, PlanStock } from '#shared/schemas/plans.ts';

/** One setting of the machine. `stopNm` is the gauge, `tapeNm` the running measure from the datum end; nanometres. */
export type BenchStep =
  | { kind: 'crop'; stopNm: number; tapeNm: number }
  | {
      kind: 'piece';
      stopNm: number;
      tapeNm: number;
      piece: PlanPiece;
      /** Position of the cut in the layout, from 0. */
      cut: number;
      /** False when the piece ends where the bar ends: nothing is left to cut off. */
      parts: boolean;
      /** The stop stands there already from the cut before. */
      sameStop: boolean;
    }
  | { kind: 'tail'; stopNm: number; tapeNm: number };

export type BenchBar = {
  stock: PlanStock;
  steps: readonly BenchStep[];
  leftoverNm: number;
  keeps: boolean;
  repeat: number;
};

/**
 * The layout of one bar as the operator works it: square the first end, the pieces in order, square the far end.
 * Null when the plan does not hold what the bar names, which the server never sends.
 */
export function benchBar(group: PlanGroup, layoutIndex: number): BenchBar | null {
  const layout = group.result.layouts[layoutIndex];
  const stock = group.stock.find((entry) => entry.stockId === layout?.stockId);
  if (!layout || !stock) return null;
  const { headCropNm, tailCropNm } = group.request.cutting;
  const pieces = new Map(group.pieces.map((piece) => [piece.id, piece]));
  const steps: BenchStep[] = [];
  if (headCropNm > 0) steps.push({ kind: 'crop', stopNm: headCropNm, tapeNm: headCropNm });
  let stopNm: number | null = null;
  for (const [cut, { pieceId, startNm, lengthNm }] of layout.cuts.entries()) {
    const piece = pieces.get(pieceId);
    if (!piece) return null;
    const tapeNm = startNm + lengthNm;
    steps.push({
      kind: 'piece',
      stopNm: lengthNm,
      tapeNm,
      piece,
      cut,
      parts: tapeNm < stock.lengthNm,
      sameStop: stopNm === lengthNm,
    });
    stopNm = lengthNm;
  }
  if (tailCropNm > 0) steps.push({ kind: 'tail', stopNm: tailCropNm, tapeNm: stock.lengthNm - tailCropNm });
  return { stock, steps, leftoverNm: layout.leftoverNm, keeps: layout.keeps, repeat: layout.repeat };
}
