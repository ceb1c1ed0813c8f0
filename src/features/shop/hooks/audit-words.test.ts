import { describe, expect, it } from 'vitest';
import { auditWords } from '#src/features/shop/hooks/audit-words.ts';
import { formatsOf } from '#src/lib/formats.ts';

const formats = formatsOf({ units: 'imperial', inchDenominator: 16, currency: 'USD' });

describe('auditWords', () => {
  it('writes lengths, masses and money as the shop does and leaves out what is empty', () => {
    const detail = JSON.stringify({
      section: 'L3x3x1/4',
      lengthNm: 6_096_000_000,
      priceMinor: 9840,
      widthNm: null,
      note: '',
      creditPercent: 60,
      drops: [1, 3],
    });
    expect(auditWords(detail, formats)).toBe(
      `section L3x3x1/4 · length 20'-0" · price $\u00a098.40 · credit percent 60 · drops 1, 3`,
    );
  });

  it('leaves plain words alone', () => {
    expect(auditWords('signed in', formats)).toBe('signed in');
    expect(auditWords('"x"', formats)).toBe('"x"');
  });
});
