/** A whole shop in a temporary folder, the application not listening: what API tests talk to. */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Express } from 'express';
import { pino } from 'pino';
import request from 'supertest';
import { createApp } from '#server/app.ts';
import type { Config } from '#server/config.ts';
import { openDatabase, write, type Database } from '#server/database.ts';
import { migrate } from '#server/migrations/index.ts';
import { passwordHash } from '#server/services/auth/passwords.ts';
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

/** Opens a set-up shop with one person a role; `empty` leaves it as on the first start. */
export async function openTestShop(options: { empty?: boolean; trial?: boolean } = {}): Promise<TestShop> {
  const dataDir = mkdtempSync(join(tmpdir(), 'barwright-test-'));
  const database = await openDatabase(dataDir);
  await migrate(database.sequelize);
  if (!options.empty) {
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
  const logged: string[] = [];
  const log = pino({ level: 'debug' }, { write: (line: string) => void logged.push(line) });
  const mailbox = await openLocalMailbox();
  const mailer = createMailer(mailbox.smtpUrl, 'Test <test@shop.example>', log);
  const config: Config = {
    port: 0,
    dataDir,
    trial: options.trial ?? true,
    demo: false,
    secret: 'a-secret-for-tests-that-is-long-enough',
    publicUrl: 'http://127.0.0.1',
    smtpUrl: null,
    mailFrom: 'Test <test@shop.example>',
    logLevel: 'debug',
  };
  const app = createApp({ config, database, mailer, log });
  const agents = new Map<Role, Agent>();
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
      const answer = await agent
        .post('/api/auth/sign-in/email')
        .send({ email: emailOf(role), password: TEST_PASSWORD });
      if (answer.status !== 200)
        throw new Error(`signing in as ${role} answered ${answer.status}: ${answer.text}`);
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
