/**
 * Reads one section cell. What is known is read into the canonical spelling; what is unknown, incomplete or could mean two
 * things is asked about with the choices, and never guessed: a wrong section is cut, welded and found out on site.
 */
import { improperFraction, looksLikeDate, plainSpelling } from '#shared/domain/section/spelling.ts';
import { nearestNames } from '#shared/domain/section/catalogue.ts';
import { readChannelOrBeam } from '#shared/domain/section/read-rolled.ts';
import { readPipe } from '#shared/domain/section/read-pipe.ts';
import { readPlate } from '#shared/domain/section/read-plate.ts';
import { readBarOrTube } from '#shared/domain/section/read-bar.ts';
import { takeWords } from '#shared/domain/section/words.ts';
import type { SectionReading } from '#shared/domain/section/types.ts';

export type SectionContext = {
  /** The list has a quantity column, so `2-1/2x6` cannot be two pieces of 1/2x6. */
  readonly hasQuantityColumn?: boolean;
  /** What bare sizes are in when both would exist: `FLT 10x3` is millimetres or inches. */
  readonly unitHint?: 'in' | 'mm';
};

export const asked = (code: string, message: string, choices: readonly string[] = []): SectionReading => ({
  outcome: 'asked',
  code,
  message,
  choices,
});

/** Reads a section as written. Never throws; an `asked` reading says what was read, what is wrong and what to do. */
export function readSection(text: string, context: SectionContext = {}): SectionReading {
  const plain = plainSpelling(text);
  if (plain === '')
    return asked('section-blank', 'No section is given. Type one, such as L4x4x3/8 or SHS 40x40x3.');
  if (looksLikeDate(plain))
    return asked(
      'section-date',
      `"${text.trim()}" looks like a size that a spreadsheet turned into a date or a number. Look at the drawing and type the section again.`,
    );
  const improper = improperFraction(plain);
  if (improper !== null) {
    const [n = '', d = ''] = improper.split('/');
    const lostSpace = n.length > 1 ? [`${n.slice(0, -1)}-${n.slice(-1)}/${d}`] : [];
    return asked(
      'section-fraction',
      `"${improper}" in "${text.trim()}" is ${Number(n) / Number(d)} or a fraction that lost its space. Type it with a dash, such as 1-1/2.`,
      lostSpace.map((fraction) => plain.replace(improper, fraction).replace(/(?<=\d)X(?=[\d.])/g, 'x')),
    );
  }
  const { kind, sizes, rest, notes } = takeWords(plain);
  const reading =
    readChannelOrBeam(kind, sizes, rest) ??
    readPipe(kind, sizes, rest) ??
    readPlate(kind, sizes, context) ??
    readBarOrTube(kind, sizes, rest, context) ??
    noFamily(text.trim(), sizes);
  return reading.outcome === 'read' ? { ...reading, notes: [...reading.notes, ...notes] } : reading;
}

/** A size with no letter may be angle, tube or bar: the family is asked for. */
function noFamily(text: string, sizes: readonly string[]): SectionReading {
  if (sizes.length >= 2 && /^[\d\s./"'X-]+$/.test(plainSpelling(text))) {
    const size = sizes.join('x').replaceAll(' ', '-');
    const families = sizes.length === 3 ? [`L${size}`, `HSS${size}`] : [`FB ${size}`, `PL${size}`];
    return asked(
      'section-no-family',
      `"${text}" has a size and no letter: it may be angle, tube or bar. Say which.`,
      families,
    );
  }
  return asked(
    'section-unknown',
    `"${text}" is not a section the shop knows. Correct it, or leave the row out.`,
    nearestNames(text),
  );
}
