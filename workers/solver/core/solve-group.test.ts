import fc from 'fast-check';
import loadHighs, { type Highs } from 'highs';
import Solver from 'javascript-lp-solver';
import { beforeAll, describe, expect, it } from 'vitest';
import { checkPlan } from '#shared/domain/check-plan.ts';
import type { SolveCutting, SolveDropRule, SolveGroup, SolveGroupResult } from '#shared/domain/solve.ts';
import { NM_PER_FOOT, NM_PER_INCH } from '#shared/domain/units.ts';
import { asGroup, readInstances } from '#tests/support/literature.ts';
import { solveGroup } from '#workers/solver/core/index.ts';
import { columnKey, makeColumn, makeProblem, type Column } from '#workers/solver/core/problem.ts';

let highs: Highs;
beforeAll(async () => {
  highs = await loadHighs();
});

const SHEAR: SolveCutting = { kerfNm: 0, headCropNm: 0, tailCropNm: 0, holdDownNm: 0 };
const SAW: SolveCutting = { ...SHEAR, kerfNm: NM_PER_INCH / 8 };
const NO_CREDIT: SolveDropRule = { keepFromNm: NM_PER_FOOT, creditMinorPerM: 0, scrapMinorPerM: 0 };

function solve(group: SolveGroup, timeLimitMs = 30_000): SolveGroupResult {
  const result = solveGroup(group, { seed: 1, timeLimitMs }, { highs, now: () => performance.now() });
  const request = { version: 1 as const, seed: 1, timeLimitMs, groups: [group] };
  expect(checkPlan(request, { version: 1, groups: [result] })).toEqual([]);
  expect(result.boundMinor).toBeLessThanOrEqual(result.netCostMinor);
  return result;
}

const inches = (feet: number, inch = 0) => Math.round(feet * NM_PER_FOOT + inch * NM_PER_INCH);
function group(
  pieces: [nm: number, quantity: number][],
  stock: [nm: number, cost: number, supply?: number][],
  cutting = SHEAR,
  drops = NO_CREDIT,
): SolveGroup {
  return {
    id: 'g',
    kind: 'linear',
    pieces: pieces.map(([lengthNm, quantity], i) => ({ id: `p${i}`, lengthNm, quantity })),
    stock: stock.map(([lengthNm, costMinor, supply], i) => ({
      id: `s${i}`,
      source: supply === undefined ? 'new' : 'drop',
      lengthNm,
      costMinor,
      supply: supply ?? null,
    })),
    cutting,
    drops,
  };
}

