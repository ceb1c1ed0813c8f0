import { readSection } from '#shared/domain/section/read-section.ts';
import type { Section } from '#shared/domain/section/types.ts';

const known = new Map<string, Section | null>();

/** The section behind a canonical name or stock key; null when it is none. */
export function sectionByName(canonical: string): Section | null {
  const found = known.get(canonical);
  if (found !== undefined) return found;
  const unitHint = /^(FLT|RND|L |SHS|RHS|CHS|PL \d)/.test(canonical) ? 'mm' : 'in';
  const reading = readSection(canonical, { hasQuantityColumn: true, unitHint });
  const section = reading.outcome === 'read' ? reading.section : null;
  known.set(canonical, section);
  return section;
}
