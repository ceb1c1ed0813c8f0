/** Plans in figures, for lists and heads: counted by the database, because a year of plans is many rows. */
import { PlanRow, Person, StationRow } from '#server/models/index.ts';
import { expectFound } from '#server/policies/version.ts';
import { idList, select } from '#server/services/select.ts';
import { groupBy } from '#shared/domain/group-by.ts';

export type PlanCounts = {
  groups: number;
  pieces: number;
  bars: number;
  barsCut: number;
  newBars: number;
  dropsUsed: number;
  netMillionths: number;
  boundMillionths: number;
};
export type PlanFacts = PlanCounts & {
  plan: PlanRow;
  jobs: { id: number; number: string; name: string }[];
  stationName: string | null;
  createdBy: string;
};

type JobOfPlan = { planId: number; id: number; number: string; name: string };

const countsSql = (plans: string) => `
  SELECT p."id" AS "planId", coalesce(g."groups", 0) AS "groups", coalesce(n."pieces", 0) AS "pieces",
    coalesce(l."bars", 0) AS "bars", coalesce(b."barsCut", 0) AS "barsCut",
    coalesce(l."bars" - l."dropsUsed", 0) AS "newBars", coalesce(l."dropsUsed", 0) AS "dropsUsed",
    coalesce(g."net", 0) AS "netMillionths", coalesce(g."bound", 0) AS "boundMillionths"
  FROM "plans" p
  LEFT JOIN (SELECT "planId", count(*) AS "groups", sum("netMillionths") AS "net", sum("boundMillionths") AS "bound"
    FROM "plan_groups" WHERE "planId" IN ${plans} GROUP BY "planId") g ON g."planId" = p."id"
  LEFT JOIN (SELECT g."planId", sum(pp."quantity" - pp."unplaced") AS "pieces"
    FROM "plan_groups" g JOIN "plan_pieces" pp ON pp."groupId" = g."id"
    WHERE g."planId" IN ${plans} GROUP BY g."planId") n ON n."planId" = p."id"
  LEFT JOIN (SELECT g."planId", sum(l."repeat") AS "bars", sum(l."repeat" * (s."source" = 'drop')) AS "dropsUsed"
    FROM "plan_groups" g JOIN "plan_layouts" l ON l."groupId" = g."id" JOIN "plan_stock" s ON s."id" = l."stockId"
    WHERE g."planId" IN ${plans} GROUP BY g."planId") l ON l."planId" = p."id"
  LEFT JOIN (SELECT "planId", count(*) AS "barsCut" FROM "bars"
    WHERE "state" = 'cut' AND "planId" IN ${plans} GROUP BY "planId") b ON b."planId" = p."id"
  WHERE p."id" IN ${plans}`;

const jobsSql = (plans: string) => `
  SELECT DISTINCT g."planId" AS "planId", j."id" AS "id", j."number" AS "number", j."name" AS "name"
  FROM "plan_groups" g JOIN "plan_pieces" pp ON pp."groupId" = g."id" JOIN "part_lines" n ON n."id" = pp."partLineId"
    JOIN "part_lists" l ON l."id" = n."partListId" JOIN "jobs" j ON j."id" = l."jobId"
  WHERE g."planId" IN ${plans} ORDER BY j."number"`;

async function factsOf(plans: readonly PlanRow[]): Promise<PlanFacts[]> {
  const ids = idList(plans.map(({ id }) => id));
  const [counts, jobRows, people, stations] = await Promise.all([
    select<PlanCounts & { planId: number }>(countsSql(ids)),
    select<JobOfPlan>(jobsSql(ids)),
    Person.findAll(),
    StationRow.findAll(),
  ]);
  const countsById = new Map(counts.map(({ planId, ...rest }) => [planId, rest]));
  const jobsById = groupBy(jobRows, ({ planId }) => planId);
  const names = new Map(people.map(({ id, name }) => [id, name]));
  const stationNames = new Map(stations.map(({ id, name }) => [id, name]));
  return plans.map((plan) => ({
    plan,
    ...expectFound(countsById.get(plan.id), 'plan'),
    jobs: (jobsById.get(plan.id) ?? []).map(({ id, number, name }) => ({ id, number, name })),
    stationName: stationNames.get(plan.stationId ?? 0) ?? null,
    createdBy: names.get(plan.createdById) ?? '',
  }));
}

/** The newest first. */
export async function listPlans(): Promise<PlanFacts[]> {
  return factsOf(await PlanRow.findAll({ order: [['number', 'DESC']] }));
}

export async function findPlanFacts(planId: number): Promise<PlanFacts> {
  const [facts] = await factsOf([expectFound(await PlanRow.findByPk(planId), 'plan')]);
  return expectFound(facts, 'plan');
}