describe('worked examples C1–C8 (fixtures/trade/worked-examples.csv, proved by exhaustive search)', () => {
  const bar20: [number, number] = [inches(20), 100];
  it('C1: kerf changes the count', () => {
    const pieces: [number, number][] = [
      [inches(8, 4), 3],
      [inches(6, 8), 3],
      [inches(5), 3],
    ];
    const shear = solve(group(pieces, [bar20]));
    expect(shear).toMatchObject({ outcome: 'proven', counts: { bars: 3 } });
    expect(shear.layouts.every(({ leftoverNm }) => leftoverNm === 0)).toBe(true);
    expect(solve(group(pieces, [bar20], SAW))).toMatchObject({ outcome: 'proven', counts: { bars: 4 } });
  });
  it('C2: longest first is not best', () => {
    expect(
      solve(
        group(
          [
            [inches(8, 4), 1],
            [inches(6, 8), 3],
            [inches(5, 10), 2],
          ],
          [bar20],
        ),
      ),
    ).toMatchObject({ outcome: 'proven', counts: { bars: 2 } });
  });
  it('C3: metric, saw 2.5 mm', () => {
    const mm = 1_000_000;
    const cutting = { ...SHEAR, kerfNm: 2_500_000 };
    expect(
      solve(
        group(
          [
            [2450 * mm, 2],
            [1100 * mm, 3],
            [1700 * mm, 2],
          ],
          [[6000 * mm, 100]],
          cutting,
        ),
      ),
    ).toMatchObject({ outcome: 'proven', counts: { bars: 2 } });
  });
  it('C4: the length floor cannot always be met', () => {
    expect(solve(group([[inches(11), 4]], [bar20]))).toMatchObject({
      outcome: 'proven',
      counts: { bars: 4 },
    });
  });
  it('C5: 20 and 40 ft at one price a foot', () => {
    const result = solve(
      group(
        [[inches(13), 4]],
        [
          [inches(20), 2000],
          [inches(40), 4000],
        ],
      ),
    );
    expect(result).toMatchObject({ outcome: 'proven', netCostMinor: 6000, counts: { bars: 2 } });
  });
  it('C6: trims and kerf: six pieces, 25 5/8 in left after the sixth kerf, end trim still in it', () => {
    // A crop includes its own cut: 1/2 in of trim and 1/8 in of kerf at the head; the tail's cut is the sixth piece's.
    const cutting = {
      kerfNm: NM_PER_INCH / 8,
      headCropNm: (5 * NM_PER_INCH) / 8,
      tailCropNm: NM_PER_INCH / 2,
      holdDownNm: 0,
    };
    const result = solve(group([[inches(0, 35.5), 6]], [bar20], cutting));
    expect(result.counts.bars).toBe(1);
    expect((result.layouts[0]?.leftoverNm ?? 0) + cutting.tailCropNm).toBe(inches(0, 25.625));
    expect(solve(group([[inches(0, 35.5), 7]], [bar20], cutting)).counts.bars).toBe(2);
  });
  it('C7: the rack first', () => {
    const pieces: [number, number][] = [
      [inches(9), 2],
      [inches(11), 1],
    ];
    const stock: [number, number, number?][] = [
      [inches(20), 1000],
      [inches(9, 2), 1, 1],
    ];
    expect(solve(group(pieces, stock))).toMatchObject({
      outcome: 'proven',
      counts: { newBars: 1, dropsUsed: 1 },
    });
    expect(solve(group(pieces, stock, SAW))).toMatchObject({ outcome: 'proven', counts: { newBars: 2 } });
  });
  it('C8: two bars either way; a credit for drops from 3 ft takes the longer ones', () => {
    const pieces: [number, number][] = [
      [inches(9), 2],
      [inches(5), 2],
    ];
    expect(solve(group(pieces, [bar20]))).toMatchObject({ outcome: 'proven', counts: { bars: 2 } });
    const rule = { keepFromNm: inches(3), creditMinorPerM: 5, scrapMinorPerM: 0 };
    // 2' of scrap and 10' kept, or 6' and 6' kept: the second is worth more.
    expect(solve(group(pieces, [bar20], SHEAR, rule)).layouts.map(({ leftoverNm }) => leftoverNm)).toEqual([
      inches(6),
    ]);
  });
});

describe('textbook and published instances', () => {
  it('Chvátal, Linear Programming (1983), ch. 13: LP 452.25, 453 raws', () => {
    const result = solve(
      asGroup({
        name: 'chvatal',
        capacity: 100,
        items: [
          [45, 97],
          [36, 610],
          [31, 395],
          [14, 211],
        ],
      }),
    );
    expect(result).toMatchObject({ outcome: 'proven', counts: { bars: 453 } });
  });
  it('the 5600 mm paper rolls, widely reprinted: 73 rolls', () => {
    const items: [number, number][] = [
      [1380, 22],
      [1520, 25],
      [1560, 12],
      [1710, 14],
      [1820, 18],
      [1880, 18],
      [1930, 20],
      [2000, 10],
      [2050, 12],
      [2100, 14],
      [2140, 16],
      [2150, 18],
      [2200, 20],
    ];
    expect(solve(asGroup({ name: 'rolls', capacity: 5600, items }))).toMatchObject({
      outcome: 'proven',
      counts: { bars: 73 },
    });
  });
  it.each(['U120', 'U250', 'U500', 'T120', 'Waescher'])(
    '%s: the first two at the published optimum, proven',
    (set) => {
      for (const instance of readInstances(set).slice(0, 2)) {
        const result = solve(asGroup(instance), 60_000);
        expect(result.counts.bars, instance.name).toBe(instance.optimum);
        expect(result.outcome, instance.name).toBe('proven');
      }
    },
  );
});

