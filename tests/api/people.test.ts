import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Invitation, Mail } from '#server/models/index.ts';
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
      .expect(204);
    expect(SessionView.parse((await nia.get('/api/session')).body).person?.name).toBe('Nia Brandt');
    await shop.anonymous
      .post(`/api/invitations/${token}/accept`)
      .send({ password: 'somebody else entirely' })
      .expect(404);
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

  it('keeps of a link its hash only, and a link seven days old opens nothing', async () => {
    const manager = await shop.as('manager');
    const { link } = InvitedPerson.parse(
      (await manager.post('/api/people').send({ name: 'Ina Voss', email: 'ina@shop.example', role: 'yard' }))
        .body,
    );
    const token = link.split('/').at(-1) ?? '';
    const invitation = await Invitation.findOne({ order: [['id', 'DESC']] });
    expect(JSON.stringify(invitation)).not.toContain(token);
    const days = (Date.parse(invitation?.expiresAt ?? '') - Date.now()) / 86_400_000;
    expect(days).toBeGreaterThan(6.9);
    expect(days).toBeLessThanOrEqual(7);
    await shop.anonymous.get(`/api/invitations/${token}`).expect(200);
    await invitation?.update({ expiresAt: new Date(Date.now() - 1000).toISOString() });
    await shop.anonymous.get(`/api/invitations/${token}`).expect(404);
    await shop.anonymous
      .post(`/api/invitations/${token}/accept`)
      .send({ password: 'long enough for it' })
      .expect(404);
  });

  it('a new link for somebody who forgot the password ends the old one and their sessions', async () => {
    const manager = await shop.as('manager');
    const operator = await shop.as('operator');
    const { people } = PeopleList.parse((await manager.get('/api/people')).body);
    const id = people.find(({ email }) => email === emailOf('operator'))?.id;
    const { link, person } = InvitedPerson.parse((await manager.post(`/api/people/${id}/link`)).body);
    expect(person.state).toBe('active');
    await operator.get('/api/jobs').expect(200);
    const token = link.split('/').at(-1);
    await shop.anonymous
      .post(`/api/invitations/${token}/accept`)
      .send({ password: 'a second password' })
      .expect(204);
    await operator.get('/api/jobs').expect(401);
    const again = request.agent(shop.app);
    const enter = (password: string) =>
      again.post('/api/auth/sign-in/email').send({ email: emailOf('operator'), password });
    expect((await enter(TEST_PASSWORD)).status).toBe(401);
    expect((await enter('a second password')).status).toBe(204);
  });

  it('closing a person closes their link for good', async () => {
    const manager = await shop.as('manager');
    const { link, person } = InvitedPerson.parse(
      (await manager.post('/api/people').send({ name: 'Udo Kern', email: 'udo@shop.example', role: 'yard' }))
        .body,
    );
    await manager.patch(`/api/people/${person.id}`).send({ active: false }).expect(200);
    await manager.post(`/api/people/${person.id}/link`).expect(409);
    await manager.patch(`/api/people/${person.id}`).send({ active: true }).expect(200);
    await shop.anonymous.get(`/api/invitations/${link.split('/').at(-1)}`).expect(404);
  });

  it('refuses an address twice, and says every fault of an input at once', async () => {
    const manager = await shop.as('manager');
    const twice = await manager
      .post('/api/people')
      .send({ name: 'Again', email: emailOf('yard').toUpperCase(), role: 'yard' });
    expect(twice.status).toBe(409);
    const bad = await manager.post('/api/people').send({ name: ' ', email: 'no', role: 'king', extra: 1 });
    expect(bad.status).toBe(422);
    const { error } = bad.body as { error: { code: string; issues: { path: string }[] } };
    expect(error.code).toBe('bad-input');
    expect(error.issues.map(({ path }) => path)).toEqual(
      expect.arrayContaining(['name', 'email', 'role', '']),
    );
  });

  it('keeps the last manager', async () => {
    const manager = await shop.as('manager');
    const { people } = PeopleList.parse((await manager.get('/api/people')).body);
    const id = people.find(({ role }) => role === 'manager')?.id;
    const change = (patch: object) => manager.patch(`/api/people/${id}`).send(patch);
    for (const patch of [{ role: 'yard' }, { active: false }]) {
      const answer = await change(patch);
      expect(answer.status).toBe(409);
      expect(answer.body).toMatchObject({ error: { code: 'wrong-state' } });
    }
    // Somebody invited who has not come in yet cannot run the shop.
    const second = await manager
      .post('/api/people')
      .send({ name: 'Bea Lund', email: 'bea@shop.example', role: 'manager' })
      .expect(201);
    expect((await change({ role: 'yard' })).status).toBe(409);
    const token = InvitedPerson.parse(second.body).link.split('/').at(-1);
    await shop.anonymous
      .post(`/api/invitations/${token}/accept`)
      .send({ password: 'a manager enters' })
      .expect(204);
    // With two, both stepping down at once leaves one.
    const bea = InvitedPerson.parse(second.body).person.id;
    const both = await Promise.all([
      change({ active: false }),
      manager.patch(`/api/people/${bea}`).send({ active: false }),
    ]);
    expect(both.map(({ status }) => status).filter((status) => status === 200)).toHaveLength(1);
  });

  it('keeps passwords, cookies and tokens out of the log', async () => {
    const letters = await Mail.findAll();
    const links = letters.flatMap(({ text }) => /https?:\S+\/join\/\S+/.exec(text)?.[0] ?? []);
    const log = shop.logged.join('');
    expect(log).toContain('/api/people');
    expect(log).not.toContain(TEST_PASSWORD);
    expect(log).not.toMatch(/session_token|long enough for|a second password|a manager enters/);
    expect(links.length).toBeGreaterThan(2);
    for (const link of links) expect(log).not.toContain(link.split('/').at(-1) ?? link);
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
      .expect(204);
    await shop.close();
  });
});
