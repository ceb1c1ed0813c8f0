import { randomUUID } from 'node:crypto';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { toNodeHandler } from 'better-auth/node';
import compression from 'compression';
import express, { type Express } from 'express';
import helmet from 'helmet';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import type { Config } from '#server/config.ts';
import type { Database } from '#server/database.ts';
import { answerErrors, apiNotFound } from '#server/middleware/errors.ts';
import { readSession, sameOrigin } from '#server/middleware/session.ts';
import { allRoutes } from '#server/routes/index.ts';
import { createAuth } from '#server/services/auth/auth.ts';
import type { Mailer } from '#server/services/mailer.ts';

const YEAR_SECONDS = 31_536_000;

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
  const auth = createAuth(database.sequelize, config);
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trial ? false : 1);
  app.use(
    pinoHttp({
      logger: log,
      genReqId: (_request, response) => {
        const id = randomUUID();
        response.setHeader('X-Request-Id', id);
        return id;
      },
      // Cookies, tokens and passwords never reach the log; the address of a one-time link is cut.
      serializers: {
        req: (request: { id: unknown; method: string; url: string }) => ({
          id: request.id,
          method: request.method,
          url: request.url.replace(/(\/(?:invitations|join)\/)[^/?]+/, '$1…'),
        }),
        res: (response: { statusCode: number }) => ({ status: response.statusCode }),
      },
      customLogLevel: (_request, response, error) =>
        error || response.statusCode >= 500 ? 'error' : response.statusCode >= 400 ? 'warn' : 'debug',
    }),
  );
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
          upgradeInsecureRequests: config.trial ? null : [],
        },
      },
      strictTransportSecurity: !config.trial,
    }),
  );
  app.use(compression());

  app.get('/healthz', async (_request, response) => {
    await database.sequelize.query('SELECT 1');
    response.json({ ok: true });
  });

  app.use('/api', sameOrigin);
  app.all('/api/auth/*splat', toNodeHandler(auth));
  app.use('/api', express.json({ limit: '20mb' }), readSession(auth));
  for (const { method, path, handlers } of allRoutes({
    trial: config.trial,
    publicUrl: config.publicUrl,
    mailer,
  }))
    app[method](path, ...handlers);
  app.use('/api', apiNotFound);

  if (clientDir !== undefined && existsSync(clientDir)) {
    app.use(
      '/assets',
      express.static(join(clientDir, 'assets'), {
        immutable: true,
        maxAge: YEAR_SECONDS * 1000,
        fallthrough: false,
      }),
    );
    app.use(express.static(clientDir, { index: false, maxAge: 0 }));
    app.get('/*splat', (_request, response) =>
      response.sendFile(join(clientDir, 'index.html'), { headers: { 'Cache-Control': 'no-cache' } }),
    );
    app.get('/', (_request, response) =>
      response.sendFile(join(clientDir, 'index.html'), { headers: { 'Cache-Control': 'no-cache' } }),
    );
  }
  app.use(answerErrors);
  return app;
}
