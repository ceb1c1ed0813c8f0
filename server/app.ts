import compression from 'compression';
import express, { type Express } from 'express';
import helmet from 'helmet';
import type { Logger } from 'pino';
import type { Config } from '#server/config.ts';
import type { Database } from '#server/database.ts';
import { answerErrors, apiNotFound } from '#server/middleware/errors.ts';
import { readJson } from '#server/middleware/read-json.ts';
import { requestLog } from '#server/middleware/request-log.ts';
import { sameOrigin } from '#server/middleware/same-origin.ts';
import { serveClient } from '#server/middleware/serve-client.ts';
import { readSession } from '#server/middleware/session.ts';
import { allRoutes } from '#server/routes/index.ts';
import { createAuth } from '#server/services/auth/auth.ts';
import { openSignIn } from '#server/services/auth/sign-in.ts';
import type { Mailer } from '#server/services/mailer.ts';
import about from '../package.json' with { type: 'json' };

type AppParts = {
  readonly config: Config;
  readonly database: Database;
  readonly mailer: Mailer;
  readonly log: Logger;
  /** Folder of the built client; left out in tests of the API. */
  readonly clientDir?: string;
};

/** The whole application, not listening. */
export function createApp({ config, database, mailer, log, clientDir }: AppParts): Express {
  const { trial, publicUrl } = config;
  const auth = createAuth(database.sequelize, config, log);
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', trial ? false : 1);
  app.use(requestLog(log, { everyRequest: !trial }));
  app.use(
    helmet({
      contentSecurityPolicy: {
        directives: {
          defaultSrc: ["'self'"],
          scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
          workerSrc: ["'self'", 'blob:'],
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          fontSrc: ["'self'", 'data:'],
          connectSrc: ["'self'"],
          upgradeInsecureRequests: trial ? null : [],
        },
      },
      strictTransportSecurity: !trial,
    }),
  );
  app.use(compression());

  app.get('/healthz', async (request, response) => {
    response.set('Cache-Control', 'no-store');
    try {
      await database.sequelize.query('SELECT 1');
      response.json({ ok: true, version: about.version });
    } catch (error) {
      request.log.error({ err: error }, 'the database does not answer');
      response.status(503).json({ ok: false, version: about.version });
    }
  });

  app.use('/api', sameOrigin(publicUrl), readSession(auth), readJson);
  app.use('/api', (_request, response, next) => {
    response.set('Cache-Control', 'no-store');
    next();
  });
  const context = { trial, publicUrl, mailer, signIn: openSignIn(auth, publicUrl) };
  for (const { method, path, handlers } of allRoutes(context)) app[method](path, ...handlers);
  app.use('/api', apiNotFound);
  if (clientDir !== undefined) app.use(serveClient(clientDir));
  app.use(answerErrors);
  return app;
}
