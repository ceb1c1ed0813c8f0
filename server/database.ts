/**
 * SQLite through Sequelize. Sequelize opens a new connection for every transaction and its connect hooks do not
 * fire for sqlite, so the pragmas ride on the driver. Writers stand in one queue: SQLite has one writer, and
 * waiting in this process is cheaper and surer than waiting in the library's thread pool.
 */
import { AsyncLocalStorage } from 'node:async_hooks';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { Sequelize, Transaction } from 'sequelize';
import sqlite3 from 'sqlite3';
import { initModels } from '#server/models/index.ts';

const PRAGMAS =
  'PRAGMA busy_timeout=5000; PRAGMA journal_mode=WAL; PRAGMA synchronous=NORMAL; PRAGMA foreign_keys=ON;';

class PragmaticDatabase extends sqlite3.Database {
  constructor(file: string, mode: number, callback?: (error: Error | null) => void) {
    super(file, mode, (error) => {
      if (error) callback?.(error);
      else this.exec(PRAGMAS, (failure) => callback?.(failure));
    });
  }
}

/** The shape Sequelize.useCLS wants, on AsyncLocalStorage: every query joins the running transaction by itself. */
const storage = new AsyncLocalStorage<Map<string, unknown>>();
const namespace = {
  bind: <T>(work: T): T => work,
  run(work: (context: Map<string, unknown>) => unknown) {
    const context = new Map(storage.getStore() ?? []);
    return storage.run(context, () => work(context));
  },
  get: (key: string) => storage.getStore()?.get(key),
  set(key: string, value: unknown) {
    storage.getStore()?.set(key, value);
    return value;
  },
};
Sequelize.useCLS(namespace);

export type Database = { readonly sequelize: Sequelize; close(): Promise<void> };

let current: Sequelize | undefined;
let tail: Promise<unknown> = Promise.resolve();

/** Opens (or makes) `barwright.sqlite` in the folder and binds the models to it. One database a process. */
export async function openDatabase(dataDir: string): Promise<Database> {
  mkdirSync(dataDir, { recursive: true });
  const sequelize = new Sequelize({
    dialect: 'sqlite',
    storage: join(dataDir, 'barwright.sqlite'),
    dialectModule: { ...sqlite3, Database: PragmaticDatabase },
    transactionType: Transaction.TYPES.IMMEDIATE,
    logging: false,
  });
  await sequelize.authenticate();
  initModels(sequelize);
  current = sequelize;
  return {
    sequelize,
    async close() {
      await tail.catch(() => undefined);
      if (current === sequelize) current = undefined;
      await sequelize.close();
    },
  };
}

/** True inside the work of a `write`. */
export function isWriting(): boolean {
  return storage.getStore()?.get('transaction') !== undefined;
}

/**
 * One IMMEDIATE transaction, after every earlier one of this process. All or nothing: an error rolls back and is
 * thrown on. A write inside a write joins it.
 */
export function write<T>(work: () => Promise<T>): Promise<T> {
  const sequelize = current;
  if (!sequelize) return Promise.reject(new Error('no database is open'));
  if (isWriting()) return work();
  const turn = tail.then(() => sequelize.transaction(() => work()));
  tail = turn.catch(() => undefined);
  return turn;
}
