/** A whole shop in a temporary folder, the application not listening: what API tests talk to. */
import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Express } from 'express';
import { pino } from 'pino';
import request from 'supertest';
import { createApp } from '#server/app.ts';
import type { Config } from '#server/config.ts';
import { DATABASE_FILE, openDatabase, write, type Database } from '#server/database.ts';
import { migrate } from '#server/migrations/index.ts';
import { loadDemoShop } from '#server/scripts/demo-shop.ts';
import { passwordHash } from '#server/services/auth/passwords.ts';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '#server/services/demo-people.ts';
import { openLocalMailbox } from '#server/services/local-mailbox.ts';
import { createMailer } from '#server/services/mailer.ts';
import { makePerson } from '#server/services/people.ts';
import { setUpShop } from '#server/services/shop.ts';
import { ROLES, type Role } from '#shared/permissions.ts';

export const TEST_PASSWORD = 'a-password-for-tests';

export type Agent = ReturnType<typeof request.agent>;

export type TestShop = {
  readonly app: Express;
  readonly database: Database;
  readonly dataDir: string;
  /** What was logged, one JSON line each. */
  readonly logged: string[];
  readonly anonymous: Agent;
  /** A browser of somebody with this role, signed in. */
  as(role: Role): Promise<Agent>;
  close(): Promise<void>;
};

export const emailOf = (role: Role) => `${role}@shop.example`;

type Filling = 'empty' | 'people' | 'demo';

async function fill(filling: Filling): Promise<void> {
  if (filling === 'demo') await loadDemoShop();
  if (filling !== 'people') return;
  await setUpShop({
    shopName: 'Test Fabrication',
    units: 'imperial',
    currency: 'USD',
    paper: 'letter',
    name: 'A manager',
    email: emailOf('manager'),
    password: TEST_PASSWORD,
  });
  const hash = await passwordHash(TEST_PASSWORD);
  await write(async () => {
    for (const role of ROLES)
      if (role !== 'manager') await makePerson({ name: `A ${role}`, email: emailOf(role), role, hash });
  });
}

const templates = new Map<Filling, Promise<string>>();

/** Migrates and fills a database once a process; closing it folds the journal into the one file that is then copied. */
function templateOf(filling: Filling): Promise<string> {
  const known = templates.get(filling);
  if (known) return known;
  const made = (async () => {
    const dataDir = mkdtempSync(join(tmpdir(), 'barwright-template-'));
    process.once('exit', () => rmSync(dataDir, { recursive: true, force: true }));
    const database = await openDatabase(dataDir);
    await migrate(database.sequelize);
    await fill(filling);
    await database.close();
    return join(dataDir, DATABASE_FILE);
  })();
  templates.set(filling, made);
  return made;
}

type Options = {
  /** As on the first start: no shop, no people. */
  empty?: boolean;
  /** The demo shop instead of a shop with one person a role and nothing else. */
  demo?: boolean;
  trial?: boolean;
  clientDir?: string;
};

/** Opens a set-up shop with one person a role. One at a time: a process has one database open. */
export async function openTestShop(options: Options = {}): Promise<TestShop> {
  const template = await templateOf(options.empty ? 'empty' : options.demo ? 'demo' : 'people');
  const dataDir = mkdtempSync(join(tmpdir(), 'barwright-test-'));
  copyFileSync(template, join(dataDir, DATABASE_FILE));
  const database = await openDatabase(dataDir);
  const logged: string[] = [];
  const log = pino({ level: 'debug' }, { write: (line: string) => void logged.push(line) });
  const mailbox = await openLocalMailbox();
  const mailer = createMailer(mailbox.smtpUrl, 'Test <test@shop.example>', log);
  const trial = options.trial ?? true;
  const config: Config = {
    port: 0,
    dataDir,
    trial,
    demo: false,
    secret: 'a-secret-for-tests-that-is-long-enough',
    publicUrl: trial ? 'http://localhost' : 'https://bars.shop.example',
    smtpUrl: null,
    mailFrom: 'Test <test@shop.example>',
    logLevel: 'debug',
  };
  const app = createApp({
    config,
    database,
    mailer,
    log,
    ...(options.clientDir === undefined ? {} : { clientDir: options.clientDir }),
  });
  const agents = new Map<Role, Agent>();
  const signInOf = (role: Role) =>
    options.demo
      ? { email: DEMO_PEOPLE.find((person) => person.role === role)?.email, password: DEMO_PASSWORD }
      : { email: emailOf(role), password: TEST_PASSWORD };
  return {
    app,
    database,
    dataDir,
    logged,
    anonymous: request.agent(app),
    async as(role) {
      const known = agents.get(role);
      if (known) return known;
      const agent = request.agent(app);
      const answer = await agent.post('/api/auth/sign-in/email').send(signInOf(role));
      if (!answer.ok) throw new Error(`signing in as ${role} answered ${answer.status}: ${answer.text}`);
      agents.set(role, agent);
      return agent;
    },
    async close() {
      mailer.close();
      await mailbox.close();
      await database.close();
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
}
