import { describe, expect, it } from 'vitest';
import { readConfig } from '../../server/config.ts';
import { SHIPPED_LIMITS } from '../../server/http/limits.ts';
import { ABSOLUTE_MS, IDLE_MS } from '../../server/session/session-store.ts';
import { SHIPPED_SCRYPT } from '../../server/session/scrypt-cost.ts';

const read = (env: Record<string, string> = {}) => readConfig(env, '/web');
const SECRET = 'kT9v#pQ2mX7rL4wZ8nB5cJ1hF6yD3gS0';

describe('configuration', () => {
  it('ships with these values', () => {
    const { now, limits, scrypt, ...rest } = read();
    expect(rest).toEqual({
      ...{ dataFolder: './data', host: '127.0.0.1', port: 3000, origin: 'http://127.0.0.1:3000' },
      ...{ secure: false, secrets: [], demo: true, trustProxy: false, smtpUrl: null },
      ...{ mailFrom: 'sinkwell@127.0.0.1', logLevel: 'info', webFolder: '/web' },
    });
    expect(now).toBe(Date.now);
    expect(scrypt).toBe(SHIPPED_SCRYPT);
    expect(limits).toEqual({
      ...{ apiPerMinute: 300, signInFailures: 5, signInFailuresPerAddress: 50 },
      ...{ signInWindowSec: 900, signInFirstWaitSec: 30, signInFailuresInARow: 100 },
      linkMailsPerHour: 10,
    });
    expect(limits).toBe(SHIPPED_LIMITS);
    expect([IDLE_MS, ABSOLUTE_MS]).toEqual([1_800_000, 43_200_000]);
  });

  it.each([
    [{ SINKWELL_PORT: '99999' }, 'SINKWELL_PORT'],
    [{ SINKWELL_PORT: 'http' }, 'SINKWELL_PORT'],
    [{ SINKWELL_URL: 'sinkwell.example' }, 'SINKWELL_URL'],
    [{ SINKWELL_URL: 'https://sinkwell.example/path' }, 'SINKWELL_URL'],
    [{ SINKWELL_URL: 'http://sinkwell.example' }, 'SINKWELL_URL'],
    [{ SINKWELL_HOST: '0.0.0.0' }, 'SINKWELL_HOST'],
    [{ SINKWELL_HOST: '192.0.2.1', SINKWELL_URL: 'http://127.0.0.1:3000' }, 'SINKWELL_HOST'],
    [{ SINKWELL_DEMO: 'yes' }, 'SINKWELL_DEMO'],
    [
      { SINKWELL_DEMO: '1', SINKWELL_HOST: '0.0.0.0', SINKWELL_URL: 'https://s.example' },
      'SINKWELL_DEMO',
    ],
    [{ SINKWELL_SECRET: 'short' }, 'SINKWELL_SECRET'],
    [{ SINKWELL_SECRET: 'x'.repeat(40) }, 'SINKWELL_SECRET'],
    [{ SINKWELL_SECRET: 'change-me-change-me-change-me-now' }, 'SINKWELL_SECRET'],
    [{ SINKWELL_SECRET: `${SECRET},short` }, 'SINKWELL_SECRET'],
    [{ SINKWELL_TRUST_PROXY: 'true' }, 'SINKWELL_TRUST_PROXY'],
    [{ SINKWELL_TRUST_PROXY: '99' }, 'SINKWELL_TRUST_PROXY'],
    [{ SINKWELL_SMTP_URL: 'mail.example' }, 'SINKWELL_SMTP_URL'],
    [{ SINKWELL_LOG_LEVEL: 'loud' }, 'SINKWELL_LOG_LEVEL'],
    [{ SINKWELL_SCRYPT_COST: '3' }, 'SINKWELL_SCRYPT_COST'],
    [{ SINKWELL_SCRYPT_COST: '16', SINKWELL_URL: 'https://s.example' }, 'SINKWELL_SCRYPT_COST'],
    [{ SINKWELL_REQUESTS_PER_MINUTE: '1' }, 'SINKWELL_REQUESTS_PER_MINUTE'],
  ])('S-51: refuses %j in one line that names the variable', (env, name) => {
    expect(() => read(env as Record<string, string>)).toThrow(new RegExp(`^${name}: [^\n]+$`));
  });

  it('S-11: an https address makes cookies secure, wherever the server listens', () => {
    const config = read({
      SINKWELL_URL: 'https://sinkwell.firm.example',
      SINKWELL_HOST: '0.0.0.0',
    });
    expect(config).toMatchObject({
      secure: true,
      demo: false,
      origin: 'https://sinkwell.firm.example',
    });
  });

  it('S-51: takes several secrets, newest first, for rotation', () => {
    expect(read({ SINKWELL_SECRET: `${SECRET}, old${SECRET}` }).secrets).toEqual([
      SECRET,
      `old${SECRET}`,
    ]);
  });

  it.each([
    ['1', 1],
    ['loopback', ['loopback']],
    ['10.0.0.0/8, fd00::/8', ['10.0.0.0/8', 'fd00::/8']],
    ['0', false],
  ])('S-47: takes %j as declared proxies', (text, expected) => {
    expect(read({ SINKWELL_TRUST_PROXY: text }).trustProxy).toEqual(expected);
  });

  it('S-05: takes cheaper hashes on loopback, dearer ones anywhere', () => {
    expect(read({ SINKWELL_SCRYPT_COST: '16' }).scrypt.logN).toBe(16);
    const dear = { SINKWELL_SCRYPT_COST: '18', SINKWELL_URL: 'https://sinkwell.firm.example' };
    expect(read(dear).scrypt.logN).toBe(18);
  });

  it('takes a demo only on plain loopback unless told otherwise', () => {
    expect(read({ SINKWELL_DEMO: '0' }).demo).toBe(false);
    expect(read({ SINKWELL_DEMO: '1' }).demo).toBe(true);
  });
});
