import request from 'supertest';
import { afterEach, describe, expect, it } from 'vitest';
import { emailOf, openTestShop, TEST_PASSWORD, type TestShop } from '#tests/support/test-shop.ts';
import { PeopleList, SessionView } from '#shared/schemas/people.ts';

let shop: TestShop;
afterEach(() => shop.close());

const signIn = (agent: ReturnType<typeof request.agent>, email: string, password: string) =>
  agent.post('/api/auth/sign-in/email').send({ email, password });

const cookiesOf = (answer: request.Response): string[] => answer.get('Set-Cookie') ?? [];

async function idOf(email: string): Promise<string> {
  const { people } = PeopleList.parse((await (await shop.as('manager')).get('/api/people')).body);
  return people.find((person) => person.email === email)?.id ?? '';
}

describe('sign-in', () => {
  it('tells what one may do, by the role, and forgets it on sign-out', async () => {
    shop = await openTestShop();
    const agent = request.agent(shop.app);
    const cookies = cookiesOf(await signIn(agent, emailOf('yard').toUpperCase(), TEST_PASSWORD).expect(204));
    expect(cookies.join()).toMatch(/HttpOnly/i);
    expect(cookies.join()).toMatch(/SameSite=Lax/i);
    const view = SessionView.parse((await agent.get('/api/session')).body);
    expect(view.person?.role).toBe('yard');
    expect(view.can['drop:log']).toBe(true);
    expect(view.can['plan:issue']).toBe(false);
    await agent.post('/api/auth/sign-out').expect(204);
    expect(SessionView.parse((await agent.get('/api/session')).body).person).toBeNull();
    await agent.get('/api/jobs').expect(401);
  });

  it('a copied cookie is worth nothing after sign-out', async () => {
    shop = await openTestShop();
    const agent = request.agent(shop.app);
    const cookie = cookiesOf(await signIn(agent, emailOf('yard'), TEST_PASSWORD)).map(
      (text) => text.split(';')[0],
    );
    await shop.anonymous.get('/api/jobs').set('Cookie', cookie.join('; ')).expect(200);
    await agent.post('/api/auth/sign-out').expect(204);
    await request(shop.app).get('/api/jobs').set('Cookie', cookie.join('; ')).expect(401);
  });

  it('says the same to a wrong password and an unknown address, in the shape of every refusal', async () => {
    shop = await openTestShop();
    const wrong = await signIn(shop.anonymous, emailOf('yard'), 'not the password');
    const unknown = await signIn(shop.anonymous, 'stranger@shop.example', TEST_PASSWORD);
    expect([wrong.status, unknown.status]).toEqual([401, 401]);
    expect(wrong.body).toMatchObject({
      error: { code: 'wrong-sign-in', requestId: wrong.get('X-Request-Id') },
    });
    expect((unknown.body as { error: { message: string } }).error.message).toBe(
      (wrong.body as { error: { message: string } }).error.message,
    );
    await shop.anonymous.post('/api/auth/sign-in/email').send({ email: 'x', password: 4 }).expect(422);
  });

  it('slows down guessing, also for who claims a new address each time', async () => {
    shop = await openTestShop();
    const statuses: number[] = [];
    for (let i = 0; i < 22; i++)
      statuses.push(
        (
          await signIn(shop.anonymous, emailOf('yard'), `wrong-guess-${i}`).set(
            'X-Forwarded-For',
            `10.1.1.${i}`,
          )
        ).status,
      );
    expect(statuses).toEqual([...Array<number>(20).fill(401), 429, 429]);
    const right = await signIn(shop.anonymous, emailOf('yard'), TEST_PASSWORD);
    expect(right.status).toBe(429);
    expect(right.body).toMatchObject({ error: { code: 'too-many-tries' } });
  });

  it('links cannot be tried out by the thousand', async () => {
    shop = await openTestShop();
    const statuses: number[] = [];
    for (let i = 0; i < 21; i++)
      statuses.push((await shop.anonymous.get(`/api/invitations/no-such-token-${i}`)).status);
    expect(statuses).toEqual([...Array<number>(20).fill(404), 429]);
  });

  it('ends the sessions of a closed person and lets them in no more', async () => {
    shop = await openTestShop();
    const yard = await shop.as('yard');
    await yard.get('/api/drops').expect(200);
    const manager = await shop.as('manager');
    const id = await idOf(emailOf('yard'));
    await manager.patch(`/api/people/${id}`).send({ active: false }).expect(200);
    await yard.get('/api/drops').expect(401);
    expect((await signIn(yard, emailOf('yard'), TEST_PASSWORD)).status).toBe(403);
    await manager.patch(`/api/people/${id}`).send({ active: true }).expect(200);
    await yard.get('/api/drops').expect(401);
    await signIn(yard, emailOf('yard'), TEST_PASSWORD).expect(204);
    await yard.get('/api/drops').expect(200);
  });

  it('a changed role counts in the running session', async () => {
    shop = await openTestShop();
    const yard = await shop.as('yard');
    await yard.get('/api/people').expect(403);
    const manager = await shop.as('manager');
    await manager
      .patch(`/api/people/${await idOf(emailOf('yard'))}`)
      .send({ role: 'manager' })
      .expect(200);
    await yard.get('/api/people').expect(200);
  });

  it.each(['sign-up/email', 'update-user', 'change-password', 'list-sessions', 'get-session'])(
    'the sign-in library answers nothing else: %s',
    async (path) => {
      shop = await openTestShop();
      await (await shop.as('manager')).post(`/api/auth/${path}`).send({ name: 'X' }).expect(404);
    },
  );

  it('in production the cookie travels encrypted only', async () => {
    shop = await openTestShop({ trial: false });
    const cookies = cookiesOf(
      await signIn(shop.anonymous, emailOf('yard'), TEST_PASSWORD).expect(204),
    ).join();
    expect(cookies).toContain('__Secure-barwright');
    expect(cookies).toMatch(/; Secure/i);
  });
});
