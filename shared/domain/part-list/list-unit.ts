import type { DecimalMark } from '#shared/domain/exact-number.ts';
import { parseLength } from '#shared/domain/length.ts';
import type { PartListReading } from '#shared/domain/part-list/types.ts';
import { plainMarks } from '#shared/domain/plain-marks.ts';
import type { System } from '#shared/domain/section/types.ts';
import type { LengthUnit } from '#shared/domain/units.ts';

export type ListUnit = { readonly unit: LengthUnit; readonly from: PartListReading['unitFrom'] };

const METRIC_CELL = /\d ?(mm|cm|m|millimet\w+|centimet\w+|met\w+|mtrs?)\.?$/;
const IMPERIAL_CELL = /['"]|\d ?(?:in|ins|inch|inches|ft|feet)\.?$/;
const BARE = /^[\d.,\s]+$/;

/** The unit that lengths with their own mark or word speak for, or null when none of them has one. */
function unitOfCells(cells: readonly string[]): LengthUnit | null {
  const plain = cells.map(plainMarks).filter((cell) => cell !== '');
  const metric = plain.flatMap((cell) => METRIC_CELL.exec(cell)?.[1] ?? []);
  const imperial = plain.filter((cell) => IMPERIAL_CELL.test(cell)).length;
  if (metric.length === 0 && imperial === 0) return null;
  if (imperial >= metric.length) return 'in';
  const words = metric.map((word) => (/^(?:mm|mil)/.test(word) ? 'mm' : word.startsWith('c') ? 'cm' : 'm'));
  const counted = (['mm', 'cm', 'm'] as const).map((unit) => words.filter((word) => word === unit).length);
  const most = counted.indexOf(Math.max(...counted));
  const unit = (['mm', 'cm', 'm'] as const)[most] ?? 'mm';
  // `3.2 m` on the cells that say so and a bare 3200 beside them: the bare ones are millimetres.
  const long = plain.some((cell) => {
    if (!BARE.test(cell)) return false;
    const read = parseLength(cell, { unit: 'mm' });
    return read.ok && read.nm >= 50_000_000;
  });
  return long ? 'mm' : unit;
}

function unitOfSections(systems: readonly System[]): LengthUnit | null {
  const en = systems.filter((system) => system === 'EN').length;
  const us = systems.length - en;
  if (en === us) return null;
  return en > us ? 'mm' : 'in';
}

/** What bare lengths of the list mean, and what said so: person, heading, cells, sections, or nothing (inches). */
export function findListUnit(known: {
  readonly given: LengthUnit | undefined;
  readonly heading: LengthUnit | null;
  readonly lengthCells: readonly string[];
  readonly systems: readonly System[];
}): ListUnit {
  if (known.given) return { unit: known.given, from: 'given' };
  if (known.heading) return { unit: known.heading, from: 'heading' };
  const cells = unitOfCells(known.lengthCells);
  if (cells) return { unit: cells, from: 'cells' };
  const sections = unitOfSections(known.systems);
  return sections ? { unit: sections, from: 'sections' } : { unit: 'in', from: 'default' };
}

const POINT_SHOWN = /\d\.\d{1,2}(?!\d)|^0?\.\d|\d,\d{3}\.\d|\d\.\d{4,}/;
const COMMA_SHOWN = /\d,\d{1,2}(?!\d)|^0?,\d|\d\.\d{3},\d|\d,\d{4,}/;

/**
 * The decimal mark the numbers of a list show beyond doubt. A semicolon list that shows none uses the
 * comma, since that is why it is not separated by commas; undefined leaves each number to itself.
 */
export function findDecimalMark(cells: readonly string[], separator: string): DecimalMark | undefined {
  const plain = cells.map(plainMarks);
  const point = plain.some((cell) => POINT_SHOWN.test(cell));
  const comma = plain.some((cell) => COMMA_SHOWN.test(cell));
  if (point !== comma) return point ? '.' : ',';
  return !point && separator === ';' ? ',' : undefined;
}
