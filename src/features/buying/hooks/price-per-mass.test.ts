import { describe, expect, it } from 'vitest';
import { pricePerMass } from '#src/features/buying/hooks/price-per-mass.ts';

describe('pricePerMass', () => {
  // 98 lb of L3x3x1/4 (4.9 lb/ft by the handbook, 20 ft) for 98.00 is one dollar a pound.
  it('is 1.000 for a bar of 98 lb at 98.00', () => {
    expect(pricePerMass(9800, Math.round(98 * 453_592.37), 'imperial', 'USD')).toBe('1.000');
  });

  it('goes by the kilogram in a metric shop', () => {
    expect(pricePerMass(12_500, 100_000_000, 'metric', 'EUR')).toBe('1.250');
  });

  it('knows currencies without a minor unit', () => {
    expect(pricePerMass(15_000, 100_000_000, 'metric', 'JPY')).toBe('150.0');
  });

  it('says nothing of a bar without mass', () => {
    expect(pricePerMass(9800, 0, 'imperial', 'USD')).toBe('');
  });
});
