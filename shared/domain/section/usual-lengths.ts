import { asNm, NM_PER_FOOT, NM_PER_M, type Nm } from '#shared/domain/units.ts';
import type { Section } from '#shared/domain/section/types.ts';

/**
 * Lengths mills and service centres usually carry, shortest first, as a first offer when the shop has none of its own. US beams 20–60 ft
 * and channels 20–40 ft, hot-rolled flats 20 ft: a US supplier's stock list; HSS 24, 40, 48 ft: a mill's list; the rest common practice, no
 * published source.
 */
export function usualLengthsNm(section: Section): Nm[] {
  const feet = (...lengths: number[]) => lengths.map((length) => asNm(length * NM_PER_FOOT));
  const metres = (...lengths: number[]) => lengths.map((length) => asNm(length * NM_PER_M));
  if (section.system === 'EN') {
    switch (section.family) {
      case 'channel':
      case 'beam':
        return metres(6, 9, 12, 15);
      case 'tube':
      case 'round-tube':
        return metres(6, 7.5, 12);
      default:
        return metres(6);
    }
  }
  switch (section.family) {
    case 'beam':
      return feet(20, 30, 40, 50, 60);
    case 'channel':
    case 'angle':
      return feet(20, 40);
    case 'tube':
    case 'round-tube':
      return feet(20, 24, 40, 48);
    case 'gauge-tube':
      return feet(20, 24);
    case 'pipe':
      return feet(21, 42);
    default:
      return feet(20);
  }
}
