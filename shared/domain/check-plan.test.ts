import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { checkPlan } from '#shared/domain/check-plan.ts';
import { findMoneyMakers } from '#shared/domain/money-makers.ts';
import type { SolveGroupResult, SolveRequest, SolveResult } from '#shared/domain/solve.ts';
import { SolveRequest as RequestSchema, SolveResult as ResultSchema } from '#shared/schemas/solve.ts';

const sample = RequestSchema.parse(
  JSON.parse(readFileSync(join(import.meta.dirname, '../../fixtures/solver/contract-sample.json'), 'utf8')),
);

/** The contract's own answer, worked by hand: 3 × 9727.61 + 7611.155 + 1465.635. */
const piece = (startNm: number) => ({ pieceId: 'p1', startNm, lengthNm: 1_828_800_000 });
const starts = [6_350_000, 1_835_150_000, 3_663_950_000];
const good: SolveResult = {
  version: 1,
  groups: [
    {
      id: 'L3x3x1/4|A36',
      outcome: 'proven',
      netCostMinor: 38259.62,
      boundMinor: 38259.62,
      gap: 0,
      layouts: [
        { stockId: 'n20', repeat: 3, cuts: starts.map(piece), leftoverNm: 603_250_000, keeps: false },
        {
          stockId: 'n20',
          repeat: 1,
          cuts: starts.slice(0, 2).map(piece),
          leftoverNm: 2_432_050_000,
          keeps: true,
        },
        {
          stockId: 'D-0412',
          repeat: 1,
          cuts: starts.slice(0, 1).map(piece),
          leftoverNm: 704_850_000,
          keeps: true,
        },
      ],
      unplaced: [],
      counts: { bars: 5, newBars: 4, dropsUsed: 1, layouts: 3 },
      work: { columns: 12, lpRuns: 6, dives: 1, enumerated: 40, elapsedMs: 20 },
    },
  ],
};

describe('check-plan', () => {
  it('accepts the contract’s own answer', () => {
    expect(checkPlan(sample, ResultSchema.parse(good))).toEqual([]);
  });

  const tampered = (change: (g: SolveGroupResult) => void): number => {
    const result = structuredClone(good);
    const [first] = result.groups;
    if (!first) throw new Error('the sample has a group');
    change(first);
    return checkPlan(sample, result).length;
  };
  const layout = (g: SolveGroupResult, i = 0) => {
    const found = g.layouts[i];
    if (!found) throw new Error('the sample has layouts');
    return found;
  };
  const cut = (g: SolveGroupResult) => {
    const [found] = layout(g).cuts;
    if (!found) throw new Error('the sample has cuts');
    return found;
  };

  it.each<[string, (g: SolveGroupResult) => void]>([
    ['a start moved by a nanometre', (g) => void cut(g).startNm++],
    ['a piece shortened', (g) => void cut(g).lengthNm--],
    ['an unknown piece', (g) => void (cut(g).pieceId = 'p2')],
    ['a cut dropped', (g) => void layout(g).cuts.pop()],
    ['a cut added', (g) => void layout(g).cuts.push(piece(5_492_750_000))],
    ['one bar more', (g) => void layout(g).repeat++],
    ['no bar at all', (g) => void (layout(g).repeat = 0)],
    ['half a bar', (g) => void (layout(g).repeat = 2.5)],
    ['a drop used twice', (g) => void (layout(g, 2).repeat = 2)],
    ['other stock', (g) => void (layout(g, 2).stockId = 'n20')],
    ['unknown stock', (g) => void (layout(g).stockId = 'n40')],
    ['a longer leftover', (g) => void layout(g).leftoverNm++],
    ['scrap called a drop', (g) => void (layout(g).keeps = true)],
    ['a drop called scrap', (g) => void (layout(g, 1).keeps = false)],
    ['a lower cost', (g) => void (g.netCostMinor -= 1)],
    ['a bound above the cost', (g) => void (g.boundMinor += 1)],
    ['a bound that is no number', (g) => void (g.boundMinor = Number.NaN)],
    ['a gap that is not there', (g) => void (g.gap = 0.01)],
    [
      'proven without proof',
      (g) => ((g.boundMinor = 30_000), (g.gap = (g.netCostMinor - 30_000) / g.netCostMinor)),
    ],
    ['called unplaceable', (g) => void (g.outcome = 'unplaceable')],
    [
      'a piece said to be unplaced',
      (g) => void g.unplaced.push({ pieceId: 'p1', quantity: 1, reason: 'none' }),
    ],
    ['wrong counts', (g) => void g.counts.newBars++],
    ['another group', (g) => void (g.id = 'other')],
    ['a layout left out', (g) => void g.layouts.pop()],
  ])('finds %s', (_name, change) => {
    expect(tampered(change)).toBeGreaterThan(0);
  });

  it('holds the clamp rule for the last cut in the order given', () => {
    const request: SolveRequest = {
      version: 1,
      seed: 1,
      timeLimitMs: 1000,
      groups: [
        {
          id: 'g',
          kind: 'linear',
          pieces: [
            { id: 'long', lengthNm: 700, quantity: 1 },
            { id: 'short', lengthNm: 200, quantity: 1 },
          ],
          stock: [{ id: 's', source: 'new', lengthNm: 1000, costMinor: 10, supply: null }],
          cutting: { kerfNm: 0, headCropNm: 0, tailCropNm: 0, holdDownNm: 300 },
          drops: { keepFromNm: 500, creditMinorPerM: 0, scrapMinorPerM: 0 },
        },
      ],
    };
    const plan = (order: readonly (readonly [string, number])[]): SolveResult => {
      let startNm = 0;
      const cuts = order.map(([pieceId, lengthNm]) => {
        const made = { pieceId, startNm, lengthNm };
        startNm += lengthNm;
        return made;
      });
      return {
        version: 1,
        groups: [
          {
            id: 'g',
            outcome: 'proven',
            netCostMinor: 10,
            boundMinor: 10,
            gap: 0,
            layouts: [{ stockId: 's', repeat: 1, cuts, leftoverNm: 100, keeps: false }],
            unplaced: [],
            counts: { bars: 1, newBars: 1, dropsUsed: 0, layouts: 1 },
            work: { columns: 0, lpRuns: 0, dives: 0, enumerated: 0, elapsedMs: 0 },
          },
        ],
      };
    };
    expect(
      checkPlan(
        request,
        plan([
          ['short', 200],
          ['long', 700],
        ]),
      ),
    ).toEqual([]);
    expect(
      checkPlan(
        request,
        plan([
          ['long', 700],
          ['short', 200],
        ]),
      ),
    ).toHaveLength(1);
  });
});

describe('requests that would make money', () => {
  it('are found by the stock they come from', () => {
    expect(findMoneyMakers(sample)).toEqual([]);
    const rich = structuredClone(sample);
    const [first] = rich.groups;
    if (first) first.drops.creditMinorPerM = 5000;
    expect(findMoneyMakers(rich).map(({ path }) => path)).toEqual([
      'groups.0.stock.0.costMinor',
      'groups.0.stock.1.costMinor',
    ]);
  });
});
