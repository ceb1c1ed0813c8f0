/** Grades as lists write them, in one spelling. A grade is never guessed from the section. */

export type GradeReading = { readonly grade: string; readonly remarks: readonly string[] };

const KNOWN: readonly (readonly [RegExp, string | ((match: RegExpExecArray) => string)])[] = [
  [/^A-?36$/, 'A36'],
  [/^A-?572(?:[-\s]*(?:GR(?:ADE)?\.?\s*)?(\d{2}))?$/, (m) => `A572-${m[1] ?? '50'}`],
  [/^(?:GR(?:ADE)?\.?\s*)50$/, 'A572-50'],
  [/^A-?992(?:[-/\s]+.*)?$/, 'A992'],
  [/^A-?500[-\s]*(?:GR(?:ADE)?\.?\s*)?([BC])$/, (m) => `A500${m[1]}`],
  [/^A-?53[-\s]*(?:GR(?:ADE)?\.?\s*)?([AB])$/, (m) => `A53${m[1]}`],
  [/^A-?529(?:[-\s]*(?:GR(?:ADE)?\.?\s*)?(\d{2}))?$/, (m) => `A529-${m[1] ?? '50'}`],
  [/^A-?588(?:[-\s]*(?:GR\.?\s*)?[AB])?$/, 'A588'],
  [/^A-?1085$/, 'A1085'],
  [/^S\s?(235|275|355)\s?(JR|J0|J2|K2)(?:H|\+N|\+AR|\+M)?$/, (m) => `S${m[1]}${m[2]}`],
  [/^(?:SS|T|AISI)?[-\s]?(304|316)(L)?(?:\s*SS)?$/, (m) => `${m[1]}${m[2] ?? ''}`],
  [/^(6061|5052|6063)[-\s]?(T\d+|H\d+)?$/, (m) => (m[2] ? `${m[1]}-${m[2]}` : (m[1] ?? ''))],
];

const REMARKS: readonly (readonly [RegExp, string])[] = [
  [/^(MS|M\.S\.|MILD( STEEL)?)$/, 'MS is not a grade for certified work'],
  [/^(HR|HRS|CR|CRS)$/, 'says how it was rolled, not which grade it is'],
  [/^ST\s?-?(37|44|52)/, 'an old DIN name; certified work wants today’s'],
];

/** Reads a grade cell. Unknown text is kept, upper-cased, as the customer wrote it; an empty cell gives ''. */
export function readGrade(text: string): GradeReading {
  const plain = text
    .replace(/[\u2010-\u2015]/g, '-')
    .trim()
    .replace(/\s+/g, ' ')
    .toUpperCase();
  const bare = plain.replace(/^ASTM\s*/, '').replace(/^EN\s*10025(-\d)?\s*/, '');
  for (const [pattern, name] of KNOWN) {
    const match = pattern.exec(bare);
    if (match) return { grade: typeof name === 'string' ? name : name(match), remarks: [] };
  }
  return {
    grade: plain,
    remarks: REMARKS.filter(([pattern]) => pattern.test(plain)).map(([, remark]) => remark),
  };
}
