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

/** Sequelize closes the connection of a transaction without waiting; whoever moves or copies the file must. */
const closings = new Set<Promise<void>>();

class PragmaticDatabase extends sqlite3.Database {
  constructor(file: string, mode: number, callback?: (error: Error | null) => void) {
    super(file, mode, (error) => {
      if (error) callback?.(error);
      else this.exec(PRAGMAS, (failure) => callback?.(failure));
    });
  }

  override close(callback?: (error: Error | null) => void): void {
    const closing = new Promise<void>((done) =>
      super.close((error) => {
        callback?.(error);
        done();
      }),
    );
    closings.add(closing);
    void closing.then(() => closings.delete(closing));
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

export type Database = {
  readonly sequelize: Sequelize;
  /** Waits for the last write, folds the journal into the one file and lets go of it. */
  close(): Promise<void>;
};

export const DATABASE_FILE = 'barwright.sqlite';

let current: Sequelize | undefined;
let tail: Promise<unknown> = Promise.resolve();

/** Opens (or makes) the database file in the folder and binds the models to it. One database a process. */
export async function openDatabase(dataDir: string): Promise<Database> {
  mkdirSync(dataDir, { recursive: true });
  const sequelize = new Sequelize({
    dialect: 'sqlite',
    storage: join(dataDir, DATABASE_FILE),
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
      await sequelize.query('PRAGMA wal_checkpoint(TRUNCATE)');
      await sequelize.close();
      await Promise.all(closings);
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
