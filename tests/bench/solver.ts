/** `npm run bench`: the solver on the published sets. --set NAME (repeatable), --limit SECONDS an instance, --most N instances a set, --json FILE. */
import { writeFileSync } from 'node:fs';
import { cpus } from 'node:os';
import { parseArgs } from 'node:util';
import { asGroup, literatureSets, readInstances } from '#tests/support/literature.ts';
import { checkPlan } from '#shared/domain/check-plan.ts';
import type { SolveRequest } from '#shared/domain/solve.ts';
import { solveRequest } from '#workers/solver/node.ts';

const { values } = parseArgs({
  options: {
    set: { type: 'string', multiple: true },
    limit: { type: 'string', default: '60' },
    most: { type: 'string', default: '1000' },
    json: { type: 'string' },
  },
});
const limitMs = Number(values.limit) * 1000;
const percent = (x: number) => `${(100 * x).toFixed(3)} %`;
const median = (sorted: readonly number[]) => sorted[Math.floor(sorted.length / 2)] ?? 0;

type Row = {
  set: string;
  instances: number;
  proven: number;
  atOptimum: number;
  meanGap: number;
  worstGap: number;
  medianSeconds: number;
  worstSeconds: number;
  faults: number;
};
const rows: Row[] = [];
console.log(
  `Node ${process.version}, ${cpus().length} × ${cpus()[0]?.model ?? 'unknown'}, limit ${values.limit} s an instance, one worker`,
);
console.log('set        instances  proven  at optimum  mean gap   worst gap  median s  worst s');
for (const set of values.set ?? literatureSets()) {
  const instances = readInstances(set).slice(0, Number(values.most));
  const seconds: number[] = [];
  const row: Row = {
    set,
    instances: instances.length,
    proven: 0,
    atOptimum: 0,
    meanGap: 0,
    worstGap: 0,
    medianSeconds: 0,
    worstSeconds: 0,
    faults: 0,
  };
  for (const instance of instances) {
    const request: SolveRequest = { version: 1, seed: 1, timeLimitMs: limitMs, groups: [asGroup(instance)] };
    const startedAt = performance.now();
    const result = await solveRequest(request);
    seconds.push((performance.now() - startedAt) / 1000);
    const [group] = result.groups;
    if (!group) continue;
    row.faults += checkPlan(request, result).length;
    if (group.outcome === 'proven') row.proven++;
    if (group.counts.bars === instance.optimum) row.atOptimum++;
    else
      console.log(
        `  ${instance.name}: ${group.counts.bars} bars, optimum ${instance.optimum}, bound ${group.boundMinor / 100}`,
      );
    row.meanGap += group.gap / instances.length;
    row.worstGap = Math.max(row.worstGap, group.gap);
  }
  seconds.sort((a, b) => a - b);
  row.medianSeconds = median(seconds);
  row.worstSeconds = seconds.at(-1) ?? 0;
  rows.push(row);
  console.log(
    [
      set.padEnd(10),
      String(row.instances).padStart(9),
      String(row.proven).padStart(7),
      String(row.atOptimum).padStart(11),
      percent(row.meanGap).padStart(10),
      percent(row.worstGap).padStart(11),
      row.medianSeconds.toFixed(2).padStart(9),
      row.worstSeconds.toFixed(2).padStart(8),
      row.faults > 0 ? `  ${row.faults} FAULTS` : '',
    ].join(' '),
  );
}
if (values.json) writeFileSync(values.json, JSON.stringify(rows, null, 2));
