import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { Router } from 'express';

const YEAR_MS = 31_536_000_000;

/** The built client: hashed files for a year, the page itself asked for anew each time, for every address of the router. */
export function serveClient(clientDir: string): Router {
  const router = Router();
  if (!existsSync(clientDir)) return router;
  router.use(
    '/assets',
    express.static(join(clientDir, 'assets'), { immutable: true, maxAge: YEAR_MS, fallthrough: false }),
  );
  router.use(express.static(clientDir, { index: false, maxAge: 0 }));
  router.get('/{*page}', (_request, response) =>
    response.sendFile('index.html', { root: clientDir, headers: { 'Cache-Control': 'no-cache' } }),
  );
  return router;
}
