/** Angles, flats, rounds, squares and tubes: everything whose name is its size. */
import { angle, flat, gaugeTube, round, roundTube, square, tube } from '#shared/domain/section/build.ts';
import { inchesToNm, mmToNm, readSize, valueOf, type Size } from '#shared/domain/section/size.ts';
import type { Section, SectionReading, System } from '#shared/domain/section/types.ts';
import type { Kind } from '#shared/domain/section/words.ts';

const read = (section: Section, notes: readonly string[] = []): SectionReading => ({
  outcome: 'read',
  section,
  notes,
});
const ask = (code: string, message: string, choices: readonly string[] = []): SectionReading => ({
  outcome: 'asked',
  code,
  message,
  choices,
});

type Hint = 'in' | 'mm' | undefined;
type Make = (system: System, ...sizes: ReturnType<typeof inchesToNm>[]) => Section;

const make = (build: Make, system: System, sizes: readonly Size[]): Section =>
  build(system, ...sizes.map(system === 'US' ? inchesToNm : mmToNm));

/**
 * Which system the numbers are in. A fraction, an inch mark or a leading point is inches; a number no inch size reaches is
 * millimetres; between the two the list's own unit decides, and without one the person.
 */
function systemOf(
  sizes: readonly Size[],
  rest: string,
  hint: Hint,
  limits: { inchUpTo: number; mmFrom: number },
): System | null {
  if (/\d\s*MM\b/.test(rest)) return 'EN';
  if (rest.includes('"') || sizes.some(({ fraction, text }) => fraction || text.startsWith('.'))) return 'US';
  const largest = Math.max(...sizes.map(valueOf));
  if (largest > limits.inchUpTo) return 'EN';
  if (largest < limits.mmFrom) return 'US';
  return hint === 'in' ? 'US' : hint === 'mm' ? 'EN' : null;
}

function eitherWay(kind: string, build: Make, sizes: readonly Size[]): SectionReading {
  const both = [make(build, 'US', sizes).name, make(build, 'EN', sizes).name];
  return ask(
    'section-ambiguous',
    `${kind} ${sizes.map(({ text }) => text).join('x')} may be inches or millimetres. Say which.`,
    both,
  );
}

/** Null when nothing says which family it is. */
export function readBarOrTube(
  kind: Kind | null,
  texts: readonly string[],
  rest: string,
  context: { hasQuantityColumn?: boolean; unitHint?: 'in' | 'mm' },
): SectionReading | null {
  if (kind === null) return null;
  const gauge = texts.find((text) => text.endsWith('GA'))?.slice(0, -2);
  const sizes = texts.filter((text) => !text.endsWith('GA')).map(readSize);
  if (sizes.some((size) => size === null || size.numerator === 0))
    return ask('section-unknown', `The size in "${rest}" cannot be read. Type it again.`);
  const given = sizes as Size[];
  const hint = context.unitHint;
  const plainNumbers = given.length;
  switch (kind) {
    case 'rebar':
      return ask(
        'section-ambiguous',
        `"${rest}" is a rebar size. Rebar is not round bar; type the section that is meant.`,
      );
    case 'angle':
    case 'angle-mm':
      return readAngle(given, rest, kind === 'angle-mm' ? 'mm' : hint);
    case 'fb-dotted':
    case 'flat':
    case 'bar':
      if (plainNumbers === 2) return readFlat(given, rest, context);
      return ask('section-incomplete', `"${rest}" needs thickness and width, such as FB 1/2x6.`);
    case 'bare-r':
      return ask(
        'section-ambiguous',
        `"${rest}" may be round bar or rebar. Say which.`,
        given[0] ? [make(round, 'EN', [given[0]]).name] : [],
      );
    case 'round':
    case 'square': {
      const build = kind === 'round' ? round : square;
      const [one, two] = given;
      if (!one || plainNumbers > 2 || (two && valueOf(two) !== valueOf(one)))
        return ask(
          'section-incomplete',
          `"${rest}" needs one size, such as ${kind === 'round' ? 'RB 3/4' : 'SQ 1/2'}.`,
        );
      const system = systemOf([one], rest, hint, { inchUpTo: 13, mmFrom: 5 });
      return system === null
        ? eitherWay(kind === 'round' ? 'Round' : 'Square', build, [one])
        : read(make(build, system, [one]));
    }
    case 'shs':
    case 'rhs':
    case 'box':
      return readBox(given, 'EN', rest);
    case 'chs':
      if (plainNumbers !== 2)
        return ask('section-incomplete', 'CHS needs diameter and wall, such as CHS 60.3x3.2.');
      return read(make(roundTube, 'EN', given));
    case 'round-hss':
      if (plainNumbers !== 2)
        return ask('section-incomplete', 'Round HSS needs diameter and wall, such as HSS3.500x0.216.');
      return read(make(roundTube, 'US', given));
    case 'hss':
    case 'tube':
    case 'square-tube':
      return readTube(kind, given, gauge, rest);
    default:
      return null;
  }
}

