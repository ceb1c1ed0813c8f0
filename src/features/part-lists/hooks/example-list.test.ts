import { describe, expect, it } from 'vitest';
import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import { PART_FIELDS } from '#shared/domain/part-list/types.ts';
import { blankTemplate, filledExample } from '#src/features/part-lists/hooks/example-list.ts';

const bytes = (text: string) => new TextEncoder().encode(text);

describe.each(['imperial', 'metric'] as const)('the %s example', (units) => {
  const reading = readPartList(bytes(filledExample(units).text), {});

  it('reads without a question, every column for certain', () => {
    expect(reading.problems).toEqual([]);
    expect(reading.fatal).toBeNull();
    expect(reading.columns.filter(({ sure }) => !sure)).toEqual([]);
    expect(reading.lines).toHaveLength(6);
    expect(reading.unit).toBe(units === 'imperial' ? 'in' : 'mm');
  });

  it('keeps the size of the rail and of the plate', () => {
    const [stringer, , , rail, , plate] = reading.lines;
    // 14 ft 3 1/2 in and 4356 mm; 11 ft 8 in and 3556 mm; 4 × 6 in and 100 × 150 mm.
    expect(stringer?.lengthNm).toBe(units === 'imperial' ? 171.5 * 25_400_000 : 4_356_000_000);
    expect(rail?.lengthNm).toBe(units === 'imperial' ? 140 * 25_400_000 : 3_556_000_000);
    expect([plate?.widthNm, plate?.lengthNm]).toEqual(
      units === 'imperial' ? [4 * 25_400_000, 6 * 25_400_000] : [100_000_000, 150_000_000],
    );
  });

  it('has a template with the same headings and nothing under them', () => {
    const template = readPartList(bytes(blankTemplate(units).text), {});
    expect(template.fatal?.code).toBe('no-rows');
    expect(Object.keys(template.mapping).sort()).toEqual(
      PART_FIELDS.filter((field) => !['feet', 'inches', 'heat'].includes(field)).sort(),
    );
  });
});
