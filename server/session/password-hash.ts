import { randomBytes, scrypt, timingSafeEqual } from 'node:crypto';
import { HashQueue } from './hash-queue.ts';
import type { ScryptCost } from './scrypt-cost.ts';

const SALT_BYTES = 16;
const KEY_BYTES = 32;

/** Hashes and verifies passwords: `scrypt$logN$r$p$salt$key`, base64url, after NFKC, without truncation. */
export class PasswordHash {
  readonly #queue = new HashQueue();
  readonly #nobody: Promise<string>;

  constructor(private readonly cost: ScryptCost) {
    this.#nobody = this.hash(randomBytes(SALT_BYTES).toString('hex'));
    this.#nobody.catch(() => undefined); // whoever awaits it sees the error
  }

  async hash(password: string): Promise<string> {
    const salt = randomBytes(SALT_BYTES);
    const key = await this.#derive(password, salt, this.cost);
    const { logN, blockSize, parallel } = this.cost;
    const fields = [
      logN,
      blockSize,
      parallel,
      salt.toString('base64url'),
      key.toString('base64url'),
    ];
    return `scrypt$${fields.join('$')}`;
  }

  /**
   * Whether the password belongs to the stored hash. Takes as long without one, so that nobody learns from the
   * clock whether an account exists.
   */
  async verify(password: string, stored: string | null): Promise<boolean> {
    const { cost, salt, key } = parse(stored ?? (await this.#nobody));
    const given = await this.#derive(password, salt, cost);
    return timingSafeEqual(given, key) && stored !== null;
  }

  /** Whether a stored hash was made at another cost than today's and should be made again. */
  isOutdated(stored: string): boolean {
    const { cost } = parse(stored);
    const { logN, blockSize, parallel } = this.cost;
    return cost.logN !== logN || cost.blockSize !== blockSize || cost.parallel !== parallel;
  }

  #derive(password: string, salt: Buffer, cost: ScryptCost): Promise<Buffer> {
    const { logN, blockSize: r, parallel: p } = cost;
    const options = { N: 2 ** logN, r, p, maxmem: 160 * 2 ** logN * r + 2 ** 20 };
    return this.#queue.run(
      () =>
        new Promise((resolve, reject) => {
          scrypt(password.normalize('NFKC'), salt, KEY_BYTES, options, (error, key) => {
            if (error) reject(error);
            else resolve(key);
          });
        }),
    );
  }
}

function parse(stored: string): { cost: ScryptCost; salt: Buffer; key: Buffer } {
  const [scheme, logN, blockSize, parallel, salt, key] = stored.split('$');
  if (scheme !== 'scrypt' || !salt || !key) throw new Error('stored password hash is not readable');
  return {
    cost: { logN: Number(logN), blockSize: Number(blockSize), parallel: Number(parallel) },
    salt: Buffer.from(salt, 'base64url'),
    key: Buffer.from(key, 'base64url'),
  };
}
