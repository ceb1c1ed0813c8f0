/** Worked examples W1, W2, P1, P2, D1, D2, H1 of fixtures/trade/worked-examples.csv, from published unit weights. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { barMassMg, formatMass, pieceMassMg } from '#shared/domain/mass.ts';
import { formatMoney, parseMoney } from '#shared/domain/money.ts';
import { readGrade } from '#shared/domain/grade.ts';
import { catalogueNames } from '#shared/domain/section/catalogue.ts';
import { readSection } from '#shared/domain/section/read-section.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import { sectionOutline } from '#shared/domain/section/outline.ts';
import { MG_PER_LB, NM_PER_FOOT, NM_PER_INCH, NM_PER_MM } from '#shared/domain/units.ts';

const section = (name: string) => {
  const found = sectionByName(name);
  if (!found) throw new Error(`${name} is not read`);
  return found;
};
const lb = (mg: number) => mg / MG_PER_LB;

describe('bills of mass', () => {
  it('W1: a US bill of seven lines', () => {
    const lines: [number, string, number, number?][] = [
      [10, 'L4x4x3/8', 42],
      [24, 'FB 1/2x6', 21.75],
      [6, 'C6x8.2', 96],
      [4, 'HSS4x2x1/4', 67.5],
      [12, 'RB 3/4', 28],
      [2, 'PL1/4', 240, 14],
      [8, 'PIPE 2 STD', 51],
    ];
    const masses = lines.map(
      ([n, name, inches, width]) =>
        n * lb(pieceMassMg(section(name), inches * NM_PER_INCH, width && width * NM_PER_INCH)),
    );
    // FB, RB and PL are on the 490 lb/ft3 basis here, on the supplier's rounded 10.2, 1.502 and 10.21 there: 0.1 %.
    [343.0, 443.7, 393.6, 198.23, 42.06, 476.47, 124.44].forEach((published, i) =>
      expect(Math.abs((masses[i] ?? 0) / published - 1)).toBeLessThan(0.002),
    );
    expect(masses.reduce((a, b) => a + b)).toBeCloseTo(2021.49, -1);
  });
  it('W2: a metric bill of five lines', () => {
    const lines: [number, string, number][] = [
      [10, 'L 50x50x5', 1250],
      [20, 'FLT 50x10', 800],
      [6, 'UPN 100', 2400],
      [8, 'SHS 40x40x3', 950],
      [12, 'RND 20', 600],
    ];
    const kg = lines.map(([n, name, mm]) => (n * pieceMassMg(section(name), mm * NM_PER_MM)) / 1e6);
    [47.125, 62.8, 152.64, 25.08, 17.755].forEach((published, i) =>
      expect(Math.abs((kg[i] ?? 0) / published - 1)).toBeLessThan(0.0015),
    );
    expect(kg.reduce((a, b) => a + b)).toBeCloseTo(305.4, 1);
  });
  it('P2, D1, H1: bars and drops', () => {
    const l4 = section('L4x4x3/8');
    expect(lb(pieceMassMg(l4, 20 * NM_PER_FOOT))).toBeCloseTo(196, 4);
    expect(196 * 0.65).toBeCloseTo(127.4, 9);
    const drop = lb(pieceMassMg(section('L2x2x1/4'), 3 * NM_PER_FOOT));
    expect(drop).toBeCloseTo(9.57, 4);
    expect(drop * (0.8 - 0.08) - 6).toBeCloseTo(0.89, 2);
    expect(6 / (3.19 * 0.72)).toBeCloseTo(2.61, 2);
    expect(lb(pieceMassMg(section('W8x31'), 20 * NM_PER_FOOT))).toBeCloseTo(620, 4);
  });
  it('D2: 490 lb/ft3 is 7849.05 kg/m3', () => {
    expect((490 * MG_PER_LB) / 1e6 / 0.3048 ** 3).toBeCloseTo(7849.05, 2);
  });
});

describe('names', () => {
  it('every name of the catalogue reads to itself and can be drawn', () => {
    for (const name of catalogueNames()) {
      const found = section(name);
      expect(found.name).toBe(name);
      const outline = sectionOutline(found);
      expect(outline.width).toBeGreaterThan(0);
      expect(outline.height).toBeGreaterThan(0);
    }
  });
  it('random flats and tubes read to themselves', () => {
    const sixteenth = fc.integer({ min: 2, max: 16 }).map((n) => n * (NM_PER_INCH / 16));
    fc.assert(
      fc.property(sixteenth, fc.integer({ min: 17, max: 128 }), (t, w) => {
        const reading = readSection(`FB ${inch(t)}x${inch((w * NM_PER_INCH) / 16)}`, {
          hasQuantityColumn: true,
          unitHint: 'in',
        });
        expect(reading.outcome).toBe('read');
        if (reading.outcome === 'read') expect(section(reading.section.name).name).toBe(reading.section.name);
      }),
    );
  });
  it('never throws', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 30 }), (text) => {
        expect(['read', 'asked']).toContain(readSection(text).outcome);
      }),
    );
  });
});

function inch(nm: number): string {
  const n = (nm * 16) / NM_PER_INCH;
  const [whole, rest] = [Math.floor(n / 16), n % 16];
  return rest === 0 ? String(whole) : whole === 0 ? `${rest}/16` : `${whole}-${rest}/16`;
}

describe('grades (aliases.csv)', () => {
  it.each([
    ['A36', 'A36'],
    ['A-36', 'A36'],
    ['ASTM A36', 'A36'],
    ['A572-50', 'A572-50'],
    ['A572 GR50', 'A572-50'],
    ['GR50', 'A572-50'],
    ['A992', 'A992'],
    ['A500B', 'A500B'],
    ['A500 GR C', 'A500C'],
    ['A53B', 'A53B'],
    ['S235JR', 'S235JR'],
    ['s355 j2', 'S355J2'],
  ])('%s is %s', (text, grade) => expect(readGrade(text)).toEqual({ grade, remarks: [] }));
  it('keeps what is no grade, with a remark', () => {
    expect(readGrade('ms')).toEqual({ grade: 'MS', remarks: ['MS is not a grade for certified work'] });
    expect(readGrade('St37').remarks).toHaveLength(1);
    expect(readGrade('')).toEqual({ grade: '', remarks: [] });
  });
});

describe('money and mass in words', () => {
  it('groups and keeps its unit', () => {
    expect(formatMoney(1_846_210, 'USD')).toBe('$\u00a018\u2009462.10');
    expect(formatMoney(-5, 'EUR')).toBe('−€\u00a00.05');
    expect(formatMass(barMassMg(14_584_000, 6_096_000_000), 'imperial')).toBe('196 lb');
    expect(formatMass(1_234_567_890, 'metric')).toBe('1\u2009235 kg');
  });
  it('reads amounts back', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1e11 }), (minor) => {
        expect(parseMoney(formatMoney(minor, 'USD'), 'USD')).toBe(minor);
      }),
    );
    expect(parseMoney('1,234.50', 'USD')).toBe(123_450);
    expect(parseMoney('nothing', 'USD')).toBeNull();
  });
});
