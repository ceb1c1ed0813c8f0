import type { Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { people } from '#server/migrations/001-people.ts';

export type Migration = { readonly name: string; readonly statements: readonly string[] };

/** In order; a migration that has shipped is never edited. */
const MIGRATIONS: readonly Migration[] = [people];

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
