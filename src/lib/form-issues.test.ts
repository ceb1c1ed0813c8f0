import { describe, expect, it, vi } from 'vitest';
import { ApiError } from '#src/lib/api-error.ts';
import { placeIssues } from '#src/lib/form-issues.ts';

const refusal = (issues: { path: string; message: string }[]) =>
  new ApiError({ code: 'bad-input', status: 422, message: 'Not saved.', issues });

describe('placeIssues', () => {
  it('puts an issue beside its field and says nothing more', () => {
    const setError = vi.fn();
    const rest = placeIssues(
      refusal([{ path: 'slot', message: 'There is no such slot.' }]),
      ['slot'],
      setError,
    );
    expect(rest).toBeNull();
    expect(setError).toHaveBeenCalledWith('slot', { type: 'server', message: 'There is no such slot.' });
  });

  it('never swallows an issue whose field is not on the page', () => {
    const setError = vi.fn();
    const rest = placeIssues(refusal([{ path: 'version', message: 'is missing' }]), ['slot'], setError);
    expect(rest).toBe('Not saved. version: is missing');
    expect(setError).not.toHaveBeenCalled();
  });

  it('says that the newest version is loaded when somebody else was quicker', () => {
    const stale = new ApiError({ code: 'stale-version', status: 409, message: 'version 3 is not 2' });
    expect(placeIssues(stale, [], vi.fn())).toMatch(
      /Somebody changed this meanwhile.*newest version is loaded/,
    );
  });
});
