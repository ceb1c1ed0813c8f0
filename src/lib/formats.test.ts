import { describe, expect, it } from 'vitest';
import { agoWords, countOf, formatHeat, formatTag } from '#src/lib/formats.ts';

describe('formats', () => {
  it('says how long a drop has lain by calendar days, as the shop counts them', () => {
    const now = new Date(2026, 11, 1, 7, 0);
    expect(agoWords(new Date(2026, 11, 1, 6, 31).toISOString(), now)).toBe('today 06:31');
    expect(agoWords(new Date(2026, 10, 30, 23, 59).toISOString(), now)).toBe('yesterday 23:59');
    expect(agoWords(new Date(2026, 10, 5, 12, 0).toISOString(), now)).toBe('26 days');
  });

  it('writes a tag with four digits or more', () => {
    expect([formatTag(91), formatTag(12_345)]).toEqual(['D-0091', 'D-12345']);
  });

  it('says that a heat is unknown instead of leaving it blank', () => {
    expect([formatHeat(null), formatHeat('47K210')]).toEqual(['heat unknown', 'heat 47K210']);
  });

  it('counts in words', () => {
    expect([countOf(1, 'drop', 'drops'), countOf(0, 'drop', 'drops')]).toEqual(['1 drop', '0 drops']);
  });
});
