/** A part list is the bytes that came in and the choices made about them; its lines are read here again from both. */
import { createHash } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/middleware/route.ts';
import { JobRow, PartLineRow, PartListRow, Person } from '#server/models/index.ts';
import { expectFound } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { CUT_SQL, PLANNED_SQL } from '#server/services/jobs.ts';
import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import type { PartListChoices } from '#shared/domain/part-list/types.ts';
import type { PartListUpload } from '#shared/schemas/jobs.ts';

export type LineWithCounts = { line: PartLineRow; jobId: number; jobNumber: string; planned: number; cut: number };
export type ListWithFacts = { list: PartListRow; jobNumber: string; uploadedBy: string; lines: number; pieces: number; massMg: number; planned: number };

type Upload = { fileName: string; bytes: Buffer; details: PartListUpload };

/** zod allows a key with undefined where the domain wants it absent. */
function choicesOf({ choices }: PartListUpload): PartListChoices {
  return JSON.parse(JSON.stringify(choices)) as PartListChoices;
}

/** Reads the bytes again and stores the list, or says by row what still stands in the way. Nothing is stored in part. */
export async function storePartList(jobId: number, { fileName, bytes, details }: Upload, actor: Actor): Promise<number> {
  const choices = choicesOf(details);
  const reading = readPartList(new Uint8Array(bytes), choices);
  if (reading.fatal) throw new ShopError('file-unreadable', reading.fatal.message);
  if (reading.problems.length > 0)
    throw new ShopError(
      'bad-input',
      `${reading.problems.length} of the rows still need you. Fix them or leave them out.`,
      reading.problems.map(({ row, column, message }) => ({ row, path: column ?? 'row', message })),
    );
  if (reading.lines.length === 0) throw new ShopError('file-unreadable', 'No line of the file is left to store.');
  const fileSha256 = createHash('sha256').update(bytes).digest('hex');
  return write(async () => {
    const job = expectFound(await JobRow.findByPk(jobId), 'job');
    const twin = await PartListRow.findOne({ where: { jobId, fileSha256, revision: details.revision } });
    if (twin)
      throw new ShopError('already-there', `Job ${job.number} already has this very file as "${twin.name}". Give it another revision if it is meant twice.`);
    const list = await PartListRow.create({
      jobId,
      name: details.name,
      revision: details.revision,
      fileName,
      fileSha256,
      file: bytes,
      fileBytes: bytes.length,
      unit: reading.unit,
      choices: JSON.stringify({ ...choices, unit: reading.unit, mapping: reading.mapping }),
      skippedRows: reading.ignored.filter(({ kind }) => kind === 'skipped').length,
      uploadedById: actor.id,
      uploadedAt: new Date().toISOString(),
    });
    await PartLineRow.bulkCreate(
      reading.lines.map((line) => ({
        partListId: list.id,
        row: line.row,
        mark: line.mark,
        quantity: line.quantity,
        section: line.section,
        stockKey: line.stockKey,
        family: line.family,
        sectionText: line.sectionText,
        grade: line.grade,
        lengthNm: line.lengthNm,
        widthNm: line.widthNm ?? null,
        pieceMassMg: line.pieceMassMg,
        note: line.note ?? '',
        finish: line.finish ?? '',
        neededBy: line.neededBy ?? '',
        remarks: JSON.stringify(line.remarks),
      })),
    );
    await record(actor, 'part-list:upload', `part list ${list.name} of job ${job.number}`, { fileName, fileSha256, lines: reading.lines.length });
    return list.id;
  });
}

async function factsOf(where: string, bind: unknown[]) {
  const sequelize = PartListRow.sequelize;
  if (!sequelize) throw new Error('no database is open');
  const rows = await sequelize.query<{ id: number; lines: number; pieces: number; massMg: number; planned: number }>(
    `SELECT l."id" AS "id", count(n."id") AS "lines", coalesce(sum(n."quantity"), 0) AS "pieces",
       coalesce(sum(n."quantity" * n."pieceMassMg"), 0) AS "massMg", coalesce(sum(pl."planned"), 0) AS "planned"
     FROM "part_lists" l LEFT JOIN "part_lines" n ON n."partListId" = l."id"
     LEFT JOIN (${PLANNED_SQL}) pl ON pl."partLineId" = n."id" WHERE ${where} GROUP BY l."id"`,
    { bind, type: QueryTypes.SELECT },
  );
  return new Map(rows.map((row) => [row.id, row]));
}

