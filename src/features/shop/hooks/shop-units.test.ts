import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  massToUnits,
  scrapPerTonne,
  scrapPerUnit,
  unitsToMass,
} from '#src/features/shop/hooks/shop-units.ts';

describe('handling mass', () => {
  // International pound, agreement of 1959: 0.453 592 37 kg exactly.
  it('is 22 679 618.5 mg for 50 lb, rounded to whole milligrams', () => {
    expect(unitsToMass(50, 'imperial')).toBe(22_679_619);
  });

  it('shows the whole number that was typed', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 2000 }),
        fc.constantFrom('imperial', 'metric'),
        (whole, units) => {
          expect(massToUnits(unitsToMass(whole, units), units)).toBe(whole);
        },
      ),
    );
  });
});

describe('scrap price', () => {
  // 100 lb = 45.359 237 kg, so 8.00 for it is 176.37 a tonne.
  it('turns 8.00 per 100 lb into 176.37 per 1000 kg', () => {
    expect(scrapPerTonne(800, 'imperial')).toBe(17_637);
  });

  it('shows the amount that was typed, in both units', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 10_000_000 }),
        fc.constantFrom('imperial', 'metric'),
        (minor, units) => {
          expect(scrapPerUnit(scrapPerTonne(minor, units), units)).toBe(minor);
        },
      ),
    );
  });
});
