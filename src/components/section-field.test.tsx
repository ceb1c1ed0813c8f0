// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { afterEach, describe, expect, it } from 'vitest';
import { SectionField, suggestSections } from '#src/components/section-field.tsx';

afterEach(cleanup);

function Form() {
  const [section, setSection] = useState<string | null>(null);
  return (
    <>
      <SectionField label="Section" value={section} onChange={setSection} units="imperial" />
      <output>{section ?? 'none'}</output>
    </>
  );
}

const field = () => screen.getByLabelText<HTMLInputElement>('Section');
const type = (text: string) => fireEvent.change(field(), { target: { value: text } });
const section = () => screen.getByRole('status').textContent;

describe('SectionField', () => {
  it('gives the canonical spelling of what was typed and writes it so when left', () => {
    render(<Form />);
    type('l 3 x 3 x 1/4');
    expect(section()).toBe('L3x3x1/4');
    fireEvent.blur(field());
    expect(field().value).toBe('L3x3x1/4');
  });

  it('never guesses the family of a bare size: it asks', () => {
    render(<Form />);
    type('4x4x3/8');
    fireEvent.blur(field());
    expect(section()).toBe('none');
    expect(screen.getByRole('alert').textContent).toContain('4x4x3/8');
  });
});

describe('suggestSections', () => {
  const names = ['L3x3x1/4', 'L3x3x3/8', 'HSS3x3x1/4', 'C3x4.1'];
  it('offers names that begin so before names that contain it', () => {
    expect(suggestSections('l3', names)).toEqual(['L3x3x1/4', 'L3x3x3/8']);
    expect(suggestSections('3 × 3', names)).toEqual(['L3x3x1/4', 'L3x3x3/8', 'HSS3x3x1/4']);
  });
  it('offers nothing while nothing is typed', () => {
    expect(suggestSections(' ', names)).toEqual([]);
  });
});
