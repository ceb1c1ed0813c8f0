import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { refusal } from '#tests/support/error-body.ts';
import {
  feet,
  findDrop,
  findPlan,
  inches,
  logDrop,
  makeList,
  makeOffer,
  makeStation,
  makeSupplier,
  read,
  saveDraft,
  sendIssue,
  SHEAR,
  solveLines,
  type Draft,
} from '#tests/support/shop-work.ts';
import { openTestShop, type TestShop } from '#tests/support/test-shop.ts';
import { BarRow, PlanCutRow, PlanGroupRow, PlanRow } from '#server/models/index.ts';
import { checkPlan } from '#shared/domain/check-plan.ts';
import type { SolveRequest, SolveResult } from '#shared/domain/solve.ts';
import { PartListView } from '#shared/schemas/jobs.ts';
import { AuditList } from '#shared/schemas/people.ts';
import { PlanList, PlanView } from '#shared/schemas/plans.ts';
import { solveRequest } from '#workers/solver/node.ts';

const ANGLE = { section: 'L3x3x1/4', grade: 'A36' } as const;

/** A shop with a shear, one offer of 20 ft angle at 98.00 and the drops that are asked for. */
async function openShop(dropsIn: readonly number[] = []) {
  const shop = await openTestShop();
  const station = await makeStation(shop);
  const supplier = await makeSupplier(shop, 'Marlgate');
  const offer = await makeOffer(shop, { ...ANGLE, supplierId: supplier.id, lengthFt: 20, priceMinor: 9800 });
  const drops = [];
  for (const lengthIn of dropsIn)
    drops.push((await logDrop(shop, { ...ANGLE, lengthIn, heat: '47K210' })).drop);
  return { shop, stationId: station.id, supplierId: supplier.id, offer, drops };
}

const firstOf = <T>(list: readonly T[]): T => {
  const [first] = list;
  if (first === undefined) throw new Error('there is none');
  return first;
};

