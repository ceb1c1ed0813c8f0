/** What the rest of the product may know of the search. */
export { solveGroup } from '#workers/solver/core/solve-group.ts';
