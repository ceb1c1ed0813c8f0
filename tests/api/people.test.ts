import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { emailOf, openTestShop, TEST_PASSWORD, type TestShop } from '#tests/support/test-shop.ts';
import { InvitedPerson, MailList, MailView, PeopleList, SessionView } from '#shared/schemas/people.ts';

describe('people', () => {
  let shop: TestShop;
  beforeAll(async () => {
    shop = await openTestShop();
  });
  afterAll(() => shop.close());

  it('tells a stranger nothing but the shop', async () => {
    const view = SessionView.parse((await shop.anonymous.get('/api/session')).body);
    expect(view).toMatchObject({ needsSetUp: false, person: null, can: {} });
  });

  it('signs in, tells what one may do, and signs out', async () => {
    const agent = request.agent(shop.app);
    await agent
      .post('/api/auth/sign-in/email')
      .send({ email: emailOf('yard'), password: TEST_PASSWORD })
      .expect(200);
    const view = SessionView.parse((await agent.get('/api/session')).body);
    expect(view.person?.role).toBe('yard');
    expect(view.can['drop:log']).toBe(true);
    expect(view.can['plan:issue']).toBe(false);
    await agent.post('/api/auth/sign-out').send({}).expect(200);
    expect(SessionView.parse((await agent.get('/api/session')).body).person).toBeNull();
  });

  it('invites by a letter over a real SMTP conversation, and the link works once', async () => {
    const manager = await shop.as('manager');
    const made = await manager
      .post('/api/people')
      .send({ name: 'Nia Brandt', email: 'Nia@Shop.example', role: 'operator' })
      .expect(201);
    const { link, mailed, person } = InvitedPerson.parse(made.body);
    expect(mailed).toBe(true);
    expect(person).toMatchObject({ email: 'nia@shop.example', state: 'invited' });

    const { mails } = MailList.parse((await manager.get('/api/mail').expect(200)).body);
    const letter = MailView.parse((await manager.get(`/api/mail/${mails[0]?.id}`)).body);
    expect(letter.to).toBe('nia@shop.example');
    expect(letter.text).toContain(link);

    const token = link.split('/').at(-1) ?? '';
    await shop.anonymous.get(`/api/invitations/${token}`).expect(200);
    await shop.anonymous.post(`/api/invitations/${token}/accept`).send({ password: 'short' }).expect(422);
    await shop.anonymous
      .post(`/api/invitations/${token}/accept`)
      .send({ password: 'long enough for anyone' })
      .expect(204);
    await shop.anonymous.get(`/api/invitations/${token}`).expect(404);

    const nia = request.agent(shop.app);
    await nia
      .post('/api/auth/sign-in/email')
      .send({ email: 'nia@shop.example', password: 'long enough for anyone' })
      .expect(200);
    await manager.patch(`/api/people/${person.id}`).send({ active: false }).expect(200);
    expect((await nia.get('/api/people')).status).toBe(401);
    const again = await nia
      .post('/api/auth/sign-in/email')
      .send({ email: 'nia@shop.example', password: 'long enough for anyone' });
    expect(again.status).toBe(403);
  });

  it('a renewed link replaces the earlier one', async () => {
    const manager = await shop.as('manager');
    const first = InvitedPerson.parse(
      (await manager.post('/api/people').send({ name: 'Ole Tamm', email: 'ole@shop.example', role: 'yard' }))
        .body,
    );
    const second = InvitedPerson.parse(
      (await manager.post(`/api/people/${first.person.id}/link`).expect(200)).body,
    );
    await shop.anonymous.get(`/api/invitations/${first.link.split('/').at(-1)}`).expect(404);
    await shop.anonymous.get(`/api/invitations/${second.link.split('/').at(-1)}`).expect(200);
  });

  it('keeps the last manager', async () => {
    const manager = await shop.as('manager');
    const { people } = PeopleList.parse((await manager.get('/api/people')).body);
    const id = people.find(({ role }) => role === 'manager')?.id;
    const answer = await manager.patch(`/api/people/${id}`).send({ role: 'yard' });
    expect(answer.status).toBe(409);
    expect(answer.body).toMatchObject({ error: { code: 'wrong-state' } });
  });

  it('nobody signs up alone', async () => {
    const answer = await shop.anonymous
      .post('/api/auth/sign-up/email')
      .send({ name: 'X', email: 'x@shop.example', password: 'long enough for anyone' });
    expect(answer.status).toBeGreaterThanOrEqual(400);
  });

  it('refuses a write from another site', async () => {
    const manager = await shop.as('manager');
    const answer = await manager
      .post('/api/people')
      .set('Origin', 'https://elsewhere.example')
      .send({ name: 'X', email: 'y@shop.example', role: 'yard' });
    expect(answer.status).toBe(403);
  });

  it('slows down guessing of passwords', async () => {
    const guesser = request.agent(shop.app);
    const statuses: number[] = [];
    for (let i = 0; i < 12; i++)
      statuses.push(
        (
          await guesser
            .post('/api/auth/sign-in/email')
            .set('X-Forwarded-For', '10.1.1.1')
            .send({ email: emailOf('yard'), password: `wrong-guess-${i}` })
        ).status,
      );
    expect(statuses[0]).toBe(401);
    expect(statuses.at(-1)).toBe(429);
  });

  it('keeps passwords, cookies and tokens out of the log', () => {
    const log = shop.logged.join('');
    expect(log).toContain('/api/people');
    expect(log).not.toContain(TEST_PASSWORD);
    expect(log).not.toMatch(/session_token|long enough for anyone/);
  });
});

describe('first start', () => {
  it('sets up shop and first manager, once', async () => {
    const shop = await openTestShop({ empty: true });
    const input = {
      shopName: 'New Shop',
      units: 'metric',
      currency: 'EUR',
      paper: 'a4',
      name: 'First Manager',
      email: 'first@shop.example',
      password: 'a long first password',
    };
    expect(SessionView.parse((await shop.anonymous.get('/api/session')).body).needsSetUp).toBe(true);
    await shop.anonymous
      .post('/api/set-up')
      .send({ ...input, currency: 'euro' })
      .expect(422);
    await shop.anonymous.post('/api/set-up').send(input).expect(201);
    await shop.anonymous.post('/api/set-up').send(input).expect(409);
    await shop.anonymous
      .post('/api/auth/sign-in/email')
      .send({ email: input.email, password: input.password })
      .expect(200);
    await shop.close();
  });
});
