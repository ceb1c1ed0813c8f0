import type { DropState } from '#shared/schemas/rack.ts';

export const STATE_WORDS: Readonly<Record<DropState, string>> = {
  racked: 'free',
  held: 'held for a plan',
  cut: 'cut up',
  scrapped: 'scrapped',
  missing: 'missing',
};
