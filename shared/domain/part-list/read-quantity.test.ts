import { describe, expect, it } from 'vitest';
import { readQuantity } from '#shared/domain/part-list/read-quantity.ts';

describe('quantities', () => {
  it.each([
    ['12', 12],
    ['12.0', 12],
    ['12,0', 12],
    ['12 pcs', 12],
    ['12 ea.', 12],
    ['(12)', 12],
    ['x12', 12],
    ['12x', 12],
    ['12 Stk', 12],
    ['1,200', 1200],
    ['1 200', 1200],
    ['1000000', 1_000_000],
  ])('%s', (text, quantity) => {
    expect(readQuantity(text)).toEqual({ ok: true, quantity });
  });

  it.each([
    ['', 'quantity-missing'],
    ['0', 'quantity-zero'],
    ['-3', 'quantity-negative'],
    ['1.5', 'quantity-not-whole'],
    ['1/2', 'quantity-not-whole'],
    ['dozen', 'quantity-unreadable'],
    ['2 or 3', 'quantity-unreadable'],
    ['8-Mar', 'quantity-unreadable'],
    ['1000001', 'quantity-too-large'],
  ])('%s is a problem with words', (text, code) => {
    const reading = readQuantity(text);
    expect(reading).toMatchObject({ ok: false, code });
    expect(!reading.ok && reading.message).toContain(text);
  });

  it('a comma list counts its thousands with points', () => {
    expect(readQuantity('2.500', ',')).toEqual({ ok: true, quantity: 2500 });
    expect(readQuantity('2.500', '.')).toMatchObject({ ok: false, code: 'quantity-not-whole' });
  });
});
