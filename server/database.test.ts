import { spawn } from 'node:child_process';
import { copyFileSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { DATABASE_FILE, isWriting, openDatabase, write, type Database } from '#server/database.ts';
import { makeCounter, raiseCounter, readCounter } from '#tests/support/counter.ts';

const root = resolve(import.meta.dirname, '..');
const dataDir = mkdtempSync(join(tmpdir(), 'barwright-database-'));
let database: Database;

const pragma = async (name: string) =>
  Object.values(
    (
      await database.sequelize.query<Record<string, unknown>>(`PRAGMA ${name}`, { type: QueryTypes.SELECT })
    )[0] ?? {},
  )[0];

const raise = (by: number) => database.sequelize.query('UPDATE "counter" SET "n" = "n" + $1', { bind: [by] });

/** Another process on the same file, as a backup or a script would be. */
function otherProcess(writers: number, times: number): Promise<number | null> {
  const program = `
    import { openDatabase } from '#server/database.ts';
    import { raiseCounter } from '#tests/support/counter.ts';
    const database = await openDatabase(${JSON.stringify(dataDir)});
    await raiseCounter(database.sequelize, ${writers}, ${times});
    await database.close();`;
  const child = spawn(process.execPath, ['--import', 'tsx', '--input-type=module', '--eval', program], {
    cwd: root,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  return new Promise((done) => child.on('exit', (code) => done(code)));
}

describe('the database', () => {
  beforeAll(async () => {
    database = await openDatabase(dataDir);
    await makeCounter(database.sequelize);
  });
  beforeEach(async () => {
    await database.sequelize.query('UPDATE "counter" SET "n" = 0');
  });
  afterAll(async () => {
    await database.close();
    rmSync(dataDir, { recursive: true, force: true });
  });

  it('has its pragmas on the connection of a transaction too', async () => {
    const inside = () =>
      Promise.all([pragma('foreign_keys'), pragma('journal_mode'), pragma('busy_timeout')]);
    expect(await inside()).toEqual([1, 'wal', 5000]);
    expect(await write(inside)).toEqual([1, 'wal', 5000]);
  });

  it('loses nothing of eight writers in this process', async () => {
    await raiseCounter(database.sequelize, 8, 25);
    expect(await readCounter(database.sequelize)).toBe(200);
  });

  it('loses nothing of eight writers here and eight in each of two other processes', async () => {
    const others = [otherProcess(8, 25), otherProcess(8, 25)];
    await raiseCounter(database.sequelize, 8, 100);
    expect(await Promise.all(others)).toEqual([0, 0]);
    expect(await readCounter(database.sequelize)).toBe(1200);
  });

  it('takes everything back when a write fails, and goes on with the next', async () => {
    const failing = write(async () => {
      await raise(5);
      throw new Error('the shop thought better of it');
    });
    const next = write(() => raise(1));
    await expect(failing).rejects.toThrow('thought better');
    await next;
    expect(await readCounter(database.sequelize)).toBe(1);
  });

  it('a write inside a write joins it: all or nothing', async () => {
    await expect(
      write(async () => {
        await write(() => raise(1));
        expect(await readCounter(database.sequelize)).toBe(1);
        throw new Error('after all not');
      }),
    ).rejects.toThrow('after all not');
    expect(await readCounter(database.sequelize)).toBe(0);
  });

  it('readers outside see nothing of a write before it is done', async () => {
    let seen = -1;
    let tellBegun = () => {};
    let tellRead = () => {};
    const begun = new Promise<void>((done) => (tellBegun = done));
    const read = new Promise<void>((done) => (tellRead = done));
    const writing = write(async () => {
      await raise(1);
      tellBegun();
      await read;
    });
    await begun;
    expect(isWriting()).toBe(false);
    seen = await readCounter(database.sequelize);
    tellRead();
    await writing;
    expect(seen).toBe(0);
    expect(await readCounter(database.sequelize)).toBe(1);
  });
});

describe('a closed database', () => {
  it('is one whole file once closed, however busy it was', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'barwright-closing-'));
    for (let i = 0; i < 10; i++) {
      const dir = join(folder, String(i));
      const busy = await openDatabase(dir);
      await makeCounter(busy.sequelize);
      await raiseCounter(busy.sequelize, 8, 2);
      await busy.close();
      expect(readdirSync(dir)).toEqual([DATABASE_FILE]);
      copyFileSync(join(dir, DATABASE_FILE), join(folder, DATABASE_FILE));
      const copy = await openDatabase(folder);
      expect(await readCounter(copy.sequelize)).toBe(16);
      await copy.close();
    }
    rmSync(folder, { recursive: true, force: true });
  });
});
