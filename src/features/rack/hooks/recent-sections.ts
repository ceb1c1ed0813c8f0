import type { Drop } from '#shared/schemas/rack.ts';

const MOST_RECENT = 4;

/** Sections lately racked, newest first, each once with the grade it last had. */
export function recentSections(drops: readonly Drop[]): { section: string; grade: string }[] {
  const newest = [...drops].sort((a, b) => b.loggedAt.localeCompare(a.loggedAt) || b.tag - a.tag);
  const grades = new Map<string, string>();
  for (const drop of newest) if (!grades.has(drop.section)) grades.set(drop.section, drop.grade);
  return [...grades].slice(0, MOST_RECENT).map(([section, grade]) => ({ section, grade }));
}

export function latelyRacked(drops: readonly Drop[], count: number): Drop[] {
  return [...drops].sort((a, b) => b.loggedAt.localeCompare(a.loggedAt) || b.tag - a.tag).slice(0, count);
}
