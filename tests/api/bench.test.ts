import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { refusal } from '#tests/support/error-body.ts';
import {
  ANGLE,
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
  solveLines,
} from '#tests/support/shop-work.ts';
import { openTestShop, type TestShop } from '#tests/support/test-shop.ts';
import { BarRow, DropRow } from '#server/models/index.ts';
import type { SolveRequest } from '#shared/domain/solve.ts';
import { JobView, PartListView } from '#shared/schemas/jobs.ts';
import { AuditList } from '#shared/schemas/people.ts';
import { CutBarAnswer, PlanningView, PlanView } from '#shared/schemas/plans.ts';
import { DropList } from '#shared/schemas/rack.ts';

describe('the bench', () => {
  let shop: TestShop;
  let stationId: number;
  beforeEach(async () => {
    shop = await openTestShop();
    stationId = (await makeStation(shop)).id;
    const supplier = await makeSupplier(shop, 'Marlgate');
    await makeOffer(shop, { ...ANGLE, supplierId: supplier.id, lengthFt: 20, priceMinor: 9800 });
  });
  afterEach(() => shop.close());

  async function issue(rows: readonly string[], change?: (request: SolveRequest) => SolveRequest) {
    const list = await makeList(shop, '1', rows);
    const draft = await saveDraft(shop, await solveLines(shop, list.lineIds, change));
    return { list, view: read(await sendIssue(shop, draft, stationId), 200, PlanView) };
  }

  const cut = async (bar: { id: number; version: number } | undefined, body: object = {}) =>
    (await shop.as('operator')).post(`/api/bars/${bar?.id}/cut`).send({ version: bar?.version, ...body });

  it('cuts new bars: the plan goes on, the drop is racked with its heat, the pieces are counted', async () => {
    // Between the crops lie 239 3/4 in: twice 119 7/8 in leave nothing, 100 in leave 139 3/4 in; mixed, 19 7/8 in would be scrap.
    const { list, view } = await issue(['A1,1,L3x3x1/4,A36,100"', 'A2,2,L3x3x1/4,A36,119 7/8"']);
    expect(view.bars.length).toBe(2);
    const kept = view.bars.find(({ makesTag }) => makesTag !== null);
    const plain = view.bars.find(({ makesTag }) => makesTag === null);
    expect([kept, plain]).not.toContain(undefined);

    const bare = refusal(await cut(kept, { heat: null }));
    expect(bare).toMatchObject({ code: 'bad-input', paths: ['slot'] });
    const wrong = refusal(await cut(kept, { measuredNm: inches(240) }));
    expect(wrong.paths).toEqual(['slot', 'measuredNm']);
    expect(refusal(await cut(plain, { slot: 'B-1', measuredNm: inches(40) })).paths).toEqual([
      'slot',
      'measuredNm',
    ]);
    expect(refusal(await cut({ id: kept?.id ?? 0, version: 7 }, { slot: 'B-1' })).code).toBe('stale-version');
    expect(
      refusal(await (await shop.as('detailer')).post(`/api/bars/${kept?.id}/cut`).send({ version: 1 })).code,
    ).toBe('not-allowed');
    expect(await BarRow.count({ where: { state: 'cut' } })).toBe(0);

    const measuredNm = inches(139.5);
    const first = read(await cut(kept, { heat: '52A377', slot: 'B-3-2', measuredNm }), 200, CutBarAnswer);
    expect(first.bar).toMatchObject({
      state: 'cut',
      heat: '52A377',
      cutBy: 'A operator',
      version: 2,
      madeDrop: { tag: kept?.makesTag, slot: 'B-3-2' },
    });
    expect(first.plan).toMatchObject({ state: 'cutting', barsCut: 1, can: { 'plan:withdraw': false } });
    const made = await findDrop(shop, first.bar.madeDrop?.id ?? 0);
    expect(made.drop).toMatchObject({
      tag: kept?.makesTag,
      section: 'L3x3x1/4',
      grade: 'A36',
      lengthNm: measuredNm,
      slot: 'B-3-2',
      heat: '52A377',
      state: 'racked',
      from: { planId: view.plan.id, planNumber: view.plan.number, barId: kept?.id, parentTag: null },
    });
    expect(made.events).toMatchObject([
      { who: 'A operator', what: expect.stringContaining('made by bar') as string },
    ]);

    const purchaser = await shop.as('purchaser');
    const order = { reason: '', version: first.plan.version };
    expect(refusal(await purchaser.post(`/api/plans/${view.plan.id}/withdraw`).send(order)).code).toBe(
      'wrong-state',
    );

    // No heat said: unknown, never a guess.
    const last = read(await cut(plain), 200, CutBarAnswer);
    expect(last.bar).toMatchObject({ heat: null, madeDrop: null });
    expect(last.plan).toMatchObject({ state: 'finished', barsCut: 2, can: { 'bar:cut': false } });
    const { lines } = read(await purchaser.get(`/api/part-lists/${list.partList.id}`), 200, PartListView);
    expect(lines.map(({ mark, planned, cut: done }) => [mark, planned, done])).toEqual([
      ['A1', 1, 1],
      ['A2', 2, 2],
    ]);
    const { job } = read(await purchaser.get(`/api/jobs/${list.job.id}`), 200, JobView);
    expect(job).toMatchObject({ pieces: 3, piecesPlanned: 3, piecesCut: 3 });
    const { entries } = read(await (await shop.as('manager')).get('/api/audit'), 200, AuditList);
    expect(entries.filter(({ action }) => action === 'bar:cut')).toHaveLength(2);
  });

  it('cuts up a drop: it is closed, its heat goes on to what is left, whatever the list wants next finds that', async () => {
    const { drop } = await logDrop(shop, { ...ANGLE, lengthIn: 200, heat: '47K210', slot: 'A-1' });
    const { view } = await issue(['A1,1,L3x3x1/4,A36,90"'], (request) => ({
      ...request,
      groups: request.groups.map((group) => ({
        ...group,
        stock: group.stock.filter(({ source }) => source === 'drop'),
      })),
    }));
    const [bar] = view.bars;
    const told = refusal(await cut(bar, { heat: 'ANOTHER', slot: 'A-2' }));
    expect(told).toMatchObject({ paths: ['heat'] });
    const { bar: done } = read(await cut(bar, { slot: 'A-2' }), 200, CutBarAnswer);
    expect(done.heat).toBe('47K210');
    const parent = await findDrop(shop, drop.id);
    expect(parent.drop).toMatchObject({ state: 'cut', heldByPlan: null, can: { 'drop:edit': false } });
    expect(parent.children).toEqual([{ id: done.madeDrop?.id, tag: bar?.makesTag }]);
    expect(parent.events.map(({ what }) => what)).toEqual([
      `cut as bar 1 of plan ${view.plan.number}`,
      `held for plan ${view.plan.number}`,
      'logged by hand, racked in A-1',
    ]);
    const child = await findDrop(shop, done.madeDrop?.id ?? 0);
    // 200 in less 1/4 in crop and 90 in.
    expect(child.drop).toMatchObject({
      heat: '47K210',
      lengthNm: inches(109.75),
      from: { parentTag: drop.tag },
    });

    // The next job is offered exactly that.
    const next = await makeList(shop, '2', ['C1,1,L3x3x1/4,A36,100"']);
    const planning = await (
      await shop.as('detailer')
    )
      .post('/api/planning')
      .send({ partLineIds: next.lineIds });
    expect(read(planning, 200, PlanningView).groups[0]?.drops.map(({ tag }) => tag)).toEqual([
      child.drop.tag,
    ]);
  });

  it('a drop of unknown heat stays unknown', async () => {
    await logDrop(shop, { ...ANGLE, lengthIn: 200 });
    const { view } = await issue(['A1,1,L3x3x1/4,A36,90"'], (request) => ({
      ...request,
      groups: request.groups.map((group) => ({
        ...group,
        stock: group.stock.filter(({ source }) => source === 'drop'),
      })),
    }));
    const { bar } = read(await cut(view.bars[0], { slot: 'A-2' }), 200, CutBarAnswer);
    expect(bar.heat).toBeNull();
    expect((await findDrop(shop, bar.madeDrop?.id ?? 0)).drop.heat).toBeNull();
  });

  it('two tablets cut the same bar: one counts, the other is told, nothing is doubled', async () => {
    await logDrop(shop, { ...ANGLE, lengthIn: 200, heat: '47K210' });
    const { view } = await issue(['A1,1,L3x3x1/4,A36,90"', 'A2,3,L3x3x1/4,A36,70"']);
    for (const bar of view.bars) {
      const slot = bar.makesTag === null ? {} : { slot: 'B-3-2' };
      const answers = await Promise.all([1, 2, 3].map(() => cut(bar, slot)));
      expect(answers.map(({ status }) => status).toSorted()).toEqual([200, 409, 409]);
      for (const answer of answers)
        if (answer.status === 409) expect(refusal(answer).message).toContain('cut already');
    }
    const after = await findPlan(shop, view.plan.id);
    expect(after.plan).toMatchObject({ state: 'finished', barsCut: view.bars.length });
    const { drops } = read(await (await shop.as('yard')).get('/api/drops?state=all'), 200, DropList);
    const tags = view.bars.flatMap(({ makesTag }) => makesTag ?? []);
    expect(
      drops
        .filter(({ from }) => from !== null)
        .map(({ tag }) => tag)
        .toSorted(),
    ).toEqual(tags.toSorted());
    expect(new Set(drops.map(({ tag }) => tag)).size).toBe(drops.length);
  });

  it('two tablets cut all bars of a plan at once: each counts once and the plan is finished', async () => {
    const { view } = await issue(['A1,12,L3x3x1/4,A36,110"']);
    expect(view.bars.length).toBe(6);
    const answers = await Promise.all(view.bars.map((bar) => cut(bar, { heat: '52A377' })));
    expect(answers.every(({ status }) => status === 200)).toBe(true);
    expect((await findPlan(shop, view.plan.id)).plan).toMatchObject({
      state: 'finished',
      barsCut: 6,
      version: 8,
    });
  });

  it('nothing is cut of a draft, of a withdrawn plan, or from a drop that is not held', async () => {
    const { drop } = await logDrop(shop, { ...ANGLE, lengthIn: 200 });
    const { view } = await issue(['A1,2,L3x3x1/4,A36,90"']);
    const bars = await BarRow.findAll({ order: [['number', 'ASC']] });
    // As if another process had scrapped the drop behind the plan's back.
    await DropRow.update({ state: 'scrapped', heldByPlanId: null }, { where: { id: drop.id } });
    const bar = view.bars[0];
    expect(refusal(await cut(bar, bar?.makesTag === null ? {} : { slot: 'A-1' })).code).toBe('drop-gone');
    expect(await BarRow.count({ where: { state: 'cut' } })).toBe(0);
    const purchaser = await shop.as('purchaser');
    await purchaser
      .post(`/api/plans/${view.plan.id}/withdraw`)
      .send({ reason: '', version: view.plan.version })
      .expect(200);
    expect(refusal(await cut(bars[0])).code).toBe('wrong-state');
    expect(refusal(await cut({ id: 99_999, version: 1 })).code).toBe('not-found');
  });
});
