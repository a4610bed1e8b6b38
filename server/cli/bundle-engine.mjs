import { createHash, randomUUID } from 'node:crypto';
import {
  existsSync,
  mkdirSync,
  readdirSync,
  readFileSync,
  renameSync,
  writeFileSync,
} from 'node:fs';
import { join, relative } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

const ROOT = fileURLToPath(new URL('../../', import.meta.url));
const CACHE = join(ROOT, 'node_modules', '.cache', 'sinkwell');

/**
 * Bundles a TypeScript entry of this project with everything it imports and loads it.
 *
 * @param {string} entry path from the project's root
 * @param {string[]} folders where the entry and all it imports live
 * @returns {Promise<any>} the module
 * @throws {Error} if the packages are not installed
 */
export async function loadBundled(entry, folders) {
  return import(pathToFileURL(await bundledFile(entry, folders)).href);
}

/**
 * Bundles a TypeScript entry of this project into plain JavaScript. The bundle is kept in node_modules/.cache under a
 * hash of all sources, so that the second start costs next to nothing and an edited source is never missed.
 *
 * @returns {Promise<string>} the bundle's path
 * @throws {Error} if the packages are not installed
 */
export async function bundledFile(entry, folders) {
  const file = join(CACHE, `${entry.replace(/\W+/g, '-')}-${sourceHash(folders)}.mjs`);
  if (!existsSync(file)) await bundle(entry, file);
  return file;
}

async function bundle(entry, file) {
  const { build } = await import('esbuild').catch(() => {
    throw new Error('The packages are not installed: run npm ci first.');
  });
  const { outputFiles } = await build({
    absWorkingDir: ROOT,
    entryPoints: [entry],
    bundle: true,
    write: false,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    logLevel: 'silent',
  });
  mkdirSync(CACHE, { recursive: true });
  // Another process may be writing the same bundle: each writes its own, the rename is atomic.
  const own = `${file}.${randomUUID()}`;
  writeFileSync(own, outputFiles[0].contents);
  renameSync(own, file);
}

/** Hash over all sources and the lock file (the bundle holds packages too). */
function sourceHash(folders) {
  const hash = createHash('sha256');
  for (const path of [join(ROOT, 'package-lock.json'), ...folders.flatMap(sourcesUnder)]) {
    hash.update(relative(ROOT, path)).update('\0').update(readFileSync(path)).update('\0');
  }
  return hash.digest('hex').slice(0, 16);
}

function sourcesUnder(folder) {
  return readdirSync(join(ROOT, folder), { recursive: true, withFileTypes: true })
    .filter((item) => item.isFile() && item.name.endsWith('.ts'))
    .map((item) => join(item.parentPath ?? item.path, item.name))
    .sort();
}
