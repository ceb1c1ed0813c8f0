/** Worked examples M1–M3 and P1 of fixtures/trade/worked-examples.csv. */
import { describe, expect, it } from 'vitest';
import { flippedLength, mitreOffset, shortPoint, unflippedLength } from '#shared/domain/mitre.ts';
import { MG_PER_LB } from '#shared/domain/units.ts';

describe('mitres', () => {
  it('M1: FB 1/2x3, long point 36 in, 45° by opposite hands: short point 30 in', () => {
    expect(shortPoint(36, 3, 45)).toBeCloseTo(30, 9);
  });
  it('M2: 2-1/2 in wide at 22.5°: offset 1.0355 in', () => {
    expect(mitreOffset(2.5, 22.5)).toBeCloseTo(1.0355, 4);
  });
  it('M3: a 20 ft bar makes 7 flipped (235.06 in) and 6 not flipped; 8 would need 268.2 in', () => {
    expect(flippedLength(7, 36, 3, 45, 1 / 8)).toBeCloseTo(235.06, 2);
    expect(flippedLength(8, 36, 3, 45, 1 / 8)).toBeCloseTo(268.2, 1);
    expect(unflippedLength(6, 36, 1 / 8)).toBeLessThanOrEqual(240);
    expect(unflippedLength(7, 36, 1 / 8)).toBeGreaterThan(240);
  });
});

describe('price', () => {
  it('P1: $40/cwt is $0.40/lb, $800 a US ton, $881.85 a tonne', () => {
    const perLb = 40 / 100;
    expect(perLb * 2000).toBeCloseTo(800, 9);
    expect(perLb * (1e9 / MG_PER_LB)).toBeCloseTo(881.85, 2);
  });
});
