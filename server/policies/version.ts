import { ShopError } from '#server/errors.ts';

/** Two people at once: the second is told, nothing is overwritten. */
export function expectVersion(row: { version: number }, version: number | undefined, what: string): void {
  if (version === undefined)
    throw new ShopError('bad-input', `A change of ${what} must say which version it changes.`, [
      { path: 'version', message: 'send the version that was loaded' },
    ]);
  if (row.version !== version)
    throw new ShopError(
      'stale-version',
      `Somebody changed ${what} meanwhile. Load it again and repeat your change.`,
    );
}

/** The row, or words that it is not there. */
export function expectFound<T>(row: T | null | undefined, what: string): T {
  if (row === null || row === undefined) throw new ShopError('not-found', `There is no such ${what}.`);
  return row;
}
