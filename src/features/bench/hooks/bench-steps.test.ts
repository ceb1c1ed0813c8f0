import { describe, expect, it } from 'vitest';
import { NM_PER_FOOT, NM_PER_INCH } from '#shared/domain/units.ts';
import type { PlanGroup, PlanView } from '#shared/schemas/plans.ts';
import { benchBar } from '#src/features/bench/hooks/bench-steps.ts';
import { markCounts } from '#src/features/bench/hooks/mark-counts.ts';

const CROP = NM_PER_INCH / 4;
const SIX_FEET = 6 * NM_PER_FOOT;

const piece = (id: number, mark: string, lengthNm: number) => ({
  id: String(id),
  partLineId: id,
  mark,
  jobNumber: '2407',
  partListName: 'stairs',
  revision: 'C',
  row: id,
  lengthNm,
  quantity: 4,
  pieceMassMg: 13_300_000,
});

function groupWith(tailCropNm: number, stockFeet: number): PlanGroup {
  return {
    id: 'L3x3x1/4|A36',
    section: 'L3x3x1/4',
    stockKey: 'L3x3x1/4',
    family: 'angle',
    grade: 'A36',
    mgPerM: 7_290_000,
    pieces: [piece(1, 'B-104', SIX_FEET), piece(2, 'B-107', 5 * NM_PER_FOOT)],
    stock: [
      {
        stockId: 'offer:1',
        source: 'new',
        lengthNm: stockFeet * NM_PER_FOOT,
        costMinor: 9800,
        supplierName: 'Cold Fork',
        drop: null,
      },
    ],
    request: {
      id: 'L3x3x1/4|A36',
      kind: 'linear',
      pieces: [],
      stock: [],
      cutting: { kerfNm: 0, headCropNm: CROP, tailCropNm, holdDownNm: 0 },
      drops: { keepFromNm: NM_PER_FOOT, creditMinorPerM: 0, scrapMinorPerM: 0 },
    },
    result: {
      id: 'L3x3x1/4|A36',
      outcome: 'proven',
      netCostMinor: 0,
      boundMinor: 0,
      gap: 0,
      layouts: [
        {
          stockId: 'offer:1',
          repeat: 2,
          cuts: [
            { pieceId: '1', startNm: CROP, lengthNm: SIX_FEET },
            { pieceId: '1', startNm: CROP + SIX_FEET, lengthNm: SIX_FEET },
            { pieceId: '2', startNm: CROP + 2 * SIX_FEET, lengthNm: 5 * NM_PER_FOOT },
          ],
          leftoverNm: 3 * NM_PER_FOOT - CROP - tailCropNm,
          keeps: true,
        },
      ],
      unplaced: [],
      counts: { bars: 2, newBars: 2, dropsUsed: 0, layouts: 1 },
      work: { columns: 0, lpRuns: 0, dives: 0, enumerated: 0, elapsedMs: 0 },
    },
  };
}

describe('benchBar', () => {
  it('squares the end, then reads stop from the piece and tape from the datum', () => {
    const bar = benchBar(groupWith(0, 20), 0);
    expect(bar?.steps.map(({ kind, stopNm, tapeNm }) => [kind, stopNm, tapeNm])).toEqual([
      ['crop', CROP, CROP],
      ['piece', SIX_FEET, CROP + SIX_FEET],
      ['piece', SIX_FEET, CROP + 2 * SIX_FEET],
      ['piece', 5 * NM_PER_FOOT, CROP + 17 * NM_PER_FOOT],
    ]);
  });

  it('says when the stop stands already, so that nobody sets it twice', () => {
    const steps = benchBar(groupWith(0, 20), 0)?.steps ?? [];
    expect(steps.map((step) => step.kind === 'piece' && step.sameStop)).toEqual([false, false, true, false]);
  });

  it('squares the far end last, measured back from it', () => {
    const steps = benchBar(groupWith(NM_PER_INCH, 20), 0)?.steps ?? [];
    expect(steps.at(-1)).toEqual({
      kind: 'tail',
      stopNm: NM_PER_INCH,
      tapeNm: 20 * NM_PER_FOOT - NM_PER_INCH,
    });
  });

  it('asks for no cut where the last piece ends with the bar', () => {
    const group = groupWith(0, 20);
    const stock = group.stock[0];
    if (!stock) throw new Error('the group has a stock');
    stock.lengthNm = CROP + 17 * NM_PER_FOOT;
    expect(benchBar(group, 0)?.steps.at(-1)).toMatchObject({ kind: 'piece', parts: false });
  });

  it('answers null for a layout the plan does not have', () => {
    expect(benchBar(groupWith(0, 20), 7)).toBeNull();
  });
});

describe('markCounts', () => {
  it('counts the pieces of each part line over all bars and those already cut', () => {
    const group = groupWith(0, 20);
    const bar = (id: number, state: 'waiting' | 'cut') => ({
      id,
      groupId: group.id,
      layout: 0,
      number: id,
      state,
    });
    const view = { groups: [group], bars: [bar(1, 'cut'), bar(2, 'waiting')] } as unknown as PlanView;
    expect(Object.fromEntries(markCounts(view))).toEqual({
      '1': { cut: 2, all: 4 },
      '2': { cut: 1, all: 2 },
    });
  });
});
