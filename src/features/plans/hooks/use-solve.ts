import { useCallback, useEffect, useRef, useState } from 'react';
import type { SolveGroupResult, SolveRequest, SolveResult } from '#shared/domain/solve.ts';
import type { SolveProgress } from '#workers/solver/api.ts';
import { createSolverPool, type SolverPool } from '#src/lib/solver-client.ts';

export type SolveRun =
  | { readonly state: 'idle' }
  | {
      readonly state: 'running';
      readonly progress: ReadonlyMap<string, SolveProgress>;
      readonly done: number;
      readonly of: number;
    }
  | {
      readonly state: 'done';
      readonly request: SolveRequest;
      readonly result: SolveResult;
      readonly progress: ReadonlyMap<string, SolveProgress>;
    }
  | { readonly state: 'failed'; readonly message: string };

/** Runs a request over the pool, groups side by side, and keeps what each tells on the way. Cancel ends the workers at once. */
export function useSolve() {
  const [run, setRun] = useState<SolveRun>({ state: 'idle' });
  const pool = useRef<SolverPool | null>(null);
  const abort = useRef<AbortController | null>(null);
  useEffect(
    () => () => {
      abort.current?.abort();
      pool.current?.close();
    },
    [],
  );

  const start = useCallback(async (request: SolveRequest) => {
    abort.current?.abort();
    const controller = new AbortController();
    abort.current = controller;
    pool.current ??= createSolverPool();
    const { current: benches } = pool;
    const progress = new Map<string, SolveProgress>();
    let done = 0;
    const show = () => {
      if (!controller.signal.aborted)
        setRun({ state: 'running', progress: new Map(progress), done, of: request.groups.length });
    };
    show();
    const options = { seed: request.seed, timeLimitMs: request.timeLimitMs };
    try {
      const groups = await Promise.all(
        request.groups.map(async (group): Promise<SolveGroupResult> => {
          const result = await benches.solve(group, options, {
            signal: controller.signal,
            onProgress: (told) => {
              progress.set(group.id, told);
              show();
            },
          });
          done++;
          progress.set(group.id, {
            groupId: group.id,
            phase: 'done',
            netCostMinor: result.netCostMinor,
            boundMinor: result.boundMinor,
            bars: result.counts.bars,
            elapsedMs: result.work.elapsedMs,
          });
          show();
          return result;
        }),
      );
      setRun({ state: 'done', request, result: { version: 1, groups }, progress });
    } catch (error) {
      controller.abort();
      if (error instanceof DOMException && error.name === 'AbortError') setRun({ state: 'idle' });
      else setRun({ state: 'failed', message: error instanceof Error ? error.message : String(error) });
    }
  }, []);

  const cancel = useCallback(() => {
    abort.current?.abort();
    setRun({ state: 'idle' });
  }, []);
  const reset = useCallback(() => setRun({ state: 'idle' }), []);
  return { run, start, cancel, reset };
}
