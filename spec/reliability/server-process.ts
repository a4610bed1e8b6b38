import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { buildSync } from 'esbuild';
import { type Reply, TestClient } from '../server/test-client.ts';

const GAUGE = path.join(import.meta.dirname, 'gauge.mjs');
const ROOT = path.resolve(import.meta.dirname, '../..');

/** The server's sources as one plain JavaScript file: a process of its own starts from it in a second. */
export function bundleServer(): string {
  // as deep as dist/node/server/seed, from where the part library is found
  const outfile = path.join(ROOT, 'dist/reliability/server/seed', `server-${process.pid}.mjs`);
  buildSync({
    ...{ entryPoints: [path.join(ROOT, 'server/main.ts')], outfile, bundle: true },
    ...{
      platform: 'node',
      format: 'esm',
      target: 'node20',
      packages: 'external',
      logLevel: 'error',
    },
    tsconfigRaw: {
      compilerOptions: { experimentalDecorators: true, useDefineForClassFields: false },
    },
  });
  return outfile;
}

/** What gauge.mjs measured inside of the process. */
export interface Figures {
  readonly loopDelayP99Ms: number;
  readonly loopDelayMaxMs: number;
  readonly rssGrowthMiB: number;
}

/** A real server process over a data folder that outlives it. */
export class ServerProcess {
  readonly folder = mkdtempSync(path.join(tmpdir(), 'sinkwell-'));
  readonly dataFolder = path.join(this.folder, 'data');
  #child: ChildProcess | null = null;
  stdout = '';
  stderr = '';

  private constructor(
    private readonly bundle: string,
    readonly port: number,
  ) {}

  static async create(bundle: string): Promise<ServerProcess> {
    return new ServerProcess(bundle, await freePort());
  }

  get url(): string {
    return `http://127.0.0.1:${this.port}`;
  }

  /**
   * Starts and waits until it says it is ready, or ends.
   *
   * @param options.gauge whether {@link gauge} will be asked
   */
  async start(env: Record<string, string> = {}, options: { gauge?: true } = {}): Promise<void> {
    this.stdout = '';
    this.stderr = '';
    const preload = options.gauge ? ['--import', pathToFileURL(GAUGE).href] : [];
    const child = spawn(process.execPath, [...preload, this.bundle], {
      cwd: this.folder,
      env: {
        ...{ PATH: process.env['PATH'], SINKWELL_DATA: this.dataFolder, SINKWELL_DEMO: '0' },
        ...{ SINKWELL_PORT: String(this.port), SINKWELL_SCRYPT_COST: '4' },
        ...{ SINKWELL_REQUESTS_PER_MINUTE: '999999', SINKWELL_LOG_LEVEL: 'warn', ...env },
      },
      stdio: ['ignore', 'pipe', 'pipe', ...(options.gauge ? (['ipc'] as const) : [])],
    });
    this.#child = child;
    const ended = once(child, 'exit');
    const ready = new Promise<void>((resolve) => {
      child.stdout!.on('data', (chunk: Buffer) => {
        this.stdout += chunk.toString();
        if (this.stdout.includes('is ready at')) resolve();
      });
    });
    child.stderr!.on('data', (chunk: Buffer) => (this.stderr += chunk.toString()));
    await Promise.race([ready, ended]);
  }

  /** Sends a signal and waits for the end; the exit code, null when killed. */
  async end(signal: NodeJS.Signals): Promise<number | null> {
    const child = this.#child;
    if (child === null) return null;
    if (child.exitCode === null && child.signalCode === null) {
      const ended = once(child, 'exit');
      child.kill(signal);
      await ended;
    }
    return child.exitCode;
  }

  /** Makes the first administrator; the client is signed in. */
  async setUp(): Promise<TestClient> {
    const code = /this once: ([0-9A-F-]+)/.exec(this.stdout)?.[1] ?? '';
    const client = await this.visit();
    const reply = await client.post('/api/setup', {
      code,
      workspace: 'Test Works',
      ...ADMINISTRATOR,
    });
    if (reply.status !== 200) throw new Error(`set-up answered ${reply.status}: ${reply.text}`);
    return client;
  }

  /** Asks the running process, which was started with its gauge. */
  async gauge(message: 'reset' | 'read'): Promise<Figures> {
    const child = this.#child!;
    const answered = once(child, 'message');
    child.send(message);
    const [figures] = (await answered) as [Figures];
    return figures;
  }

  /** The administrator's sign-in from a browser that has visited; whatever the answer. */
  signInBy(client: TestClient, headers: Record<string, string> = {}): Promise<Reply> {
    const { email, password } = ADMINISTRATOR;
    return client.post('/api/session', { email, password }, headers);
  }

  async signIn(): Promise<TestClient> {
    const client = await this.visit();
    const reply = await this.signInBy(client);
    if (reply.status !== 200) throw new Error(`sign-in answered ${reply.status}: ${reply.text}`);
    return client;
  }

  async visit(): Promise<TestClient> {
    const client = new TestClient(this.url);
    await client.get('/api/session');
    return client;
  }

  async remove(): Promise<void> {
    await this.end('SIGKILL');
    rmSync(this.folder, { recursive: true, force: true });
  }
}

const ADMINISTRATOR = {
  ...{ name: 'Ada Admin', email: 'ada.admin@works.example', password: 'plain-otter-walks-north' },
};

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, '127.0.0.1');
  await once(probe, 'listening');
  const { port } = probe.address() as { port: number };
  probe.close();
  await once(probe, 'close');
  return port;
}
