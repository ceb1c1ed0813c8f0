import { readFileSync } from 'node:fs';
import { QueryTypes, type DatabaseError } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { read, post } from '#tests/support/shop-work.ts';
import { openTestShop, type TestShop } from '#tests/support/test-shop.ts';
import { checkPlan } from '#shared/domain/check-plan.ts';
import { barMassMg } from '#shared/domain/mass.ts';
import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import { MG_PER_LB } from '#shared/domain/units.ts';
import { ROLES } from '#shared/permissions.ts';
import { JobList, PartLineList } from '#shared/schemas/jobs.ts';
import { PlanList, PlanningView, PlanView } from '#shared/schemas/plans.ts';
import { DropList } from '#shared/schemas/rack.ts';
import { OfferList, StationList, SupplierList } from '#shared/schemas/yard.ts';

describe('the demo shop', () => {
  let shop: TestShop;
  beforeAll(async () => {
    shop = await openTestShop({ demo: true });
  });
  afterAll(() => shop.close());
  const get = async (path: string) => (await shop.as('manager')).get(`/api${path}`);

  it('lets every role in', async () => {
    for (const role of ROLES) expect((await (await shop.as(role)).get('/api/jobs')).status).toBe(200);
  });

  it('has stations, suppliers and offers at prices of the trade', async () => {
    const { stations } = read(await get('/stations'), 200, StationList);
    expect(stations.length).toBe(3);
    expect(read(await get('/suppliers'), 200, SupplierList).suppliers.length).toBe(3);
    const { offers } = read(await get('/offers'), 200, OfferList);
    for (const { priceMinor, massMg } of offers) {
      const centsPerLb = priceMinor / (massMg / MG_PER_LB);
      expect(centsPerLb).toBeGreaterThan(65);
      expect(centsPerLb).toBeLessThan(111);
    }
  });

  it('has a rack with slots, heats known and unknown', async () => {
    const { drops } = read(await get('/drops?state=all'), 200, DropList);
    expect(drops.length).toBeGreaterThanOrEqual(30);
    expect(drops.filter(({ heat }) => heat === null).length).toBeGreaterThan(5);
    expect(drops.every(({ slot }) => /^[A-E]-\d-\d$/.test(slot))).toBe(true);
    expect(new Set(drops.map(({ state }) => state))).toEqual(
      new Set(['racked', 'held', 'cut', 'scrapped', 'missing']),
    );
  });

  it('has an issued plan partly cut and a draft, both true', async () => {
    const { plans } = read(await get('/plans'), 200, PlanList);
    expect(plans.map(({ number, state }) => [number, state])).toEqual([
      [102, 'draft'],
      [101, 'cutting'],
    ]);
    for (const { id } of plans) {
      const { groups, bars, plan } = read(await get(`/plans/${id}`), 200, PlanView);
      const request = {
        version: 1 as const,
        seed: 1,
        timeLimitMs: 1,
        groups: groups.map((group) => group.request),
      };
      expect(checkPlan(request, { version: 1, groups: groups.map(({ result }) => result) })).toEqual([]);
      expect(groups.flatMap(({ result }) => result.unplaced)).toEqual([]);
      expect(bars.filter(({ state }) => state === 'cut').length).toBe(plan.barsCut);
    }
  });

  it('has three jobs, and everything left in them can be planned with what is offered', async () => {
    const { jobs } = read(await get('/jobs'), 200, JobList);
    expect(jobs.length).toBe(3);
    const { lines } = read(
      await get(`/part-lines?jobIds=${jobs.map(({ id }) => id).join(',')}&open=1`),
      200,
      PartLineList,
    );
    const view = await post(
      shop,
      'detailer',
      '/planning',
      { partLineIds: lines.map(({ id }) => id) },
      PlanningView,
      200,
    );
    expect(view.left).toEqual([]);
    for (const group of view.groups) {
      expect(group.offers.length, group.id).toBeGreaterThan(0);
      expect(group.stationId, group.id).not.toBeNull();
      const longest = Math.max(...group.offers.map(({ lengthNm }) => lengthNm));
      for (const piece of group.pieces) expect(piece.lengthNm).toBeLessThan(longest);
    }
  });

  it('offers a longer bar than any piece of the mixed list, in its grades', async () => {
    const { offers } = read(await get('/offers'), 200, OfferList);
    const lines = readPartList(readFileSync('fixtures/csv/mixed-300.csv'), {}).lines;
    const without = lines.filter(
      ({ stockKey, grade, lengthNm }) =>
        !offers.some(
          (offer) => offer.stockKey === stockKey && offer.grade === grade && offer.lengthNm > lengthNm,
        ),
    );
    expect(without.map(({ row, section, grade }) => `${row} ${section} ${grade}`)).toEqual([]);
    expect(lines.length).toBeGreaterThan(280);
  });

  it('keeps every length, mass and sum of money as a whole number', async () => {
    const { sequelize } = shop.database;
    const columns = await sequelize.query<{ tableName: string; name: string; type: string }>(
      `SELECT m.name AS tableName, p.name, p.type FROM sqlite_master m JOIN pragma_table_info(m.name) p WHERE m.type = 'table' AND m.name NOT LIKE 'sqlite_%'`,
      { type: QueryTypes.SELECT },
    );
    expect(columns.filter(({ type }) => !/^(INTEGER|TEXT|BLOB|VARCHAR\(255\))$/.test(type))).toEqual([]);
    for (const { tableName, name } of columns.filter(({ type }) => type === 'INTEGER')) {
      const [row] = await sequelize.query<{ n: number }>(
        `SELECT count(*) AS n FROM "${tableName}" WHERE typeof("${name}") NOT IN ('integer', 'null')`,
        { type: QueryTypes.SELECT },
      );
      expect(row?.n, `${tableName}.${name}`).toBe(0);
    }
    expect(barMassMg(7_292_000, 1_000_000_000)).toBe(7_292_000);
  });

  it('the database itself refuses what cannot be', async () => {
    const { sequelize } = shop.database;
    for (const statement of [
      `UPDATE "drops" SET "state" = 'lost'`,
      `UPDATE "drops" SET "state" = 'held' WHERE "heldByPlanId" IS NULL`,
      `UPDATE "drops" SET "lengthNm" = 0`,
      `UPDATE "drops" SET "tag" = 1`,
      `UPDATE "bars" SET "state" = 'waiting' WHERE "state" = 'cut'`,
      `UPDATE "bars" SET "number" = 1`,
      `UPDATE "plans" SET "stationId" = 999`,
      `UPDATE "plans" SET "state" = 'issued' WHERE "state" = 'draft' AND "issuedAt" IS NULL`,
      `UPDATE "plan_groups" SET "netMillionths" = "netMillionths" + 0.5`,
      `UPDATE "plan_groups" SET "boundMillionths" = "netMillionths" + 1`,
      `UPDATE "offers" SET "priceMinor" = -1`,
      `UPDATE "stations" SET "kerfNm" = 1 WHERE "method" = 'shear'`,
      `UPDATE "part_lines" SET "quantity" = 0`,
      `DELETE FROM "part_lines"`,
      `DELETE FROM "suppliers"`,
      `DELETE FROM "jobs"`,
    ])
      await expect(
        sequelize.query(statement).catch((error: DatabaseError) => error.parent.message),
        statement,
      ).resolves.toMatch(/constraint failed/i);
  });
});
