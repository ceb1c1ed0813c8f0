import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { refusal } from '#tests/support/error-body.ts';
import {
  findDrop,
  findPlan,
  firstOf,
  makeList,
  openAngleShop,
  read,
  saveDraft,
  sendIssue,
  solveLines,
} from '#tests/support/shop-work.ts';
import type { TestShop } from '#tests/support/test-shop.ts';
import { BarRow } from '#server/models/index.ts';
import { PlanView } from '#shared/schemas/plans.ts';
import { solveRequest } from '#workers/solver/node.ts';

describe('issuing and withdrawing', () => {
  let shop: TestShop;
  let stationId: number;
  let drops: { id: number; tag: number }[];
  beforeAll(async () => {
    ({ shop, stationId, drops } = await openAngleShop([100, 130]));
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