describe('saving a plan', () => {
  let shop: TestShop;
  let stationId: number;
  let drops: { id: number; tag: number; version: number }[];
  let lineIds: number[];
  let draft: Draft;
  let supplierId: number;

  beforeAll(async () => {
    ({ shop, stationId, drops, supplierId } = await openShop([100, 150]));
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

describe('issuing and withdrawing', () => {
  let shop: TestShop;
  let stationId: number;
  let drops: { id: number; tag: number }[];
  beforeAll(async () => {
    ({ shop, stationId, drops } = await openShop([100, 130]));
  });
  afterAll(() => shop.close());

  const withdraw = async (view: PlanView, version = view.plan.version, reason = '') =>
    (await shop.as('purchaser')).post(`/api/plans/${view.plan.id}/withdraw`).send({ reason, version });

  it('holds the drops, makes a bar for every repeat and reserves the tags', async () => {
    const { lineIds } = await makeList(shop, '1', ['A1,7,L3x3x1/4,A36,60"', 'A2,2,L3x3x1/4,A36,90"']);
    const draft = await saveDraft(shop, await solveLines(shop, lineIds));
    const layouts = draft.groups.flatMap(({ result }) => result.layouts);
    expect(layouts.some(({ stockId }) => stockId.startsWith('drop:'))).toBe(true);

    const operator = await shop.as('operator');
    const order = { stationId, version: draft.plan.version };
    expect(refusal(await operator.post(`/api/plans/${draft.plan.id}/issue`).send(order)).code).toBe(
      'not-allowed',
    );
    expect(refusal(await sendIssue(shop, draft, 999)).paths).toEqual(['stationId']);
    const issued = read(await sendIssue(shop, draft, stationId), 200, PlanView);
    expect(issued.plan).toMatchObject({
      state: 'issued',
      stationId,
      bars: layouts.reduce((bars, { repeat }) => bars + repeat, 0),
      can: { 'plan:issue': false, 'plan:withdraw': true, 'plan:remove': false },
    });
    expect(issued.plan.issuedAt).not.toBeNull();
    expect(issued.bars.map(({ number }) => number)).toEqual(issued.bars.map((_, i) => i + 1));
    // Bars stand in the order of the layouts, each with the tag of the drop it will leave.
    const expanded = layouts.flatMap((layout, i) =>
      Array.from({ length: layout.repeat }, () => ({ i, keeps: layout.keeps })),
    );
    expect(issued.bars.map(({ layout, makesTag }) => ({ i: layout, keeps: makesTag !== null }))).toEqual(
      expanded,
    );
    const tags = issued.bars.flatMap(({ makesTag }) => makesTag ?? []);
    expect(tags.every((tag) => tag > 2)).toBe(true);
    expect(new Set(tags).size).toBe(tags.length);

    const used = layouts.flatMap(({ stockId }) =>
      stockId.startsWith('drop:') ? [Number(stockId.slice(5))] : [],
    );
    for (const id of used) {
      const { drop, events } = await findDrop(shop, id);
      expect(drop).toMatchObject({
        state: 'held',
        heldByPlan: { id: issued.plan.id, number: issued.plan.number },
      });
      expect(events[0]).toMatchObject({ who: 'A purchaser', what: `held for plan ${issued.plan.number}` });
      const yard = await shop.as('yard');
      for (const state of ['scrapped', 'missing'])
        expect(
          refusal(await yard.patch(`/api/drops/${id}`).send({ state, version: drop.version })).code,
        ).toBe('wrong-state');
    }
    expect(refusal(await sendIssue(shop, draft, stationId)).code).toBe('wrong-state');
    expect(refusal(await operator.delete(`/api/plans/${issued.plan.id}`)).code).toBe('not-allowed');
    expect(refusal(await (await shop.as('detailer')).delete(`/api/plans/${issued.plan.id}`)).code).toBe(
      'wrong-state',
    );
    expect(refusal(await (await shop.as('manager')).delete(`/api/stations/${stationId}`)).code).toBe(
      'wrong-state',
    );

    // Withdrawn: drops free again, quantities open again, tags not given a second time.
    expect(refusal(await withdraw(issued, 1)).code).toBe('stale-version');
    const back = read(await withdraw(issued, issued.plan.version, 'list revised'), 200, PlanView);
    expect(back).toMatchObject({ plan: { state: 'withdrawn', can: { 'plan:withdraw': false } }, bars: [] });
    for (const id of used) {
      const { drop, events } = await findDrop(shop, id);
      expect(drop).toMatchObject({ state: 'racked', heldByPlan: null });
      expect(events[0]).toMatchObject({
        what: `given back by plan ${issued.plan.number}`,
        why: 'list revised',
      });
    }
    expect(refusal(await withdraw(back)).code).toBe('wrong-state');
    expect(refusal(await sendIssue(shop, back, stationId)).code).toBe('wrong-state');
    const second = await saveDraft(shop, await solveLines(shop, lineIds));
    const issuedAgain = read(await sendIssue(shop, second, stationId), 200, PlanView);
    const newTags = issuedAgain.bars.flatMap(({ makesTag }) => makesTag ?? []);
    expect(newTags.filter((tag) => tags.includes(tag))).toEqual([]);
    read(await withdraw(issuedAgain), 200, PlanView);
  });

  it('gives a drop to one of two plans; the other is told its tag and changes nothing', async () => {
    const [drop] = drops;
    const plans: PlanView[] = [];
    for (const number of ['2', '3']) {
      const { lineIds } = await makeList(shop, number, ['A1,1,L3x3x1/4,A36,95"', 'A2,3,L3x3x1/4,A36,70"']);
      const draft = await solveLines(shop, lineIds, (request) => ({
        ...request,
        groups: request.groups.map((group) => ({
          ...group,
          stock: group.stock.filter(({ source, id }) => source === 'new' || id === `drop:${drop?.id}`),
        })),
      }));
      const view = await saveDraft(shop, draft);
      expect(view.plan.dropsUsed).toBe(1);
      plans.push(view);
    }
    const answers = await Promise.all(plans.map((view) => sendIssue(shop, view, stationId)));
    expect(answers.map(({ status }) => status).toSorted()).toEqual([200, 409]);
    const lost = answers.findIndex(({ status }) => status === 409);
    const loser = firstOf(plans.slice(lost, lost + 1));
    const won = firstOf(answers.filter(({ status }) => status === 200)).body as PlanView;
    const tag = `D-${String(drop?.tag).padStart(4, '0')}`;
    const told = refusal(firstOf(answers.filter(({ status }) => status === 409)));
    expect(told).toMatchObject({ code: 'drop-gone', paths: [tag] });
    expect(told.message).toContain(tag);
    expect((await findDrop(shop, drop?.id ?? 0)).drop).toMatchObject({
      state: 'held',
      heldByPlan: { id: won.plan.id },
    });
    expect(await findPlan(shop, loser.plan.id)).toMatchObject({
      plan: { state: 'draft', version: 1 },
      bars: [],
    });
    expect(await BarRow.count({ where: { planId: loser.plan.id } })).toBe(0);

    // Withdrawing the winner frees it for the other.
    read(await withdraw(won), 200, PlanView);
    read(await sendIssue(shop, loser, stationId), 200, PlanView);
  });

  it('issues one plan once when two people press at the same time', async () => {
    const { lineIds } = await makeList(shop, '4', ['A1,3,L3x3x1/4,A36,60"']);
    const draft = await saveDraft(shop, await solveLines(shop, lineIds));
    const answers = await Promise.all([1, 2, 3].map(() => sendIssue(shop, draft, stationId)));
    expect(answers.map(({ status }) => status).toSorted()).toEqual([200, 409, 409]);
    expect(await BarRow.count({ where: { planId: draft.plan.id } })).toBe(draft.plan.bars);
  });

  it('saves one of two drafts of the same open pieces', async () => {
    const { lineIds } = await makeList(shop, '5', ['A1,3,L3x3x1/4,A36,60"']);
    const { request } = await solveLines(shop, lineIds);
    const result = await solveRequest(request);
    const body = { name: 'Twice', stationId: null, request, result };
    const agent = await shop.as('detailer');
    const answers = await Promise.all([1, 2].map(() => agent.post('/api/plans').send(body)));
    expect(answers.map(({ status }) => status).toSorted()).toEqual([201, 422]);
  });
});
