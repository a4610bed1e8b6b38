import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { ensureBuilt } from './ensure-built.mjs';
import { requireInstalled } from './preconditions.mjs';

/** `npm start`: builds what is out of date, then runs the server in this very process. */
const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
process.env.NODE_ENV = 'production';
requireInstalled(root);
await ensureBuilt(root);
await import(pathToFileURL(join(root, 'dist', 'node', 'server', 'main.js')).href);
