import { randomUUID } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type Server } from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { RequestHandler, Router } from 'express';
import { type Config, readConfig } from '../../server/config.ts';
import { createApp } from '../../server/app.ts';
import type { Endpoint } from '../../server/http/endpoint.ts';
import { endpointOf } from '../../server/http/mount.ts';
import { createLogger } from '../../server/http/request-log.ts';
import { Database } from '../../server/persistence/database.ts';
import { createServices, type Services } from '../../server/services.ts';
import { PersonEntity } from '../../server/users/person-entity.ts';
import { WorkspaceEntity } from '../../server/users/workspace-entity.ts';
import { TestClient } from './test-client.ts';

/** Good under the rules of password-rules.ts; every test person has it. */
export const PASSWORD = 'plain-otter-walks-north';
const START_MS = Date.UTC(2026, 0, 12, 8, 0, 0);

export interface TestPerson {
  readonly id: string;
  readonly name: string;
  readonly email: string;
}

/** What lies in a router; `route` is missing for anything but a route. */
export interface Layer {
  readonly route?: { readonly path: string; readonly stack: { handle: RequestHandler }[] };
}

/** The declarations behind all routes of a router. */
export function endpointsOf(router: Router): Endpoint[] {
  const handlers = (router.stack as Layer[]).flatMap(({ route }) => route?.stack ?? []);
  return handlers.flatMap(({ handle }) => endpointOf(handle) ?? []);
}

/** A whole server on a free port of loopback, over a database file in a temp folder of its own. */
export class TestServer {
  /** Of every test person. */
  readonly password = PASSWORD;
  #clockMs = START_MS;

  private constructor(
    readonly folder: string,
    readonly config: Config,
    readonly database: Database,
    readonly services: Services,
    readonly router: Router,
    private readonly server: Server,
    readonly url: string,
  ) {}

  static async start(changes: Partial<Config> = {}): Promise<TestServer> {
    const folder = await mkdtemp(path.join(tmpdir(), 'sinkwell-'));
    const clock = { read: () => START_MS };
    const config: Config = {
      ...readConfig({ SINKWELL_DATA: folder, SINKWELL_DEMO: '0' }, path.join(folder, 'web')),
      scrypt: { logN: 4, blockSize: 8, parallel: 1 },
      now: () => clock.read(),
      ...changes,
    };
    const database = await Database.open(path.join(folder, 'sinkwell.sqlite'));
    const lines: string[] = [];
    const logger = createLogger('info', { write: (line: string) => lines.push(line) });
    const services = createServices(config, database, path.join(folder, 'mailbox'), logger);
    const { express, router } = createApp(services, ['test-'.repeat(8)], logger);
    const server = createServer(express);
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const { port } = server.address() as { port: number };
    const url = `http://127.0.0.1:${port}`;
    const made = new TestServer(folder, config, database, services, router, server, url);
    clock.read = () => made.#clockMs;
    made.#log = lines;
    return made;
  }

  #log: string[] = [];

  /** What the server logged so far, one JSON text a line. */
  get log(): readonly string[] {
    return this.#log;
  }

  get nowMs(): number {
    return this.#clockMs;
  }

  /** Lets time pass for the server's clock. */
  pass(ms: number): void {
    this.#clockMs += ms;
  }

  /** Names the workspace and adds a first administrator, as set-up would. */
  async setUp(): Promise<TestPerson> {
    await this.database.transaction((m) =>
      m.insert(WorkspaceEntity, { id: 1, name: 'Test Works' }),
    );
    return this.addPerson('Ada Admin', { administrator: true });
  }

  /** An active account with {@link PASSWORD}. */
  async addPerson(name: string, changes: Partial<PersonEntity> = {}): Promise<TestPerson> {
    const email = `${name.toLowerCase().replaceAll(' ', '.')}@works.example`;
    const passwordHash = await this.services.hashes.hash(PASSWORD);
    const person = await this.database.transaction((manager) =>
      manager.save(
        manager.create(PersonEntity, {
          ...{ id: randomUUID(), name, email, administrator: false, state: 'active', passwordHash },
          ...{ passwordVersion: 1, failedSignIns: 0, createdAtMs: this.nowMs },
          ...{ lastSignInAtMs: null, ...changes },
        }),
      ),
    );
    return { id: person.id, name: person.name, email: person.email };
  }

  /** A client without any cookie. */
  stranger(): TestClient {
    return new TestClient(this.url);
  }

  /** The mails kept so far, once everything queued has been tried; newest first. */
  async mails(): Promise<{ to: string; subject: string; text: string }[]> {
    this.services.outbox.wake();
    await this.services.outbox.settled();
    return (await this.services.mailbox?.list()) ?? [];
  }

  /** Has a link mailed and takes the token out of the newest mail to the person. */
  async tokenFor(
    person: { readonly email: string },
    ask: (client: TestClient) => Promise<void>,
  ): Promise<string> {
    await ask(await this.visit());
    const mail = (await this.mails()).find(({ to }) => to.includes(`<${person.email}>`));
    return /#([\w-]{43})/.exec(mail?.text ?? '')?.[1] ?? '';
  }

  /** A browser of its own, signed out, with its XSRF token. */
  async visit(): Promise<TestClient> {
    const client = new TestClient(this.url);
    await client.get('/api/session');
    return client;
  }

  /** A browser of its own, signed in. */
  async signIn(person: { readonly email: string }, password = PASSWORD): Promise<TestClient> {
    const client = await this.visit();
    const reply = await client.post('/api/session', { email: person.email, password });
    if (reply.status !== 200) throw new Error(`sign-in answered ${reply.status}: ${reply.text}`);
    return client;
  }

  async stop(): Promise<void> {
    await this.services.outbox.stop();
    this.server.closeAllConnections();
    await new Promise((resolve) => this.server.close(resolve));
    await this.database.close();
    await rm(this.folder, { recursive: true, force: true });
  }
}
