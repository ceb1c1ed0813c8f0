import { describe, expect, it } from 'vitest';
import { readHeading, readUnitWord, type HeadingMeaning } from '#shared/domain/part-list/headings.ts';

describe('headings as lists write them', () => {
  it.each<[HeadingMeaning, string[]]>([
    [
      'mark',
      [
        'Mark',
        'MARK',
        'Pc. Mk.',
        'Piece Mark',
        'piece_mark',
        'Part No.',
        'Item #',
        'Pos.-Nr.',
        'Position',
        'Repère',
      ],
    ],
    [
      'quantity',
      [
        'Qty',
        'QTY.',
        "Q'ty",
        'Quantity',
        'No.',
        'Nos',
        'Pcs',
        "No. Req'd",
        'Req’d',
        'Count',
        'Stk',
        'Stück',
        'Anzahl',
        'Qté',
        'N°',
      ],
    ],
    [
      'section',
      [
        'Section',
        'Profile',
        'Profil',
        'Material Size',
        "Mat'l Size",
        'Description',
        'Designation',
        'Querschnitt',
      ],
    ],
    ['size', ['Size', 'Dimension']],
    ['shape', ['Shape', 'Type']],
    ['grade', ['Grade', 'Material Grade', 'Spec.', "Mat'l Spec", 'Quality', 'Stahlgüte', 'ASTM']],
    ['material', ['Material', 'MAT’L', 'Werkstoff']],
    [
      'length',
      ['Length', 'LEN.', 'Lg', 'Cut Length', 'Cut-Length', 'Long', 'Länge', 'Longueur', 'O.A. Length'],
    ],
    ['feet', ['Ft', 'Feet']],
    ['inches', ['In.', 'Inches']],
    ['width', ['Width', 'Breite']],
    ['note', ['Notes', 'Remarks', 'Bemerkung']],
    ['finish', ['Finish', 'Coating']],
    ['heat', ['Heat', 'Heat No.']],
    ['neededBy', ['Needed by', 'Due Date', "Date Req'd"]],
    ['other', ['Weight', 'Total Length', 'Assembly', 'Dwg No.', 'Rev']],
  ])('%s', (meaning, spellings) => {
    for (const spelling of spellings)
      expect([spelling, readHeading(spelling).meaning]).toEqual([spelling, meaning]);
  });

  it.each([
    ['Length (mm)', 'mm'],
    ['Länge [mm]', 'mm'],
    ['Length mm', 'mm'],
    ['len_in', 'in'],
    ['Cut Length (Inches)', 'in'],
    ['LENGTH (FT-IN)', 'in'],
    ['Length (ft)', 'ft'],
    ['Longueur (m)', 'm'],
    ['Length {cm}', 'cm'],
  ])('%s names its unit', (text, unit) => {
    expect(readHeading(text)).toMatchObject({ meaning: 'length', unit });
  });

  it('longer words are likely, not certain', () => {
    expect(readHeading('Overall finished cut length of part')).toMatchObject({ meaning: 'length', rank: 5 });
    expect(readHeading('Total weight of item')).toMatchObject({ meaning: 'other' });
    expect(readHeading('Zorp').meaning).toBeNull();
    expect(readHeading('').meaning).toBeNull();
  });

  it('knows units in a row of their own', () => {
    expect(['mm', '(mm)', '[in]', 'ft-in', '"', 'kg'].map(readUnitWord)).toEqual([
      'mm',
      'mm',
      'in',
      'in',
      'in',
      null,
    ]);
  });
});
