import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ratioOf, readNumber, timesWhole } from '#shared/domain/exact-number.ts';

function valueOf(text: string, decimal?: '.' | ','): [bigint, bigint] | string {
  const reading = readNumber(text, decimal);
  return reading.outcome === 'read' ? [reading.value.numerator, reading.value.denominator] : reading.outcome;
}

describe('numbers without unit', () => {
  it.each<[string, [bigint, bigint] | string]>([
    ['42', [42n, 1n]],
    ['1-1/2', [3n, 2n]],
    ['1 1/2', [3n, 2n]],
    ['1.5', [15n, 10n]],
    ['1,5', [15n, 10n]],
    ['.375', [375n, 1000n]],
    ['12.', [12n, 1n]],
    ['3 823,5', [38235n, 10n]],
    ['1,234,567', [1234567n, 1n]],
    ['1.234.567,25', [123456725n, 100n]],
    ['0,125', [125n, 1000n]],
    ['11/2', 'open'],
    ['1,234', 'open'],
    ['1.234', [1234n, 1000n]],
    ['1/0', 'unreadable'],
    ['1.2.3', 'unreadable'],
    ['1 23', 'unreadable'],
    ['.', 'unreadable'],
    ['', 'unreadable'],
    ['twelve', 'unreadable'],
  ])('%s', (text, expected) => {
    expect(valueOf(text)).toEqual(expected);
  });

  it('a known custom settles thousands', () => {
    expect(valueOf('1,234', '.')).toEqual([1234n, 1n]);
    expect(valueOf('1,234', ',')).toEqual([1234n, 1000n]);
    expect(valueOf('1.234', ',')).toEqual([1234n, 1n]);
    expect(valueOf('1.23', ',')).toEqual([123n, 100n]);
  });

  it('a decimal is the digits it is written with, not the nearest binary number', () => {
    fc.assert(
      fc.property(
        fc.bigInt({ min: 0n, max: 10n ** 9n }),
        fc.integer({ min: 0, max: 999_999 }),
        (whole, places) => {
          const text = `${whole}.${String(places).padStart(6, '0')}`;
          expect(valueOf(text)).toEqual([whole * 1_000_000n + BigInt(places), 1_000_000n]);
        },
      ),
    );
  });

  it('multiplies to the nearest whole number, halves up', () => {
    expect(timesWhole(ratioOf(1n, 3n), 25_400_000)).toBe(8_466_667n);
    expect(timesWhole(ratioOf(1n, 2n), 1)).toBe(1n);
    expect(timesWhole(ratioOf(1n, 64n), 25_400_000)).toBe(396_875n);
  });
});
