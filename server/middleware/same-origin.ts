import type { RequestHandler } from 'express';
import { ShopError } from '#server/errors.ts';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * A write must come from our own pages: the browser's word (Sec-Fetch-Site, Origin) is checked against the address
 * asked and the public one, which differ behind a proxy. Programs that send neither carry no cookie by accident and
 * are let through to sign in as anybody else.
 */
export function sameOrigin(publicUrl: string): RequestHandler {
  const publicHost = new URL(publicUrl).host;
  const isOurs = (origin: string, host: string | undefined) => {
    const from = URL.canParse(origin) ? new URL(origin).host : null;
    return from !== null && (from === host || from === publicHost);
  };
  return (request, _response, next) => {
    if (SAFE.has(request.method)) return next();
    const site = request.get('sec-fetch-site');
    const origin = request.get('origin');
    const foreign =
      (site !== undefined && site !== 'same-origin' && site !== 'none') ||
      (origin !== undefined && !isOurs(origin, request.get('host')));
    return next(
      foreign
        ? new ShopError('not-allowed', 'This request came from another site and was refused.')
        : undefined,
    );
  };
}
