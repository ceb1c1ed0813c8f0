import { describe, expect, it } from 'vitest';
import { BLANK_DROP, LogDropFormSchema } from '#src/features/rack/hooks/log-drop-form.ts';

const filled = {
  ...BLANK_DROP,
  section: 'L3x3x1/4',
  grade: 'A36',
  lengthNm: 1_149_350_000,
  slot: ' B-3-2 ',
  heatKnown: 'read',
  heat: '47K210',
} as const;

describe('the form of a new drop', () => {
  it('sends the heat that was read off the steel', () => {
    expect(LogDropFormSchema.parse(filled)).toEqual({
      section: 'L3x3x1/4',
      grade: 'A36',
      lengthNm: 1_149_350_000,
      widthNm: null,
      slot: 'B-3-2',
      heat: '47K210',
      note: '',
    });
  });

  it('sends null only when "unknown" was chosen, whatever was typed before', () => {
    expect(LogDropFormSchema.parse({ ...filled, heatKnown: 'unknown' }).heat).toBeNull();
  });

  it('never takes an empty heat for an unknown one', () => {
    expect(LogDropFormSchema.safeParse({ ...filled, heat: ' ' }).error?.issues).toMatchObject([
      { path: ['heat'] },
    ]);
  });

  it('asks for all that is missing at once, the choice about the heat among it', () => {
    const paths = LogDropFormSchema.safeParse(BLANK_DROP).error?.issues.map((issue) => issue.path.join('.'));
    expect(paths?.sort()).toEqual(['heatKnown', 'lengthNm', 'section', 'slot']);
  });
});
