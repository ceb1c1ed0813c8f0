import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { readSection } from '#shared/domain/section/read-section.ts';
import { MG_PER_LB } from '#shared/domain/units.ts';

const fixture = (name: string) =>
  Papa.parse<Record<string, string>>(
    readFileSync(join(import.meta.dirname, '../../../fixtures/trade', name), 'utf8'),
    {
      header: true,
      skipEmptyLines: true,
    },
  ).data;

const seen = (text: string, context = {}) => {
  const reading = readSection(text, context);
  return reading.outcome === 'read' ? reading.section.name : reading.code;
};

describe('spellings seen in the trade (aliases.csv)', () => {
  const ASKED: Record<string, string> = {
    'P 1/4x14': 'PL1/4x14',
    'PLT .25x14x240': `PL1/4x14x20'-0"`,
  };
  const OPEN = new Set([
    // Each of these has two readings or is incomplete by the trap column or rule 7.
    '1/2x1/2',
    'R20',
    'I200',
    '50NB',
    '2" NB medium',
    '2" PIPE',
    '2" BLK PIPE',
    '200PFC (regional sizes differ)',
    'STD I 8',
    'SHIP CHANNEL',
    '1x1x.065',
    'CHKR PL',
    'CHK PL',
    'TREAD PL',
    'DIAMOND PL',
    'CHQ',
    'PL 6.35',
    'BFL (wide flat)',
  ]);
  for (const row of fixture('aliases.csv')) {
    const canonical = row.canonical ?? '';
    if (['lengths', 'fractions', 'separators', 'spreadsheet damage', 'grades'].includes(canonical)) continue;
    for (const variant of [
      canonical,
      ...(row.variants_seen ?? '').split(';').map((text) => text.trim()),
    ].filter(Boolean))
      it(`${variant} → ${canonical}`, () => {
        const name = seen(variant);
        if (OPEN.has(variant)) expect(name).toMatch(/^section-/);
        else expect(name).toBe(ASKED[variant] ?? canonical);
      });
  }
});

describe('published masses (weights-check-values.csv)', () => {
  it('reads every row, within the tolerance of its family', () => {
    const off: string[] = [];
    for (const row of fixture('weights-check-values.csv')) {
      const designation = (row.designation ?? '').replace(/ \(same as rebar.*\)| \(uncoated\)| CF$/g, '');
      const published = Number(row.published_weight);
      const reading = readSection(designation, {
        hasQuantityColumn: true,
        unitHint: row.system === 'US' ? 'in' : 'mm',
      });
      if (reading.outcome !== 'read') {
        off.push(`${designation}: ${reading.code}`);
        continue;
      }
      const { mass } = reading.section;
      const perArea = row.unit === 'lb/ft2';
      const value =
        mass.per === 'area'
          ? (mass.mgPerM2 / MG_PER_LB) * 0.3048 ** 2
          : row.unit === 'kg/m'
            ? mass.mgPerM / 1e6
            : (mass.mgPerM / MG_PER_LB) * 0.3048;
      const digits = (row.published_weight ?? '').split('.')[1]?.length ?? 0;
      // Half a unit in the last published digit, and the spread the handbook found between formula and list.
      const spread =
        { flat: 0.004, 'HSS rect/square': 0.0012, SHS: 0.0037, RHS: 0.0037 }[
          row.family?.split(' EN')[0] ?? ''
        ] ?? 0.0025;
      if (
        (mass.per === 'area') !== perArea ||
        Math.abs(value - published) > 0.5 * 10 ** -digits + spread * published
      )
        off.push(`${designation}: ${value.toFixed(4)} against ${published}`);
    }
    expect(off).toEqual([]);
  });
});

