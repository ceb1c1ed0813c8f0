import { UniqueConstraintError } from 'sequelize';
import { ShopError } from '#server/errors.ts';
import type { ErrorIssue } from '#shared/errors.ts';

/** Turns the refusal of a unique index into words of the shop. Other constraints come under the same class and are faults. */
export async function refuseTwin<T>(
  message: string,
  issues: ErrorIssue[],
  work: () => Promise<T>,
): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof UniqueConstraintError && error.parent.message.includes('UNIQUE constraint failed'))
      throw new ShopError('already-there', message, issues);
    throw error;
  }
}
