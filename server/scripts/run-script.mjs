/** Runs one TypeScript program of this folder or the benches: `node run-script.mjs plan request.json`. */
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { ensureInstalled, root } from './steps.mjs';

const [script, ...args] = process.argv.slice(2);
ensureInstalled();
const result = spawnSync(process.execPath, ['--import', 'tsx', join(root, script), ...args], {
  stdio: 'inherit',
});
process.exit(result.status ?? 1);
