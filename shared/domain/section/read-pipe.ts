/** Pipe goes by nominal size and weight class; the nominal size is no dimension of it. */
import { pipe, type PipeClass } from '#shared/domain/section/build.ts';
import { inchText, inchesToNm, readSize } from '#shared/domain/section/size.ts';
import { US_PIPE } from '#shared/domain/section/tables/us-pipe.ts';
import type { SectionReading } from '#shared/domain/section/types.ts';
import type { Kind } from '#shared/domain/section/words.ts';

const ask = (code: string, message: string, choices: readonly string[] = []): SectionReading => ({
  outcome: 'asked',
  code,
  message,
  choices,
});

/** Schedules meet the weight classes up to these sizes and part above (ASME B36.10, from memory). */
const SCHEDULE_40_IS_STD_TO = 10;
const SCHEDULE_80_IS_XS_TO = 8;

type Weight = { readonly weight: PipeClass } | { readonly schedule: number } | null;

function weightOf(kind: Kind, rest: string): Weight {
  if (kind === 'p') return { weight: 'STD' };
  if (kind === 'px') return { weight: 'XS' };
  if (kind === 'pxx') return { weight: 'XXS' };
  if (/\b(XXS|XXH|DBL EX( HVY)?|DOUBLE EXTRA (STRONG|HEAVY))\b|\dXXS\b/.test(rest)) return { weight: 'XXS' };
  if (/\b(XS|XH|EX HVY|EXTRA (STRONG|HEAVY))\b|\dXS\b/.test(rest)) return { weight: 'XS' };
  if (/\b(STD|STANDARD)\b|\dSTD\b/.test(rest)) return { weight: 'STD' };
  const schedule = /\bSCH(?:EDULE)?\s*\.?\s*(\d+)/.exec(rest);
  return schedule ? { schedule: Number(schedule[1]) } : null;
}

/** Null when the words do not say pipe. */
export function readPipe(kind: Kind | null, sizes: readonly string[], rest: string): SectionReading | null {
  if (kind === 'nominal-bore')
    return ask(
      'section-ambiguous',
      `"${rest}" is a nominal bore: its outside diameter and wall are not in the name. Type the true size, such as CHS 60.3x3.2.`,
    );
  if (kind !== 'pipe' && kind !== 'p' && kind !== 'px' && kind !== 'pxx') return null;
  // `P 1/4x14` is plate: pipe has one size.
  if (kind === 'p' && sizes.length !== 1) return null;
  const size = readSize(sizes[0] ?? '');
  if (!size) return ask('section-incomplete', 'Pipe needs its nominal size and weight, such as PIPE 2 STD.');
  const nps = inchText(inchesToNm(size));
  const classes = Object.keys(US_PIPE[nps] ?? {}).filter((key): key is PipeClass => key !== 'od');
  const choices = classes.map((weight) => `PIPE ${nps} ${weight}`);
  const weight = weightOf(kind, rest);
  if (!weight)
    return ask('section-incomplete', `PIPE ${nps} is incomplete: several weights exist. Say which.`, choices);
  let weightClass: PipeClass | null;
  if ('weight' in weight) weightClass = weight.weight;
  else {
    const inches = inchesToNm(size) / 25_400_000;
    weightClass =
      weight.schedule === 40 && inches <= SCHEDULE_40_IS_STD_TO
        ? 'STD'
        : weight.schedule === 80 && inches <= SCHEDULE_80_IS_XS_TO
          ? 'XS'
          : null;
    if (!weightClass)
      return ask(
        'section-ambiguous',
        `Schedule ${weight.schedule} of NPS ${nps} is neither STD nor XS: above NPS 10 and 8 they part. Say which.`,
        choices,
      );
  }
  const section = pipe(nps, weightClass);
  return section
    ? { outcome: 'read', section, notes: [] }
    : ask('section-unknown', `PIPE ${nps} ${weightClass} is not a listed pipe.`, choices);
}
