/** Channels and beams: their last number is their mass per length, so a name without it is incomplete. */
import { asNm, NM_PER_INCH, NM_PER_MM } from '#shared/domain/units.ts';
import { bar } from '#shared/domain/section/build.ts';
import { kgPerMToMgPerM, lbPerFtToMgPerM } from '#shared/domain/section/mass-formulas.ts';
import {
  HEA_KG_PER_M,
  HEB_KG_PER_M,
  IPE_KG_PER_M,
  PFC_KG_PER_M,
  UPN_KG_PER_M,
} from '#shared/domain/section/tables/en-beams.ts';
import { US_C } from '#shared/domain/section/tables/us-c.ts';
import { US_MC } from '#shared/domain/section/tables/us-mc.ts';
import { US_W } from '#shared/domain/section/tables/us-w.ts';
import type { Family, Section, SectionReading } from '#shared/domain/section/types.ts';
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

type Weights = Readonly<Record<string, readonly string[]>>;

/** S shapes seen on lists (weights are in the names; from memory). */
const US_S: Weights = {
  '3': ['5.7', '7.5'],
  '4': ['7.7', '9.5'],
  '5': ['10'],
  '6': ['12.5', '17.25'],
  '8': ['18.4', '23'],
  '10': ['25.4', '35'],
  '12': ['31.8', '35', '40.8', '50'],
};

const US_KINDS: Partial<Record<Kind, { letter: string; family: Family; weights: Weights }>> = {
  c: { letter: 'C', family: 'channel', weights: US_C },
  mc: { letter: 'MC', family: 'channel', weights: US_MC },
  w: { letter: 'W', family: 'beam', weights: US_W },
  s: { letter: 'S', family: 'beam', weights: US_S },
};

function readUs(
  { letter, family, weights }: { letter: string; family: Family; weights: Weights },
  sizes: readonly string[],
): SectionReading {
  const [depth, weight, more] = sizes;
  const kind = letter === 'W' || letter === 'S' ? 'beam' : 'channel';
  if (depth === undefined || more !== undefined)
    return ask(
      'section-incomplete',
      `A ${kind} needs its depth and lb/ft, such as ${letter}6x${weights['6']?.[0] ?? '12'}.`,
    );
  const known = weights[depth] ?? [];
  if (weight === undefined)
    return ask(
      'section-incomplete',
      `${letter}${depth} is incomplete: several weights exist. Say which.`,
      known.map((w) => `${letter}${depth}x${w}`),
    );
  if (letter === 'W' && Number(depth) >= 100) return softMetricW(Number(depth), Number(weight));
  const plain = String(Number(weight));
  if (!(Number(plain) > 0) || !/^\d+$/.test(depth))
    return ask('section-unknown', `${letter}${depth}x${weight} is not a ${kind}.`, []);
  const notes =
    known.length > 0 && !known.includes(plain)
      ? [`${letter}${depth} is listed with ${known.join(', ')} lb/ft, not ${plain}`]
      : [];
  return read(
    bar({
      name: `${letter}${depth}x${plain}`,
      family,
      system: 'US',
      dimensions: { depth: asNm(Number(depth) * NM_PER_INCH) },
      mgPerM: lbPerFtToMgPerM(Number(plain)),
      basis: 'name',
    }),
    notes,
  );
}

/** W200x46 is W8x31 in millimetres and kg/m, rounded: read when exactly one listed shape fits. */
function softMetricW(depthMm: number, kgPerM: number): SectionReading {
  const depth = Math.round(depthMm / 25);
  const fits = (US_W[String(depth)] ?? []).filter((lb) => Math.abs(Number(lb) * 1.488164 - kgPerM) <= 0.55);
  const [only] = fits;
  if (fits.length !== 1 || only === undefined)
    return ask(
      'section-unknown',
      `W${depthMm}x${kgPerM} is a metric name the shop has no match for. Type the inch name, such as W8x31.`,
      fits.map((lb) => `W${depth}x${lb}`),
    );
  const reading = readUs({ letter: 'W', family: 'beam', weights: US_W }, [String(depth), only]);
  return reading.outcome === 'read'
    ? { ...reading, notes: [`W${depthMm}x${kgPerM} is the metric name of W${depth}x${only}`] }
    : reading;
}

function enBar(
  name: string,
  family: Family,
  depthMm: number,
  kgPerM: number,
  notes: readonly string[] = [],
): SectionReading {
  return read(
    bar({
      name,
      family,
      system: 'EN',
      dimensions: { depth: asNm(depthMm * NM_PER_MM) },
      mgPerM: kgPerMToMgPerM(kgPerM),
      basis: 'table',
    }),
    notes,
  );
}

