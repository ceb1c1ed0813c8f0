/**
 * What the commands of package.json share. Node built-ins only: these run before anything is installed.
 */
import { spawn, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';

export const root = resolve(import.meta.dirname, '../..');
const tool = (name) => join(root, 'node_modules', '.bin', name);

/** Runs a program with this terminal; returns its exit code (1 when it could not be started). */
export function run(program, args, options = {}) {
  const result = spawnSync(program, args, { cwd: root, stdio: 'inherit', ...options });
  if (result.error) console.error(`${program} could not be started: ${result.error.message}`);
  return result.status ?? 1;
}

export function runTool(name, args, options = {}) {
  return run(tool(name), args, options);
}

/** Starts a program and leaves it running; signals to this process reach it too. */
export function startProgram(program, args, options = {}) {
  const child = spawn(program, args, { cwd: root, stdio: 'inherit', ...options });
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => child.kill(signal));
  child.on('exit', (code, signal) => process.exit(code ?? (signal ? 128 : 1)));
  return child;
}

function fingerprintOf(parts) {
  const hash = createHash('sha256');
  for (const part of parts) hash.update(part).update('\0');
  return hash.digest('hex');
}

function stampedWith(file, fingerprint) {
  return existsSync(file) && readFileSync(file, 'utf8') === fingerprint;
}

/** Installs exactly what the lock file names, once for each lock file and Node version. */
export function ensureInstalled() {
  const stamp = join(root, 'node_modules', '.installed-from');
  const fingerprint = fingerprintOf([
    readFileSync(join(root, 'package-lock.json')),
    process.version,
    process.platform,
  ]);
  if (stampedWith(stamp, fingerprint)) return;
  console.error('Installing packages from the lock file. The first time takes a few minutes.');
  // What npm says goes to standard error, so that a command's own output stays clean.
  const code = run('npm', ['ci', '--include=dev', '--no-fund', '--no-audit'], { stdio: ['ignore', 2, 2] });
  if (code !== 0) {
    console.error('Installing failed; see above. Nothing was started.');
    process.exit(code);
  }
  writeFileSync(stamp, fingerprint);
}

function* filesBelow(folder) {
  for (const entry of readdirSync(folder, { withFileTypes: true }).sort((a, b) =>
    a.name < b.name ? -1 : 1,
  )) {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) yield* filesBelow(path);
    else if (!/\.test\.tsx?$/.test(entry.name)) yield path;
  }
}

/** Builds client and server into dist/, only when a file they are made of has changed. */
export function ensureBuilt() {
  const sources = ['src', 'server', 'shared', 'workers', 'fixtures/demo'].flatMap((folder) => [
    ...filesBelow(join(root, folder)),
  ]);
  sources.push(
    ...['index.html', 'vite.config.ts', 'tailwind.config.ts', 'package-lock.json'].map((f) => join(root, f)),
  );
  const fingerprint = fingerprintOf(sources.flatMap((path) => [path.slice(root.length), readFileSync(path)]));
  const stamp = join(root, 'dist', '.built-from');
  if (stampedWith(stamp, fingerprint)) return;
  console.error('Building client and server.');
  const code =
    runTool('vite', ['build', '--logLevel', 'warn']) ||
    runTool('vite', ['build', '--ssr', '--logLevel', 'warn']);
  if (code !== 0) {
    console.error('The build failed; see above. Nothing was started.');
    process.exit(code);
  }
  mkdirSync(join(root, 'dist'), { recursive: true });
  writeFileSync(stamp, fingerprint);
}

/** The browser tests drive Debian's Chromium; CHROMIUM names another one. */
export const chromiumPath = process.env.CHROMIUM ?? '/usr/bin/chromium';

export function ensureChromium() {
  if (existsSync(chromiumPath)) return;
  console.error(`No browser at ${chromiumPath}: installing Debian's chromium.`);
  const code = run('apt-get', ['update', '-q']) || run('apt-get', ['install', '-y', '-q', 'chromium']);
  if (code !== 0 || !existsSync(chromiumPath)) {
    console.error(
      'Chromium could not be installed. Install it, or set CHROMIUM to the path of one, and run again.',
    );
    process.exit(1);
  }
}
