// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import fc from 'fast-check';
import { useState } from 'react';
import { afterEach, describe, expect, it } from 'vitest';
import type { LengthStyle } from '#shared/domain/length.ts';
import { LengthField } from '#src/components/length-field.tsx';

afterEach(cleanup);

const IMPERIAL: LengthStyle = { units: 'imperial', denominator: 16 };
const METRIC: LengthStyle = { units: 'metric', denominator: 16 };

type FormProps = { start?: number | null; lengthStyle?: LengthStyle; allowZero?: boolean; error?: string };

function Form({ start = null, lengthStyle = IMPERIAL, allowZero = false, error }: FormProps) {
  const [nm, setNm] = useState<number | null>(start);
  return (
    <>
      <LengthField
        label="Length"
        value={nm}
        onChange={setNm}
        lengthStyle={lengthStyle}
        allowZero={allowZero}
        error={error}
      />
      <output>{String(nm)}</output>
      <button onClick={() => setNm(6_096_000_000)}>twenty feet</button>
    </>
  );
}

const field = () => screen.getByLabelText<HTMLInputElement>('Length');
const type = (text: string) => fireEvent.change(field(), { target: { value: text } });
const leave = () => fireEvent.blur(field());
const nm = () => screen.getByText(/^(null|\d+)$/).textContent;

describe('LengthField', () => {
  // 1 in = 25.4 mm exactly (1959), so 12'-6 1/2" = 150.5 in = 3 822 700 000 nm and 1/64 in = 396 875 nm.
  it.each([
    [`12'-6 1/2"`, '3822700000'],
    [`12-6 1/2`, '3822700000'],
    [`150 1/2"`, '3822700000'],
    ['150.5', '3822700000'],
    ['3-6', '1066800000'],
    ['42', '1066800000'],
    ['3822.7 mm', '3822700000'],
    ['3.8227 m', '3822700000'],
    ['1/64', '396875'],
  ])('reads %s in an imperial shop to exact nanometres', (text, exact) => {
    render(<Form />);
    type(text);
    expect(nm()).toBe(exact);
  });

  it.each([
    ['3823', '3823000000'],
    ['3823.5', '3823500000'],
    ['382.3 cm', '3823000000'],
    [`12'-6 1/2"`, '3822700000'],
  ])('reads %s in a metric shop to exact nanometres', (text, exact) => {
    render(<Form lengthStyle={METRIC} />);
    type(text);
    expect(nm()).toBe(exact);
  });

  it('shows how it was read while typing, and writes it so when left', () => {
    render(<Form />);
    type('150.5');
    expect(screen.getByText(`= 12'-6 1/2"`)).toBeTruthy();
    leave();
    expect(field().value).toBe(`12'-6 1/2"`);
    expect(nm()).toBe('3822700000');
  });

  it('asks instead of guessing, offers the readings, and takes the chosen one', () => {
    render(<Form />);
    type('11/2');
    leave();
    expect(nm()).toBe('null');
    expect(screen.getByRole('alert').textContent).toContain('11/2');
    const choices = screen.getAllByRole('button').filter((button) => button.textContent !== 'twenty feet');
    expect(choices.length).toBeGreaterThanOrEqual(2);
    fireEvent.click(choices[0]!);
    expect(nm()).toMatch(/^\d+$/);
    expect(screen.queryByRole('alert')).toBeNull();
  });

  it('does not complain of a half-typed length before it is left', () => {
    render(<Form />);
    type(`12'-`);
    expect(screen.queryByRole('alert')).toBeNull();
    leave();
  });

  it('does not push a button away while it is being pressed', async () => {
    render(<Form />);
    type('nonsense');
    fireEvent.pointerDown(screen.getByText('twenty feet'));
    leave();
    expect(screen.queryByRole('alert')).toBeNull();
    fireEvent.pointerUp(screen.getByText('twenty feet'));
    expect((await screen.findByRole('alert')).textContent).toContain('nonsense');
  });

  it('takes nothing at all as zero where an allowance may be none', () => {
    render(<Form allowZero />);
    type('0');
    expect(nm()).toBe('0');
    cleanup();
    render(<Form />);
    type('0');
    expect(nm()).toBe('null');
  });

  it("shows the form's own error while the field is empty", () => {
    render(<Form error="Fill this in." />);
    expect(screen.getByRole('alert').textContent).toBe('Fill this in.');
    expect(field().getAttribute('aria-invalid')).toBe('true');
  });

  it('follows a length set from outside', () => {
    render(<Form />);
    type('11/2');
    fireEvent.click(screen.getByText('twenty feet'));
    expect(field().value).toBe(`20'-0"`);
  });

  it('never changes a length by showing it and leaving it again', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 20_000_000_000 }),
        fc.constantFrom(IMPERIAL, METRIC),
        (start, lengthStyle) => {
          render(<Form start={start} lengthStyle={lengthStyle} />);
          const shown = field().value;
          type(`${shown} `);
          leave();
          const after = nm();
          cleanup();
          expect(after).toBe(String(start));
        },
      ),
      { numRuns: 60 },
    );
  });
});
