/** Every route × every role: the answer is the one the permission table gives, whatever else is wrong with the request. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Route } from '#server/middleware/route.ts';
import { allRoutes } from '#server/routes/index.ts';
import { openTestShop, type Agent, type TestShop } from '#tests/support/test-shop.ts';
import { ACTIONS, ROLES, roleMay } from '#shared/permissions.ts';

const nobody = { send: () => Promise.resolve(false), close: () => undefined };
const noCookies = () => Promise.resolve([]);

/** Only looked at, never run. Signing out comes last, or the walk would go on signed out. */
const ROUTES = allRoutes({
  trial: true,
  publicUrl: 'http://localhost',
  mailer: nobody,
  signIn: { signIn: noCookies, signOut: noCookies },
}).toSorted((a, b) => Number(a.path.endsWith('/sign-out')) - Number(b.path.endsWith('/sign-out')));

/** Nothing has this id, so that an allowed request changes nothing. */
const ask = async (agent: Agent, { method, path }: Route) =>
  (await agent[method](path.replaceAll(/:\w+/g, '987654321012'))).status;

describe('permissions', () => {
  let shop: TestShop;
  beforeAll(async () => {
    shop = await openTestShop();
  });
  afterAll(() => shop.close());

  it('lists every route once', () => {
    const names = ROUTES.map(({ method, path }) => `${method} ${path}`);
    expect(names.length).toBeGreaterThan(40);
    expect(new Set(names).size).toBe(names.length);
  });

  it('guards something with every action of the table', () => {
    const used = new Set<string>(ROUTES.map(({ allow }) => allow));
    expect(ACTIONS.filter((action) => !used.has(action))).toEqual([]);
  });

  it('only sign-in, the first page and one-time links are open to anyone', () => {
    expect(
      ROUTES.filter(({ allow }) => allow === 'anyone').map(({ method, path }) => `${method} ${path}`),
    ).toEqual([
      'post /api/auth/sign-in/email',
      'get /api/session',
      'post /api/set-up',
      'get /api/invitations/:token',
      'post /api/invitations/:token/accept',
      'post /api/auth/sign-out',
    ]);
  });

  it.each(['signed out', ...ROLES] as const)('%s', async (who) => {
    const agent = who === 'signed out' ? shop.anonymous : await shop.as(who);
    const wrong: string[] = [];
    for (const route of ROUTES) {
      const status = await ask(agent, route);
      const { allow } = route;
      const expected =
        allow === 'anyone'
          ? 'let in'
          : who === 'signed out'
            ? 401
            : allow === 'signed-in' || roleMay(who, allow)
              ? 'let in'
              : 403;
      const right =
        expected === 'let in' ? status !== 401 && status !== 403 && status < 500 : status === expected;
      if (!right) wrong.push(`${route.method} ${route.path} (${allow}): ${status}, expected ${expected}`);
    }
    expect(wrong).toEqual([]);
  });
});
