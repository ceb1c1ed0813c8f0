import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { refusal } from '#tests/support/error-body.ts';
import { findDrop, inches, logDrop, read } from '#tests/support/shop-work.ts';
import { openTestShop, type TestShop } from '#tests/support/test-shop.ts';
import { AuditList } from '#shared/schemas/people.ts';
import { DropList, DropView } from '#shared/schemas/rack.ts';

describe('the drop rack', () => {
  let shop: TestShop;
  beforeAll(async () => {
    shop = await openTestShop();
  });
  afterAll(() => shop.close());

  const log = { section: 'L3x3x1/4', grade: 'A36', lengthNm: inches(96.5), slot: 'B-3-2', heat: null };
  const send = async (body: object) => (await shop.as('yard')).post('/api/drops').send(body);
  const patch = async (dropId: number, body: object) =>
    (await shop.as('yard')).patch(`/api/drops/${dropId}`).send(body);
  const list = async (query = '') =>
    read(await (await shop.as('operator')).get(`/api/drops${query}`), 200, DropList).drops;

  it('logs a drop by hand, in canonical spelling, with the next tag', async () => {
    const view = read(
      await send({ ...log, section: '3x3x1/4 angle', grade: 'A-36', note: 'one end torched' }),
      201,
      DropView,
    );
    expect(view.drop).toMatchObject({
      tag: 1,
      section: 'L3x3x1/4',
      family: 'angle',
      grade: 'A36',
      heat: null,
      state: 'racked',
      loggedBy: 'A yard',
      heldByPlan: null,
      from: null,
      version: 1,
      can: { 'drop:edit': true, 'drop:scrap': true, 'drop:missing': true, 'drop:found': false },
    });
    expect(view.events).toMatchObject([{ what: 'logged by hand, racked in B-3-2', why: 'one end torched' }]);
    expect(view.children).toEqual([]);
    const operator = await (await shop.as('operator')).post('/api/drops').send(log);
    expect(read(operator, 201, DropView).drop).toMatchObject({ tag: 2, can: { 'drop:edit': false } });
    expect(refusal(await (await shop.as('detailer')).post('/api/drops').send(log)).code).toBe('not-allowed');
  });

  it('asks when the section is not clear, and takes no tag for it', async () => {
    const unclear = refusal(await send({ ...log, section: '4x4x3/8' }));
    expect(unclear).toMatchObject({ code: 'bad-input', paths: ['section'] });
    expect(unclear.issues[0]?.message).toContain('L4x4x3/8');
    expect(refusal(await send({ ...log, section: '8-Mar' })).paths).toEqual(['section']);
    expect(refusal(await send({ ...log, section: 'PL1/4' })).paths).toEqual(['widthNm']);
    expect(refusal(await send({ ...log, lengthNm: 0, slot: ' ', heat: '' })).paths).toEqual([
      'lengthNm',
      'slot',
      'heat',
    ]);
    const plate = read(await send({ ...log, section: 'PL1/4', widthNm: inches(20) }), 201, DropView);
    // 1/4 in plate is 10.2 lb/ft2 (40.8 lb/ft2 an inch): 96.5 x 20 in are 136.7 lb.
    expect(plate.drop.massMg / 453_592.37).toBeCloseTo(136.8, 0);
    expect(plate.drop).toMatchObject({ tag: 3, widthNm: inches(20) });
  });

  it('moves, corrects and scraps, and every change is in the history', async () => {
    const { drop } = await logDrop(shop, { section: 'C6x8.2', grade: 'A36', lengthIn: 104.5, slot: 'D-1-1' });
    let version = drop.version;
    const change = async (body: object) => {
      const view = read(await patch(drop.id, { ...body, version }), 200, DropView);
      version = view.drop.version;
      return view;
    };
    expect((await change({ slot: 'D-1-2', note: 'red end' })).events[0]).toMatchObject({
      who: 'A yard',
      what: 'moved from D-1-1 to D-1-2, note changed',
    });
    expect(refusal(await patch(drop.id, { slot: 'X', version: 1 })).code).toBe('stale-version');

    // A heat becomes known, changes and becomes unknown only with a reason.
    expect(refusal(await patch(drop.id, { heat: '44H602', version })).paths).toEqual(['reason']);
    expect((await change({ heat: '44H602', reason: 'stamped on the end' })).events[0]).toMatchObject({
      what: 'heat unknown → 44H602',
      why: 'stamped on the end',
    });
    expect(refusal(await patch(drop.id, { heat: '44H603', version })).paths).toEqual(['reason']);
    expect((await change({ heat: null, reason: 'stamp is of another bar' })).drop.heat).toBeNull();
    // The same again is no change and needs no reason.
    expect((await change({ heat: null })).drop.version).toBe(version);

    expect((await change({ state: 'missing' })).drop).toMatchObject({
      state: 'missing',
      can: { 'drop:found': true, 'drop:scrap': false },
    });
    expect((await change({ state: 'racked', slot: 'D-1-3' })).drop).toMatchObject({
      state: 'racked',
      slot: 'D-1-3',
    });
    expect((await change({ state: 'scrapped', reason: 'bent' })).drop.state).toBe('scrapped');
    expect(refusal(await patch(drop.id, { state: 'missing', version })).code).toBe('wrong-state');
    expect(refusal(await patch(drop.id, { state: 'racked', version })).paths).toEqual(['reason']);
    const back = await change({ state: 'racked', reason: 'wrong tag read' });
    expect(back.events[0]).toMatchObject({ what: 'back on the rack', why: 'wrong tag read' });
    expect(refusal(await patch(drop.id, { state: 'held', version })).paths).toEqual(['state']);
    expect(
      refusal(await (await shop.as('operator')).patch(`/api/drops/${drop.id}`).send({ slot: 'X', version }))
        .code,
    ).toBe('not-allowed');
    expect(refusal(await patch(99_999, { slot: 'X', version: 1 })).code).toBe('not-found');

    const { entries } = read(await (await shop.as('manager')).get('/api/audit'), 200, AuditList);
    const told = entries.filter(
      ({ action, subject }) => action === 'drop:edit' && subject === `D-${String(drop.tag).padStart(4, '0')}`,
    );
    expect(told).toHaveLength(back.events.length - 1);
    expect(told[0]?.who).toBe('A yard');
  });

  it('finds a drop by what somebody at the rack would say', async () => {
    const { drop } = await logDrop(shop, {
      section: 'PIPE 2 STD',
      grade: 'A53B',
      lengthIn: 126,
      heat: 'P20774',
      slot: 'C-3-1',
    });
    const ids = async (query: string) => (await list(query)).map(({ id }) => id);
    for (const text of [`d-000${drop.tag}`, 'p20774', 'c-3-1', 'pipe2std', 'PIPE 2', 'a53b'])
      expect(await ids(`?text=${encodeURIComponent(text)}`)).toContain(drop.id);
    expect(await ids(`?section=${encodeURIComponent('pipe 2')}`)).toEqual([drop.id]);
    expect(await ids(`?section=pipe&minLengthNm=${inches(126)}`)).toEqual([drop.id]);
    expect(await ids(`?section=pipe&minLengthNm=${inches(126) + 1}`)).toEqual([]);
    expect(await ids('?text=no+such+thing')).toEqual([]);
    expect(refusal(await (await shop.as('yard')).get('/api/drops?state=lost')).paths).toEqual(['state']);
  });

  it('shows what lies there, and what went, when asked', async () => {
    const { drop } = await logDrop(shop, { section: 'RB 3/4', grade: 'A36', lengthIn: 30 });
    read(await patch(drop.id, { state: 'scrapped', version: 1 }), 200, DropView);
    const has = async (query: string) => (await list(query)).some(({ id }) => id === drop.id);
    expect([
      await has(''),
      await has('?state=racked'),
      await has('?state=scrapped'),
      await has('?state=all'),
    ]).toEqual([false, false, true, true]);
  });

  it('never gives a tag twice, however many log at once', async () => {
    const views = await Promise.all(
      Array.from({ length: 12 }, () => logDrop(shop, { section: 'SQ 1/2', grade: 'A36', lengthIn: 40 })),
    );
    const tags = views.map(({ drop }) => drop.tag);
    expect(new Set(tags).size).toBe(12);
    const all = (await list('?state=all')).map(({ tag }) => tag).toSorted((a, b) => a - b);
    expect(all).toEqual(all.map((_, i) => i + 1));
  });

  it('two people change one drop: the second is told', async () => {
    const { drop } = await logDrop(shop, { section: 'SQ 1/2', grade: 'A36', lengthIn: 50, slot: 'A-1' });
    const answers = await Promise.all(['A-2', 'A-3'].map((slot) => patch(drop.id, { slot, version: 1 })));
    expect(answers.map(({ status }) => status).toSorted()).toEqual([200, 409]);
    const won = answers.find(({ status }) => status === 200)?.body as DropView;
    expect((await findDrop(shop, drop.id)).drop.slot).toBe(won.drop.slot);
  });
});
