/** `npm run --silent plan -- request.json`: result on standard output, progress and every fault on standard error; exit 0, or 2 for a bad request. */
import { readFileSync } from 'node:fs';
import { findMoneyMakers } from '#shared/domain/money-makers.ts';
import { SolveRequest } from '#shared/schemas/solve.ts';
import { solveRequest } from '#workers/solver/node.ts';

function refuse(lines: readonly string[]): never {
  process.stderr.write(`${lines.join('\n')}\n`);
  process.exit(2);
}

function readRequest(path: string | undefined, rest: readonly string[]): SolveRequest {
  if (path === undefined || rest.length > 0) refuse(['Say which request: plan request.json']);
  let text: string;
  try {
    text = readFileSync(path, 'utf8');
  } catch (error) {
    refuse([`${path} cannot be read: ${error instanceof Error ? error.message : String(error)}`]);
  }
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch (error) {
    refuse([`${path} is not JSON: ${error instanceof Error ? error.message : String(error)}`]);
  }
  const parsed = SolveRequest.safeParse(json);
  if (!parsed.success)
    refuse(parsed.error.issues.map(({ path: at, message }) => `${at.join('.') || 'request'}: ${message}`));
  const makers = findMoneyMakers(parsed.data);
  if (makers.length > 0) refuse(makers.map(({ path: at, message }) => `${at}: ${message}`));
  return parsed.data;
}

const [path, ...rest] = process.argv.slice(2);
const request = readRequest(path, rest);
let lastTold = -Infinity;
const result = await solveRequest(
  request,
  ({ groupId, phase, netCostMinor, boundMinor, bars, elapsedMs }) => {
    const now = performance.now();
    if (phase !== 'done' && now - lastTold < 200) return;
    lastTold = now;
    process.stderr.write(
      `${groupId}: ${phase}, net ${netCostMinor?.toFixed(2) ?? '–'}, bound ${boundMinor?.toFixed(2) ?? '–'}, ${bars ?? 0} bars, ${Math.round(elapsedMs)} ms\n`,
    );
  },
);
process.stdout.write(`${JSON.stringify(result, null, 2)}\n`);
