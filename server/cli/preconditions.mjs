import { existsSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';

const require = createRequire(import.meta.url);

/** Ends the process with one sentence. */
export function giveUp(sentence) {
  process.stderr.write(`${sentence}\n`);
  process.exit(1);
}

/** Checks that what `npm ci` installs is there and that the SQLite addon loads; says what is missing otherwise. */
export function requireInstalled(root) {
  if (!existsSync(join(root, 'node_modules', '@angular', 'build'))) {
    giveUp(
      'The packages are not installed, or only without the development ones: run "npm ci" first.',
    );
  }
  try {
    const Database = require('better-sqlite3');
    new Database(':memory:').close();
  } catch {
    giveUp(
      'The SQLite addon better-sqlite3 was not compiled: install python3, make and g++, then run "npm ci" with install scripts allowed.',
    );
  }
}