describe('rules of reading (common practice, no published source)', () => {
  it('rule 1: crosses, primes, words and single-glyph fractions are one spelling', () => {
    for (const text of [
      'L4X4X3/8',
      'l 4×4×⅜',
      'L4*4*3/8',
      '4 by 4 by 3/8 angle',
      'ANGLE 4″x4″x3/8″',
      'L4x4x3⁄8',
    ])
      expect(seen(text), text).toBe('L4x4x3/8');
  });
  it('rule 2: fractions are one value in every writing; 11/2 is asked', () => {
    for (const text of ['RB 1-1/2', 'RB 1 1/2', 'RB 1.5"', 'RB 1½', 'RB 1 1⁄2'])
      expect(seen(text), text).toBe('RB 1-1/2');
    expect(seen('RB 11/2')).toBe('section-fraction');
    expect(seen('FB 11/2x6')).toBe('section-fraction');
  });
  it('rule 3: 2-1/2x6 may be two pieces, unless the list counts them in a column', () => {
    expect(readSection('FB 2-1/2x6')).toMatchObject({
      outcome: 'asked',
      choices: ['FB 2-1/2x6', 'FB 1/2x6'],
    });
    expect(seen('FB 2-1/2x6', { hasQuantityColumn: true })).toBe('FB 2-1/2x6');
  });
  it('rule 5: a date is a damaged fraction and is never repaired', () => {
    for (const text of ['8-Mar', '3-Aug', '2-Jan', 'Mar-08', '3/8/2024', '45359', '1.25E+01', '2024-03-08'])
      expect(readSection(text), text).toMatchObject({ outcome: 'asked', code: 'section-date', choices: [] });
  });
  it('rule 6: a size without a letter has no family', () => {
    expect(readSection('4x4x3/8')).toMatchObject({
      outcome: 'asked',
      code: 'section-no-family',
      choices: ['L4x4x3/8', 'HSS4x4x3/8'],
    });
    expect(seen('2x2x1/4')).toBe('section-no-family');
  });
  it('rule 7: C6, W8 and PIPE 2 are incomplete', () => {
    expect(readSection('C6')).toMatchObject({
      outcome: 'asked',
      code: 'section-incomplete',
      choices: ['C6x13', 'C6x10.5', 'C6x8.2'],
    });
    expect(seen('W8')).toBe('section-incomplete');
    expect(readSection('PIPE 2')).toMatchObject({
      outcome: 'asked',
      choices: ['PIPE 2 STD', 'PIPE 2 XS', 'PIPE 2 XXS'],
    });
  });
  it('rule 9: round HSS and pipe of one size are two sections', () => {
    expect(seen('HSS3.500x0.216')).not.toBe(seen('PIPE 3 STD'));
  });
  it('rule 10: schedules meet the weight classes through NPS 10 and 8, above they part (ASME B36.10, from memory)', () => {
    expect(seen('PIPE 10 SCH 40')).toBe('PIPE 10 STD');
    expect(seen('PIPE 12 SCH 40')).toBe('section-ambiguous');
    expect(seen('PIPE 8 SCH 80')).toBe('PIPE 8 XS');
    expect(seen('PIPE 10 SCH 80')).toBe('section-ambiguous');
  });
  it('rule 11: 16 ga is 0.0598 in as sheet and 0.065 in as tube', () => {
    expect(readSection('SHEET 16 GA')).toMatchObject({ section: { dimensions: { thickness: 1_518_920 } } });
    expect(readSection('TUBE 1x1x16GA')).toMatchObject({ section: { dimensions: { wall: 1_651_000 } } });
  });
  it('C and MC never merge, W and S never merge', () => {
    expect(seen('C6x12')).not.toBe(seen('MC6x12'));
    expect(seen('S8x18.4')).not.toBe(seen('W8x18'));
  });
  it('says what is near when it does not know', () => {
    expect(readSection('LL4x4x3/8')).toMatchObject({ outcome: 'asked' });
    expect(readSection('Unobtainium 5')).toMatchObject({ outcome: 'asked', code: 'section-unknown' });
  });
});
