import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { boundWords, gapPercent } from '#src/features/plans/hooks/bound-words.ts';

describe('how good a plan says it is', () => {
  it('says proven only when cost and bound meet', () => {
    expect(boundWords('proven', 1000, 1000)).toBe('least possible, proven');
    expect(boundWords('bounded', 100_000, 99_880)).toBe('within 0.12 % of the least possible');
  });
  it('never rounds in the plan’s favour', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1000, max: 1e9 }),
        fc.double({ min: 0, max: 0.5, noNaN: true }),
        (net, gap) => {
          const bound = net * (1 - gap);
          expect(Number.parseFloat(gapPercent(net, bound)) + 1e-3).toBeGreaterThanOrEqual(
            (100 * (net - bound)) / net - 1e-4,
          );
        },
      ),
    );
  });
});
