import { DROP_STATES, type DropState } from '#shared/schemas/rack.ts';

/** `here`: what lies on the rack, promised to a plan or not. `all`: every drop there ever was. */
type StateFilter = 'here' | 'all' | DropState;
export type RackFilter = { state: StateFilter; section: string; minLengthNm: number | null; text: string };

/** The filter an address asks for; what lies on the rack when it names no state. */
export function readFilter(get: (key: string) => string): RackFilter {
  const state = get('state');
  const min = get('min');
  return {
    section: get('section'),
    text: get('text'),
    minLengthNm: /^[1-9]\d{0,12}$/.test(min) ? Number(min) : null,
    state: state === 'all' ? 'all' : (DROP_STATES.find((known) => known === state) ?? 'here'),
  };
}
