import { describe, expect, it } from 'vitest';
import type { Offer } from '#shared/schemas/yard.ts';
import { filterOffers } from '#src/features/buying/hooks/filter-offers.ts';

const offer = (id: number, section: string, grade: string, feet: number, supplierId = 1) =>
  ({ id, section, grade, supplierId, lengthNm: feet * 304_800_000, priceMinor: 9800 }) as Offer;

const OFFERS = [
  offer(1, 'L4x4x3/8', 'A36', 40),
  offer(2, 'L3x3x1/4', 'A36', 40, 2),
  offer(3, 'L3x3x1/4', 'A36', 20),
  offer(4, 'HSS2x2x3/16', 'A500C', 20),
];

describe('filterOffers', () => {
  it('orders by section, grade and length', () => {
    expect(filterOffers(OFFERS, { section: '', supplierId: null }).map(({ id }) => id)).toEqual([4, 3, 2, 1]);
  });

  it('finds a section however it is spaced or crossed', () => {
    expect(filterOffers(OFFERS, { section: 'l 3 × 3', supplierId: null }).map(({ id }) => id)).toEqual([
      3, 2,
    ]);
  });

  it('finds a grade and keeps to one supplier', () => {
    expect(filterOffers(OFFERS, { section: 'a500', supplierId: null }).map(({ id }) => id)).toEqual([4]);
    expect(filterOffers(OFFERS, { section: '', supplierId: 2 }).map(({ id }) => id)).toEqual([2]);
  });
});
