/** `npm start`: install, build, then serve client and API on one port. A second start does neither again. */
import { join } from 'node:path';
import { ensureBuilt, ensureInstalled, root, startProgram } from './steps.mjs';

ensureInstalled();
ensureBuilt();
startProgram(process.execPath, ['--enable-source-maps', join(root, 'dist/server/main.js')]);
