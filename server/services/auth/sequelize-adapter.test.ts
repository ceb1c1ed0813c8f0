/** The sign-in library's own suite for adapters, as its authors publish it in @better-auth/test-utils. */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import {
  authFlowTestSuite,
  caseInsensitiveTestSuite,
  joinsTestSuite,
  normalTestSuite,
  testAdapter,
  transactionsTestSuite,
  uuidTestSuite,
} from '@better-auth/test-utils/adapter';
import type { BetterAuthOptions } from 'better-auth';
import { getAuthTables } from 'better-auth/db';
import { openDatabase } from '#server/database.ts';
import { sequelizeAdapter } from '#server/services/auth/sequelize-adapter.ts';

const dataDir = mkdtempSync(join(tmpdir(), 'barwright-adapter-'));
const database = await openDatabase(dataDir);

/** The suite asks for tables of many shapes; they are made anew each time from the library's own description. */
async function makeTables(options: BetterAuthOptions): Promise<void> {
  const { sequelize } = database;
  await sequelize.query('PRAGMA foreign_keys=OFF');
  await sequelize.getQueryInterface().dropAllTables();
  for (const { modelName, fields } of Object.values(getAuthTables(options))) {
    const columns = Object.entries(fields).map(([name, { fieldName, type, unique }]) => {
      const kind = type === 'number' || type === 'boolean' ? 'NUMERIC' : 'TEXT';
      return `"${fieldName ?? name}" ${kind}${unique ? ' UNIQUE' : ''}`;
    });
    await sequelize.query(
      `CREATE TABLE IF NOT EXISTS "${modelName}" ("id" TEXT PRIMARY KEY, ${columns.join(', ')})`,
    );
  }
}

const { execute } = await testAdapter({
  adapter: () => sequelizeAdapter(database.sequelize),
  runMigrations: makeTables,
  tests: [
    normalTestSuite(),
    authFlowTestSuite(),
    transactionsTestSuite(),
    caseInsensitiveTestSuite(),
    joinsTestSuite(),
    uuidTestSuite(),
  ],
  async onFinish() {
    await database.close();
    rmSync(dataDir, { recursive: true, force: true });
  },
});
execute();
