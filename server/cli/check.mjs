import { bundledFile, loadBundled } from './bundle-engine.mjs';

const FOLDERS = ['server/cli', 'shared'];

try {
  const { check } = await loadBundled('server/cli/check.ts', FOLDERS);
  const threadFile = await bundledFile('server/cli/sample-thread.ts', FOLDERS);
  process.exitCode = await check(process.argv.slice(2), threadFile);
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 2;
}
