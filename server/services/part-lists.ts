/** Part lists and their lines as they stand, with what is planned and cut of them. */
import { JobRow, PartLineRow, PartListRow, Person } from '#server/models/index.ts';
import { expectFound } from '#server/policies/version.ts';
import { countCut, countPlanned } from '#server/services/line-counts.ts';
import { idList, select } from '#server/services/select.ts';

export type LineWithCounts = {
  line: PartLineRow;
  jobId: number;
  jobNumber: string;
  planned: number;
  cut: number;
};
type ListFacts = {
  lines: number;
  pieces: number;
  massMg: number;
  /** Lines that stand in a plan, withdrawn ones too. */
  inPlans: number;
};
export type ListWithFacts = ListFacts & { list: PartListRow; jobNumber: string; uploadedBy: string };

/** The bytes stay where they are unless somebody asks for them. */
const WITHOUT_FILE = { attributes: { exclude: ['file'] } };

async function withFacts(lists: PartListRow[]): Promise<ListWithFacts[]> {
  const [rows, jobs, people] = await Promise.all([
    select<ListFacts & { id: number }>(
      `SELECT n."partListId" AS "id", count(*) AS "lines", sum(n."quantity") AS "pieces",
         sum(n."quantity" * n."pieceMassMg") AS "massMg",
         sum(EXISTS (SELECT 1 FROM "plan_pieces" pp WHERE pp."partLineId" = n."id")) AS "inPlans"
       FROM "part_lines" n WHERE n."partListId" IN ${idList(lists.map(({ id }) => id))} GROUP BY n."partListId"`,
    ),
    JobRow.findAll(),
    Person.findAll(),
  ]);
  const facts = new Map(rows.map(({ id, ...counts }) => [id, counts]));
  const numbers = new Map(jobs.map(({ id, number }) => [id, number]));
  const names = new Map(people.map(({ id, name }) => [id, name]));
  return lists.map((list) => ({
    list,
    jobNumber: numbers.get(list.jobId) ?? '',
    uploadedBy: names.get(list.uploadedById) ?? '',
    ...(facts.get(list.id) ?? { lines: 0, pieces: 0, massMg: 0, inPlans: 0 }),
  }));
}

export async function listPartLists(jobId: number): Promise<ListWithFacts[]> {
  return withFacts(await PartListRow.findAll({ where: { jobId }, order: [['id', 'DESC']], ...WITHOUT_FILE }));
}

export async function findPartList(partListId: number): Promise<ListWithFacts> {
  const list = expectFound(await PartListRow.findByPk(partListId, WITHOUT_FILE), 'part list');
  const [found] = await withFacts([list]);
  return expectFound(found, 'part list');
}

/** The original file, byte for byte. */
export async function findPartListFile(partListId: number): Promise<{ fileName: string; file: Buffer }> {
  const { fileName, file } = expectFound(await PartListRow.findByPk(partListId), 'part list');
  return { fileName, file };
}

type LineQuery = {
  partListId?: number;
  jobIds?: readonly number[];
  partLineIds?: readonly number[];
  open?: boolean;
};

/** Lines with what is planned and cut of them; `open` leaves out those that are planned in full. */
export async function listLines(query: LineQuery): Promise<LineWithCounts[]> {
  const lists = await PartListRow.findAll({
    ...(query.jobIds
      ? { where: { jobId: [...query.jobIds] } }
      : query.partListId
        ? { where: { id: query.partListId } }
        : {}),
    ...WITHOUT_FILE,
  });
  const [jobs, lines] = await Promise.all([
    JobRow.findAll(),
    PartLineRow.findAll({
      where: query.partLineIds ? { id: [...query.partLineIds] } : { partListId: lists.map(({ id }) => id) },
      order: [
        ['partListId', 'ASC'],
        ['row', 'ASC'],
      ],
    }),
  ]);
  const lineIds = lines.map(({ id }) => id);
  const [planned, cut] = await Promise.all([countPlanned(lineIds), countCut(lineIds)]);
  const jobById = new Map(jobs.map((job) => [job.id, job]));
  const jobOfList = new Map(lists.map(({ id, jobId }) => [id, jobById.get(jobId)]));
  return lines.flatMap((line) => {
    const job = jobOfList.get(line.partListId);
    if (!job) return [];
    const entry = {
      line,
      jobId: job.id,
      jobNumber: job.number,
      planned: planned.get(line.id) ?? 0,
      cut: cut.get(line.id) ?? 0,
    };
    return query.open && entry.planned >= line.quantity ? [] : [entry];
  });
}
