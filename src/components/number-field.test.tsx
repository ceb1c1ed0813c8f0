// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { afterEach, describe, expect, it } from 'vitest';
import { NumberField } from '#src/components/number-field.tsx';

afterEach(cleanup);

function Form({ start = null }: { start?: number | null }) {
  const [value, setValue] = useState<number | null>(start);
  return (
    <>
      <NumberField label="Pieces" value={value} onChange={setValue} min={1} max={5000} />
      <output>{String(value)}</output>
      <button onClick={() => setValue(12)}>reset</button>
    </>
  );
}

const type = (text: string) => fireEvent.change(screen.getByLabelText('Pieces'), { target: { value: text } });
const value = () => screen.getByRole('status').textContent;

describe('NumberField', () => {
  it('gives the whole number, gaps between thousands allowed', () => {
    render(<Form />);
    type('1 250');
    expect(value()).toBe('1250');
    type('1,250');
    expect(value()).toBe('1250');
  });

  it.each(['2.5', 'dozen', '1e3', '0', '5001'])('gives nothing for %s and says why', (text) => {
    render(<Form />);
    type(text);
    expect(value()).toBe('null');
    expect(screen.getByRole('alert').textContent).toContain(text);
    expect(screen.getByLabelText('Pieces').getAttribute('aria-invalid')).toBe('true');
  });

  it('follows a value set from outside and keeps what is typed otherwise', () => {
    render(<Form start={7} />);
    type('8x');
    expect(screen.getByLabelText<HTMLInputElement>('Pieces').value).toBe('8x');
    fireEvent.click(screen.getByText('reset'));
    expect(screen.getByLabelText<HTMLInputElement>('Pieces').value).toBe('12');
  });
});
