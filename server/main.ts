import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { pino } from 'pino';
import { createApp } from '#server/app.ts';
import { ConfigError, readConfig, type Config } from '#server/config.ts';
import { openDatabase } from '#server/database.ts';
import { migrate } from '#server/migrations/index.ts';
import { loadDemoShop } from '#server/scripts/demo-shop.ts';
import { openLocalMailbox } from '#server/services/local-mailbox.ts';
import { createMailer } from '#server/services/mailer.ts';
import { findShop } from '#server/services/shop.ts';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '#server/services/demo-people.ts';

const GRACE_MS = 10_000;

function greet(config: Config, port: number, demo: boolean): string {
  const address = config.trial ? `http://localhost:${port}` : config.publicUrl;
  const lines = [`Barwright serves ${address}`];
  if (config.trial)
    lines.push(
      'Local trial: no production settings are given, so data stays in this folder and mail in a local mailbox that a manager can read.',
    );
  if (demo) {
    lines.push(
      `Demo shop. Sign in on the first page with one click, or with the password "${DEMO_PASSWORD}" as:`,
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

async function main(): Promise<void> {
  const config = readConfig(process.env);
  const log = pino({ level: config.logLevel, base: undefined, timestamp: pino.stdTimeFunctions.isoTime });
  const database = await openDatabase(config.dataDir);
  await migrate(database.sequelize);
  let shop = await findShop();
  if (!shop && config.demo) {
    await loadDemoShop();
    shop = await findShop();
  }
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
    const address = server.address();
    const port = address !== null && typeof address === 'object' ? address.port : config.port;
    process.stdout.write(`${greet(config, port, shop?.demo === 1)}\n`);
  });

  let stopping = false;
  const stop = (signal: string) => {
    if (stopping) return;
    stopping = true;
    log.info({ signal }, 'stopping: finishing what is under way');
    const deadline = setTimeout(() => server.closeAllConnections(), GRACE_MS);
    server.close(() => {
      clearTimeout(deadline);
      mailer.close();
      Promise.all([mailbox?.close(), database.close()]).then(
        () => process.exit(0),
        (error: unknown) => {
          log.error({ err: error }, 'stopping failed');
          process.exit(1);
        },
      );
    });
    server.closeIdleConnections();
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
