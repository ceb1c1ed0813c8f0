import { write } from '#server/database.ts';
import type { Actor } from '#server/policies/actor.ts';
import { JobRow } from '#server/models/index.ts';
import { expectFound, expectVersion } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { cutSql, plannedSql } from '#server/services/line-counts.ts';
import { refuseTwin } from '#server/services/refuse-twin.ts';
import { select } from '#server/services/select.ts';
import type { JobInput } from '#shared/schemas/jobs.ts';

export type JobCounts = { partLists: number; pieces: number; piecesPlanned: number; piecesCut: number };
export type JobWithCounts = { job: JobRow; counts: JobCounts };

const NOTHING: JobCounts = { partLists: 0, pieces: 0, piecesPlanned: 0, piecesCut: 0 };

async function countsByJob(): Promise<Map<number, JobCounts>> {
  const rows = await select<JobCounts & { jobId: number }>(
    `SELECT l."jobId" AS "jobId", count(DISTINCT l."id") AS "partLists", coalesce(sum(n."quantity"), 0) AS "pieces",
       coalesce(sum(pl."count"), 0) AS "piecesPlanned", coalesce(sum(ct."count"), 0) AS "piecesCut"
     FROM "part_lists" l LEFT JOIN "part_lines" n ON n."partListId" = l."id"
     LEFT JOIN (${plannedSql()}) pl ON pl."partLineId" = n."id"
     LEFT JOIN (${cutSql()}) ct ON ct."partLineId" = n."id"
     GROUP BY l."jobId"`,
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

const numbered = <T>(number: string, work: () => Promise<T>): Promise<T> =>
  refuseTwin(
    `There is already a job ${number}.`,
    [{ path: 'number', message: `job ${number} exists already` }],
    work,
  );

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
