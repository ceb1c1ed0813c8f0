import { betterAuth } from 'better-auth';
import { APIError } from 'better-auth/api';
import type { Logger } from 'pino';
import type { Sequelize } from 'sequelize';
import type { Config } from '#server/config.ts';
import { Person } from '#server/models/index.ts';
import { sequelizeAdapter } from '#server/services/auth/sequelize-adapter.ts';

/** A whole shop behind one address signs in at the start of a shift; somebody guessing is slowed to 20 a minute. */
const SIGN_IN_TRIES = 20;
const SIGN_IN_WINDOW_SECONDS = 60;

/** Carries the caller's address into the sign-in library; set by this server alone, whatever a request claims. */
export const ADDRESS_HEADER = 'x-caller-address';

/** E-mail and password, sessions, sign-out. People are made by set-up and invitation only, so sign-up is closed. */
export function createAuth(sequelize: Sequelize, config: Config, log: Logger) {
  return betterAuth({
    appName: 'Barwright',
    baseURL: config.publicUrl,
    basePath: '/api/auth',
    secret: config.secret,
    database: sequelizeAdapter(sequelize),
    telemetry: { enabled: false },
    logger: { level: 'warn', log: (level, message) => log[level]({ from: 'sign-in' }, message) },
    emailAndPassword: { enabled: true, disableSignUp: true, minPasswordLength: 10, maxPasswordLength: 128 },
    user: {
      additionalFields: {
        role: { type: 'string', input: false },
        closed: { type: 'number', input: false, defaultValue: 0 },
      },
    },
    session: { expiresIn: 60 * 60 * 24 * 14, updateAge: 60 * 60 * 24 },
    advanced: {
      useSecureCookies: !config.trial,
      cookiePrefix: 'barwright',
      ipAddress: { ipAddressHeaders: [ADDRESS_HEADER] },
      database: { generateId: () => crypto.randomUUID() },
    },
    rateLimit: {
      enabled: true,
      storage: 'database',
      window: 60,
      max: 600,
      customRules: { '/sign-in/email': { window: SIGN_IN_WINDOW_SECONDS, max: SIGN_IN_TRIES } },
    },
    databaseHooks: {
      session: {
        create: {
          before: async (session) => {
            const person = await Person.findByPk(session.userId);
            if (!person || person.closed === 1)
              throw new APIError('FORBIDDEN', {
                message: 'This person no longer has access. Ask a manager.',
              });
          },
        },
      },
    },
  });
}

export type Auth = ReturnType<typeof createAuth>;
