import multer from 'multer';
import { z } from 'zod';
import { ShopError } from '#server/errors.ts';
import { route, type Route } from '#server/middleware/route.ts';
import { presentJob, presentPartLine, presentPartList } from '#server/presenters/jobs.ts';
import { changeJob, findJob, listJobs, makeJob } from '#server/services/jobs.ts';
import { findPartList, findPartListFile, listLines, listPartLists } from '#server/services/part-lists.ts';
import { removePartList, storePartList } from '#server/services/store-part-list.ts';
import { MOST_FILE_BYTES } from '#shared/domain/part-list/decode-file.ts';
import { roleMay, type Role } from '#shared/permissions.ts';
import { Id } from '#shared/schemas/common.ts';
import {
  Job,
  JobInput,
  JobList,
  JobView,
  PartLineList,
  PartListUpload,
  PartListView,
} from '#shared/schemas/jobs.ts';

/** The choices about a long list may be long themselves: a fix for every row. */
const MOST_DETAILS_BYTES = 8 * 1024 * 1024;
const upload = multer({
  storage: multer.memoryStorage(),
  limits: { fileSize: MOST_FILE_BYTES, files: 1, fields: 4, fieldSize: MOST_DETAILS_BYTES },
  defParamCharset: 'utf8',
});

const ByJob = z.object({ jobId: Id });
const ByPartList = z.object({ partListId: Id });
const Ids = z
  .string()
  .regex(/^\d+(,\d+)*$/, 'whole numbers with commas')
  .transform((text) => text.split(',').map(Number));

/** The JSON beside the file of a multipart upload. */
const Details = z.object({
  details: z
    .string()
    .transform((text, ctx): unknown => {
      try {
        return JSON.parse(text);
      } catch {
        ctx.addIssue({ code: 'custom', message: 'not JSON' });
        return z.NEVER;
      }
    })
    .pipe(PartListUpload),
});

async function viewPartList(partListId: number, role: Role) {
  const [list, lines] = await Promise.all([findPartList(partListId), listLines({ partListId })]);
  return { partList: presentPartList(list, role), lines: lines.map(presentPartLine) };
}

export const jobRoutes: Route[] = [
  route({ method: 'get', path: '/api/jobs', allow: 'job:read', answer: JobList }, async ({ actor }) => ({
    jobs: (await listJobs()).map((job) => presentJob(job, actor.role)),
    can: { 'job:edit': roleMay(actor.role, 'job:edit') },
  })),
  route(
    { method: 'post', path: '/api/jobs', allow: 'job:edit', body: JobInput, answer: Job, status: 201 },
    async ({ body, actor }) => presentJob(await makeJob(body, actor), actor.role),
  ),
  route(
    { method: 'get', path: '/api/jobs/:jobId', allow: 'job:read', params: ByJob, answer: JobView },
    async ({ params, actor }) => {
      const [job, partLists] = await Promise.all([findJob(params.jobId), listPartLists(params.jobId)]);
      return {
        job: presentJob(job, actor.role),
        partLists: partLists.map((list) => presentPartList(list, actor.role)),
      };
    },
  ),
  route(
    {
      method: 'put',
      path: '/api/jobs/:jobId',
      allow: 'job:edit',
      params: ByJob,
      body: JobInput,
      answer: Job,
    },
    async ({ params, body, actor }) => presentJob(await changeJob(params.jobId, body, actor), actor.role),
  ),
  route(
    {
      method: 'post',
      path: '/api/jobs/:jobId/part-lists',
      allow: 'part-list:edit',
      params: ByJob,
      before: [upload.single('file')],
      body: Details,
      answer: PartListView,
      status: 201,
    },
    async ({ params, body, actor, request }) => {
      if (!request.file)
        throw new ShopError('bad-input', 'No file came with the upload.', [
          { path: 'file', message: 'missing' },
        ]);
      const { originalname, buffer } = request.file;
      const id = await storePartList(
        params.jobId,
        { fileName: originalname, bytes: buffer, details: body.details },
        actor,
      );
      return viewPartList(id, actor.role);
    },
  ),
  route(
    {
      method: 'get',
      path: '/api/part-lists/:partListId',
      allow: 'part-list:read',
      params: ByPartList,
      answer: PartListView,
    },
    ({ params, actor }) => viewPartList(params.partListId, actor.role),
  ),
  route(
    { method: 'get', path: '/api/part-lists/:partListId/file', allow: 'part-list:read', params: ByPartList },
    async ({ params, response }) => {
      const { fileName, file } = await findPartListFile(params.partListId);
      response.attachment(fileName);
      // Whatever was uploaded, a browser saves it and never runs it.
      response.type('application/octet-stream').set('X-Content-Type-Options', 'nosniff').send(file);
      return undefined;
    },
  ),
  route(
    { method: 'delete', path: '/api/part-lists/:partListId', allow: 'part-list:edit', params: ByPartList },
    async ({ params, actor }) => {
      await removePartList(params.partListId, actor);
      return undefined;
    },
  ),
  route(
    {
      method: 'get',
      path: '/api/part-lines',
      allow: 'part-list:read',
      query: z.object({
        jobIds: Ids.optional(),
        partListId: Id.optional(),
        open: z.enum(['0', '1']).optional(),
      }),
      answer: PartLineList,
    },
    async ({ query }) => ({
      lines: (
        await listLines({
          ...(query.jobIds ? { jobIds: query.jobIds } : {}),
          ...(query.partListId ? { partListId: query.partListId } : {}),
          open: query.open === '1',
        })
      ).map(presentPartLine),
    }),
  ),
];