function readAngle(sizes: readonly Size[], rest: string, hint: Hint): SectionReading {
  if (sizes.length < 2 || sizes.length > 3)
    return ask('section-incomplete', `"${rest}" needs two legs and a thickness, such as L4x4x3/8.`);
  const system = hint === 'mm' ? 'EN' : systemOf(sizes, rest, hint, { inchUpTo: 12, mmFrom: 12.5 });
  const [a, b, c] = sizes;
  if (!a || !b || system === null)
    return ask('section-incomplete', `"${rest}" needs two legs and a thickness.`);
  const legs = c ? [a, b, c] : [a, a, b];
  if (!c && system === 'US')
    return ask(
      'section-incomplete',
      `"${rest}" gives two numbers; an inch angle needs both legs and the thickness.`,
      [make(angle, 'US', legs).name],
    );
  if (valueOf(legs[2] ?? a) >= Math.min(valueOf(legs[0] ?? a), valueOf(legs[1] ?? a)))
    return ask('section-unknown', `"${rest}" is thicker than its leg. Legs come first, the thickness last.`);
  return read(make(angle, system, legs), c ? [] : ['two numbers: equal legs']);
}

function readFlat(
  sizes: readonly Size[],
  rest: string,
  context: { hasQuantityColumn?: boolean; unitHint?: 'in' | 'mm' },
): SectionReading {
  const [first, second] = sizes;
  if (first?.dashed && second && context.hasQuantityColumn !== true) {
    const whole = make(flat, 'US', sizes).name;
    const pieces = readSize(first.text.replace(/^\d+\s*-\s*/, ''));
    return ask(
      'section-quantity',
      `"${rest}" may be ${first.text} by ${second.text}, or ${first.text.replace(/\s*-.*$/, '')} pieces of ${pieces?.text ?? ''}x${second.text}. Say which.`,
      pieces ? [whole, make(flat, 'US', [pieces, second]).name] : [whole],
    );
  }
  const smallest = Math.min(...sizes.map(valueOf));
  const system = smallest > 4 ? 'EN' : systemOf(sizes, rest, context.unitHint, { inchUpTo: 14, mmFrom: 9 });
  return system === null ? eitherWay('Flat', flat, sizes) : read(make(flat, system, sizes));
}

function readBox(sizes: readonly Size[], system: System, rest: string): SectionReading {
  const [a, b, c] = sizes;
  if (!a || !b)
    return ask(
      'section-incomplete',
      `"${rest}" needs both sides and the wall, such as ${system === 'US' ? 'HSS4x2x1/4' : 'SHS 40x40x3'}.`,
    );
  const sides = c ? [a, b, c] : [a, a, b];
  if (
    sizes.length > 3 ||
    valueOf(sides[2] ?? a) * 2 >= Math.min(valueOf(sides[0] ?? a), valueOf(sides[1] ?? a))
  )
    return ask(
      'section-unknown',
      `"${rest}" has a wall thicker than half its side. Sides come first, the wall last.`,
    );
  return read(make(tube, system, sides), c ? [] : ['two numbers: equal sides']);
}

function readTube(
  kind: Kind,
  sizes: readonly Size[],
  gauge: string | undefined,
  rest: string,
): SectionReading {
  if (gauge !== undefined) {
    const [a, b] = sizes;
    if (!a) return ask('section-incomplete', `"${rest}" needs its side, such as TUBE 1x1x16GA.`);
    const section = gaugeTube(
      inchesToNm(a),
      b ? inchesToNm(b) : kind === 'square-tube' ? inchesToNm(a) : null,
      gauge,
    );
    return section
      ? read(section, ['tube gauge, not sheet gauge'])
      : ask('section-unknown', `${gauge} is not a tube gauge.`);
  }
  const system = Math.max(...sizes.map(valueOf)) >= 24 && !rest.includes('"') ? 'EN' : 'US';
  const [a, b] = sizes;
  // `SQ TB 1x16`: the second number is the gauge.
  if (
    kind === 'square-tube' &&
    sizes.length === 2 &&
    a &&
    b &&
    system === 'US' &&
    valueOf(b) >= 7 &&
    valueOf(a) < 7
  ) {
    const section = gaugeTube(inchesToNm(a), inchesToNm(a), String(valueOf(b)));
    if (section) return read(section, ['tube gauge, not sheet gauge']);
  }
  if (kind === 'hss' && system === 'EN')
    return ask(
      'section-ambiguous',
      `"${rest}" is HSS in millimetres. Type the inch size, or SHS or RHS for an EN tube.`,
      [],
    );
  if (sizes.length === 2 && kind === 'hss') return read(make(roundTube, 'US', sizes));
  if (sizes.length === 2 && kind === 'tube')
    return ask('section-ambiguous', `"${rest}" may be round or square tube. Say which.`, []);
  return readBox(sizes, system, rest);
}
