/** `npm run dev`: the server restarts on change, the client reloads in place. */
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { ensureInstalled, root } from './steps.mjs';

ensureInstalled();
const bin = (name) => join(root, 'node_modules/.bin', name);
const apiPort = process.env.PORT ?? '4310';
const children = [
  spawn(bin('tsx'), ['watch', 'server/main.ts'], {
    cwd: root,
    stdio: 'inherit',
    env: { ...process.env, PORT: apiPort },
  }),
  spawn(bin('vite'), ['--port', process.env.DEV_PORT ?? '5173'], {
    cwd: root,
    stdio: 'inherit',
    env: { ...process.env, API_PORT: apiPort },
  }),
];
const stop = (code) => {
  for (const child of children) child.kill('SIGTERM');
  process.exitCode = code;
};
for (const child of children) child.on('exit', (code) => stop(code ?? 0));
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => stop(0));
