/** Splits a plain spelling into what kind of section it says it is and the sizes it gives. */

export type Kind =
  | 'angle'
  | 'angle-mm'
  | 'flat'
  | 'bar'
  | 'plate'
  | 'floor-plate'
  | 'sheet'
  | 'round'
  | 'bare-r'
  | 'square'
  | 'c'
  | 'mc'
  | 'upn'
  | 'bare-u'
  | 'pfc'
  | 'w'
  | 's'
  | 'bare-i'
  | 'ipe'
  | 'hea'
  | 'heb'
  | 'ub'
  | 'tube'
  | 'square-tube'
  | 'hss'
  | 'box'
  | 'shs'
  | 'rhs'
  | 'chs'
  | 'round-hss'
  | 'pipe'
  | 'p'
  | 'px'
  | 'pxx'
  | 'nominal-bore'
  | 'rebar'
  | 'fb-dotted';

/** Longest first within a kind; matched as whole words or glued to the size (`FB1/2x6`, `40x40x3SHS`). */
const WORDS: readonly (readonly [Kind, RegExp])[] = [
  ['rebar', /\bREBAR\b|(?<![\d.])#\d+\s*$/],
  [
    'floor-plate',
    /\b(FLOOR|CHKR|CHK|CHEQ(UER)?|CHECKER(ED)?|TREAD|DIAMOND|RIFFLE)\s*\.?\s*(PLATE|PLT|PL)?\b|\bCHQ\b/,
  ],
  ['sheet', /\bSHEET\b|\bSHT\b|\bSH\b(?=.*GA)/],
  ['pxx', /^PXX(?=\d)/],
  ['px', /^PX(?=\d)/],
  ['p', /^P(?=\s*\d)/],
  [
    'round-hss',
    /\b(RND|ROUND)\s+(HSS|TUBE|TS)\b|\bHSS\s+(RND|ROUND)\b|\bTO(?=\s*\d)|\bHSS(?=\s*[\d.\s/-]+"?\s*OD)/,
  ],
  ['shs', /\b(SHS|QRO)(?=[\s\d]|$)/],
  ['rhs', /\b(RHS|RRO)(?=[\s\d]|$)/],
  ['chs', /\b(CHS|RO)(?=[\s\d]|$)/],
  ['nominal-bore', /\d\s*"?\s*NB\b/],
  [
    'pipe',
    /\b(PIPE|NPS)(?=[\s\d]|$)|\bSCH(EDULE)?\s*\.?\s*\d+|\b(STD\s+WT|XXH|XH|DBL\s+EX(\s+HVY)?|EX\s+HVY)\b/,
  ],
  ['box', /\bBOX(?=[\s\d]|$)/],
  ['square-tube', /\b(SQ|SQUARE)\s*\.?\s*(TUBE|TB|TUBING)\b/],
  ['hss', /\b(HSS|TS|ST|RT)(?=[\s\d.])/],
  ['tube', /\b((REC|RECT|RECTANGULAR)\s*\.?\s*)?(TUBE|TUBING|TB)(?=[\s\d]|$)/],
  ['upn', /\b(UPN|UNP)(?=[\s\d]|$)/],
  ['pfc', /\bPFC(?=[\s\d]|$)|(?<=\d)PFC\b/],
  ['ub', /\bUB(?=[\s\d]|$)/],
  ['ipe', /\bIPE(?=[\s\d-]|$)/],
  ['hea', /\bHE-?\s?A(?=[\s\d]|$)|\bHE\s*(?=\d+\s*A\b)|\bIPBL(?=[\s\d]|$)/],
  ['heb', /\bHE-?\s?B(?=[\s\d]|$)|\bHE\s*(?=\d+\s*B\b)|\bIPB(?=[\s\d]|$)/],
  ['angle-mm', /\b(EA|UA|RSA)(?=[\s\d]|$)/],
  ['angle', /\b(ANGLES?|ANG|AI|L)(?=[\s\d.]|$)|[<∠](?=\s*\d)/],
  ['mc', /\bMC(?=[\s\d]|$)|\bSHIP\s+CHANNEL\b/],
  ['c', /\b(CHANNEL|CHAN|CH|C)(?=[\s\d@]|$)|\[(?=\s*\d)/],
  ['w', /(?<=\d)\s*WF(?=\s*\d)|\b(WF|W)(?=[\s\d]|$)/],
  ['s', /\bS(?=\s*\d)|\bSTD\s+I\b/],
  ['bare-i', /\bI(?=\s*\d)/],
  ['bare-u', /\bU(?=\s*\d)/],
  ['fb-dotted', /\bF\.\s?B\.?(?=[\s\d]|$)/],
  ['flat', /\b(FLAT\s+BAR|FLATS?|FLT|HRF|BFL|FB|FL)(?=[\s\d.]|$)/],
  ['plate', /\b(PLATE|PLT|PL)(?=[\s\d.]|$)/],
  ['square', /\b(SQ\s+BAR|SQUARE(\s+BAR)?|SQR|VKT|SQ|SB)(?=[\s\d.]|$)/],
  [
    'round',
    /\b(ROUND(\s+BAR)?|RND|ROD|HRR|RB|RD|DIA)(?=[\s\d.]|$)|(?<=[\d"])\s*DIA\b|(?<=\d"?)\s*O$|^O(?=\s*\d)/,
  ],
  ['bare-r', /^R(?=\s*\d)/],
  ['bar', /\b(BAR|BR)(?=[\s\d.]|$)/],
];

/** Words that say how it was made or to which standard: kept as remarks, not part of what stock must match. */
const REMARKS: readonly (readonly [RegExp, (match: string) => string])[] = [
  [/\bEN\s?\d{5}(-\d)?\b|\b(ASTM|AISC)\b/g, (m) => `written with ${m}`],
  [/\bHR[SP]?\b(?!\w)/g, () => 'hot rolled'],
  [/\b(CRS|CDS|CD|CR|CF)\b/g, () => 'cold drawn or cold rolled: keep apart from hot rolled'],
  [/\b(BLK|BLACK)\b/g, () => 'black'],
  [/\b(GALV|GALVANI[SZ]ED)\b/g, () => 'galvanised'],
  [/\bLL[VH]\b/g, (m) => (m === 'LLV' ? 'long leg vertical' : 'long leg horizontal')],
];

export type Words = {
  readonly kind: Kind | null;
  /** Sizes in the order written, plain: `1/2`, `2-1/2`, `.375`, `20'-0"`, `16GA`. */
  readonly sizes: readonly string[];
  /** The whole plain spelling, for readers that need its marks (@, #, SCH 40). */
  readonly rest: string;
  readonly notes: readonly string[];
};

const SIZE =
  /\d+(?:\.\d+)?\s*'\s*-?\s*(?:\d+(?:[\s-]+\d+\/\d+)?"?|\d+\/\d+"?)?|\d+\s*-\s*\d+\/\d+|\d+\s+\d+\/\d+|\d+\/\d+|\d*[.,]\d+|\d+/g;

export function takeWords(plain: string): Words {
  const notes: string[] = [];
  let text = plain;
  for (const [pattern, say] of REMARKS)
    text = text.replace(pattern, (match) => {
      notes.push(say(match));
      return ' ';
    });
  text = text.replace(/\s+/g, ' ').trim();
  const found = WORDS.find(([, pattern]) => pattern.test(text));
  const bare = found ? text.replace(found[1], ' ') : text;
  const sizes = [...bare.matchAll(new RegExp(`(${SIZE.source})(\\s*GA(?:UGE)?\\b)?`, 'g'))].map(
    ([, size = '', gauge]) => (gauge ? `${size.trim()}GA` : size.replace(/\s+/g, ' ').trim()),
  );
  return { kind: found?.[0] ?? null, sizes, rest: text, notes };
}
