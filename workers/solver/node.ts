/** The same search in Node: for the command line, the benches and the demo shop. */
import loadHighs from 'highs';
import type { SolveRequest, SolveResult } from '#shared/domain/solve.ts';
import type { SolveProgress } from '#workers/solver/api.ts';
import { solveGroup } from '#workers/solver/core/index.ts';

/** Groups one after another; each may use an equal share of the time that is left, so a quick one leaves more to the rest. */
export async function solveRequest(
  request: SolveRequest,
  onProgress?: (progress: SolveProgress) => void,
): Promise<SolveResult> {
  const highs = await loadHighs();
  const now = () => performance.now();
  const startedAt = now();
  const groups = request.groups.map((group, i) => {
    const left = Math.max(1, request.timeLimitMs - (now() - startedAt));
    return solveGroup(
      group,
      { seed: request.seed, timeLimitMs: left / (request.groups.length - i) },
      { highs, now, ...(onProgress ? { onProgress } : {}) },
    );
  });
  return { version: 1, groups };
}
