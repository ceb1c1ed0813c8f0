/** `npm test`: everything, in the order that fails fastest, with one line to end on. */
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromiumPath, ensureBuilt, ensureChromium, ensureInstalled, runTool } from './steps.mjs';

ensureInstalled();
ensureChromium();

const reports = mkdtempSync(join(tmpdir(), 'barwright-test-'));
const count = { passed: 0, failed: 0, skipped: 0 };

function check(name, work) {
  const started = Date.now();
  console.log(`\n== ${name}`);
  const code = work();
  console.log(
    `== ${name}: ${code === 0 ? 'good' : 'FAILED'}, ${((Date.now() - started) / 1000).toFixed(0)} s`,
  );
  return code;
}

function tests(project) {
  const report = join(reports, `${project}.json`);
  const code = runTool(
    'vitest',
    ['run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`],
    { env: { ...process.env, CHROMIUM: chromiumPath, NODE_ENV: 'test' } },
  );
  if (existsSync(report)) {
    const totals = JSON.parse(readFileSync(report, 'utf8'));
    count.passed += totals.numPassedTests;
    count.failed += totals.numFailedTests;
    count.skipped += totals.numPendingTests + totals.numTodoTests;
  }
  return code;
}

const steps = [
  ['format', () => runTool('prettier', ['--check', '--log-level', 'warn', '.'])],
  ['lint', () => runTool('eslint', ['--max-warnings', '0', '.'])],
  ['types', () => runTool('tsc', ['--noEmit'])],
  ['unused code', () => runTool('knip', ['--no-progress'])],
  ['unit, API and architecture tests', () => tests('node')],
  ['build', () => (ensureBuilt(), 0)],
  ['browser tests', () => tests('browser')],
];
const failed = steps.filter(([name, work]) => check(name, work) !== 0).map(([name]) => name);
rmSync(reports, { recursive: true, force: true });

const failures = Math.max(count.failed, failed.length);
if (failed.length > 0) console.log(`\nFailed: ${failed.join(', ')}.`);
console.log(
  `\n${count.passed} passed, ${failures} failed${count.skipped > 0 ? `, ${count.skipped} skipped` : ''}`,
);
process.exit(failures > 0 || count.passed === 0 ? 1 : 0);