/** Every layout of a small group, not only maximal ones: a drop has a value. */
function everyColumn(small: SolveGroup): Column[] {
  const problem = makeProblem(small);
  const columns = new Map<string, Column>();
  problem.stocks.forEach((_, s) => {
    const visit = (i: number, counts: Map<number, number>) => {
      if (i === problem.items.length) {
        const column = makeColumn(problem, s, counts);
        if (column) columns.set(columnKey(column), column);
        return;
      }
      for (let k = 0; k <= (problem.items[i]?.demand ?? 0); k++) visit(i + 1, new Map([...counts, [i, k]]));
    };
    visit(0, new Map());
  });
  return [...columns.values()];
}

function completeModel(small: SolveGroup) {
  const problem = makeProblem(small);
  const columns = everyColumn(small);
  const constraints: Record<string, { equal: number } | { max: number }> = {};
  problem.items.forEach(({ demand }, i) => (constraints[`i${i}`] = { equal: demand }));
  problem.stocks.forEach(({ supply }, s) => {
    if (Number.isFinite(supply)) constraints[`s${s}`] = { max: supply };
  });
  const variables: Record<string, Record<string, number>> = {};
  columns.forEach((column, c) => {
    const row: Record<string, number> = { cost: column.cost, [`s${column.stock}`]: 1 };
    column.items.forEach((item, j) => (row[`i${item}`] = column.counts[j] ?? 0));
    variables[`x${c}`] = row;
  });
  return { problem, columns, constraints, variables };
}

/** The complete integer model in HiGHS, through its text interface: none of the solver's own code but the layout rule. */
function bestByHighs(small: SolveGroup): number | null {
  const { constraints, variables } = completeModel(small);
  const names = Object.keys(variables);
  if (names.length === 0) return null;
  const sum = (key: string) =>
    names.flatMap((name) => (variables[name]?.[key] ? [`${variables[name][key]} ${name}`] : [])).join(' + ');
  const rows = Object.entries(constraints).map(([key, bound], r) => {
    const left = sum(key);
    return left === ''
      ? null
      : ` r${r}: ${left} ${'equal' in bound ? `= ${bound.equal}` : `<= ${bound.max}`}`;
  });
  if (Object.entries(constraints).some(([key, bound]) => 'equal' in bound && sum(key) === '')) return null;
  const text = `Minimize\n obj: ${sum('cost') || `0 ${names[0]}`}\nSubject To\n${rows.filter(Boolean).join('\n')}\nGeneral\n ${names.join(' ')}\nEnd`;
  const answer = highs.solve(text, { mip_rel_gap: 0, mip_abs_gap: 1e-9 });
  return answer.Status === 'Optimal' ? answer.ObjectiveValue : null;
}

const smallGroup = fc
  .record({
    pieces: fc.uniqueArray(fc.integer({ min: 4, max: 40 }), { minLength: 1, maxLength: 4 }),
    quantities: fc.array(fc.integer({ min: 1, max: 3 }), { minLength: 4, maxLength: 4 }),
    bars: fc.uniqueArray(fc.integer({ min: 41, max: 80 }), { minLength: 1, maxLength: 2 }),
    racked: fc.array(fc.integer({ min: 10, max: 60 }), { maxLength: 3 }),
    kerf: fc.constantFrom(0, 1, 2),
    crop: fc.constantFrom(0, 1),
    hold: fc.constantFrom(0, 0, 6, 12),
    credit: fc.constantFrom(0, 0, 3, 6),
    keep: fc.integer({ min: 8, max: 25 }),
  })
  .map(({ pieces, quantities, bars, racked, kerf, crop, hold, credit, keep }): SolveGroup => {
    const unit = 100_000_000;
    return {
      id: 'small',
      kind: 'linear',
      pieces: pieces.map((length, i) => ({
        id: `p${i}`,
        lengthNm: length * unit,
        quantity: quantities[i] ?? 1,
      })),
      stock: [
        ...bars.map((length, i) => ({
          id: `n${i}`,
          source: 'new' as const,
          lengthNm: length * unit,
          costMinor: length * 10 + i,
          supply: null,
        })),
        ...racked.map((length, i) => ({
          id: `d${i}`,
          source: 'drop' as const,
          lengthNm: length * unit,
          costMinor: length * 7,
          supply: 1,
        })),
      ],
      cutting: { kerfNm: kerf * unit, headCropNm: crop * unit, tailCropNm: 0, holdDownNm: hold * unit },
      drops: { keepFromNm: keep * unit, creditMinorPerM: credit * 10, scrapMinorPerM: credit },
    };
  });