const WITHOUT_FILE = { attributes: { exclude: ['file'] } };

async function withFacts(lists: PartListRow[], facts: Awaited<ReturnType<typeof factsOf>>): Promise<ListWithFacts[]> {
  const [jobs, people] = await Promise.all([JobRow.findAll(), Person.findAll()]);
  const numbers = new Map(jobs.map(({ id, number }) => [id, number]));
  const names = new Map(people.map(({ id, name }) => [id, name]));
  return lists.map((list) => {
    const { lines = 0, pieces = 0, massMg = 0, planned = 0 } = facts.get(list.id) ?? {};
    return { list, jobNumber: numbers.get(list.jobId) ?? '', uploadedBy: names.get(list.uploadedById) ?? '', lines, pieces, massMg, planned };
  });
}

export async function listPartLists(jobId: number): Promise<ListWithFacts[]> {
  const lists = await PartListRow.findAll({ where: { jobId }, order: [['id', 'DESC']], ...WITHOUT_FILE });
  return withFacts(lists, await factsOf('l."jobId" = $1', [jobId]));
}

export async function findPartList(partListId: number): Promise<ListWithFacts> {
  const list = expectFound(await PartListRow.findByPk(partListId, WITHOUT_FILE), 'part list');
  const [found] = await withFacts([list], await factsOf('l."id" = $1', [partListId]));
  return expectFound(found, 'part list');
}

/** The original file, byte for byte. */
export async function findPartListFile(partListId: number): Promise<{ fileName: string; file: Buffer }> {
  const { fileName, file } = expectFound(await PartListRow.findByPk(partListId), 'part list');
  return { fileName, file };
}

type LineQuery = { partListId?: number; jobIds?: readonly number[]; partLineIds?: readonly number[]; open?: boolean };

/** Lines with what is planned and cut of them; `open` leaves out those that are planned in full. */
export async function listLines(query: LineQuery): Promise<LineWithCounts[]> {
  const lists = await PartListRow.findAll({
    ...(query.jobIds ? { where: { jobId: [...query.jobIds] } } : query.partListId ? { where: { id: query.partListId } } : {}),
    ...WITHOUT_FILE,
  });
  const jobs = new Map((await JobRow.findAll()).map((job) => [job.id, job]));
  const listsById = new Map(lists.map((list) => [list.id, list]));
  const lines = await PartLineRow.findAll({
    where: query.partLineIds ? { id: [...query.partLineIds] } : { partListId: lists.map(({ id }) => id) },
    order: [['partListId', 'ASC'], ['row', 'ASC']],
  });
  const sequelize = PartLineRow.sequelize;
  if (!sequelize) throw new Error('no database is open');
  const [planned, cut] = await Promise.all([
    sequelize.query<{ partLineId: number; planned: number }>(PLANNED_SQL, { type: QueryTypes.SELECT }),
    sequelize.query<{ partLineId: number; cut: number }>(CUT_SQL, { type: QueryTypes.SELECT }),
  ]);
  const plannedBy = new Map(planned.map((row) => [row.partLineId, row.planned]));
  const cutBy = new Map(cut.map((row) => [row.partLineId, row.cut]));
  return lines.flatMap((line) => {
    const list = listsById.get(line.partListId);
    const job = list ? jobs.get(list.jobId) : undefined;
    if (!job) return [];
    const entry = { line, jobId: job.id, jobNumber: job.number, planned: plannedBy.get(line.id) ?? 0, cut: cutBy.get(line.id) ?? 0 };
    return query.open && entry.planned >= line.quantity ? [] : [entry];
  });
}

export function removePartList(partListId: number, actor: Actor): Promise<void> {
  return write(async () => {
    const { list } = await findPartList(partListId);
    const sequelize = PartLineRow.sequelize;
    const [used] =
      (await sequelize?.query<{ n: number }>(
        `SELECT count(*) AS n FROM "plan_pieces" pp JOIN "part_lines" n ON n."id" = pp."partLineId" WHERE n."partListId" = $1`,
        { bind: [partListId], type: QueryTypes.SELECT },
      )) ?? [];
    if ((used?.n ?? 0) > 0) throw new ShopError('wrong-state', `Lines of "${list.name}" stand in plans, so the list stays.`);
    await PartListRow.destroy({ where: { id: partListId } });
    await record(actor, 'part-list:remove', `part list ${list.name}`, { fileSha256: list.fileSha256 });
  });
}
