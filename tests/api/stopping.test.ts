/** The server as a process: what it prints, how it stops, how it refuses to start. */
import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { request } from 'node:http';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { DATABASE_FILE } from '#server/database.ts';
import { SessionView } from '#shared/schemas/people.ts';

const root = resolve(import.meta.dirname, '../..');
const folder = mkdtempSync(join(tmpdir(), 'barwright-process-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

async function freePort(): Promise<number> {
  const server = createServer();
  await new Promise<void>((done) => server.listen(0, '127.0.0.1', done));
  const address = server.address();
  await new Promise((done) => server.close(done));
  if (address === null || typeof address === 'string') throw new Error('no free port');
  return address.port;
}

function start(settings: Record<string, string>) {
  const { PATH } = process.env;
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
    cwd: root,
    env: { PATH, DATA_DIR: join(folder, 'data'), NODE_ENV: 'production', ...settings },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  let waiting: (() => void)[] = [];
  const hear = (chunk: Buffer) => {
    output += chunk.toString();
    for (const look of waiting) look();
  };
  child.stdout.on('data', hear);
  child.stderr.on('data', hear);
  const ended = new Promise<number | null>((done) => child.on('close', (code) => done(code)));
  const says = (words: string) =>
    new Promise<void>((done, failed) => {
      const look = () => {
        if (output.includes(words)) done();
      };
      waiting = [...waiting, look];
      look();
      void ended.then(() => failed(new Error(`ended before saying "${words}":\n${output}`)));
    });
  return { child, ended, says, output: () => output };
}

describe('the server process', () => {
  it('migrates, says how to begin, and on SIGTERM finishes what is under way and ends well', async () => {
    const port = await freePort();
    const server = start({ PORT: String(port), DEMO: 'off', LOG_LEVEL: 'info' });
    await server.says(`Barwright serves http://localhost:${port}`);
    await server.says('No shop yet');
    expect(server.output()).toContain('Local trial');

    // A request that has begun: its body is still to come when the signal arrives.
    const body = JSON.stringify({ shopName: '' });
    const slow = request({
      port,
      host: '127.0.0.1',
      path: '/api/set-up',
      method: 'POST',
      headers: { 'Content-Type': 'application/json', 'Content-Length': body.length },
    });
    const answered = new Promise<number | undefined>((done, failed) => {
      slow.on('response', (answer) => {
        answer.resume();
        done(answer.statusCode);
      });
      slow.on('error', failed);
    });
    await new Promise<void>((sent) => slow.write(body.slice(0, 5), () => sent()));
    expect((await fetch(`http://127.0.0.1:${port}/healthz`)).status).toBe(200);
    server.child.kill('SIGTERM');
    await server.says('stopping');
    slow.end(body.slice(5));
    expect(await answered).toBe(422);
    expect(await server.ended).toBe(0);
    await expect(fetch(`http://127.0.0.1:${port}/healthz`)).rejects.toThrow();
  });

  it('a demo shop broken off in the making is made anew, whole; a second start finds it', async () => {
    const port = await freePort();
    const settings = { PORT: String(port), DATA_DIR: join(folder, 'demo') };
    const broken = start(settings);
    const aside = join(folder, 'demo', 'demo-in-the-making');
    while (!existsSync(join(aside, DATABASE_FILE)) && broken.child.exitCode === null)
      await new Promise((done) => setTimeout(done, 20));
    broken.child.kill('SIGKILL');
    await broken.ended;

    const whole = start(settings);
    await whole.says('Demo shop, open to anyone');
    expect(existsSync(aside)).toBe(false);
    const session = async () =>
      SessionView.parse(await (await fetch(`http://127.0.0.1:${port}/api/session`)).json());
    const { demoSignIns, shop } = await session();
    expect(demoSignIns).toHaveLength(5);
    whole.child.kill('SIGINT');
    expect(await whole.ended).toBe(0);

    const again = start(settings);
    await again.says('Demo shop, open to anyone');
    expect((await session()).shop).toEqual(shop);
    again.child.kill('SIGTERM');
    expect(await again.ended).toBe(0);
  }, 240_000);

  it('refuses half a production configuration, naming all of it', async () => {
    const server = start({ PUBLIC_URL: 'https://bars.shop.example' });
    expect(await server.ended).toBe(1);
    for (const name of ['BARWRIGHT_SECRET', 'SMTP_URL', 'MAIL_FROM', 'DEMO'])
      expect(server.output()).toContain(name);
    expect(server.output()).not.toContain('    at ');
  });

  it('says when the port is taken', async () => {
    const other = createServer();
    await new Promise<void>((done) => other.listen(0, done));
    const address = other.address();
    const port = address !== null && typeof address === 'object' ? address.port : 0;
    const server = start({ PORT: String(port), DEMO: 'off' });
    expect(await server.ended).toBe(1);
    expect(server.output()).toContain(`Port ${port} cannot be used`);
    await new Promise((done) => other.close(done));
  });
});
