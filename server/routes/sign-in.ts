import type { Request, Response } from 'express';
import { z } from 'zod';
import { route, type Route } from '#server/middleware/route.ts';
import type { Caller, SignIn } from '#server/services/auth/sign-in.ts';
import { EmailAddress } from '#shared/schemas/people.ts';

const SignInInput = z.object({ email: EmailAddress, password: z.string().min(1).max(128) });

const callerOf = (request: Request): Caller => ({
  address: request.ip ?? '',
  userAgent: request.get('user-agent') ?? '',
  cookie: request.get('cookie') ?? '',
});

const setCookies = (response: Response, cookies: readonly string[]) => {
  for (const cookie of cookies) response.append('Set-Cookie', cookie);
};

export function signInRoutes({ signIn, signOut }: SignIn): Route[] {
  return [
    route(
      { method: 'post', path: '/api/auth/sign-in/email', allow: 'anyone', body: SignInInput },
      async ({ body, request, response }) => {
        setCookies(response, await signIn(body, callerOf(request)));
        return undefined;
      },
    ),
    route({ method: 'post', path: '/api/auth/sign-out', allow: 'anyone' }, async ({ request, response }) => {
      setCookies(response, await signOut(callerOf(request)));
      return undefined;
    }),
  ];
}
