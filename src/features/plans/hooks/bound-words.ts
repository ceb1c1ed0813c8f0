import type { SolveOutcome } from '#shared/domain/solve.ts';

/** How near the best possible, never rounded in the plan's favour. */
export function gapPercent(netMinor: number, boundMinor: number): string {
  if (netMinor <= 0 || netMinor - boundMinor < 1e-6 * netMinor) return '0 %';
  const percent = (100 * (netMinor - boundMinor)) / netMinor;
  const digits = percent < 0.1 ? 3 : percent < 10 ? 2 : 1;
  return `${(Math.ceil(percent * 10 ** digits) / 10 ** digits).toFixed(digits)} %`;
}

/** What a plan may honestly say of itself. */
export function boundWords(outcome: SolveOutcome, netMinor: number, boundMinor: number): string {
  if (outcome === 'proven' || netMinor - boundMinor < 1e-6 * Math.max(1, netMinor))
    return 'least possible, proven';
  return `within ${gapPercent(netMinor, boundMinor)} of the least possible`;
}
