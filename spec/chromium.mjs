import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';

const DEBIAN = '/usr/bin/chromium';

/**
 * Path of the browser for the browser tests: CHROMIUM_PATH, else Debian's, else, as root on Debian, installed now.
 *
 * @returns the path, or null when there is none and none can be installed
 */
export function findChromium() {
  const named = process.env.CHROMIUM_PATH;
  if (named) return existsSync(named) ? named : null;
  if (existsSync(DEBIAN)) return DEBIAN;
  if (process.getuid?.() !== 0) return null;
  process.stdout.write('Installing Chromium for the browser tests …\n');
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  for (const args of [
    ['update', '-qq'],
    ['install', '-y', '-qq', '--no-install-recommends', 'chromium'],
  ]) {
    spawnSync('apt-get', args, { env, stdio: ['ignore', 'ignore', 'inherit'] });
  }
  return existsSync(DEBIAN) ? DEBIAN : null;
}
