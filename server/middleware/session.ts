import { fromNodeHeaders } from 'better-auth/node';
import type { RequestHandler } from 'express';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/middleware/route.ts';
import type { Auth } from '#server/services/auth/auth.ts';
import { Person } from '#server/models/index.ts';

/** Finds out who asks. The role is read from the person's row, so that a change counts at once. */
export function readSession(auth: Auth): RequestHandler {
  return async (request, response, next) => {
    const session = await auth.api.getSession({ headers: fromNodeHeaders(request.headers) });
    const person = session ? await Person.findByPk(session.user.id) : null;
    if (person && person.closed !== 1) {
      const actor: Actor = { id: person.id, name: person.name, email: person.email, role: person.role };
      response.locals.actor = actor;
    }
    next();
  };
}

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/** A write must come from our own pages: the browser's word (Sec-Fetch-Site, Origin) is checked; programs without either are let through to sign in as anybody else. */
export const sameOrigin: RequestHandler = (request, _response, next) => {
  if (SAFE.has(request.method)) return next();
  const site = request.get('sec-fetch-site');
  const origin = request.get('origin');
  const foreign =
    (site !== undefined && site !== 'same-origin' && site !== 'none') ||
    (origin !== undefined && new URL(origin).host !== request.get('host'));
  return next(
    foreign
      ? new ShopError('not-allowed', 'This request came from another site and was refused.')
      : undefined,
  );
};
