import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import { Server as NetServer } from 'node:net';
import type { Logger } from 'pino';
import { createApp } from './app.ts';
import type { Config } from './config.ts';
import { Database } from './persistence/database.ts';
import { DataFolder } from './persistence/data-folder.ts';
import { prepareDatabase } from './seed/prepare-database.ts';
import { isCheap } from './session/scrypt-cost.ts';
import { createServices, type Services } from './services.ts';
import { StartRefusal } from './start-refusal.ts';

const SWEEP_EVERY_MS = 10 * 60_000;
/** Idle connections get this long to send one more request and learn that the server goes. */
const IDLE_GRACE_MS = 2000;
const LONGEST_DRAIN_MS = 10_000;

/** A listening server with everything behind it, and the orderly way to stop. */
export class RunningServer {
  #stopping: Promise<void> | null = null;

  private constructor(
    private readonly http: Server,
    private readonly folder: DataFolder,
    private readonly services: Services,
    private readonly timers: readonly NodeJS.Timeout[],
    private readonly logger: Logger,
  ) {}

  /**
   * Takes the port, then the data folder, and only then touches anything.
   *
   * @param tell prints a line for the person who started the server
   * @throws {StartRefusal}
   */
  static async start(
    config: Config,
    logger: Logger,
    tell: (line: string) => void,
  ): Promise<RunningServer> {
    const http = createServer({ maxHeaderSize: 16_384 });
    Object.assign(http, { headersTimeout: 10_000, requestTimeout: 30_000 });
    Object.assign(http, { keepAliveTimeout: 5000, maxHeadersCount: 100 });
    http.on('request', notYet);
    await listen(http, config);
    try {
      const folder = new DataFolder(config.dataFolder);
      const secrets = config.secrets.length > 0 ? config.secrets : [folder.secret()];
      const database = await Database.open(folder.databaseFile);
      const services = createServices(config, database, folder.mailbox, logger);
      const { express } = createApp(services, secrets, logger);
      if (isCheap(config.scrypt)) {
        const cost = config.scrypt.logN;
        logger.warn(
          { event: 'cheap-hashes', cost },
          'SINKWELL_SCRYPT_COST makes passwords cheap to guess',
        );
      }
      await prepareDatabase(services, tell);
      const timers = [setInterval(() => void services.sessions.sweep(), SWEEP_EVERY_MS)];
      const running = new RunningServer(http, folder, services, timers, logger);
      http.removeListener('request', notYet);
      http.on('request', (request, response) => {
        if (running.#stopping) response.setHeader('Connection', 'close');
        express(request, response);
      });
      services.outbox.start();
      await running.#greet(tell);
      return running;
    } catch (error) {
      http.close();
      http.closeAllConnections();
      throw error;
    }
  }

  /** Not ready at once, no new connections, running requests end, the queue runs dry, the database closes. */
  stop(): Promise<void> {
    this.#stopping ??= this.#stop();
    return this.#stopping;
  }

  async #stop(): Promise<void> {
    this.logger.info({ event: 'stopping' }, 'stopping');
    this.services.health.stopping = true;
    this.timers.forEach(clearInterval);
    await this.#drain();
    await this.services.outbox.stop();
    await this.services.database.close();
    this.folder.release();
    this.logger.info({ event: 'stopped' }, 'stopped');
  }

  /** net's close, not http's: that one would cut idle connections a client may be about to use. */
  async #drain(): Promise<void> {
    const startedAtMs = performance.now();
    const closed = new Promise<void>((resolve) => {
      NetServer.prototype.close.call(this.http, () => {
        resolve();
      });
    });
    const rest = setTimeout(() => {
      this.http.closeAllConnections();
    }, LONGEST_DRAIN_MS);
    const sweep = setInterval(() => {
      if (performance.now() - startedAtMs > IDLE_GRACE_MS) this.http.closeIdleConnections();
    }, 100);
    await closed;
    clearTimeout(rest);
    clearInterval(sweep);
  }

  async #greet(tell: (line: string) => void): Promise<void> {
    const { config, setup } = this.services;
    if (await setup.isNeeded()) {
      tell(`Nobody has an account yet. Set-up code, shown this once: ${setup.issueCode()}`);
    }
    tell(`Sinkwell is ready at ${config.origin}`);
  }
}

function notYet(_request: IncomingMessage, response: ServerResponse): void {
  response.writeHead(503, { 'Retry-After': '1', 'Content-Type': 'text/plain' }).end('starting\n');
}

function listen(http: Server, config: Config): Promise<void> {
  return new Promise((resolve, reject) => {
    http.once('error', (error: NodeJS.ErrnoException) => {
      reject(portRefusal(error, config));
    });
    http.listen(config.port, config.host.replace(/^\[|\]$/g, ''), resolve);
  });
}

function portRefusal(error: NodeJS.ErrnoException, { host, port }: Config): StartRefusal {
  if (error.code === 'EADDRINUSE') {
    return new StartRefusal(`SINKWELL_PORT: port ${port} on ${host} is taken`);
  }
  return new StartRefusal(`SINKWELL_HOST: cannot listen on ${host}:${port} (${error.code ?? ''})`);
}
