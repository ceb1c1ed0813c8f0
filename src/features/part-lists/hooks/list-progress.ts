import type { PartLine } from '#shared/schemas/jobs.ts';

export type ListProgress = { readonly pieces: number; readonly planned: number; readonly cut: number };

/** Pieces of each part list with what is planned and cut of them, from the lines of the whole job. */
export function progressByList(
  lines: readonly Pick<PartLine, 'partListId' | 'quantity' | 'planned' | 'cut'>[],
): Map<number, ListProgress> {
  const lists = new Map<number, ListProgress>();
  for (const { partListId, quantity, planned, cut } of lines) {
    const so = lists.get(partListId) ?? { pieces: 0, planned: 0, cut: 0 };
    lists.set(partListId, {
      pieces: so.pieces + quantity,
      planned: so.planned + planned,
      cut: so.cut + cut,
    });
  }
  return lists;
}
