/** The built server as `npm start` runs it, on a free port with a data folder of its own. */
import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';

const root = resolve(import.meta.dirname, '../..');

async function freePort(): Promise<number> {
  const server = createServer();
  await new Promise<void>((done) => server.listen(0, '127.0.0.1', done));
  const address = server.address();
  await new Promise((done) => server.close(done));
  if (address === null || typeof address === 'string') throw new Error('no free port');
  return address.port;
}

export type RunningShop = {
  readonly address: string;
  readonly output: () => string;
  stop(): Promise<number | null>;
};

/** Starts dist/server/main.js and waits until /healthz answers. `demo` loads the demo shop first. */
export async function startShop({ demo }: { demo: boolean }): Promise<RunningShop> {
  const dataDir = mkdtempSync(join(tmpdir(), 'barwright-shop-'));
  const port = await freePort();
  const address = `http://127.0.0.1:${port}`;
  const child = spawn(process.execPath, [join(root, 'dist/server/main.js')], {
    cwd: root,
    env: {
      ...process.env,
      NODE_ENV: 'production',
      PORT: String(port),
      DATA_DIR: dataDir,
      DEMO: demo ? 'on' : 'off',
    },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  child.stdout.on('data', (chunk: Buffer) => (output += chunk.toString()));
  child.stderr.on('data', (chunk: Buffer) => (output += chunk.toString()));
  const ended = new Promise<number | null>((done) => child.on('exit', (code) => done(code)));

  for (let tries = 0; ; tries++) {
    if (child.exitCode !== null || tries > 600) {
      child.kill('SIGKILL');
      throw new Error(`the server did not come up:\n${output}`);
    }
    const up = await fetch(`${address}/healthz`).then(
      (answer) => answer.ok,
      () => false,
    );
    if (up) break;
    await new Promise((done) => setTimeout(done, 100));
  }
  return {
    address,
    output: () => output,
    async stop() {
      child.kill('SIGTERM');
      const code = await ended;
      rmSync(dataDir, { recursive: true, force: true });
      return code;
    },
  };
}
