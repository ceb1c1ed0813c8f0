import type { PartLine } from '#shared/schemas/jobs.ts';

export const LINE_STATES = ['open', 'planned', 'cut'] as const;
export type LineState = (typeof LINE_STATES)[number];
export type LineFilter = {
  readonly section: string;
  readonly mark: string;
  readonly state: LineState | null;
};

/** Reads a filter from the address; what is not known there counts as not set. */
export function readLineFilter(get: (key: string) => string): LineFilter {
  const state = get('state');
  return {
    section: get('section'),
    mark: get('mark'),
    state: LINE_STATES.find((known) => known === state) ?? null,
  };
}

const squeeze = (text: string) => text.toLowerCase().replace(/[\s×*]/g, (sign) => (sign.trim() ? 'x' : ''));

/** Open: pieces that stand in no plan. Planned: in plans but not all cut. Cut: every piece. */
function isInState({ quantity, planned, cut }: PartLine, state: LineState): boolean {
  if (state === 'open') return planned < quantity;
  if (state === 'cut') return cut >= quantity;
  return planned > 0 && cut < quantity;
}

/** Lines whose section, the list's own words for it or the mark hold what was typed. */
export function filterLines(lines: readonly PartLine[], { section, mark, state }: LineFilter): PartLine[] {
  const wanted = squeeze(section);
  const wantedMark = mark.trim().toLowerCase();
  return lines.filter(
    (line) =>
      (squeeze(line.section).includes(wanted) || squeeze(line.sectionText).includes(wanted)) &&
      line.mark.toLowerCase().includes(wantedMark) &&
      (state === null || isInState(line, state)),
  );
}
