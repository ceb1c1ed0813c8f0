import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { checkPlan } from '#shared/domain/check-plan.ts';
import { SolveRequest, SolveResult } from '#shared/schemas/solve.ts';

const root = resolve(import.meta.dirname, '../..');
const sample = join(root, 'fixtures/solver/contract-sample.json');
const plan = (...args: string[]) =>
  spawnSync(process.execPath, ['--import', 'tsx', join(root, 'server/scripts/plan.ts'), ...args], {
    cwd: root,
    encoding: 'utf8',
  });

describe('the plan command', () => {
  let folder = '';
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'barwright-plan-'));
  });
  afterAll(() => rmSync(folder, { recursive: true, force: true }));
  const file = (text: string) => {
    const path = join(folder, 'request.json');
    writeFileSync(path, text);
    return path;
  };

  it('answers the contract’s request as worked by hand', () => {
    const { status, stdout, stderr } = plan(sample);
    expect(status).toBe(0);
    const result = SolveResult.parse(JSON.parse(stdout));
    expect(result.groups[0]).toMatchObject({
      outcome: 'proven',
      netCostMinor: 38259.62,
      boundMinor: 38259.62,
      gap: 0,
      counts: { bars: 5, newBars: 4, dropsUsed: 1, layouts: 3 },
    });
    expect(checkPlan(SolveRequest.parse(JSON.parse(readFileSync(sample, 'utf8'))), result)).toEqual([]);
    expect(stderr).toContain('L3x3x1/4|A36');
  });
  it('names every problem of a bad request with its path, and prints no result', () => {
    const request = JSON.parse(readFileSync(sample, 'utf8')) as {
      seed: unknown;
      groups: { pieces: unknown[]; stock: { costMinor: number }[] }[];
    };
    request.seed = -1;
    const [group] = request.groups;
    group?.pieces.push({ id: 'p1', lengthNm: 1.5, quantity: 1 });
    const { status, stdout, stderr } = plan(file(JSON.stringify(request)));
    expect(status).toBe(2);
    expect(stdout).toBe('');
    expect(stderr).toMatch(/^seed:/m);
    expect(stderr).toMatch(/^groups\.0\.pieces\.1\.lengthNm:/m);
  });
  it.each([
    ['no file', () => plan()],
    ['a file that is not there', () => plan(join(tmpdir(), 'no-such-request.json'))],
    ['a file that is not JSON', () => plan(file('{'))],
  ])('exits 2 with words for %s', (_name, run) => {
    const { status, stdout, stderr } = run();
    expect(status).toBe(2);
    expect(stdout).toBe('');
    expect(stderr.trim()).not.toBe('');
  });
});