describe('against the complete model', () => {
  it('HiGHS over every layout finds nothing cheaper, and the bound holds', () => {
    fc.assert(
      fc.property(smallGroup, (small) => {
        const result = solve(small, 20_000);
        const best = bestByHighs(small);
        if (best === null) {
          expect(result.outcome).toBe('unplaceable');
          return;
        }
        if (result.outcome === 'unplaceable') return;
        expect(result.netCostMinor).toBeGreaterThanOrEqual(best - 1e-6);
        expect(result.boundMinor).toBeLessThanOrEqual(best + 1e-6);
        expect(result.netCostMinor).toBeLessThanOrEqual(best * 1.000001 + 1e-6);
      }),
      { numRuns: 60, seed: 7 },
    );
  });
  it('javascript-lp-solver, a second opinion, agrees on very small ones', () => {
    fc.assert(
      fc.property(smallGroup, (small) => {
        const tiny = { ...small, pieces: small.pieces.slice(0, 2), stock: small.stock.slice(0, 2) };
        const result = solve(tiny, 20_000);
        const { constraints, variables } = completeModel(tiny);
        const names = Object.keys(variables);
        if (result.outcome === 'unplaceable' || names.length === 0 || names.length > 40) return;
        const answer = Solver.Solve({
          optimize: 'cost',
          opType: 'min',
          constraints,
          variables,
          ints: Object.fromEntries(names.map((name) => [name, 1])),
        }) as { feasible: boolean; result: number };
        expect(answer.feasible).toBe(true);
        expect(result.netCostMinor).toBeCloseTo(answer.result, 4);
      }),
      { numRuns: 25, seed: 11 },
    );
  });
});

describe('degenerate requests', () => {
  it('nothing wanted, nothing to cut from', () => {
    expect(solve(group([], [[100, 1]]))).toMatchObject({ outcome: 'proven', netCostMinor: 0, layouts: [] });
    expect(solve(group([[100, 0]], [[100, 1]]))).toMatchObject({ outcome: 'proven', layouts: [] });
    expect(solve(group([[100, 3]], []))).toMatchObject({
      outcome: 'unplaceable',
      unplaced: [{ pieceId: 'p0', quantity: 3, reason: 'no stock is given' }],
    });
  });
  it('a piece as long as the bar, one a nanometre longer, a kerf longer than the piece', () => {
    expect(solve(group([[1000, 2]], [[1000, 5]], { ...SHEAR, kerfNm: 50 })).counts.bars).toBe(2);
    expect(
      solve(
        group(
          [
            [1001, 1],
            [500, 2],
          ],
          [[1000, 5]],
        ),
      ),
    ).toMatchObject({
      outcome: 'unplaceable',
      unplaced: [{ pieceId: 'p0', quantity: 1, reason: 'longer than any stock' }],
      counts: { bars: 1 },
    });
    expect(solve(group([[10, 4]], [[1000, 5]], { ...SHEAR, kerfNm: 300 })).counts.bars).toBe(1);
  });
  it('supplies that run out leave the rest unplaced and plan what there is', () => {
    const result = solve(group([[600, 5]], [[1000, 5, 2]]));
    expect(result).toMatchObject({ outcome: 'unplaceable', counts: { bars: 2 } });
    expect(result.unplaced).toMatchObject([{ pieceId: 'p0', quantity: 3 }]);
  });
  it('lengths that share no grid', () => {
    const result = solve(
      group(
        [
          [1_828_800_001, 7],
          [1_371_599_993, 5],
          [913_400_017, 9],
        ],
        [[6_096_000_000, 9800]],
      ),
      10_000,
    );
    expect(result.gap).toBeLessThan(0.2);
  });
  it('ten thousand of one', () => {
    expect(solve(group([[inches(3), 10_000]], [[inches(20), 100]]))).toMatchObject({
      outcome: 'proven',
      counts: { bars: 1667, layouts: 2 },
    });
  });
});

it('the same request and seed give the same plan', () => {
  const [instance] = readInstances('U120');
  if (!instance) throw new Error('the set is there');
  const strip = ({ work: { elapsedMs: _elapsed, ...work }, ...rest }: SolveGroupResult) => ({
    ...rest,
    work,
  });
  expect(strip(solve(asGroup(instance)))).toEqual(strip(solve(asGroup(instance))));
});
