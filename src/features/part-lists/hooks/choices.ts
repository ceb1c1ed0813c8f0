import {
  PART_FIELDS,
  type ColumnMapping,
  type PartField,
  type PartListChoices,
} from '#shared/domain/part-list/types.ts';
import type { LengthUnit } from '#shared/domain/units.ts';

/** Nothing decided yet: the file speaks for itself. */
export const NO_CHOICES: PartListChoices = {};

type RowFixes = Partial<Record<PartField, string>>;
export type CellFix = { readonly row: number; readonly field: PartField; readonly text: string };

/**
 * The same decisions are the same choices, letter by letter, in whatever order they were made: nothing empty, fields
 * in their fixed order, rows rising.
 */
function settled({ unit, mapping, fixes, skips }: PartListChoices): PartListChoices {
  const kept: Record<number, RowFixes> = {};
  for (const [row, texts] of Object.entries(fixes ?? {})) {
    const ordered: RowFixes = {};
    for (const field of PART_FIELDS) {
      const text = texts[field];
      if (text !== undefined) ordered[field] = text;
    }
    if (Object.keys(ordered).length > 0) kept[Number(row)] = ordered;
  }
  const rows = [...new Set(skips ?? [])].sort((a, b) => a - b);
  return {
    ...(unit ? { unit } : {}),
    ...(mapping ? { mapping } : {}),
    ...(Object.keys(kept).length > 0 ? { fixes: kept } : {}),
    ...(rows.length > 0 ? { skips: rows } : {}),
  };
}

/** null gives the unit back to what the file says. */
export function chooseUnit(choices: PartListChoices, unit: LengthUnit | null): PartListChoices {
  return settled({ ...choices, unit: unit ?? undefined });
}

/** A length stands in one column or is split over two, never both. */
const RIVALS: Readonly<Partial<Record<PartField, readonly PartField[]>>> = {
  length: ['feet', 'inches'],
  feet: ['length'],
  inches: ['length'],
};

/**
 * Says what one column is; null when it is not used. `read` is the mapping the page shows now, so that the other
 * columns stay as they were seen. A field that stood elsewhere moves here.
 */
export function chooseColumn(
  choices: PartListChoices,
  read: ColumnMapping,
  index: number,
  field: PartField | null,
): PartListChoices {
  const mapping: ColumnMapping = {};
  for (const known of PART_FIELDS) {
    const at = read[known];
    if (known === field) mapping[known] = index;
    else if (at !== undefined && at !== index && !(field && RIVALS[field]?.includes(known)))
      mapping[known] = at;
  }
  return settled({ ...choices, mapping });
}

/** The columns as shown are right: unsure ones are decided by the person from here on. */
export function confirmColumns(choices: PartListChoices, read: ColumnMapping): PartListChoices {
  return settled({ ...choices, mapping: { ...read } });
}

export function fixCells(choices: PartListChoices, cells: readonly CellFix[]): PartListChoices {
  const fixes: Record<number, RowFixes> = { ...choices.fixes };
  for (const { row, field, text } of cells) fixes[row] = { ...fixes[row], [field]: text };
  return settled({ ...choices, fixes });
}

/** The row reads as the file has it again. */
export function unfixRow(choices: PartListChoices, row: number): PartListChoices {
  const { [row]: _gone, ...fixes } = choices.fixes ?? {};
  return settled({ ...choices, fixes });
}

export function leaveOut(choices: PartListChoices, rows: readonly number[]): PartListChoices {
  return settled({ ...choices, skips: [...(choices.skips ?? []), ...rows] });
}

export function takeBack(choices: PartListChoices, row: number): PartListChoices {
  return settled({ ...choices, skips: (choices.skips ?? []).filter((skipped) => skipped !== row) });
}
