import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** A port that was free a moment ago. */
function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      if (address === null || typeof address === 'string') {
        reject(new Error('no port'));
        return;
      }
      probe.close(() => {
        resolve(address.port);
      });
    });
  });
}

/** A built server of its own: temp folder, free port, everything it prints. */
export interface RunningServer {
  readonly url: string;
  readonly output: () => string;
  readonly stop: () => Promise<void>;
}

/**
 * Starts the built server on an empty data folder.
 *
 * @param demo whether the demo project is made
 * @throws {Error} if it does not become ready within 30 s; the message holds what it printed
 */
export async function startServer(demo: boolean): Promise<RunningServer> {
  const port = await freePort();
  const folder = mkdtempSync(join(tmpdir(), 'sinkwell-e2e-'));
  const url = `http://127.0.0.1:${port}`;
  const child: ChildProcess = spawn(process.execPath, ['dist/node/server/main.js'], {
    stdio: ['ignore', 'pipe', 'pipe'],
    env: {
      ...process.env,
      NODE_ENV: 'production',
      SINKWELL_DATA: folder,
      SINKWELL_PORT: String(port),
      SINKWELL_DEMO: demo ? '1' : '0',
      // Suites sign in often and ask fast.
      SINKWELL_SCRYPT_COST: '10',
      SINKWELL_REQUESTS_PER_MINUTE: '6000',
      // On a port of its own, whatever the shell around says.
      SINKWELL_URL: url,
    },
  });
  let printed = '';
  child.stdout?.on('data', (text: Buffer) => (printed += text.toString()));
  child.stderr?.on('data', (text: Buffer) => (printed += text.toString()));
  const stop = async (): Promise<void> => {
    if (child.exitCode === null) {
      const ended = new Promise((resolve) => child.once('close', resolve));
      child.kill('SIGTERM');
      await ended;
    }
    rmSync(folder, { recursive: true, force: true });
  };
  for (let tries = 0; tries < 150; tries += 1) {
    if (child.exitCode !== null) break;
    const ready = await fetch(`${url}/readyz`).then(
      (answer) => answer.ok,
      () => false,
    );
    if (ready) return { url, output: () => printed, stop };
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  await stop();
  throw new Error(`the server did not become ready:\n${printed}`);
}
