import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { creditMinorPerM, dropCostMinor, scrapMinorPerM, usualKeepFromNm } from '#shared/domain/drop-rule.ts';
import { findMoneyMakers } from '#shared/domain/money-makers.ts';
import { FAMILIES } from '#shared/domain/section/types.ts';
import { NM_PER_FOOT, NM_PER_M } from '#shared/domain/units.ts';

/** Up to a million in minor units a bar, between a hand and a barge long. */
const price = fc.record({
  costMinor: fc.integer({ min: 0, max: 100_000_000 }),
  lengthNm: fc.integer({ min: 1, max: 30 * NM_PER_M }),
});
const percent = fc.integer({ min: 0, max: 100 });

describe('what a drop is worth', () => {
  it('takes the share of the cheapest price a metre', () => {
    // Worked by hand: 20 ft at 98.00 is 1607.61… cents a metre, 40 ft at 190.00 is 1558.39…; half of the cheaper, rounded down.
    const prices = [
      { lengthNm: 20 * NM_PER_FOOT, costMinor: 9800 },
      { lengthNm: 40 * NM_PER_FOOT, costMinor: 19_000 },
    ];
    expect(creditMinorPerM(prices, 50)).toBe(779);
    expect(creditMinorPerM(prices, 100)).toBe(1558);
    expect(creditMinorPerM([], 50)).toBe(0);
    expect(dropCostMinor(2_540_000_000, 779)).toBe(1979);
    // 200.00 for 1000 kg is 20 cents a kg; at 7.292 kg/m 145.84 cents a metre.
    expect(scrapMinorPerM(20_000, 7_292_000, 779)).toBe(145);
    expect(scrapMinorPerM(20_000, 7_292_000, 100)).toBe(100);
  });

  it('never credits a whole bar with more than it cost', () => {
    fc.assert(
      fc.property(fc.array(price, { minLength: 1, maxLength: 6 }), percent, (prices, share) => {
        const credit = BigInt(creditMinorPerM(prices, share));
        for (const { costMinor, lengthNm } of prices)
          expect(credit * BigInt(lengthNm) <= BigInt(costMinor) * BigInt(NM_PER_M)).toBe(true);
      }),
    );
  });

  it('never lets a plan earn money by cutting, new bars and racked drops alike', () => {
    fc.assert(
      fc.property(
        fc.array(price, { minLength: 1, maxLength: 4 }),
        percent,
        fc.array(fc.integer({ min: 1, max: 12 * NM_PER_M }), { maxLength: 4 }),
        fc.integer({ min: 1, max: 6 * NM_PER_M }),
        fc.integer({ min: 0, max: 1_000_000 }),
        fc.integer({ min: 0, max: 3 * NM_PER_M }),
        (prices, share, drops, pieceNm, scrapPerTonne, keepFromNm) => {
          const credit = creditMinorPerM(prices, share);
          const faults = findMoneyMakers({
            version: 1,
            seed: 1,
            timeLimitMs: 1,
            groups: [
              {
                id: 'g',
                kind: 'linear',
                pieces: [{ id: 'p', lengthNm: pieceNm, quantity: 1 }],
                stock: [
                  ...prices.map((entry, i) => ({
                    id: `n${i}`,
                    source: 'new' as const,
                    supply: null,
                    ...entry,
                  })),
                  ...drops.map((lengthNm, i) => ({
                    id: `d${i}`,
                    source: 'drop' as const,
                    supply: 1,
                    lengthNm,
                    costMinor: dropCostMinor(lengthNm, credit),
                  })),
                ],
                cutting: { kerfNm: 0, headCropNm: 0, tailCropNm: 0, holdDownNm: 0 },
                drops: {
                  keepFromNm,
                  creditMinorPerM: credit,
                  scrapMinorPerM: scrapMinorPerM(scrapPerTonne, 7_292_000, credit),
                },
              },
            ],
          });
          expect(faults).toEqual([]);
        },
      ),
    );
  });

  it('keeps beams from a greater length than flats', () => {
    for (const family of FAMILIES) expect(usualKeepFromNm(family)).toBeGreaterThanOrEqual(NM_PER_FOOT);
    expect(usualKeepFromNm('beam')).toBeGreaterThan(usualKeepFromNm('flat'));
  });
});
