import { QueryTypes, UniqueConstraintError } from 'sequelize';
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/middleware/route.ts';
import { JobRow } from '#server/models/index.ts';
import { expectFound, expectVersion } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import type { JobInput } from '#shared/schemas/jobs.ts';

export type JobCounts = { partLists: number; pieces: number; piecesPlanned: number; piecesCut: number };
export type JobWithCounts = { job: JobRow; counts: JobCounts };

const NOTHING: JobCounts = { partLists: 0, pieces: 0, piecesPlanned: 0, piecesCut: 0 };

/** Pieces of a part line standing in plans that are not withdrawn, and those of bars already cut. */
export const PLANNED_SQL = `
  SELECT pp."partLineId" AS "partLineId", sum(pp."quantity" - pp."unplaced") AS "planned"
  FROM "plan_pieces" pp JOIN "plan_groups" g ON g."id" = pp."groupId" JOIN "plans" p ON p."id" = g."planId"
  WHERE p."state" <> 'withdrawn' GROUP BY pp."partLineId"`;
export const CUT_SQL = `
  SELECT c."partLineId" AS "partLineId", count(*) AS "cut"
  FROM "bars" b JOIN "plan_cuts" c ON c."layoutId" = b."layoutId"
  WHERE b."state" = 'cut' GROUP BY c."partLineId"`;

async function countsByJob(): Promise<Map<number, JobCounts>> {
  const sequelize = JobRow.sequelize;
  if (!sequelize) throw new Error('no database is open');
  const rows = await sequelize.query<JobCounts & { jobId: number }>(
    `SELECT l."jobId" AS "jobId", count(DISTINCT l."id") AS "partLists", coalesce(sum(n."quantity"), 0) AS "pieces",
       coalesce(sum(pl."planned"), 0) AS "piecesPlanned", coalesce(sum(ct."cut"), 0) AS "piecesCut"
     FROM "part_lists" l LEFT JOIN "part_lines" n ON n."partListId" = l."id"
     LEFT JOIN (${PLANNED_SQL}) pl ON pl."partLineId" = n."id"
     LEFT JOIN (${CUT_SQL}) ct ON ct."partLineId" = n."id"
     GROUP BY l."jobId"`,
    { type: QueryTypes.SELECT },
  );
  return new Map(rows.map(({ jobId, ...counts }) => [jobId, counts]));
}

export async function listJobs(): Promise<JobWithCounts[]> {
  const [jobs, counts] = await Promise.all([JobRow.findAll({ order: [['number', 'DESC']] }), countsByJob()]);
  return jobs.map((job) => ({ job, counts: counts.get(job.id) ?? NOTHING }));
}

export async function findJob(jobId: number): Promise<JobWithCounts> {
  const [job, counts] = await Promise.all([JobRow.findByPk(jobId), countsByJob()]);
  return { job: expectFound(job, 'job'), counts: counts.get(jobId) ?? NOTHING };
}

async function numbered<T>(number: string, work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof UniqueConstraintError)
      throw new ShopError('already-there', `There is already a job ${number}.`, [{ path: 'number', message: `job ${number} exists` }]);
    throw error;
  }
}

export function makeJob(input: JobInput, actor: Actor | null): Promise<JobWithCounts> {
  return write(() =>
    numbered(input.number, async () => {
      const { number, name, customer } = input;
      const job = await JobRow.create({ number, name, customer, createdAt: new Date().toISOString() });
      await record(actor, 'job:make', `job ${number}`, { name, customer });
      return { job, counts: NOTHING };
    }),
  );
}

export async function changeJob(jobId: number, input: JobInput, actor: Actor): Promise<JobWithCounts> {
  await write(() =>
    numbered(input.number, async () => {
      const job = expectFound(await JobRow.findByPk(jobId), 'job');
      const { version, ...details } = input;
      expectVersion(job, version, `job ${job.number}`);
      await job.update({ ...details, version: job.version + 1 });
      await record(actor, 'job:edit', `job ${job.number}`, details);
    }),
  );
  return findJob(jobId);
}
