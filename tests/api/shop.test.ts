import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openTestShop, type TestShop } from '#tests/support/test-shop.ts';
import { AuditList, Shop } from '#shared/schemas/people.ts';

describe('the shop', () => {
  let shop: TestShop;
  beforeAll(async () => {
    shop = await openTestShop();
  });
  afterAll(() => shop.close());

  const settings = async () => Shop.parse((await (await shop.as('yard')).get('/api/shop').expect(200)).body);
  const audit = async (query = '') =>
    AuditList.parse((await (await shop.as('manager')).get(`/api/audit${query}`).expect(200)).body);

  it('keeps changed settings, and who changed them', async () => {
    const manager = await shop.as('manager');
    const before = await settings();
    const changed = { ...before, inchDenominator: 32 as const, scrapMinorPerTonne: 18_000 };
    const answer = Shop.parse((await manager.put('/api/shop').send(changed).expect(200)).body);
    expect(answer).toEqual({ ...changed, version: before.version + 1 });
    expect(await settings()).toEqual(answer);
    const [latest] = (await audit()).entries;
    expect(latest).toMatchObject({ who: 'A manager', action: 'shop:edit', subject: 'shop Test Fabrication' });
    expect(latest?.detail).toContain('18000');
  });

  it('tells the second of two at once, and overwrites nothing', async () => {
    const manager = await shop.as('manager');
    const before = await settings();
    const answers = await Promise.all(
      ['First name', 'Second name'].map((name) => manager.put('/api/shop').send({ ...before, name })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(answers.find(({ status }) => status === 409)?.body).toMatchObject({
      error: { code: 'stale-version' },
    });
    const won = Shop.parse(answers.find(({ status }) => status === 200)?.body);
    expect(await settings()).toEqual(won);
    expect((await audit()).entries.filter(({ detail }) => detail.includes(' name"'))).toHaveLength(1);
  });

  it('names every setting that cannot be, and takes none', async () => {
    const manager = await shop.as('manager');
    const before = await settings();
    const answer = await manager
      .put('/api/shop')
      .send({ ...before, currency: 'dollars', inchDenominator: 10, handlingMassMg: 0.5 });
    expect(answer.status).toBe(422);
    const { error } = answer.body as { error: { issues: { path: string }[] } };
    expect(new Set(error.issues.map(({ path }) => path))).toEqual(
      new Set(['currency', 'inchDenominator', 'handlingMassMg']),
    );
    expect(await settings()).toEqual(before);
  });

  it('reads the audit trail backwards, page by page, each entry once', async () => {
    const manager = await shop.as('manager');
    let version = (await settings()).version;
    for (let i = 0; i < 120; i++)
      version = Shop.parse(
        (await manager.put('/api/shop').send({ ...(await settings()), version })).body,
      ).version;
    const first = await audit();
    expect(first.entries).toHaveLength(100);
    const second = await audit(`?before=${first.nextBefore}`);
    expect(second.nextBefore).toBeNull();
    const ids = [...first.entries, ...second.entries].map(({ id }) => id);
    expect(ids).toEqual(ids.toSorted((a, b) => b - a));
    expect(new Set(ids).size).toBe(ids.length);
    expect(second.entries.at(-1)).toMatchObject({ action: 'shop:set-up', who: 'A manager' });
    await manager.get('/api/audit?before=yesterday').expect(422);
  });
});

describe('mail', () => {
  it('is kept here in a trial only', async () => {
    const trial = await openTestShop();
    await (await trial.as('manager')).get('/api/mail').expect(200, { mails: [] });
    await (await trial.as('manager')).get('/api/mail/1').expect(404);
    await trial.close();
  });
});
