import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { refusal } from '#tests/support/error-body.ts';
import {
  ANGLE,
  feet,
  firstOf,
  inches,
  logDrop,
  makeList,
  makeOffer,
  openAngleShop,
  read,
  saveDraft,
  SHEAR,
  solveLines,
  type Draft,
} from '#tests/support/shop-work.ts';
import type { TestShop } from '#tests/support/test-shop.ts';
import { PlanCutRow, PlanGroupRow, PlanRow } from '#server/models/index.ts';
import { checkPlan } from '#shared/domain/check-plan.ts';
import type { SolveRequest, SolveResult } from '#shared/domain/solve.ts';
import { PartListView } from '#shared/schemas/jobs.ts';
import { AuditList } from '#shared/schemas/people.ts';
import { PlanList } from '#shared/schemas/plans.ts';

describe('saving a plan', () => {
  let shop: TestShop;
  let stationId: number;
  let drops: { id: number; tag: number; version: number }[];
  let lineIds: number[];
  let draft: Draft;
  let supplierId: number;

  beforeAll(async () => {
    ({ shop, stationId, drops, supplierId } = await openAngleShop([100, 150]));
    ({ lineIds } = await makeList(shop, '1', [
      'A1,5,L3x3x1/4,A36,60"',
      'A2,3,L3x3x1/4,A36,90 1/2"',
      'B1,2,L2x2x1/4,A36,40"',
    ]));
    draft = await solveLines(shop, lineIds.slice(0, 2));
  });
  afterAll(() => shop.close());

  type Body = { request: unknown; result: unknown; stationId?: number | null; name?: string };
  const send = async ({ request, result, ...rest }: Body) =>
    (await shop.as('detailer'))
      .post('/api/plans')
      .send({ name: 'Angles', stationId, request, result, ...rest });

  it('takes a true plan and gives back what was sent', async () => {
    const view = await saveDraft(shop, draft, stationId);
    expect(view.plan).toMatchObject({
      number: 101,
      state: 'draft',
      stationName: SHEAR.name,
      groups: 1,
      pieces: 8,
      barsCut: 0,
      createdBy: 'A detailer',
      issuedAt: null,
      version: 1,
      jobs: [{ number: '1' }],
      can: { 'plan:issue': false, 'plan:withdraw': false, 'plan:remove': true, 'bar:cut': false },
    });
    expect(view.bars).toEqual([]);
    const [group] = view.groups;
    const [sent] = draft.result.groups;
    expect(group?.request).toEqual(draft.request.groups[0]);
    expect(group?.result.layouts).toEqual(sent?.layouts);
    expect(group?.result).toMatchObject({
      outcome: sent?.outcome,
      netCostMinor: sent?.netCostMinor,
      counts: sent?.counts,
    });
    // A bound may only be rounded down on its way to the books.
    expect(group?.result.boundMinor).toBeLessThanOrEqual(sent?.boundMinor ?? 0);
    expect((sent?.boundMinor ?? 0) - (group?.result.boundMinor ?? 0)).toBeLessThan(1e-5);
    expect(view.plan.netMinor).toBe(Math.round(sent?.netCostMinor ?? 0));
    // What was stored still holds by the check that let it in.
    expect(
      checkPlan(
        { ...draft.request, groups: view.groups.map(({ request }) => request) },
        { version: 1, groups: view.groups.map(({ result }) => result) },
      ),
    ).toEqual([]);
    expect(view.groups[0]?.stock.find(({ drop }) => drop?.tag === drops[0]?.tag)?.drop?.heat).toBe('47K210');
    expect(await PlanCutRow.count()).toBe(
      sent?.layouts.reduce((cuts, layout) => cuts + layout.cuts.length, 0),
    );
  });

  it('counts the pieces of a draft as planned and opens them again when it is deleted', async () => {
    const detailer = await shop.as('detailer');
    const { plans } = read(await detailer.get('/api/plans'), 200, PlanList);
    const plan = firstOf(plans);
    const again = refusal(await send({ request: draft.request, result: draft.result }));
    expect(again.code).toBe('plan-rejected');
    expect(again.issues.map(({ message }) => message)).toEqual([
      'A1: 5 wanted and 0 not planned yet',
      'A2: 3 wanted and 0 not planned yet',
    ]);
    await detailer.delete(`/api/plans/${plan.id}`).expect(204);
    expect([await PlanGroupRow.count(), await PlanCutRow.count()]).toEqual([0, 0]);
    expect(refusal(await detailer.get(`/api/plans/${plan.id}`)).code).toBe('not-found');
    // The number is used up.
    const { plan: next } = await saveDraft(shop, draft);
    expect(next.number).toBe(102);
    await detailer.delete(`/api/plans/${next.id}`).expect(204);
  });

  type Tamper = (request: SolveRequest, result: SolveResult) => unknown;
  const request0 = (request: SolveRequest) => firstOf(request.groups);
  const piece0 = (request: SolveRequest) => firstOf(request0(request).pieces);
  const stockBy = (request: SolveRequest, kind: string) => {
    const found = request0(request).stock.find(({ id }) => id.startsWith(kind));
    if (!found) throw new Error(`no ${kind}`);
    return found;
  };
  const result0 = (result: SolveResult) => firstOf(result.groups);
  const layout0 = (result: SolveResult) => firstOf(result0(result).layouts);

  it.each<[string, Tamper, RegExp]>([
    ['a line that is not there', (request) => (piece0(request).id = '99999'), /no part line 99999/],
    ['an id that is no number', (request) => (piece0(request).id = '1 OR 1=1'), /no part line/],
    ['another length', (request) => (piece0(request).lengthNm += 1), /not as long as its part line/],
    ['more than is wanted', (request) => (piece0(request).quantity += 1), /6 wanted and 5 not planned/],
    ['another section', (request) => (request0(request).id = 'L4x4x3/8|A36'), /belongs to L3x3x1\/4\|A36/],
    [
      'a line of another section',
      (request) =>
        request0(request).pieces.push({ id: String(lineIds[2]), lengthNm: inches(40), quantity: 1 }),
      /B1 belongs to L2x2x1\/4\|A36/,
    ],
    [
      'an offer that is not there',
      (request) => (stockBy(request, 'offer').id = 'offer:999'),
      /offer:999 is not offered/,
    ],
    [
      'an offer of another length',
      (request) => (stockBy(request, 'offer').lengthNm = feet(21)),
      /of another length/,
    ],
    ['an offer passed off as a drop', (request) => (stockBy(request, 'offer').source = 'drop'), /bar to buy/],
    [
      'a drop that is not there',
      (request) => (stockBy(request, 'drop').id = 'drop:999'),
      /no drop behind drop:999/,
    ],
    [
      'a longer drop',
      (request) => (stockBy(request, 'drop').lengthNm += inches(10)),
      /D-\d+ is of another length/,
    ],
    ['a drop twice', (request) => (stockBy(request, 'drop').supply = 2), /used once/],
    ['stock from nowhere', (request) => (stockBy(request, 'offer').id = 'gift:1'), /no offer, no drop/],
    [
      'a typed length for nothing',
      (request) =>
        request0(request).stock.push({
          id: 'length:1',
          source: 'new',
          lengthNm: feet(20),
          costMinor: 0,
          supply: null,
        }),
      /needs its price/,
    ],
    [
      'a credit that makes money',
      (request) => (request0(request).drops.creditMinorPerM = 1_000_000),
      /credit/,
    ],
    ['a shifted cut', (_, result) => (firstOf(layout0(result).cuts).startNm += 1), /starts at/],
    ['a longer leftover', (_, result) => (layout0(result).leftoverNm += 1), /are left/],
    [
      'scrap called a drop',
      (_, result) => (layout0(result).keeps = !layout0(result).keeps),
      /is kept|is scrap/,
    ],
    ['a layout too often', (_, result) => (layout0(result).repeat += 1), /wanted|used 2 times/],
    ['a lower cost', (_, result) => (result0(result).netCostMinor -= 1), /the layouts cost/],
    ['a bound above the cost', (_, result) => (result0(result).boundMinor += 10_000), /bound/],
    ['a missing group', (_, result) => (result.groups = []), /no answer/],
  ])('refuses %s', async (_name, tamper, words) => {
    const request = structuredClone(draft.request);
    const result = structuredClone(draft.result);
    tamper(request, result);
    const told = refusal(await send({ request, result }));
    expect(told.code).toBe('plan-rejected');
    expect(told.issues.map(({ message }) => message).join(' · ')).toMatch(words);
    expect(await PlanRow.count()).toBe(0);
  });

  it('tells every fault at once, with its path', async () => {
    const request = structuredClone(draft.request);
    const result = structuredClone(draft.result);
    piece0(request).lengthNm += 1;
    stockBy(request, 'offer').lengthNm += 1;
    result0(result).netCostMinor -= 1;
    const told = refusal(await send({ request, result, stationId: 999 }));
    for (const path of [
      'request.groups.0.pieces.0',
      /^request\.groups\.0\.stock\.\d$/,
      'stationId',
      'result.groups.0.netCostMinor',
    ])
      expect(told.paths.some((entry) => (typeof path === 'string' ? entry === path : path.test(entry)))).toBe(
        true,
      );
    expect(refusal(await send({ request: { ...request, version: 2 }, result, name: '' })).paths).toEqual(
      expect.arrayContaining(['name', 'request.version']),
    );
    const empty = { version: 1, seed: 1, timeLimitMs: 1000, groups: [] };
    expect(refusal(await send({ request: empty, result: { version: 1, groups: [] } })).paths).toEqual([
      'request.groups',
    ]);
  });

  it('takes a typed length and a typed price, and writes the price down', async () => {
    const typed = await solveLines(shop, lineIds.slice(0, 2), (request) => {
      const group = request0(request);
      stockBy(request, 'offer').costMinor = 9500;
      group.stock.push({
        id: 'length:1',
        source: 'new',
        lengthNm: feet(30),
        costMinor: 13_000,
        supply: null,
      });
      return request;
    });
    const { plan, groups } = await saveDraft(shop, typed);
    expect(groups[0]?.stock.find(({ stockId }) => stockId === 'length:1')).toMatchObject({
      supplierName: null,
      drop: null,
      costMinor: 13_000,
    });
    const { entries } = read(await (await shop.as('manager')).get('/api/audit'), 200, AuditList);
    const entry = entries.find(
      ({ action, subject }) => action === 'plan:draft' && subject === `plan ${plan.number}`,
    );
    expect(JSON.parse(entry?.detail ?? '')).toMatchObject({
      prices: [{ askedMinor: 9800, plannedMinor: 9500 }],
    });
    await (await shop.as('detailer')).delete(`/api/plans/${plan.id}`).expect(204);
  });

  it('refuses an offer that was withdrawn and a drop that went meanwhile', async () => {
    const { drop } = await logDrop(shop, { ...ANGLE, lengthIn: 200 });
    const other = await makeOffer(shop, { ...ANGLE, supplierId, lengthFt: 40, priceMinor: 19_000 });
    const late = await solveLines(shop, lineIds.slice(0, 2));
    await (await shop.as('purchaser')).delete(`/api/offers/${other.id}`).expect(204);
    await (
      await shop.as('yard')
    )
      .patch(`/api/drops/${drop.id}`)
      .send({ state: 'missing', version: 1 })
      .expect(200);
    const messages = refusal(await send({ request: late.request, result: late.result }))
      .issues.map(({ message }) => message)
      .join(' · ');
    expect(messages).toContain(`offer:${other.id} is not offered any more`);
    expect(messages).toMatch(/D-\d+ is missing and no longer free/);
  });

  it('keeps what could not be placed open', async () => {
    const { lineIds: long, partList } = await makeList(shop, '2', [
      'L1,2,L3x3x1/4,A36,25\'-0"',
      'L2,2,L3x3x1/4,A36,60"',
    ]);
    const view = await saveDraft(shop, await solveLines(shop, long));
    expect(view.plan.pieces).toBe(2);
    expect(view.groups[0]?.result).toMatchObject({
      outcome: 'unplaceable',
      unplaced: [{ pieceId: String(long[0]), quantity: 2 }],
    });
    const { lines } = read(
      await (await shop.as('detailer')).get(`/api/part-lists/${partList.id}`),
      200,
      PartListView,
    );
    expect(lines.map(({ mark, planned }) => [mark, planned])).toEqual([
      ['L1', 0],
      ['L2', 2],
    ]);
    await (await shop.as('detailer')).delete(`/api/plans/${view.plan.id}`).expect(204);
  });
});
