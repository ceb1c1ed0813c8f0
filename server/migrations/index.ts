import type { Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { people } from '#server/migrations/001-people.ts';
import { yard } from '#server/migrations/010-yard.ts';
import { jobs } from '#server/migrations/020-jobs.ts';
import { plans } from '#server/migrations/030-plans.ts';
import { encodingsAndIndexes } from '#server/migrations/040-encodings-and-indexes.ts';

export type Migration = { readonly name: string; readonly statements: readonly string[] };

/** In order; a migration that has shipped is never edited. */
const MIGRATIONS: readonly Migration[] = [people, yard, jobs, plans, encodingsAndIndexes];

/** Brings the database to the newest shape, each step in a transaction of its own. Returns the names of the steps done. */
export async function migrate(sequelize: Sequelize): Promise<string[]> {
  const umzug = new Umzug({
    migrations: MIGRATIONS.map(({ name, statements }) => ({
      name,
      up: () =>
        sequelize.transaction(async () => {
          for (const statement of statements) await sequelize.query(statement);
        }),
    })),
    storage: new SequelizeStorage({ sequelize, tableName: 'migrations', timestamps: false }),
    logger: undefined,
  });
  return (await umzug.up()).map(({ name }) => name);
}
