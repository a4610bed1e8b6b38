import { existsSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { bundleServer, ServerProcess } from './server-process.ts';

describe('start', () => {
  let bundle: string;
  let server: ServerProcess;
  let second: ServerProcess;
  beforeEach(async () => {
    bundle = bundleServer();
    server = await ServerProcess.create(bundle);
    second = await ServerProcess.create(bundle);
    await server.start();
  });
  afterEach(async () => {
    await server.remove();
    await second.remove();
  });

  it('S-51: makes a private data folder and a secret of 32 bytes, once', async () => {
    const mode = (file: string): number => statSync(file).mode & 0o777;
    const secret = path.join(server.dataFolder, 'secret');
    expect([mode(server.dataFolder), mode(secret)]).toEqual([0o700, 0o600]);
    const text = readFileSync(secret, 'utf8');
    expect(Buffer.from(text, 'hex')).toHaveLength(32);
    await server.end('SIGTERM');
    await server.start();
    expect(readFileSync(secret, 'utf8')).toBe(text);
    expect(server.stdout + server.stderr).not.toContain(text);
  });

  it('R-07: refuses a data folder in use, in one line, and leaves everything as it is', async () => {
    await second.start({ SINKWELL_DATA: server.dataFolder });
    expect(await second.end('SIGTERM')).toBe(1);
    expect(second.stderr).toBe(`SINKWELL_DATA: ${server.dataFolder} is in use by another server\n`);
    expect((await server.visit()).cookies.has('XSRF-TOKEN')).toBe(true);
  });

  it('refuses a port in use, in one line, and makes no folder', async () => {
    await second.start({ SINKWELL_PORT: String(server.port) });
    expect(await second.end('SIGTERM')).toBe(1);
    expect(second.stderr).toBe(`SINKWELL_PORT: port ${server.port} on 127.0.0.1 is taken\n`);
    expect(existsSync(second.dataFolder)).toBe(false);
  });

  it('S-51: refuses a secret file that holds none', async () => {
    await server.end('SIGTERM');
    writeFileSync(path.join(server.dataFolder, 'secret'), 'short');
    await server.start();
    expect(await server.end('SIGTERM')).toBe(1);
    expect(server.stderr).toContain('SINKWELL_DATA: ');
  });

  it('takes over the folder of a server that was killed', async () => {
    await server.end('SIGKILL');
    await second.start({ SINKWELL_DATA: server.dataFolder });
    expect(second.stdout).toContain('is ready at');
  });

  it('S-05: warns of hashes cheaper than shipped, and of nothing else', async () => {
    const lines = () => server.stderr.trim().split('\n');
    expect(lines()).toHaveLength(1);
    expect(JSON.parse(lines()[0]!)).toMatchObject({ level: 40, event: 'cheap-hashes', cost: 4 });
    await server.end('SIGTERM');
    await server.start({ SINKWELL_SCRYPT_COST: '' });
    expect(server.stderr).toBe('');
  });

  it('S-47: answers and limits callers by IPv6 without a word of complaint from its libraries', async () => {
    await server.end('SIGTERM');
    await server.start({ SINKWELL_HOST: '::1', NODE_ENV: 'production', SINKWELL_SCRYPT_COST: '' });
    const reply = await fetch(`http://[::1]:${server.port}/api/session`);
    expect([reply.status, reply.headers.get('ratelimit')]).toEqual([
      200,
      expect.stringMatching(/r=/),
    ]);
    expect(server.stderr).toBe('');
  });

  it('S-09: prints a set-up code as long as nobody has an account, another one each time', async () => {
    const code = /this once: ([0-9A-F-]{35})/.exec(server.stdout)?.[1];
    expect(code).toBeDefined();
    await server.end('SIGTERM');
    await server.start();
    expect(server.stdout).not.toContain(code);
    await server.setUp();
    await server.end('SIGTERM');
    await server.start();
    expect(server.stdout).not.toContain('Set-up code');
  });
});
