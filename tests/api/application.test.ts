/** What holds for every request: ids, headers, refusals in one shape, the pages beside the API. */
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import about from '../../package.json' with { type: 'json' };
import { emailOf, openTestShop, TEST_PASSWORD, type TestShop } from '#tests/support/test-shop.ts';

const PAGE = '<!doctype html><title>Bars</title>';

describe('the application', () => {
  let shop: TestShop;
  const clientDir = mkdtempSync(join(tmpdir(), 'barwright-client-'));
  beforeAll(async () => {
    mkdirSync(join(clientDir, 'assets'));
    writeFileSync(join(clientDir, 'index.html'), PAGE);
    writeFileSync(join(clientDir, 'assets/solver-1a2b.wasm'), Buffer.alloc(50_000));
    writeFileSync(join(clientDir, 'assets/main-3c4d.js'), 'void 0;'.repeat(1000));
    shop = await openTestShop({ clientDir });
  });
  afterAll(async () => {
    await shop.close();
    rmSync(clientDir, { recursive: true, force: true });
  });

  it('says that it is well, and which version it is', async () => {
    await shop.anonymous.get('/healthz').expect(200, { ok: true, version: about.version });
  });

  it('gives each request an id of its own, in header, refusal and log alike', async () => {
    const first = await shop.anonymous.get('/api/jobs').expect(401);
    const second = await shop.anonymous.get('/api/jobs').set('X-Request-Id', 'mine').expect(401);
    const id = first.get('X-Request-Id');
    expect(id).toMatch(/^[0-9a-f-]{36}$/);
    expect(second.get('X-Request-Id')).not.toBe('mine');
    expect(second.get('X-Request-Id')).not.toBe(id);
    expect(first.body).toEqual({
      error: { code: 'not-signed-in', message: 'Sign in first.', requestId: id },
    });
    expect(shop.logged.some((line) => line.includes(`"id":"${id}"`) && line.includes('"status":401'))).toBe(
      true,
    );
  });

  it('lets the page load from here and nowhere else', async () => {
    const policy = (await shop.anonymous.get('/')).get('Content-Security-Policy') ?? '';
    for (const part of [
      "default-src 'self'",
      "script-src 'self' 'wasm-unsafe-eval'",
      "worker-src 'self' blob:",
      "style-src 'self' 'unsafe-inline'",
      "img-src 'self' data: blob:",
      "font-src 'self' data:",
      "connect-src 'self'",
      "object-src 'none'",
      "frame-ancestors 'self'",
    ])
      expect(policy.split(';')).toContain(part);
    expect(policy).not.toContain('upgrade-insecure-requests');
  });

  it.each([
    [{ Origin: 'https://elsewhere.example' }, 403],
    [{ Origin: 'null' }, 403],
    [{ 'Sec-Fetch-Site': 'cross-site' }, 403],
    [{ 'Sec-Fetch-Site': 'same-site', Origin: 'http://localhost' }, 403],
    [{ 'Sec-Fetch-Site': 'same-origin', Origin: 'http://localhost' }, 422],
    [{}, 422],
  ])('a write sent with %j is answered %i', async (headers, status) => {
    const manager = await shop.as('manager');
    const answer = await manager.post('/api/people').set(headers).send({});
    expect(answer.status).toBe(status);
  });

  it('refuses in one shape what it cannot read', async () => {
    const manager = await shop.as('manager');
    const codeOf = async (sent: PromiseLike<{ status: number; body: unknown }>) => {
      const { status, body } = await sent;
      return [status, (body as { error: { code: string } }).error.code];
    };
    const json = { 'Content-Type': 'application/json' };
    expect(await codeOf(manager.post('/api/jobs').set(json).send('{"number":'))).toEqual([422, 'bad-input']);
    expect(
      await codeOf(
        manager
          .post('/api/jobs')
          .set(json)
          .send(`"${'x'.repeat(300_000)}"`),
      ),
    ).toEqual([413, 'file-too-large']);
    expect(await codeOf(manager.get('/api/jobs/%E0%A4%A'))).toEqual([422, 'bad-input']);
    expect(await codeOf(manager.get('/api/nothing/here'))).toEqual([404, 'not-found']);
    expect(await codeOf(shop.anonymous.get('/assets/gone-9z.js'))).toEqual([404, 'not-found']);
  });

  it('takes a large plan of the signed-in only', async () => {
    const large = { pieces: 'x'.repeat(400_000) };
    expect((await shop.anonymous.post('/api/plans').send(large)).status).toBe(413);
    expect((await (await shop.as('manager')).post('/api/plans').send(large)).status).toBe(422);
  });

  it('answers of the API are kept by nobody on the way', async () => {
    expect((await shop.anonymous.get('/api/session')).get('Cache-Control')).toBe('no-store');
  });

  it('serves hashed files for a year and compressed, the page fresh at every address of it', async () => {
    for (const path of ['/', '/jobs/4', '/rack']) {
      const page = await shop.anonymous.get(path).expect(200);
      expect(page.text).toBe(PAGE);
      expect(page.get('Cache-Control')).toBe('no-cache');
    }
    const wasm = await shop.anonymous
      .get('/assets/solver-1a2b.wasm')
      .set('Accept-Encoding', 'gzip')
      .expect(200);
    expect(wasm.get('Content-Type')).toBe('application/wasm');
    expect(wasm.get('Content-Encoding')).toBe('gzip');
    expect(wasm.get('Cache-Control')).toContain('max-age=31536000, immutable');
    const script = await shop.anonymous.get('/assets/main-3c4d.js').expect(200);
    expect(script.get('Content-Type')).toContain('text/javascript');
    await shop.anonymous.get('/../../etc/passwd').expect(200, PAGE);
  });

  it('a fault of the server says so without telling what, and logs it without the values of the statement', async () => {
    const broken = await openTestShop();
    const manager = await broken.as('manager');
    await broken.database.sequelize.query('DROP TABLE "audit_entries"');
    const answer = await manager
      .post('/api/people')
      .send({ name: 'Kit', email: 'kit@shop.example', role: 'yard' });
    expect(answer.status).toBe(500);
    expect(answer.body).toMatchObject({ error: { code: 'server-fault' } });
    expect(answer.text).not.toContain('audit_entries');
    const log = broken.logged.join('');
    expect(log).toContain('no such table: audit_entries');
    expect(log).not.toContain('kit@shop.example');
    // Nothing was changed: the person made before the fault is gone with it.
    const { people } = (await manager.get('/api/people')).body as { people: { name: string }[] };
    expect(people.map(({ name }) => name)).not.toContain('Kit');
    await broken.close();
  });
});

