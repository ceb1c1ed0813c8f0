/** Puts labels into as few rows as keep them apart: each goes to the first row whose last label ends before it begins. */
export type Label = { readonly at: number; readonly width: number };
export type Placed = { readonly left: number; readonly row: number };

/** Labels are centred on `at` and pushed inside [from, to]; given left to right. */
export function stagger(labels: readonly Label[], from: number, to: number, gap: number): Placed[] {
  const ends: number[] = [];
  return labels.map(({ at, width }) => {
    const left = Math.max(from, Math.min(to - width, at - width / 2));
    let row = ends.findIndex((end) => end + gap <= left);
    if (row < 0) row = ends.length;
    ends[row] = left + width;
    return { left, row };
  });
}
