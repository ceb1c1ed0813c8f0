import { randomUUID } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { hashPassword } from 'better-auth/crypto';
import { Person } from '#server/models/index.ts';

/** Sets or replaces a person's password inside the running write. */
export async function setPassword(personId: string, hash: string): Promise<void> {
  const sequelize = Person.sequelize;
  if (!sequelize) throw new Error('no database is open');
  const now = new Date().toISOString();
  await sequelize.query(`DELETE FROM "account" WHERE "userId" = $1 AND "providerId" = 'credential'`, {
    bind: [personId],
  });
  await sequelize.query(
    `INSERT INTO "account" ("id", "accountId", "providerId", "userId", "password", "createdAt", "updatedAt") VALUES ($1, $2, 'credential', $2, $3, $4, $4)`,
    { bind: [randomUUID(), personId, hash, now] },
  );
}

/** Slow on purpose: done before a write begins, so that no writer waits for it. */
export const passwordHash = (password: string): Promise<string> => hashPassword(password);

/** Ends every session of a person at once. */
export async function endSessions(personId: string): Promise<void> {
  await Person.sequelize?.query(`DELETE FROM "session" WHERE "userId" = $1`, { bind: [personId] });
}

/** True when the person has set a password. */
export async function personsWithPassword(): Promise<Set<string>> {
  const sequelize = Person.sequelize;
  if (!sequelize) throw new Error('no database is open');
  const rows = await sequelize.query<{ userId: string }>(
    `SELECT "userId" FROM "account" WHERE "providerId" = 'credential'`,
    {
      type: QueryTypes.SELECT,
    },
  );
  return new Set(rows.map(({ userId }) => userId));
}
