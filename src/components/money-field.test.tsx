// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import fc from 'fast-check';
import { useState } from 'react';
import { afterEach, describe, expect, it } from 'vitest';
import { MoneyField } from '#src/components/money-field.tsx';

afterEach(cleanup);

function Form({ start = null, currency = 'USD' }: { start?: number | null; currency?: string }) {
  const [minor, setMinor] = useState<number | null>(start);
  return (
    <>
      <MoneyField label="Price" value={minor} onChange={setMinor} currency={currency} />
      <output>{String(minor)}</output>
    </>
  );
}

const field = () => screen.getByLabelText<HTMLInputElement>('Price');
const type = (text: string) => fireEvent.change(field(), { target: { value: text } });
const minor = () => screen.getByText(/^(null|\d+)$/).textContent;

describe('MoneyField', () => {
  it.each([
    ['98', 'USD', '9800'],
    ['98.40', 'USD', '9840'],
    ['$98.4', 'USD', '9840'],
    ['18 462.10', 'USD', '1846210'],
    ['1500', 'JPY', '1500'],
  ])('reads %s %s to exact minor units', (text, currency, exact) => {
    render(<Form currency={currency} />);
    type(text);
    expect(minor()).toBe(exact);
  });

  it('keeps quiet while typing and says what is wrong when left', () => {
    render(<Form />);
    type('98.4.0');
    expect(minor()).toBe('null');
    expect(screen.queryByRole('alert')).toBeNull();
    fireEvent.blur(field());
    expect(screen.getByRole('alert').textContent).toContain('98.4.0');
  });

  it('refuses a fraction of the smallest coin instead of rounding it', () => {
    render(<Form />);
    type('98.405');
    expect(minor()).toBe('null');
  });

  it('never changes an amount by showing it and leaving it again', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 1_000_000_000 }),
        fc.constantFrom('USD', 'EUR', 'JPY', 'KWD'),
        (start, currency) => {
          render(<Form start={start} currency={currency} />);
          type(`${field().value} `);
          fireEvent.blur(field());
          const after = minor();
          cleanup();
          expect(after).toBe(String(start));
        },
      ),
      { numRuns: 60 },
    );
  });
});
