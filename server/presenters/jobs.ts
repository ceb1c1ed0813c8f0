import type { JobWithCounts } from '#server/services/jobs.ts';
import type { LineWithCounts, ListWithFacts } from '#server/services/part-lists.ts';
import { roleMay, type Role } from '#shared/permissions.ts';
import type { Job, PartLine, PartListSummary } from '#shared/schemas/jobs.ts';

export const presentJob = ({ job, counts }: JobWithCounts, role: Role): Job => ({
  id: job.id,
  number: job.number,
  name: job.name,
  customer: job.customer,
  ...counts,
  createdAt: job.createdAt,
  version: job.version,
  can: {
    'job:edit': roleMay(role, 'job:edit'),
    'part-list:edit': roleMay(role, 'part-list:edit'),
    'plan:draft': roleMay(role, 'plan:draft'),
  },
});

export const presentPartList = (
  { list, jobNumber, uploadedBy, lines, pieces, massMg, inPlans }: ListWithFacts,
  role: Role,
): PartListSummary => ({
  id: list.id,
  jobId: list.jobId,
  jobNumber,
  name: list.name,
  revision: list.revision,
  fileName: list.fileName,
  fileSha256: list.fileSha256,
  fileBytes: list.fileBytes,
  unit: list.unit,
  lines,
  pieces,
  skippedRows: list.skippedRows,
  massMg,
  uploadedBy,
  uploadedAt: list.uploadedAt,
  version: list.version,
  can: {
    'part-list:edit': roleMay(role, 'part-list:edit'),
    'part-list:remove': roleMay(role, 'part-list:edit') && inPlans === 0,
    'plan:draft': roleMay(role, 'plan:draft'),
  },
});

export const presentPartLine = ({ line, jobId, jobNumber, planned, cut }: LineWithCounts): PartLine => ({
  id: line.id,
  partListId: line.partListId,
  jobId,
  jobNumber,
  row: line.row,
  mark: line.mark,
  quantity: line.quantity,
  planned,
  cut,
  section: line.section,
  stockKey: line.stockKey,
  family: line.family,
  sectionText: line.sectionText,
  grade: line.grade,
  lengthNm: line.lengthNm,
  widthNm: line.widthNm ?? null,
  pieceMassMg: line.pieceMassMg,
  note: line.note,
  finish: line.finish,
  neededBy: line.neededBy,
  remarks: JSON.parse(line.remarks) as string[],
});
