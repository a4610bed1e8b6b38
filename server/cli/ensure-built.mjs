import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join, relative } from 'node:path';
import { giveUp } from './preconditions.mjs';

const SOURCES = ['src', 'server', 'shared'];
const CONFIGS = [
  'angular.json',
  'package.json',
  'package-lock.json',
  'tsconfig.json',
  'tsconfig.app.json',
  'tsconfig.server.json',
];

/** SHA-256 over names and contents of everything the build reads. */
function hashOfSources(root) {
  const hash = createHash('sha256');
  const files = SOURCES.flatMap((folder) =>
    readdirSync(join(root, folder), { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .map((entry) => relative(root, join(entry.parentPath, entry.name))),
  );
  for (const file of [...CONFIGS, ...files.sort()]) {
    hash
      .update(`${file}\0`)
      .update(readFileSync(join(root, file)))
      .update('\0');
  }
  return hash.digest('hex');
}

function read(file) {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return '';
  }
}

/** Runs one build step to its end; a signal to this process ends the step too. */
function step(root, name, args) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, args, {
      cwd: root,
      stdio: ['ignore', 'pipe', 'pipe'],
      env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
    });
    let output = '';
    child.stdout.on('data', (text) => (output += text));
    child.stderr.on('data', (text) => (output += text));
    const stop = (signal) => {
      child.kill(signal);
      process.exit(1);
    };
    process.once('SIGTERM', stop);
    process.once('SIGINT', stop);
    child.on('close', (code) => {
      process.off('SIGTERM', stop);
      process.off('SIGINT', stop);
      if (code !== 0) giveUp(`${output}\nThe ${name} build failed.`);
      resolve();
    });
  });
}

/** Builds client and server into dist/ unless the stamp there says that they stand for these very sources. */
export async function ensureBuilt(root) {
  const stamp = join(root, 'dist', 'sources.sha256');
  const wanted = hashOfSources(root);
  if (read(stamp) === wanted) return;
  process.stdout.write('Building, about a minute the first time …\n');
  rmSync(stamp, { force: true });
  rmSync(join(root, 'dist', 'node'), { recursive: true, force: true });
  rmSync(join(root, 'dist', '.tsbuildinfo-server'), { force: true });
  await step(root, 'server', ['node_modules/typescript/bin/tsc', '-p', 'tsconfig.server.json']);
  await step(root, 'client', ['node_modules/@angular/cli/bin/ng.js', 'build']);
  mkdirSync(join(root, 'dist'), { recursive: true });
  writeFileSync(stamp, wanted);
}
