import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { refusal } from '#tests/support/error-body.ts';
import {
  feet,
  inches,
  logDrop,
  makeList,
  makeOffer,
  makeStation,
  makeSupplier,
  post,
  saveDraft,
  SHEAR,
  solveLines,
} from '#tests/support/shop-work.ts';
import { openTestShop, type TestShop } from '#tests/support/test-shop.ts';
import { findMoneyMakers } from '#shared/domain/money-makers.ts';
import { defaultEdits, planRequest } from '#shared/domain/plan-request.ts';
import { Shop } from '#shared/schemas/people.ts';
import { PlanningView } from '#shared/schemas/plans.ts';
import { DropRule } from '#shared/schemas/yard.ts';

describe('planning defaults', () => {
  let shop: TestShop;
  let shear: number;
  const plan = (partLineIds: readonly number[]) =>
    post(shop, 'detailer', '/planning', { partLineIds }, PlanningView, 200);

  beforeAll(async () => {
    shop = await openTestShop();
    shear = (await makeStation(shop)).id;
    await makeStation(shop, {
      ...SHEAR,
      name: 'Cold saw',
      method: 'saw',
      kerfNm: inches(0.125),
      families: ['tube', 'angle'],
    });
    const manager = await shop.as('manager');
    const settings = Shop.parse((await manager.get('/api/shop')).body);
    await manager
      .put('/api/shop')
      .send({ ...settings, scrapMinorPerTonne: 20_000 })
      .expect(200);
    const marlgate = (await makeSupplier(shop, 'Marlgate')).id;
    const quillon = (await makeSupplier(shop, 'Quillon')).id;
    const angle = { section: 'L3x3x1/4', grade: 'A36' };
    await makeOffer(shop, { ...angle, supplierId: marlgate, lengthFt: 20, priceMinor: 9800 });
    await makeOffer(shop, { ...angle, supplierId: quillon, lengthFt: 40, priceMinor: 19_000 });
    await makeOffer(shop, {
      ...angle,
      grade: 'A572-50',
      supplierId: quillon,
      lengthFt: 20,
      priceMinor: 5000,
    });
    for (const lengthIn of [100, 61, 60, 59.5]) await logDrop(shop, { ...angle, lengthIn });
    await logDrop(shop, { ...angle, grade: 'A572-50', lengthIn: 120 });
  });
  afterAll(() => shop.close());

  it('groups open lines by section and grade, with the stock of exactly that', async () => {
    const { lineIds } = await makeList(shop, '1', [
      'A1,4,L3x3x1/4,A36,60"',
      'A2,2,angle 3x3x1/4,A-36,7\'-6"',
      'B1,3,HSS2x2x3/16,A500B,50"',
      'P1,2,PL1/4x10,A36,20"',
      'A3,1,L3x3x1/4,A572-50,48"',
    ]);
    const view = await plan(lineIds);
    expect(view.groups.map(({ id }) => id)).toEqual([
      'L3x3x1/4|A36',
      'HSS2x2x3/16|A500B',
      'L3x3x1/4|A572-50',
    ]);
    const [angle, tube, strong] = view.groups;
    expect(
      angle?.pieces.map(({ mark, quantity, row, jobNumber }) => [mark, quantity, row, jobNumber]),
    ).toEqual([
      ['A1', 4, 2, '1'],
      ['A2', 2, 3, '1'],
    ]);
    expect(
      angle?.offers.map(({ supplierName, lengthNm, costMinor }) => [supplierName, lengthNm, costMinor]),
    ).toEqual([
      ['Marlgate', feet(20), 9800],
      ['Quillon', feet(40), 19_000],
    ]);
    // At least as long as the shortest piece, the longest first; those of another grade stay away.
    expect(angle?.drops.map(({ lengthNm }) => lengthNm)).toEqual([100, 61, 60].map(inches));
    // Cheapest a metre: 19 000 / 12.192 m = 1558.39…; half of it, rounded down. 4.9 lb/ft is 7.292 kg/m.
    expect(angle?.rule).toEqual({ keepFromNm: feet(3), creditMinorPerM: 779, scrapMinorPerM: 145 });
    // 100 in is 2.54 m at 779: 1978.66, rounded up.
    expect(angle?.drops[0]?.costMinor).toBe(1979);
    expect(angle?.usualLengthsNm).toContain(feet(20));
    expect(strong?.offers.map(({ costMinor }) => costMinor)).toEqual([5000]);
    // The first station by name that takes the family.
    expect(angle?.stationId).toBe(shear);
    expect(angle?.cutting).toEqual({
      kerfNm: 0,
      headCropNm: inches(0.25),
      tailCropNm: 0,
      holdDownNm: inches(4),
    });
    expect(tube?.cutting.kerfNm).toBe(inches(0.125));
    // Nobody offers the tube: no price, no credit.
    expect(tube?.rule).toMatchObject({ creditMinorPerM: 0, scrapMinorPerM: 0 });
    expect(tube?.usualLengthsNm.length).toBeGreaterThan(0);
    expect(view.left).toMatchObject([{ mark: 'P1', section: 'PL1/4x10' }]);
    expect(view.left[0]?.reason).toContain('by area');
  });

  it('offers what is not planned yet', async () => {
    const { lineIds } = await makeList(shop, '2', ['A1,4,L3x3x1/4,A36,60"', 'A2,2,L3x3x1/4,A36,90"']);
    const draft = await solveLines(shop, lineIds, (request) => ({
      ...request,
      groups: request.groups.map((group) => ({
        ...group,
        pieces: group.pieces.map((piece) => ({ ...piece, quantity: piece.mark === 'A1' ? 3 : 2 })),
      })),
    }));
    await saveDraft(shop, draft);
    const [group] = (await plan(lineIds)).groups;
    expect(group?.pieces.map(({ mark, quantity }) => [mark, quantity])).toEqual([['A1', 1]]);
  });

  it('makes no money by cutting, whatever share a manager credits', async () => {
    const { lineIds } = await makeList(shop, '3', ['A1,4,L3x3x1/4,A36,1"']);
    const manager = await shop.as('manager');
    const rule = { family: 'angle', keepFromNm: inches(1), creditPercent: 100, version: 1 };
    DropRule.parse((await manager.put('/api/drop-rules').send(rule)).body);
    const view = await plan(lineIds);
    expect(view.groups[0]?.rule.creditMinorPerM).toBe(1558);
    expect(findMoneyMakers(planRequest(view, defaultEdits(view), { seed: 1, timeLimitMs: 1000 }))).toEqual(
      [],
    );
  });

  it('names lines that are not there', async () => {
    const answer = await (await shop.as('detailer')).post('/api/planning').send({ partLineIds: [1, 77_777] });
    expect(refusal(answer)).toMatchObject({ code: 'bad-input', paths: ['partLineIds.1'] });
    const empty = await (await shop.as('detailer')).post('/api/planning').send({ partLineIds: [] });
    expect(refusal(empty).paths).toEqual(['partLineIds']);
  });
});