describe('the application in production', () => {
  it('has no local mailbox, no demo, and keeps browsers on the encrypted address', async () => {
    const shop = await openTestShop({ trial: false });
    const signedIn = await shop.anonymous
      .post('/api/auth/sign-in/email')
      .send({ email: emailOf('manager'), password: TEST_PASSWORD })
      .expect(204);
    // The agent talks plainly and would keep a secure cookie to itself.
    const cookie = (signedIn.get('Set-Cookie') ?? []).map((text) => text.split(';')[0]).join('; ');
    const get = (path: string) => shop.anonymous.get(path).set('Cookie', cookie);
    const session = await get('/api/session').expect(200);
    expect(session.body).toMatchObject({ trial: false, demoSignIns: [], person: { role: 'manager' } });
    await get('/api/people').expect(200);
    await get('/api/mail').expect(404);
    await get('/api/mail/1').expect(404);
    expect(session.get('Strict-Transport-Security')).toContain('max-age=');
    expect(session.get('Content-Security-Policy')).toContain('upgrade-insecure-requests');
    await shop.close();
  });

  it('takes writes of its public address, which a proxy in front may not pass on as the host', async () => {
    const shop = await openTestShop({ trial: false });
    const answer = (origin: string) => shop.anonymous.post('/api/auth/sign-out').set('Origin', origin);
    expect((await answer('https://bars.shop.example')).status).toBe(204);
    expect((await answer('https://bars.shop.example.elsewhere.example')).status).toBe(403);
    await shop.close();
  });
});
