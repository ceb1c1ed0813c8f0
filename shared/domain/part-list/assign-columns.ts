import {
  columnCells,
  isGradeCell,
  isLengthCell,
  isQuantityCell,
  isSectionCell,
  shareOf,
} from '#shared/domain/part-list/column-cells.ts';
import { LEAST_UNSURE_RANK, type Heading, type HeadingMeaning } from '#shared/domain/part-list/headings.ts';
import type { ReadSectionCell } from '#shared/domain/part-list/section-cells.ts';
import type { Row } from '#shared/domain/part-list/split-rows.ts';
import { PART_FIELDS, type ColumnMapping, type PartField } from '#shared/domain/part-list/types.ts';

export type AssignedColumns = {
  readonly mapping: ColumnMapping;
  /** Second half of a section split over two columns (`L` | `4x4x3/8`), or null. */
  readonly sectionSize: number | null;
  /** Columns taken on a doubtful word or against a rival. */
  readonly unsure: ReadonlySet<number>;
};

const HALF = 0.5;
/** From here on the cells cannot make up for the heading. */
const DOUBTFUL_RANK = 4;

type Named = { readonly column: number } & Heading;

function isInchFoot(named: Named, unit: 'in' | 'ft'): boolean {
  return (
    named.meaning === (unit === 'ft' ? 'feet' : 'inches') ||
    (named.meaning === 'length' && named.unit === unit)
  );
}

/**
 * Gives each field its column from the headings. Words that can mean two things (material, shape and size,
 * description, no.) are settled by what stands under them.
 */
export function assignColumns(
  headings: readonly Heading[],
  rows: readonly Row[],
  readSectionCell: ReadSectionCell,
): AssignedColumns {
  const named: Named[] = headings.map((heading, column) => ({ ...heading, column }));
  const mapping: ColumnMapping = {};
  const unsure = new Set<number>();
  const meaning = (...wanted: readonly HeadingMeaning[]) =>
    named
      .filter((each) => each.meaning !== null && wanted.includes(each.meaning))
      .sort((one, other) => one.rank - other.rank || one.column - other.column);
  const sectionShare = (column: number, size?: number) => {
    const texts = size === undefined ? columnCells(rows, column) : joinedCells(rows, column, size);
    return shareOf(texts.slice(0, 60), (text) => isSectionCell(text, readSectionCell));
  };
  const confirms: Partial<Record<PartField, (cell: string) => boolean>> = {
    mark: (cell) => cell !== '',
    quantity: isQuantityCell,
    length: isLengthCell,
    section: (cell) => isSectionCell(cell, readSectionCell),
    grade: isGradeCell,
  };
  const take = (field: PartField, candidates: readonly Named[]) => {
    const [best, rival] = candidates;
    if (!best) return;
    mapping[field] = best.column;
    const confirm = confirms[field];
    const confirmed =
      confirm !== undefined &&
      best.rank < DOUBTFUL_RANK &&
      shareOf(columnCells(rows, best.column), confirm) > HALF;
    if (rival?.rank === best.rank || (best.rank >= LEAST_UNSURE_RANK && !confirmed)) unsure.add(best.column);
  };

  const sections = [...meaning('section'), ...meaning('size', 'shape')];
  const fitting = sections.filter(({ column }) => sectionShare(column) > HALF);
  const halves = joinHalves(meaning('shape', 'section'), meaning('size', 'section'), sectionShare);
  const alone = fitting[0];
  let sectionSize: number | null = null;
  if (halves && (!alone || sectionShare(alone.column) < halves.share)) {
    mapping.section = halves.shape;
    sectionSize = halves.size;
  } else if (alone) {
    take(
      'section',
      fitting.filter(({ rank }) => rank === alone.rank),
    );
  } else {
    const materials = meaning('material').filter(({ column }) => sectionShare(column) > HALF);
    take('section', materials.length > 0 ? materials : sections);
  }

  const material = meaning('material').filter(({ column }) => column !== mapping.section);
  take('grade', [...meaning('grade'), ...material]);

  const feet = named.find((each) => isInchFoot(each, 'ft'));
  const inches = named.find((each) => isInchFoot(each, 'in'));
  const lengths = meaning('length').filter((each) => each !== feet && each !== inches);
  if (feet && inches && lengths.length === 0) {
    take('feet', [feet]);
    take('inches', [inches]);
  } else {
    take('length', [...meaning('length'), ...meaning('feet', 'inches')]);
  }

  for (const field of PART_FIELDS) {
    if (['section', 'grade', 'length', 'feet', 'inches'].includes(field)) continue;
    take(field, meaning(field));
  }
  return { mapping, sectionSize, unsure };
}

function joinedCells(rows: readonly Row[], shape: number, size: number): string[] {
  return rows
    .slice(0, 200)
    .map(({ cells }) => `${cells[shape] ?? ''} ${cells[size] ?? ''}`.trim())
    .filter((text) => text !== '');
}

/** The pair of columns whose cells read as sections only when put together. */
function joinHalves(
  shapes: readonly Named[],
  sizes: readonly Named[],
  share: (column: number, size?: number) => number,
): { shape: number; size: number; share: number } | null {
  for (const shape of shapes) {
    for (const size of sizes) {
      if (shape.column === size.column) continue;
      const together = share(shape.column, size.column);
      if (together > HALF) return { shape: shape.column, size: size.column, share: together };
    }
  }
  return null;
}
