/** A part list is the bytes that came in and the choices made about them; its lines are read here again from both. */
import { createHash } from 'node:crypto';
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import { JobRow, PartLineRow, PartListRow } from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';
import { expectFound } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { findPartList } from '#server/services/part-lists.ts';
import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import type { PartListChoices, PartListLine } from '#shared/domain/part-list/types.ts';
import type { PartListUpload } from '#shared/schemas/jobs.ts';

type Upload = { fileName: string; bytes: Buffer; details: PartListUpload };

/** zod allows a key with undefined where the domain wants it absent. */
function choicesOf({ choices }: PartListUpload): PartListChoices {
  return JSON.parse(JSON.stringify(choices)) as PartListChoices;
}

/** The name alone, without folders and control characters, so that it may stand in a header and on a page. */
function plainFileName(fileName: string): string {
  const name = fileName.split(/[\\/]/).at(-1) ?? '';
  const printable = name.replace(/\p{Cc}/gu, '').trim();
  return printable === '' ? 'part-list.csv' : printable.slice(-120);
}

/** The lines of the file, or the refusal that names every row that still stands in the way. */
function readLines(bytes: Buffer, choices: PartListChoices) {
  const reading = readPartList(new Uint8Array(bytes), choices);
  if (reading.fatal) throw new ShopError('file-unreadable', reading.fatal.message);
  const { problems, lines } = reading;
  if (problems.length > 0) {
    const rows = new Set(problems.map(({ row }) => row)).size;
    throw new ShopError(
      'bad-input',
      `${rows} ${rows === 1 ? 'row' : 'rows'} of the file cannot be read yet. Fix each one or leave it out; nothing was stored.`,
      problems.map(({ row, column, message }) => ({ row, path: column ?? 'row', message })),
    );
  }
  if (lines.length === 0) throw new ShopError('file-unreadable', 'No row of the file is left to store.');
  return reading;
}

const rowOf = (line: PartListLine, partListId: number) => ({
  partListId,
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
});

/** Reads the bytes again and stores the list, or says by row what still stands in the way. Nothing is stored in part. */
export async function storePartList(
  jobId: number,
  { fileName, bytes, details }: Upload,
  actor: Actor,
): Promise<number> {
  expectFound(await JobRow.findByPk(jobId), 'job');
  const choices = choicesOf(details);
  const reading = readLines(bytes, choices);
  const fileSha256 = createHash('sha256').update(bytes).digest('hex');
  return write(async () => {
    const job = expectFound(await JobRow.findByPk(jobId), 'job');
    const twin = await PartListRow.findOne({
      where: { jobId, fileSha256, revision: details.revision },
      attributes: ['name'],
    });
    if (twin)
      throw new ShopError(
        'already-there',
        `Job ${job.number} already has this very file as "${twin.name}". Give it another revision if it is meant twice.`,
      );
    const list = await PartListRow.create({
      jobId,
      name: details.name,
      revision: details.revision,
      fileName: plainFileName(fileName),
      fileSha256,
      file: bytes,
      fileBytes: bytes.length,
      encoding: reading.encoding,
      unit: reading.unit,
      choices: JSON.stringify({ ...choices, unit: reading.unit, mapping: reading.mapping }),
      skippedRows: reading.ignored.filter(({ kind }) => kind === 'skipped').length,
      uploadedById: actor.id,
      uploadedAt: new Date().toISOString(),
    });
    await PartLineRow.bulkCreate(reading.lines.map((line) => rowOf(line, list.id)));
    await record(actor, 'part-list:upload', `part list ${list.name} of job ${job.number}`, {
      fileName: list.fileName,
      fileSha256,
      lines: reading.lines.length,
      fixed: Object.keys(choices.fixes ?? {}).length,
      leftOut: list.skippedRows,
    });
    return list.id;
  });
}

/** A list that was ever planned stays, even when the plan was withdrawn: its lines are part of that plan's history. */
export function removePartList(partListId: number, actor: Actor): Promise<void> {
  return write(async () => {
    const { list, jobNumber, inPlans } = await findPartList(partListId);
    if (inPlans > 0)
      throw new ShopError(
        'wrong-state',
        `${inPlans} ${inPlans === 1 ? 'line' : 'lines'} of "${list.name}" stand in plans, so the list stays.`,
      );
    await PartListRow.destroy({ where: { id: partListId } });
    await record(actor, 'part-list:remove', `part list ${list.name} of job ${jobNumber}`, {
      fileName: list.fileName,
      fileSha256: list.fileSha256,
    });
  });
}
