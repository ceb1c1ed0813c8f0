import { proxy, releaseProxy, wrap, type Remote } from 'comlink';
import type { SolveGroup, SolveGroupResult } from '#shared/domain/solve.ts';
import type { SolveOptions, SolveProgress, SolverWorker } from '#workers/solver/api.ts';

export type SolverPool = {
  /** Solves one group in a worker of its own as soon as one is free. An abort ends the worker at once and rejects with AbortError. */
  solve(
    group: SolveGroup,
    options: SolveOptions,
    hooks: { onProgress?: (progress: SolveProgress) => void; signal?: AbortSignal },
  ): Promise<SolveGroupResult>;
  /** Ends every worker. */
  close(): void;
};

const MOST_WORKERS = 8;

type Bench = { worker: Worker; solver: Remote<SolverWorker> };

function openBench(): Bench {
  const worker = new Worker(new URL('../../workers/solver/solver.worker.ts', import.meta.url), {
    type: 'module',
  });
  return { worker, solver: wrap<SolverWorker>(worker) };
}

const aborted = () => new DOMException('The planning was cancelled.', 'AbortError');

/** A pool as wide as the machine: groups are solved side by side, a worker loads the solver once and is used again. */
export function createSolverPool({
  size = navigator.hardwareConcurrency || 2,
}: { size?: number } = {}): SolverPool {
  const width = Math.max(1, Math.min(MOST_WORKERS, size));
  const idle: Bench[] = [];
  const busy = new Set<Bench>();
  const queue: (() => void)[] = [];

  const next = () => {
    while (queue.length > 0 && busy.size < width) queue.shift()?.();
  };
  const end = (bench: Bench) => {
    bench.solver[releaseProxy]();
    bench.worker.terminate();
  };

  return {
    solve(group, options, { onProgress, signal }) {
      return new Promise<SolveGroupResult>((resolve, reject) => {
        if (signal?.aborted) return reject(aborted());
        const start = () => {
          if (signal?.aborted) return reject(aborted());
          const bench = idle.pop() ?? openBench();
          busy.add(bench);
          const settle = (reuse: boolean) => {
            signal?.removeEventListener('abort', onAbort);
            bench.worker.removeEventListener('error', onError);
            busy.delete(bench);
            if (reuse) idle.push(bench);
            else end(bench);
            next();
          };
          const onAbort = () => {
            settle(false);
            reject(aborted());
          };
          const onError = (event: ErrorEvent) => {
            settle(false);
            reject(new Error(`The planner stopped: ${event.message || 'the worker could not be started'}`));
          };
          signal?.addEventListener('abort', onAbort, { once: true });
          bench.worker.addEventListener('error', onError);
          bench.solver.solveGroup(group, options, proxy(onProgress ?? (() => undefined))).then(
            (result) => {
              if (!busy.has(bench)) return;
              settle(true);
              resolve(result);
            },
            (error: unknown) => {
              if (!busy.has(bench)) return;
              settle(false);
              reject(error instanceof Error ? error : new Error(String(error)));
            },
          );
        };
        queue.push(start);
        next();
      });
    },
    close() {
      for (const bench of [...idle, ...busy]) end(bench);
      idle.length = 0;
      busy.clear();
      queue.length = 0;
    },
  };
}
