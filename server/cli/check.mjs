import { loadBundled } from './bundle-engine.mjs';

try {
  const { check } = await loadBundled('server/cli/check.ts', ['server/cli', 'shared']);
  process.exitCode = await check(process.argv.slice(2));
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 2;
}
