import { describe, expect, it } from 'vitest';
import type { Drop } from '#shared/schemas/rack.ts';
import { recentSections } from '#src/features/rack/hooks/recent-sections.ts';

const drop = (tag: number, section: string, grade: string, day: number) =>
  ({ tag, section, grade, loggedAt: `2026-11-${String(day).padStart(2, '0')}T08:00:00.000Z` }) as Drop;

describe('recentSections', () => {
  it('offers each section once, newest first, with the grade it last had', () => {
    const drops = [
      drop(1, 'L3x3x1/4', 'A36', 3),
      drop(2, 'FB 3/8x4', 'A36', 5),
      drop(3, 'L3x3x1/4', 'A572-50', 9),
    ];
    expect(recentSections(drops)).toEqual([
      { section: 'L3x3x1/4', grade: 'A572-50' },
      { section: 'FB 3/8x4', grade: 'A36' },
    ]);
  });

  it('offers four at most, so that they fit under one thumb', () => {
    const drops = ['C6x8.2', 'RB 3/4', 'SQ 1/2', 'W8x18', 'PIPE 2 STD'].map((section, i) =>
      drop(i, section, '', i + 1),
    );
    expect(recentSections(drops)).toHaveLength(4);
  });
});
