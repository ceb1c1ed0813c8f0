import { ShopError } from '#server/errors.ts';
import { readGrade } from '#shared/domain/grade.ts';
import { PLATE_FAMILIES, type Section } from '#shared/domain/section/types.ts';
import { readSection } from '#shared/domain/section/read-section.ts';

/** The section behind what was typed, in canonical spelling; 422 with the choices when it is not clear. */
export function sectionTyped(text: string, options: { plate?: boolean } = {}): Section {
  const reading = readSection(text, { hasQuantityColumn: true });
  if (reading.outcome === 'asked') {
    const choices = reading.choices.length > 0 ? ` Near it: ${reading.choices.join(', ')}.` : '';
    throw new ShopError('bad-input', `The section is not clear. ${reading.message}`, [
      { path: 'section', message: `${reading.message}${choices}` },
    ]);
  }
  if (options.plate !== true && PLATE_FAMILIES.includes(reading.section.family))
    throw new ShopError('bad-input', 'Plate is not kept as bars.', [
      { path: 'section', message: `${reading.section.name} is plate: give a bar section.` },
    ]);
  return reading.section;
}

export const gradeTyped = (text: string): string => readGrade(text).grade;
