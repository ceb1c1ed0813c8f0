import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { billOf, ledgerOf, massesOf } from '#shared/domain/bill-of-stock.ts';
import { leftoverNm, usableNm } from '#shared/domain/layout-cost.ts';
import type { SolveGroup, SolveGroupResult } from '#shared/domain/solve.ts';

/** Any group with layouts that hold the layout rule; costs do not matter here. */
const cutGroup = fc
  .record({
    stockNm: fc.integer({ min: 2_000_000_000, max: 12_000_000_000 }),
    kerfNm: fc.integer({ min: 0, max: 5_000_000 }),
    headCropNm: fc.integer({ min: 0, max: 20_000_000 }),
    tailCropNm: fc.integer({ min: 0, max: 20_000_000 }),
    shares: fc.array(fc.integer({ min: 20_000_000, max: 400_000_000 }), { minLength: 1, maxLength: 4 }),
    repeat: fc.integer({ min: 1, max: 9 }),
    keepFromNm: fc.integer({ min: 1, max: 2_000_000_000 }),
    drop: fc.boolean(),
  })
  .map(({ stockNm, kerfNm, headCropNm, tailCropNm, shares, repeat, keepFromNm, drop }) => {
    const cutting = { kerfNm, headCropNm, tailCropNm, holdDownNm: 0 };
    const total = shares.reduce((a, b) => a + b);
    const left = leftoverNm(usableNm(stockNm, cutting), total, shares.length, cutting);
    const request: SolveGroup = {
      id: 'FB 1/2x6|A36',
      kind: 'linear',
      pieces: shares.map((lengthNm, i) => ({ id: `p${i}`, lengthNm, quantity: repeat })),
      stock: [{ id: 's', source: drop ? 'drop' : 'new', lengthNm: stockNm, costMinor: 1000, supply: null }],
      cutting,
      drops: { keepFromNm, creditMinorPerM: 0, scrapMinorPerM: 0 },
    };
    let startNm = headCropNm;
    const cuts = shares.map((lengthNm, i) => {
      const cut = { pieceId: `p${i}`, startNm, lengthNm };
      startNm += lengthNm + kerfNm;
      return cut;
    });
    const result: SolveGroupResult = {
      id: request.id,
      outcome: 'bounded',
      netCostMinor: 1000 * repeat,
      boundMinor: 0,
      gap: 1,
      layouts: [{ stockId: 's', repeat, cuts, leftoverNm: left, keeps: left > 0 && left >= keepFromNm }],
      unplaced: [],
      counts: { bars: repeat, newBars: drop ? 0 : repeat, dropsUsed: drop ? repeat : 0, layouts: 1 },
      work: { columns: 0, lpRuns: 0, dives: 0, enumerated: 0, elapsedMs: 0 },
    };
    return {
      id: request.id,
      stockKey: 'FB 1/2x6',
      section: 'FB 1/2x6',
      grade: 'A36',
      mgPerM: 15_186_000,
      request,
      result,
    };
  });

describe('bill of stock', () => {
  it('adds up to the nanometre: stock in is pieces, crops, kerf, drops and scrap', () => {
    fc.assert(
      fc.property(cutGroup, (group) => {
        const { stock, bought, fromRack, pieces, crops, kerf, drops, scrap } = ledgerOf(group);
        expect(pieces + crops + kerf + drops + scrap).toBe(stock);
        expect(bought + fromRack).toBe(stock);
        for (const part of [pieces, crops, kerf, drops, scrap]) expect(part).toBeGreaterThanOrEqual(0);
      }),
    );
  });
  it('bills every bar once and weighs what it bills', () => {
    fc.assert(
      fc.property(cutGroup, (group) => {
        const [line] = billOf([group]);
        expect(line).toMatchObject({
          bars: group.result.counts.bars,
          costMinor: 1000 * group.result.counts.bars,
        });
        const masses = massesOf([group]);
        expect(Math.abs(masses.stock - (line?.massMg ?? 0))).toBeLessThanOrEqual(group.result.counts.bars);
        expect(masses.yield).toBeGreaterThan(0);
        expect(masses.yield).toBeLessThanOrEqual(1);
      }),
    );
  });
});
