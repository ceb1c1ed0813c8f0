import { ShopError } from '#server/errors.ts';
import { ADDRESS_HEADER, type Auth } from '#server/services/auth/auth.ts';

/** What the sign-in library wants to know about who is asking. */
export type Caller = { readonly address: string; readonly userAgent: string; readonly cookie: string };

export type SignIn = {
  /** Opens a session; returns the cookies to set. Throws wrong-sign-in, not-allowed (closed) or too-many-tries. */
  readonly signIn: (input: { email: string; password: string }, caller: Caller) => Promise<string[]>;
  /** Ends the caller's session; returns the cookies to set. */
  readonly signOut: (caller: Caller) => Promise<string[]>;
};

/** The two doors of the sign-in library that are open; its refusals in the shop's words. */
export function openSignIn(auth: Auth, publicUrl: string): SignIn {
  const ask = (path: string, body: object, caller: Caller) =>
    auth.handler(
      new Request(`${publicUrl}/api/auth${path}`, {
        method: 'POST',
        headers: {
          'Content-Type': 'application/json',
          'User-Agent': caller.userAgent,
          // Where a write comes from has been checked before anything gets here.
          Origin: publicUrl,
          Cookie: caller.cookie,
          [ADDRESS_HEADER]: caller.address,
        },
        body: JSON.stringify(body),
      }),
    );
  return {
    async signIn(input, caller) {
      const answer = await ask('/sign-in/email', input, caller);
      if (answer.ok) return answer.headers.getSetCookie();
      switch (answer.status) {
        case 401:
          throw new ShopError('wrong-sign-in', 'E-mail address or password is wrong.');
        case 403:
          throw new ShopError('not-allowed', 'This sign-in is closed. Ask a manager of the shop.');
        case 429:
          throw new ShopError(
            'too-many-tries',
            'Too many tries in a short time. Wait a minute, then try again.',
          );
        default:
          throw new Error(`the sign-in library answered ${answer.status}`);
      }
    },
    async signOut(caller) {
      const answer = await ask('/sign-out', {}, caller);
      if (!answer.ok) throw new Error(`the sign-in library answered ${answer.status}`);
      return answer.headers.getSetCookie();
    },
  };
}
