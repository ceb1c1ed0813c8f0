import { describe, expect, it } from 'vitest';
import { readFilter } from '#src/features/rack/hooks/read-filter.ts';

const filterOf = (search: string) => {
  const params = new URLSearchParams(search);
  return readFilter((key) => params.get(key) ?? '');
};

describe('readFilter', () => {
  it('shows what is on the rack when the address asks for nothing', () => {
    expect(filterOf('')).toEqual({ state: 'here', section: '', minLengthNm: null, text: '' });
  });

  it('reads section, least length, text and state', () => {
    expect(filterOf('section=L3x3&min=914400000&text=B-3&state=missing')).toEqual({
      state: 'missing',
      section: 'L3x3',
      minLengthNm: 914_400_000,
      text: 'B-3',
    });
  });

  it('takes "all" as every state and nonsense as nothing asked', () => {
    expect(filterOf('state=all').state).toBe('all');
    expect(filterOf('state=melted&min=-4')).toMatchObject({ state: 'here', minLengthNm: null });
  });
});