function fromTable(
  letter: string,
  table: Readonly<Record<string, number>>,
  family: Family,
  sizes: readonly string[],
  notes: readonly string[] = [],
): SectionReading {
  const [depth] = sizes;
  const mass = depth === undefined ? undefined : table[depth];
  if (depth === undefined || mass === undefined)
    return ask(
      'section-unknown',
      `${letter}${depth ? ` ${depth}` : ''} is not in the list of ${letter} sizes.`,
      Object.keys(table)
        .slice(0, 5)
        .map((size) => `${letter} ${size}`),
    );
  return enBar(`${letter} ${depth}`, family, Number(depth), mass, notes);
}

function readPfc(sizes: readonly string[]): SectionReading {
  const [depth, flange, mass] = sizes;
  const fits = Object.keys(PFC_KG_PER_M).filter((name) => {
    const [d, f, m] = name.split('x');
    return d === depth && (flange === undefined || f === flange) && (mass === undefined || m === mass);
  });
  const [only] = fits;
  if (flange === undefined || fits.length !== 1 || only === undefined)
    return ask(
      flange === undefined ? 'section-incomplete' : 'section-unknown',
      `PFC ${sizes.join('x')} needs depth, flange and kg/m; sizes differ by region. Say which.`,
      fits.map((name) => `PFC ${name}`),
    );
  return enBar(`PFC ${only}`, 'channel', Number(depth), PFC_KG_PER_M[only] ?? 0);
}

function readUb(sizes: readonly string[]): SectionReading {
  const [depth, flange, mass] = sizes;
  if (depth === undefined || flange === undefined || mass === undefined || sizes.length > 3)
    return ask('section-incomplete', `A UB needs depth, flange and kg/m, such as UB 203x133x25.`);
  return read(
    bar({
      name: `UB ${depth}x${flange}x${mass}`,
      family: 'beam',
      system: 'EN',
      dimensions: { depth: asNm(Number(depth) * NM_PER_MM), flange: asNm(Number(flange) * NM_PER_MM) },
      mgPerM: kgPerMToMgPerM(Number(mass)),
      basis: 'name',
    }),
    ['the last number of the name is its rounded kg/m'],
  );
}

/** Null when the words say it is neither channel nor beam. */
export function readChannelOrBeam(
  kind: Kind | null,
  sizes: readonly string[],
  rest: string,
): SectionReading | null {
  // Supplier lists write beams as 8@31#, lb/ft after the at-sign.
  const supplier = /^(\d+)\s*"?\s*@\s*(\d+(?:\.\d+)?)\s*#$/.exec(rest);
  if (kind === null && supplier) {
    const [, depth = '', weight = ''] = supplier;
    return (US_W[depth] ?? []).includes(weight)
      ? readUs({ letter: 'W', family: 'beam', weights: US_W }, [depth, weight])
      : ask(
          'section-unknown',
          `${rest} reads as a beam of ${weight} lb/ft; no W${depth} of that weight is listed. Say which.`,
          (US_W[depth] ?? []).map((w) => `W${depth}x${w}`),
        );
  }
  if (kind === null) return null;
  const us = US_KINDS[kind];
  if (us)
    return readUs(us, kind === 's' && /\bSTD I\b/.test(rest) && sizes.length < 2 ? sizes.slice(0, 1) : sizes);
  switch (kind) {
    case 'upn':
      return fromTable('UPN', UPN_KG_PER_M, 'channel', sizes);
    case 'bare-u':
      return fromTable('UPN', UPN_KG_PER_M, 'channel', sizes, [
        'U alone is read as UPN; UPE and PFC are other shapes',
      ]);
    case 'pfc':
      return readPfc(sizes);
    case 'ub':
      return readUb(sizes);
    case 'ipe':
      return fromTable('IPE', IPE_KG_PER_M, 'beam', sizes);
    case 'hea':
      return fromTable('HEA', HEA_KG_PER_M, 'beam', sizes);
    case 'heb':
      return fromTable('HEB', HEB_KG_PER_M, 'beam', sizes);
    case 'bare-i': {
      const [depth = '', weight] = sizes;
      if (weight !== undefined && Number(depth) <= 24)
        return readUs({ letter: 'S', family: 'beam', weights: US_S }, sizes);
      return ask(
        'section-ambiguous',
        `I${depth} may be IPE or IPN. Say which.`,
        IPE_KG_PER_M[depth] === undefined ? [] : [`IPE ${depth}`],
      );
    }
    default:
      return null;
  }
}
