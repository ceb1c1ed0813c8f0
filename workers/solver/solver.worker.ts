import { expose } from 'comlink';
import loadHighs from 'highs';
import wasmUrl from 'highs/runtime?url';
import { solveGroup } from '#workers/solver/core/index.ts';
import type { SolverWorker } from '#workers/solver/api.ts';

const loading = loadHighs({ locateFile: () => wasmUrl });

const worker: SolverWorker = {
  async solveGroup(group, options, onProgress) {
    const highs = await loading;
    return solveGroup(group, options, { highs, now: () => performance.now(), onProgress });
  },
};
expose(worker);
