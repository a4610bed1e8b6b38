import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { PASSWORD, TestServer } from '../test-server.ts';

const PAGE = '<!doctype html><app-root ngCspNonce="%CSP_NONCE%"></app-root>';

describe('browser defences', () => {
  let server: TestServer;
  let webFolder: string;
  beforeAll(async () => {
    webFolder = mkdtempSync(path.join(tmpdir(), 'sinkwell-web-'));
    mkdirSync(path.join(webFolder, '.git'));
    writeFileSync(path.join(webFolder, 'index.html'), PAGE);
    writeFileSync(path.join(webFolder, 'main-ABCDEFGH.js'), 'export {};');
    writeFileSync(path.join(webFolder, 'main-ABCDEFGH.js.map'), '{}');
    writeFileSync(path.join(webFolder, 'stats.json'), '{}');
    writeFileSync(path.join(webFolder, '.git', 'HEAD'), 'ref');
    server = await TestServer.start({ webFolder });
    await server.setUp();
  });
  afterAll(async () => {
    await server.stop();
    rmSync(webFolder, { recursive: true });
  });

  it('S-27: sends the policy with a nonce of its own in each page', async () => {
    const client = await server.visit();
    const [first, second] = [await client.get('/projects'), await client.get('/')];
    const policy = first.headers.get('content-security-policy')!;
    const nonce = /'nonce-([\w+/=]{24})'/.exec(policy)![1]!;
    expect(first.text).toBe(PAGE.replace('%CSP_NONCE%', nonce));
    expect(second.text).not.toBe(first.text);
    expect(first.headers.get('cache-control')).toBe('no-store');
    expect(policy.replace(nonce, 'R').split(';')).toEqual([
      ...["default-src 'none'", "script-src 'self'", "style-src 'self' 'nonce-R'"],
      ...[
        "img-src 'self' data: blob:",
        "font-src 'self'",
        "connect-src 'self'",
        "worker-src 'self'",
      ],
      ...["manifest-src 'self'", "base-uri 'self'", "form-action 'self'", "object-src 'none'"],
      ...["frame-ancestors 'none'", "require-trusted-types-for 'script'"],
      ...['trusted-types angular angular#bundler dompurify', 'report-to csp'],
    ]);
  });

  it('S-28: sends the other headers and does not say what it is made of', async () => {
    const { headers } = await (await server.visit()).get('/');
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('referrer-policy')).toBe('no-referrer');
    expect(headers.get('cross-origin-opener-policy')).toBe('same-origin');
    expect(headers.get('cross-origin-resource-policy')).toBe('same-origin');
    expect(headers.get('permissions-policy')).toContain('camera=()');
    expect(headers.get('x-powered-by')).toBeNull();
    expect(headers.get('strict-transport-security')).toBeNull();
  });

  it('S-15: lets nobody keep an API answer, and clears the browser at sign-out', async () => {
    const client = await server.signIn(await server.addPerson('Dora Designer'));
    expect((await client.get('/api/session')).headers.get('cache-control')).toBe('no-store');
    expect((await client.get('/api/nothing')).headers.get('cache-control')).toBe('no-store');
    const out = await client.delete('/api/session');
    expect(out.headers.get('clear-site-data')).toBe('"cache", "storage"');
  });

  it('keeps hashed files for a year, and no source maps, reports, hidden files or lists', async () => {
    const client = await server.visit();
    const script = await client.get('/main-ABCDEFGH.js');
    expect(script.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    for (const hidden of [
      '/main-ABCDEFGH.js.map',
      '/stats.json',
      '/.git/HEAD',
      '/index.html',
      '/no.js',
    ]) {
      expect((await client.get(hidden)).status, hidden).toBe(404);
    }
    expect((await client.get('/.git/')).text).not.toContain('HEAD');
    expect((await client.get('/..%2f..%2fetc%2fpasswd')).text).not.toContain('root:');
  });

  it('S-25: answers no other origin, whatever it asks', async () => {
    const client = await server.visit();
    const asked = { Origin: 'https://evil.example', 'Access-Control-Request-Method': 'PUT' };
    for (const method of ['OPTIONS', 'GET']) {
      const { headers } = await client.send(method, '/api/session', undefined, asked);
      expect([...headers.keys()].filter((name) => name.startsWith('access-control'))).toEqual([]);
    }
  });

  it('S-51: does not answer TRACE', async () => {
    const net = await import('node:net');
    const { port } = new URL(server.url);
    const answer = await new Promise<string>((resolve) => {
      const socket = net.connect(Number(port), '127.0.0.1', () => {
        socket.write(
          'TRACE /api/session HTTP/1.1\r\nHost: x\r\nX-Echo: echo-me\r\nConnection: close\r\n\r\n',
        );
      });
      let text = '';
      socket.on('data', (chunk) => (text += chunk.toString()));
      socket.on('close', () => {
        resolve(text);
      });
    });
    expect(answer).toMatch(/^HTTP\/1\.1 40[0345]/);
    expect(answer).not.toContain('echo-me');
  });

  describe('S-24: forged requests', () => {
    const credentials = { email: 'ada.admin@works.example', password: PASSWORD };
    const wish = { email: 'ada.admin@works.example' };

    it.each([
      ['without the token', { 'X-XSRF-TOKEN': '' }],
      ['with a token of another session', { 'X-XSRF-TOKEN': 'f'.repeat(64) }],
      ['from another site', { 'Sec-Fetch-Site': 'cross-site' }],
      ['from a sister site', { 'Sec-Fetch-Site': 'same-site' }],
      ['from another origin', { Origin: 'https://evil.example' }],
      ['from an opaque origin', { Origin: 'null' }],
    ])('are refused %s, sign-in too', async (_, headers) => {
      const client = await server.visit();
      const signIn = await client.post('/api/session', credentials, headers);
      expect([signIn.status, signIn.body.code]).toEqual([403, 'request-forged']);
      expect((await client.post('/api/password-resets', wish, headers)).status).toBe(403);
      expect((await client.get('/api/session')).body.person).toBeNull();
    });

    it('are refused as a text/plain form', async () => {
      const client = await server.visit();
      const type = { 'Content-Type': 'text/plain', 'X-XSRF-TOKEN': '' };
      expect((await client.post('/api/session', credentials, type)).status).toBe(415);
    });

    it('do not include requests of the own origin by any name of this machine', async () => {
      const client = await server.visit();
      const { port } = new URL(server.url);
      for (const origin of [server.config.origin, `http://127.0.0.1:${port}`]) {
        const headers = { Origin: origin, 'Sec-Fetch-Site': 'same-origin' };
        expect((await client.post('/api/password-resets', wish, headers)).status).toBe(202);
      }
    });
  });

  it('S-11, S-28: over https sets __Host-sid, Secure, and HSTS', async () => {
    const secure = await TestServer.start({
      secure: true,
      origin: 'https://sinkwell.firm.example',
    });
    const client = await secure.visit();
    const reply = await client.get('/api/session', { 'X-Forwarded-Proto': 'https', Cookie: '' });
    const cookie = reply.headers.getSetCookie().find((line) => line.startsWith('__Host-sid='));
    expect(cookie).toMatch(/; Path=\/; HttpOnly; Secure; SameSite=Lax$/);
    expect(reply.headers.get('strict-transport-security')).toBe(
      'max-age=31536000; includeSubDomains',
    );
    await secure.stop();
  });

  it('S-30: redirects nowhere', async () => {
    const client = await server.visit();
    for (const path of ['//evil.example', '/\\evil.example', '/%2f%2fevil.example', '/assets']) {
      const reply = await client.send('GET', path);
      expect(reply.headers.get('location'), path).toBeNull();
    }
  });
});
