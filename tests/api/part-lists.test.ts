import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { refusal } from '#tests/support/error-body.ts';
import { makeJob, makeList, read, saveDraft, solveLines, upload } from '#tests/support/shop-work.ts';
import { openTestShop, type TestShop } from '#tests/support/test-shop.ts';
import { PartListRow } from '#server/models/index.ts';
import { MOST_FILE_BYTES } from '#shared/domain/part-list/decode-file.ts';
import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import { NM_PER_INCH } from '#shared/domain/units.ts';
import { JobList, JobView, PartLineList, PartListView } from '#shared/schemas/jobs.ts';

const fixture = (name: string) => readFileSync(`fixtures/csv/${name}`);
const mixed = fixture('mixed-300.csv');
/** The ten bad rows of the list, as fixtures/csv/README.md has them. */
const BAD_ROWS = [17, 46, 73, 101, 128, 160, 189, 214, 247, 279];

describe('jobs', () => {
  let shop: TestShop;
  beforeAll(async () => {
    shop = await openTestShop();
  });
  afterAll(() => shop.close());

  it('has every number once and changes with the version', async () => {
    const detailer = await shop.as('detailer');
    const job = await makeJob(shop, '24-100');
    expect(job).toMatchObject({ pieces: 0, partLists: 0, version: 1 });
    const twin = refusal(await detailer.post('/api/jobs').send({ number: '24-100', name: 'Other' }));
    expect(twin).toMatchObject({ code: 'already-there', paths: ['number'] });
    const put = (body: object) => detailer.put(`/api/jobs/${job.id}`).send(body);
    await put({ number: '24-101', name: 'Canopy', customer: 'Somebody', version: 1 }).expect(200);
    expect(refusal(await put({ number: '24-102', name: 'Late', version: 1 })).code).toBe('stale-version');
    const { jobs, can } = read(await (await shop.as('yard')).get('/api/jobs'), 200, JobList);
    expect(jobs.map(({ number, name }) => [number, name])).toEqual([['24-101', 'Canopy']]);
    expect(can['job:edit']).toBe(false);
    expect(refusal(await detailer.get('/api/jobs/999')).code).toBe('not-found');
  });
});

