import { existsSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { pino } from 'pino';
import { createApp } from '#server/app.ts';
import { ConfigError, readConfig, type Config } from '#server/config.ts';
import { DATABASE_FILE, openDatabase, type Database } from '#server/database.ts';
import { migrate } from '#server/migrations/index.ts';
import { loadDemoShop } from '#server/scripts/demo-shop.ts';
import { openLocalMailbox } from '#server/services/local-mailbox.ts';
import { createMailer } from '#server/services/mailer.ts';
import { findShop } from '#server/services/shop.ts';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '#server/services/demo-people.ts';

const GRACE_MS = 10_000;
const SWEEP_MS = 100;

function greet(config: Config, { setUp, demo }: { setUp: boolean; demo: boolean }): string {
  const lines = [`Barwright serves ${config.publicUrl}`];
  if (config.trial)
    lines.push(
      'Local trial: no production settings are given, so data stays in this folder and mail in a local mailbox that a manager can read.',
    );
  if (!setUp)
    lines.push('No shop yet: open the address and set it up; whoever does so becomes its first manager.');
  if (demo) {
    lines.push(
      `Demo shop, open to anyone who reaches this address. Sign in on the first page with one click, or with the password "${DEMO_PASSWORD}" as:`,
    );
    for (const { role, email } of DEMO_PEOPLE) lines.push(`  ${role.padEnd(10)} ${email}`);
  }
  return lines.join('\n');
}

/** dist/server/main.js serves dist/client beside it; from the sources there is a client only once it has been built. */
function clientDir(): string {
  const beside = join(import.meta.dirname, '../client');
  return existsSync(beside) ? beside : join(import.meta.dirname, '../dist/client');
}

/** Made aside and moved into place whole: a start that is broken off leaves no half of a demo shop. */
async function makeDemoShop(dataDir: string): Promise<void> {
  const aside = join(dataDir, 'demo-in-the-making');
  rmSync(aside, { recursive: true, force: true });
  const database = await openDatabase(aside);
  await migrate(database.sequelize);
  await loadDemoShop();
  await database.close();
  for (const left of ['-wal', '-shm']) rmSync(join(dataDir, `${DATABASE_FILE}${left}`), { force: true });
  renameSync(join(aside, DATABASE_FILE), join(dataDir, DATABASE_FILE));
  rmSync(aside, { recursive: true, force: true });
}

async function openShop({ dataDir, demo }: Config): Promise<Database> {
  const database = await openDatabase(dataDir);
  await migrate(database.sequelize);
  if (!demo || (await findShop())) return database;
  await database.close();
  await makeDemoShop(dataDir);
  return openDatabase(dataDir);
}

async function main(): Promise<void> {
  const config = readConfig(process.env);
  const log = pino({ level: config.logLevel, base: undefined, timestamp: pino.stdTimeFunctions.isoTime });
  const database = await openShop(config);
  const shop = await findShop();
  const mailbox = config.smtpUrl === null ? await openLocalMailbox() : null;
  const mailer = createMailer(config.smtpUrl ?? mailbox?.smtpUrl ?? '', config.mailFrom, log);
  const app = createApp({ config, database, mailer, log, clientDir: clientDir() });

  const server = app.listen(config.port, (error?: Error) => {
    if (error) {
      process.stderr.write(
        `Port ${config.port} cannot be used: ${error.message}. Set PORT to another one.\n`,
      );
      process.exit(1);
    }
    process.stdout.write(`${greet(config, { setUp: shop !== null, demo: shop?.demo === 1 })}\n`);
  });

  let stopping = false;
  const stop = (signal: string) => {
    if (stopping) return;
    stopping = true;
    log.info({ signal }, 'stopping: finishing what is under way');
    const deadline = setTimeout(() => server.closeAllConnections(), GRACE_MS);
    // A connection kept open for a next request is closed once its last answer is out.
    const sweep = setInterval(() => server.closeIdleConnections(), SWEEP_MS);
    server.close(() => {
      clearTimeout(deadline);
      clearInterval(sweep);
      mailer.close();
      Promise.all([mailbox?.close(), database.close()]).then(
        () => process.exit(0),
        (error: unknown) => {
          log.error({ err: error }, 'stopping failed');
          process.exit(1);
        },
      );
    });
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
}

main().catch((error: unknown) => {
  const words =
    error instanceof ConfigError
      ? error.message
      : error instanceof Error
        ? (error.stack ?? error.message)
        : String(error);
  process.stderr.write(`${words}\n`);
  process.exit(1);
});
