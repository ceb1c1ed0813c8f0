import type { ErrorIssue } from '#shared/errors.ts';
import { readGrade } from '#shared/domain/grade.ts';
import { PLATE_FAMILIES, type Section } from '#shared/domain/section/types.ts';
import { readSection } from '#shared/domain/section/read-section.ts';

type TypedSection = { ok: true; section: Section } | { ok: false; issue: ErrorIssue };

/** The section behind what was typed, in canonical spelling, or why it is not clear and what is near it. */
export function findSectionTyped(text: string, options: { plate?: boolean } = {}): TypedSection {
  const refuse = (message: string): TypedSection => ({ ok: false, issue: { path: 'section', message } });
  const reading = readSection(text, { hasQuantityColumn: true });
  if (reading.outcome === 'asked') {
    const near = reading.choices.filter((choice) => !reading.message.includes(choice));
    return refuse(near.length > 0 ? `${reading.message} Near it: ${near.join(', ')}.` : reading.message);
  }
  const { section } = reading;
  if (options.plate !== true && PLATE_FAMILIES.includes(section.family))
    return refuse(`${section.name} is plate, which is not bought as bars here: give a bar section.`);
  return { ok: true, section };
}

export const gradeTyped = (text: string): string => readGrade(text).grade;
