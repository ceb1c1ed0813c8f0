import type { Request, RequestHandler, Response } from 'express';
import type { z } from 'zod';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/policies/actor.ts';
import type { ErrorIssue } from '#shared/errors.ts';
import { roleMay, type Action } from '#shared/permissions.ts';

export type Allow = Action | 'signed-in' | 'anyone';

type Spec<P, Q, B, A, L extends Allow> = {
  readonly method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  readonly path: string;
  /** An action of the permission table, any signed-in person, or anyone at all. */
  readonly allow: L;
  readonly params?: z.ZodType<P>;
  readonly query?: z.ZodType<Q>;
  readonly body?: z.ZodType<B>;
  /** Parsed on the way out: nothing leaves that the schema does not name. Left out: the handler answers itself. */
  readonly answer?: z.ZodType<A>;
  readonly status?: number;
  /** Between the permission check and the validation, e.g. the reading of an upload. */
  readonly before?: readonly RequestHandler[];
};

type Input<P, Q, B, L extends Allow> = {
  readonly params: P;
  readonly query: Q;
  readonly body: B;
  readonly actor: L extends 'anyone' ? Actor | null : Actor;
  readonly request: Request;
  readonly response: Response;
};

export type Route = {
  readonly method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  readonly path: string;
  readonly allow: Allow;
  readonly handlers: readonly RequestHandler[];
};

/** Set by the session middleware before any route runs. */
export function actorOf(response: Response): Actor | null {
  return (response.locals.actor as Actor | undefined) ?? null;
}

function permit(allow: Allow): RequestHandler {
  return (_request, response, next) => {
    if (allow === 'anyone') return next();
    const actor = actorOf(response);
    if (!actor) return next(new ShopError('not-signed-in', 'Sign in first.'));
    if (allow !== 'signed-in' && !roleMay(actor.role, allow))
      return next(new ShopError('not-allowed', `A ${actor.role} may not do this. Ask a manager.`));
    return next();
  };
}

function collect<T>(schema: z.ZodType<T> | undefined, value: unknown, issues: ErrorIssue[]): T {
  if (!schema) return undefined as T;
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  for (const issue of result.error.issues)
    issues.push({ path: issue.path.map(String).join('.'), message: issue.message });
  return undefined as T;
}

/** One route: permission, then validation with every issue at once, then the work, then the answer by its schema. */
export function route<L extends Allow, P = undefined, Q = undefined, B = undefined, A = unknown>(
  spec: Spec<P, Q, B, A, L>,
  work: (input: Input<P, Q, B, L>) => Promise<A | undefined> | A | undefined,
): Route {
  const handler: RequestHandler = async (request, response) => {
    const issues: ErrorIssue[] = [];
    const params = collect(spec.params, request.params, issues);
    const query = collect(spec.query, request.query, issues);
    const body = collect(spec.body, request.body as unknown, issues);
    if (issues.length > 0)
      throw new ShopError('bad-input', 'Some of what was sent cannot be used; see each field.', issues);
    const actor = actorOf(response) as Input<P, Q, B, L>['actor'];
    const answer = await work({ params, query, body, actor, request, response });
    if (response.headersSent) return;
    if (!spec.answer) response.status(spec.status ?? 204).end();
    else response.status(spec.status ?? 200).json(spec.answer.parse(answer));
  };
  return {
    method: spec.method,
    path: spec.path,
    allow: spec.allow,
    handlers: [permit(spec.allow), ...(spec.before ?? []), handler],
  };
}
