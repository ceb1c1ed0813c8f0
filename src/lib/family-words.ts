import type { Family } from '#shared/domain/section/types.ts';

export const FAMILY_WORDS: Readonly<Record<Family, string>> = {
  angle: 'angle',
  flat: 'flat bar',
  round: 'round bar',
  square: 'square bar',
  channel: 'channel',
  beam: 'beam',
  tube: 'square and rectangular tube',
  'round-tube': 'round tube',
  pipe: 'pipe',
  'gauge-tube': 'gauge tube',
  plate: 'plate',
  'floor-plate': 'floor plate',
  sheet: 'sheet',
};