describe('part lists', () => {
  let shop: TestShop;
  beforeAll(async () => {
    shop = await openTestShop();
  });
  afterAll(() => shop.close());

  it('refuses a list with every open row at once, and stores nothing', async () => {
    const job = await makeJob(shop, '1');
    const told = refusal(await upload(shop, job.id, mixed));
    expect(told.code).toBe('bad-input');
    expect([...new Set(told.issues.map(({ row }) => row))]).toEqual(BAD_ROWS);
    const view = read(await (await shop.as('detailer')).get(`/api/jobs/${job.id}`), 200, JobView);
    expect(view.partLists).toEqual([]);
  });

  it('stores the lines read from the very bytes, with rows, fixes and the customer’s words', async () => {
    const job = await makeJob(shop, '2');
    const [fixed = 0, ...skips] = BAD_ROWS;
    const choices = { fixes: { [fixed]: { mark: 'ST02-10' } }, skips };
    const answer = await upload(shop, job.id, mixed, { fileName: 'C:\\lists\\mixed 300.csv', choices });
    const { partList, lines } = read(answer, 201, PartListView);
    const reading = readPartList(mixed, choices);
    expect(lines.length).toBe(reading.lines.length);
    expect(lines.length).toBe(300 - skips.length);
    expect(partList).toMatchObject({
      fileName: 'mixed 300.csv',
      fileSha256: createHash('sha256').update(mixed).digest('hex'),
      fileBytes: mixed.length,
      unit: 'in',
      lines: lines.length,
      pieces: lines.reduce((sum, { quantity }) => sum + quantity, 0),
      massMg: lines.reduce((sum, { quantity, pieceMassMg }) => sum + quantity * pieceMassMg, 0),
      skippedRows: skips.length,
      uploadedBy: 'A detailer',
    });
    expect(lines.find(({ row }) => row === fixed)?.mark).toBe('ST02-10');
    const tube = lines.find(({ sectionText }) => sectionText === 'TS4x2x1/4');
    expect(tube).toMatchObject({ section: 'HSS4x2x1/4', family: 'tube', grade: 'A500B', planned: 0, cut: 0 });
    const stored = await PartListRow.findByPk(partList.id);
    expect(stored).toMatchObject({ encoding: 'utf-8' });
    expect(JSON.parse(stored?.choices ?? '')).toMatchObject({
      ...choices,
      unit: 'in',
      mapping: { mark: 0, length: 3 },
    });
  });

  it('keeps encoding and unit of a metric list', async () => {
    const job = await makeJob(shop, '3');
    const bytes = fixture('metric-semicolon-1252.csv');
    const { partList, lines } = read(
      await upload(shop, job.id, bytes, { choices: { skips: [11] } }),
      201,
      PartListView,
    );
    expect(partList.unit).toBe('mm');
    expect((await PartListRow.findByPk(partList.id))?.encoding).toBe('windows-1252');
    expect(lines.every(({ lengthNm }) => Number.isSafeInteger(lengthNm))).toBe(true);
  });

  it('gives the original back byte for byte, to be saved and never run', async () => {
    const job = await makeJob(shop, '4');
    const bytes = fixture('tabs-utf16.csv');
    const fileName = 'Träger "Süd"; 1.html';
    const made = read(
      await upload(shop, job.id, bytes, { fileName, choices: { skips: [13] } }),
      201,
      PartListView,
    );
    const answer = await (await shop.as('yard')).get(`/api/part-lists/${made.partList.id}/file`).buffer(true);
    expect(answer.status).toBe(200);
    expect(Buffer.from(answer.body as Buffer).equals(bytes)).toBe(true);
    expect(answer.headers['content-type']).toBe('application/octet-stream');
    expect(answer.headers['x-content-type-options']).toBe('nosniff');
    expect(answer.headers['content-disposition']).toMatch(/^attachment; filename=/);
    expect(answer.headers['content-disposition']).toContain(encodeURIComponent('Träger'));
  });

  it('takes the same bytes twice only under another revision', async () => {
    const { job, partList } = await makeList(shop, '5', ['A1,2,L3x3x1/4,A36,60"']);
    const bytes = 'Mark,Qty,Section,Grade,Length\nA1,2,L3x3x1/4,A36,60"';
    const again = refusal(await upload(shop, job.id, bytes));
    expect(again.code).toBe('already-there');
    expect(again.message).toContain(partList.name);
    read(await upload(shop, job.id, bytes, { revision: 'B' }), 201, PartListView);
    const other = await makeJob(shop, '5b');
    read(await upload(shop, other.id, bytes), 201, PartListView);
    // Two people at once: one list, one refusal.
    const both = await Promise.all([1, 2].map(() => upload(shop, job.id, bytes, { revision: 'C' })));
    expect(both.map(({ status }) => status).toSorted()).toEqual([201, 409]);
  });

  it('says what is wrong with a file that cannot be read', async () => {
    const job = await makeJob(shop, '6');
    expect(refusal(await upload(shop, job.id, fixture('renamed-archive.csv'))).code).toBe('file-unreadable');
    expect(refusal(await upload(shop, job.id, '')).code).toBe('file-unreadable');
    expect(refusal(await upload(shop, 999_999, 'x')).code).toBe('not-found');
    const large = refusal(await upload(shop, job.id, Buffer.alloc(MOST_FILE_BYTES + 1, 'a')));
    expect(large.code).toBe('file-too-large');
    expect(large.message).toContain('20 MB');
    const detailer = await shop.as('detailer');
    const path = `/api/jobs/${job.id}/part-lists`;
    expect(
      refusal(await detailer.post(path).field('details', '{').attach('file', Buffer.from('x'), 'x.csv'))
        .paths,
    ).toEqual(['details']);
    const details = JSON.stringify({ name: 'List', choices: {} });
    expect(refusal(await detailer.post(path).field('details', details)).paths).toEqual(['file']);
    expect(
      refusal(await detailer.post(path).field('details', details).attach('other', Buffer.from('x'), 'x.csv'))
        .code,
    ).toBe('bad-input');
  });

  it('goes only while none of its lines stands in a plan', async () => {
    const detailer = await shop.as('detailer');
    const { partList, lineIds } = await makeList(shop, '7', ['A1,2,L3x3x1/4,A36,60"']);
    const get = async () => read(await detailer.get(`/api/part-lists/${partList.id}`), 200, PartListView);
    expect((await get()).partList.can['part-list:remove']).toBe(true);
    const draft = await solveLines(shop, lineIds, (request) => ({
      ...request,
      groups: request.groups.map((group) => ({
        ...group,
        stock: [
          { id: 'length:1', source: 'new', lengthNm: 240 * NM_PER_INCH, costMinor: 9800, supply: null },
        ],
      })),
    }));
    const { plan } = await saveDraft(shop, draft);
    expect((await get()).partList.can['part-list:remove']).toBe(false);
    expect(refusal(await detailer.delete(`/api/part-lists/${partList.id}`)).code).toBe('wrong-state');
    await detailer.delete(`/api/plans/${plan.id}`).expect(204);
    expect(refusal(await (await shop.as('operator')).delete(`/api/part-lists/${partList.id}`)).code).toBe(
      'not-allowed',
    );
    await detailer.delete(`/api/part-lists/${partList.id}`).expect(204);
    expect(refusal(await detailer.get(`/api/part-lists/${partList.id}`)).code).toBe('not-found');
  });

  it('lists lines by job, and the open ones alone', async () => {
    const detailer = await shop.as('detailer');
    const { job, lineIds } = await makeList(shop, '8', ['A1,2,L3x3x1/4,A36,60"', 'A2,1,PL1/4x10,A36,20"']);
    const lines = async (query: string) =>
      read(await detailer.get(`/api/part-lines?${query}`), 200, PartLineList).lines;
    expect((await lines(`jobIds=${job.id}&open=1`)).map(({ id }) => id)).toEqual(lineIds);
    expect(refusal(await detailer.get('/api/part-lines?jobIds=1;2')).paths).toEqual(['jobIds']);
    expect((await lines(`jobIds=${job.id}`))[1]).toMatchObject({
      family: 'plate',
      stockKey: 'PL1/4',
      widthNm: 10 * NM_PER_INCH,
    });
  });

  it('stores a list of twenty thousand rows', async () => {
    const job = await makeJob(shop, '9');
    const rows = Array.from(
      { length: 20_000 },
      (_, i) => `M${i},${1 + (i % 9)},L3x3x1/4,A36,${10 + (i % 200)}"`,
    );
    const { partList } = read(
      await upload(shop, job.id, ['Mark,Qty,Section,Grade,Length', ...rows].join('\n')),
      201,
      PartListView,
    );
    expect(partList.lines).toBe(20_000);
  });
});
