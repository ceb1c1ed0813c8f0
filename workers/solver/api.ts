/** The one typed door to the solver: types only, so that a page can import it without the search. */
import type { SolveGroup, SolveGroupResult } from '#shared/domain/solve.ts';

/** What a running search tells, at least four times a second. */
export type SolveProgress = {
  readonly groupId: string;
  readonly phase: 'start' | 'bound' | 'dive' | 'master' | 'proof' | 'done';
  /** Best plan so far in minor units, or null before the first. */
  readonly netCostMinor: number | null;
  /** No plan can cost less than this, in minor units; null before the first bound. */
  readonly boundMinor: number | null;
  readonly bars: number | null;
  readonly elapsedMs: number;
};

export type SolveOptions = {
  readonly seed: number;
  readonly timeLimitMs: number;
};

/** Exposed by solver.worker.ts through comlink. Cancel is `worker.terminate()`. */
export type SolverWorker = {
  solveGroup(
    group: SolveGroup,
    options: SolveOptions,
    onProgress: (progress: SolveProgress) => void,
  ): Promise<SolveGroupResult>;
};
