import { readSection } from '#shared/domain/section/read-section.ts';
import type { SectionReading } from '#shared/domain/section/types.ts';

export type SectionContext = { readonly hasQuantityColumn: boolean; readonly unitHint?: 'in' | 'mm' };
export type ReadSectionCell = (text: string) => SectionReading;

/** Reads each distinct section text of a list once: twenty thousand rows hold a few dozen of them. */
export function createSectionCells(context: SectionContext): ReadSectionCell {
  const read = new Map<string, SectionReading>();
  return (text) => {
    const known = read.get(text);
    if (known) return known;
    const reading = readSection(text, context);
    read.set(text, reading);
    return reading;
  };
}
