import { fromNodeHeaders } from 'better-auth/node';
import type { RequestHandler } from 'express';
import { Person } from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';
import type { Auth } from '#server/services/auth/auth.ts';

/** Finds out who asks. The role is read from the person's row, so that a change counts at once. */
export function readSession(auth: Auth): RequestHandler {
  return async (request, response, next) => {
    const { headers, response: session } = await auth.api.getSession({
      headers: fromNodeHeaders(request.headers),
      returnHeaders: true,
    });
    // A session in use is prolonged, its cookie with it.
    for (const cookie of headers.getSetCookie()) response.append('Set-Cookie', cookie);
    const person = session ? await Person.findByPk(session.user.id) : null;
    if (person && person.closed !== 1) {
      const actor: Actor = { id: person.id, name: person.name, email: person.email, role: person.role };
      response.locals.actor = actor;
    }
    next();
  };
}
