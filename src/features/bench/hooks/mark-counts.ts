import type { PlanView } from '#shared/schemas/plans.ts';

/** How many pieces of a part line the bars already cut have given, and how many the plan makes in all. */
export function markCounts(view: PlanView): ReadonlyMap<string, { cut: number; all: number }> {
  const counts = new Map<string, { cut: number; all: number }>();
  for (const bar of view.bars) {
    const layout = view.groups.find((group) => group.id === bar.groupId)?.result.layouts[bar.layout];
    for (const { pieceId } of layout?.cuts ?? []) {
      const count = counts.get(pieceId) ?? { cut: 0, all: 0 };
      counts.set(pieceId, { cut: count.cut + (bar.state === 'cut' ? 1 : 0), all: count.all + 1 });
    }
  }
  return counts;
}
