import { z } from 'zod';
import { PART_FIELDS } from '#shared/domain/part-list/types.ts';
import { Can, FamilyName, Instant, OptionalText, Text, UnitName, Version } from '#shared/schemas/common.ts';

export const JobInput = z.strictObject({
  number: Text(20),
  name: Text(80),
  customer: OptionalText(80),
  version: Version.optional(),
});
export const Job = z.object({
  id: z.int(),
  number: z.string(),
  name: z.string(),
  customer: z.string(),
  partLists: z.int(),
  pieces: z.int(),
  piecesPlanned: z.int(),
  piecesCut: z.int(),
  createdAt: Instant,
  version: z.int(),
  can: Can,
});
export const JobList = z.object({ jobs: z.array(Job), can: Can });

const FieldName = z.enum(PART_FIELDS);

/** The person's choices about a file; the server reads the file again with them and trusts nothing else. */
export const PartListChoicesInput = z.strictObject({
  unit: UnitName.optional(),
  mapping: z.partialRecord(FieldName, z.int().min(0).max(500)).optional(),
  fixes: z.record(z.coerce.number().int(), z.partialRecord(FieldName, z.string().max(400))).optional(),
  skips: z.array(z.int().min(1)).optional(),
});
/** Multipart field `details` beside the file field `file`. */
export const PartListUpload = z.strictObject({
  name: Text(80),
  revision: OptionalText(20),
  choices: PartListChoicesInput,
});

export const PartListSummary = z.object({
  id: z.int(),
  jobId: z.int(),
  jobNumber: z.string(),
  name: z.string(),
  revision: z.string(),
  fileName: z.string(),
  fileSha256: z.string(),
  fileBytes: z.int(),
  unit: UnitName,
  lines: z.int(),
  pieces: z.int(),
  skippedRows: z.int(),
  massMg: z.int(),
  uploadedBy: z.string(),
  uploadedAt: Instant,
  version: z.int(),
  can: Can,
});
export const PartLine = z.object({
  id: z.int(),
  partListId: z.int(),
  jobId: z.int(),
  jobNumber: z.string(),
  row: z.int(),
  mark: z.string(),
  quantity: z.int(),
  /** Pieces standing in plans that are not withdrawn, drafts included. */
  planned: z.int(),
  cut: z.int(),
  section: z.string(),
  stockKey: z.string(),
  family: FamilyName,
  sectionText: z.string(),
  grade: z.string(),
  lengthNm: z.int(),
  widthNm: z.int().nullable(),
  pieceMassMg: z.int(),
  note: z.string(),
  finish: z.string(),
  neededBy: z.string(),
  remarks: z.array(z.string()),
});
export const PartListView = z.object({ partList: PartListSummary, lines: z.array(PartLine) });
export const JobView = z.object({ job: Job, partLists: z.array(PartListSummary) });
export const PartLineList = z.object({ lines: z.array(PartLine) });

export type Job = z.infer<typeof Job>;
export type JobInput = z.infer<typeof JobInput>;
export type JobView = z.infer<typeof JobView>;
export type PartListSummary = z.infer<typeof PartListSummary>;
export type PartListUpload = z.infer<typeof PartListUpload>;
export type PartListView = z.infer<typeof PartListView>;
export type PartLine = z.infer<typeof PartLine>;
