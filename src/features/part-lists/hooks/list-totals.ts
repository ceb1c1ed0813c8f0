import type { PartListLine } from '#shared/domain/part-list/types.ts';

/** Sums over the good lines: pieces, distinct sections, and mass in milligrams. */
export function listTotals(lines: readonly PartListLine[]): {
  pieces: number;
  sections: number;
  massMg: number;
} {
  let pieces = 0;
  let massMg = 0;
  for (const { quantity, pieceMassMg } of lines) {
    pieces += quantity;
    massMg += quantity * pieceMassMg;
  }
  return { pieces, massMg, sections: new Set(lines.map(({ stockKey }) => stockKey)).size };
}
