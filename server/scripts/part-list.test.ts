import { execFile } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

const root = resolve(import.meta.dirname, '../..');
let folder = '';

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'part-list-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

type Ran = { status: number | null; stdout: string; stderr: string };

function run(...args: string[]): Promise<Ran> {
  return new Promise((done) => {
    const child = execFile(
      process.execPath,
      ['--import', 'tsx', 'server/scripts/part-list.ts', ...args],
      { cwd: root, maxBuffer: 1 << 28 },
      (_error, stdout, stderr) => done({ status: child.exitCode, stdout, stderr }),
    );
  });
}

type Answer = {
  lines: {
    row: number;
    mark: string;
    quantity: number;
    section: string;
    lengthNm: number;
    widthNm?: number;
  }[];
  problems: { row: number; column: string; read: string; code: string; message: string }[];
  mapping: Record<string, number>;
  unit: string;
};
const answerOf = ({ stdout }: Ran) => JSON.parse(stdout) as Answer;

describe('part-list on the command line', () => {
  it('prints lines, problems, mapping and unit of a list with bad rows, and ends with 0', async () => {
    const ran = await run('fixtures/csv/mixed-300.csv');
    expect([ran.status, ran.stderr]).toEqual([0, '']);
    const { lines, problems, mapping, unit } = answerOf(ran);
    expect(lines).toHaveLength(290);
    expect(problems.map(({ row, code }) => [row, code])).toContainEqual([73, 'section-date']);
    expect(problems).toHaveLength(10);
    expect(mapping).toEqual({ mark: 0, quantity: 1, section: 2, length: 3, grade: 4, note: 5 });
    expect(unit).toBe('in');
  });

  it('takes the unit of bare numbers', async () => {
    const file = join(folder, 'bare.csv');
    await writeFile(file, 'Mark,Qty,Section,Length,Width\nB-1,2,PL 1/4,600,300\n');
    const { lines, unit } = answerOf(await run(file, '--unit', 'mm'));
    expect(unit).toBe('mm');
    expect(lines).toMatchObject([{ row: 2, mark: 'B-1', lengthNm: 600_000_000, widthNm: 300_000_000 }]);
  });

  it.each([
    ['a file that is not there', ['nowhere.csv'], /There is no file nowhere\.csv/],
    ['a folder', ['fixtures'], /is a folder/],
    ['no file', [], /No file is given\. Use: /],
    ['two files', ['a.csv', 'b.csv'], /One file at a time/],
    ['an unknown unit', ['fixtures/csv/mixed-300.csv', '--unit', 'furlong'], /Unit furlong is not known/],
    ['an unknown flag', ['--fast', 'fixtures/csv/mixed-300.csv'], /--fast/],
    ['a spreadsheet with another ending', ['fixtures/csv/renamed-archive.csv'], /spreadsheet/],
  ])('says in words what is wrong and ends with 2: %s', async (_about, args, words) => {
    const ran = await run(...args);
    expect([ran.status, ran.stdout]).toEqual([2, '']);
    expect(ran.stderr).toMatch(words);
    expect(ran.stderr).not.toContain('    at ');
  });

  it('ends with 2 and still lists the problems when no row could be read', async () => {
    const file = join(folder, 'all-bad.csv');
    await writeFile(file, 'Mark,Qty,Section,Length\nB-1,0,C6,42\n');
    const ran = await run(file);
    expect(ran.status).toBe(2);
    expect(answerOf(ran).problems).toHaveLength(2);
    expect(ran.stderr).toContain('no row could be read');
  });
});
