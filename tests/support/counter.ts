import { QueryTypes, type Sequelize } from 'sequelize';
import { write } from '#server/database.ts';

export async function makeCounter(sequelize: Sequelize): Promise<void> {
  await sequelize.query('CREATE TABLE "counter" ("n" INTEGER NOT NULL)');
  await sequelize.query('INSERT INTO "counter" VALUES (0)');
}

export async function readCounter(sequelize: Sequelize): Promise<number> {
  const [row] = await sequelize.query<{ n: number }>('SELECT "n" FROM "counter"', {
    type: QueryTypes.SELECT,
  });
  return row?.n ?? -1;
}

/** Reads, then writes what was read plus one: any two that overlap would lose one. No query names its transaction. */
export async function raiseCounter(sequelize: Sequelize, writers: number, times: number): Promise<void> {
  const one = async () => {
    for (let i = 0; i < times; i++)
      await write(async () => {
        const n = await readCounter(sequelize);
        await sequelize.query('UPDATE "counter" SET "n" = $1', { bind: [n + 1] });
      });
  };
  await Promise.all(Array.from({ length: writers }, one));
}
