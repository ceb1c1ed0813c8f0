import { betterAuth } from 'better-auth';
import { APIError } from 'better-auth/api';
import type { Sequelize } from 'sequelize';
import type { Config } from '#server/config.ts';
import { Person } from '#server/models/index.ts';
import { sequelizeAdapter } from '#server/services/auth/sequelize-adapter.ts';

const SIGN_IN_TRIES = 8;
const SIGN_IN_WINDOW_SECONDS = 60;

/** E-mail and password, sessions, sign-out. People are made by set-up and invitation only, so sign-up is closed. */
export function createAuth(sequelize: Sequelize, config: Config) {
  return betterAuth({
    appName: 'Barwright',
    baseURL: config.publicUrl,
    basePath: '/api/auth',
    secret: config.secret,
    database: sequelizeAdapter(sequelize),
    telemetry: { enabled: false },
    // A trial is reached as localhost, as 127.0.0.1 or by the machine's name in the shop's network; the server's own same-origin check guards writes.
    trustedOrigins: (request) => {
      const host = request?.headers.get('host');
      return config.trial && host ? [`http://${host}`] : [config.publicUrl];
    },
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
