/** What the rest of the product may know of the search. */
export { solveGroup, type SolveHooks } from '#workers/solver/core/solve-group.ts';
export { bestFitDecreasing } from '#workers/solver/core/greedy.ts';
export { makeProblem } from '#workers/solver/core/problem.ts';
