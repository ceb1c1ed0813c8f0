import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { refusal } from '#tests/support/error-body.ts';
import {
  feet,
  inches,
  makeOffer,
  makeStation,
  makeSupplier,
  post,
  read,
  SHEAR,
} from '#tests/support/shop-work.ts';
import { openTestShop, type TestShop } from '#tests/support/test-shop.ts';
import { FAMILIES } from '#shared/domain/section/types.ts';
import { AuditList } from '#shared/schemas/people.ts';
import {
  DropRule,
  DropRuleList,
  Offer,
  OfferList,
  Station,
  StationList,
  SupplierList,
} from '#shared/schemas/yard.ts';

describe('stations, rules, suppliers, offers', () => {
  let shop: TestShop;
  beforeAll(async () => {
    shop = await openTestShop();
  });
  afterAll(() => shop.close());

  it('keeps stations, and a shear has no kerf', async () => {
    const manager = await shop.as('manager');
    const made = await makeStation(shop);
    expect(made).toMatchObject({ method: 'shear', kerfNm: 0, version: 1, can: { 'station:edit': true } });

    const kerf = refusal(
      await manager.post('/api/stations').send({ ...SHEAR, name: 'Other', kerfNm: inches(0.125) }),
    );
    expect(kerf).toMatchObject({ code: 'bad-input', paths: ['kerfNm'] });
    const twin = refusal(await manager.post('/api/stations').send(SHEAR));
    expect(twin).toMatchObject({ code: 'already-there' });

    const put = (body: object) => manager.put(`/api/stations/${made.id}`).send(body);
    expect(refusal(await put(SHEAR))).toMatchObject({ code: 'bad-input', paths: ['version'] });
    const changed = read(await put({ ...SHEAR, holdDownNm: inches(5), version: 1 }), 200, Station);
    expect(changed).toMatchObject({ holdDownNm: inches(5), version: 2 });
    expect(refusal(await put({ ...SHEAR, version: 1 })).code).toBe('stale-version');

    const { stations } = read(await (await shop.as('yard')).get('/api/stations'), 200, StationList);
    expect(stations).toMatchObject([{ name: SHEAR.name, can: { 'station:edit': false } }]);
    await manager.delete(`/api/stations/${made.id}`).expect(204);
    expect(refusal(await manager.delete(`/api/stations/${made.id}`)).code).toBe('not-found');
  });

  it('tells every fault of a station at once', async () => {
    const manager = await shop.as('manager');
    const answer = await manager
      .post('/api/stations')
      .send({ ...SHEAR, name: '', families: [], holdDownNm: -1, headCropNm: 0.5, longestStopNm: 0 });
    expect(refusal(answer).paths.toSorted()).toEqual([
      'families',
      'headCropNm',
      'holdDownNm',
      'longestStopNm',
      'name',
    ]);
  });

  it('starts with one rule a family, and changes it with its version', async () => {
    const manager = await shop.as('manager');
    const { rules } = read(await manager.get('/api/drop-rules'), 200, DropRuleList);
    expect(rules.map(({ family }) => family).toSorted()).toEqual([...FAMILIES].toSorted());
    // The trade's floors (common practice, no published source): flats from 2 ft, angle from 3 ft, beams from 5 ft.
    const keepFrom = (family: string) => rules.find((rule) => rule.family === family)?.keepFromNm;
    expect([keepFrom('flat'), keepFrom('angle'), keepFrom('beam')]).toEqual([feet(2), feet(3), feet(5)]);

    const put = (body: object) => manager.put('/api/drop-rules').send(body);
    const wish = { family: 'angle', keepFromNm: inches(30), creditPercent: 40, version: 1 };
    expect(read(await put(wish), 200, DropRule)).toMatchObject({
      keepFromNm: inches(30),
      creditPercent: 40,
      version: 2,
    });
    expect(refusal(await put(wish)).code).toBe('stale-version');
    expect(refusal(await put({ ...wish, version: 2, creditPercent: 101 })).paths).toEqual(['creditPercent']);
  });

  it('keeps offers in canonical spelling, one price a bar', async () => {
    const purchaser = await shop.as('purchaser');
    const { id: supplierId } = await makeSupplier(shop, 'Marlgate Metals');
    const bar = {
      supplierId,
      section: '3 x 3 x 1/4 ANGLE',
      grade: 'ASTM A-36',
      lengthFt: 20,
      priceMinor: 7644,
    };
    const offer = await makeOffer(shop, bar);
    expect(offer).toMatchObject({
      section: 'L3x3x1/4',
      stockKey: 'L3x3x1/4',
      grade: 'A36',
      supplierName: 'Marlgate Metals',
    });
    // L3x3x1/4 weighs 4.9 lb/ft (published table of US angles): 98 lb a 20 ft bar.
    expect(offer.massMg / 453_592.37).toBeCloseTo(98, 1);

    const send = (body: object) => purchaser.post('/api/offers').send(body);
    const again = { supplierId, section: 'L3x3x1/4', grade: 'A36', lengthNm: feet(20), priceMinor: 1 };
    expect(refusal(await send(again)).code).toBe('already-there');
    const unclear = refusal(await send({ ...again, supplierId: 999, section: '4x4x3/8' }));
    expect(unclear).toMatchObject({ code: 'bad-input', paths: ['supplierId', 'section'] });
    expect(unclear.issues[1]?.message).toContain('L4x4x3/8');
    expect(refusal(await send({ ...again, section: 'PL1/4' })).issues[0]?.message).toContain('plate');

    const changed = await purchaser
      .put(`/api/offers/${offer.id}`)
      .send({ ...again, priceMinor: 7800, version: offer.version });
    expect(read(changed, 200, Offer)).toMatchObject({ priceMinor: 7800, version: 2 });

    await purchaser.delete(`/api/offers/${offer.id}`).expect(204);
    expect(read(await purchaser.get('/api/offers'), 200, OfferList).offers).toEqual([]);
    // A withdrawn offer does not stand in the way of a new one.
    expect((await makeOffer(shop, bar)).id).not.toBe(offer.id);
  });

  it('keeps a supplier with offers, and the name of one is taken once', async () => {
    const purchaser = await shop.as('purchaser');
    const { suppliers } = read(await purchaser.get('/api/suppliers'), 200, SupplierList);
    const known = suppliers.find(({ name }) => name === 'Marlgate Metals');
    expect(refusal(await purchaser.delete(`/api/suppliers/${known?.id}`)).code).toBe('wrong-state');
    expect(refusal(await purchaser.post('/api/suppliers').send({ name: 'Marlgate Metals' })).code).toBe(
      'already-there',
    );
    expect(
      refusal(await purchaser.post('/api/suppliers').send({ name: 'X', email: 'nobody' })).paths,
    ).toEqual(['email']);
    const bare = await makeSupplier(shop, 'Nobody Asked');
    const put = (body: object) => purchaser.put(`/api/suppliers/${bare.id}`).send(body);
    await put({ name: 'Somebody', email: 'sales@somebody.example', note: 'by phone', version: 1 }).expect(
      200,
    );
    expect(refusal(await put({ name: 'Late', version: 1 })).code).toBe('stale-version');
    await purchaser.delete(`/api/suppliers/${bare.id}`).expect(204);
  });

  it('writes every change down with its person', async () => {
    const { entries } = read(await (await shop.as('manager')).get('/api/audit'), 200, AuditList);
    for (const action of ['station:make', 'station:edit', 'station:remove', 'drop-rule:edit'])
      expect(entries.find((entry) => entry.action === action)?.who).toBe('A manager');
    for (const action of [
      'supplier:make',
      'supplier:edit',
      'supplier:remove',
      'offer:make',
      'offer:edit',
      'offer:remove',
    ])
      expect(entries.find((entry) => entry.action === action)?.who).toBe('A purchaser');
    // What was refused left no entry.
    expect(entries.filter(({ action }) => action === 'station:make')).toHaveLength(1);
    expect(entries.filter(({ action }) => action === 'offer:make')).toHaveLength(2);
  });

  it('lets nobody else change them', async () => {
    for (const role of ['detailer', 'operator', 'yard'] as const) {
      const answer = await (await shop.as(role)).post('/api/suppliers').send({ name: 'X' });
      expect(refusal(answer).code).toBe('not-allowed');
    }
    const made = await post(shop, 'manager', '/stations', { ...SHEAR, name: 'By the boss' }, Station);
    expect(made.name).toBe('By the boss');
  });
});
