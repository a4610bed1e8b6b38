import { StartRefusal } from '../start-refusal.ts';

/** Cost of one password hash: memory is 128 · 2^logN · blockSize bytes. */
export interface ScryptCost {
  readonly logN: number;
  readonly blockSize: number;
  readonly parallel: number;
}

/** OWASP Password Storage Cheat Sheet, scrypt: N = 2^17, r = 8, p = 1. */
export const SHIPPED_SCRYPT: ScryptCost = { logN: 17, blockSize: 8, parallel: 1 };

/**
 * Cheaper hashes are for suites that sign in often, on one machine; the server warns of them in its log.
 *
 * @param text exponent of N, 4 … 20; undefined: the shipped cost
 * @param secure whether people reach the server by https, from anywhere
 * @throws {StartRefusal} if it is no such number, or a cheaper one for a server that is in use
 */
export function readScryptCost(text: string | undefined, secure: boolean): ScryptCost {
  if (text === undefined || text === '') return SHIPPED_SCRYPT;
  const logN = /^\d{1,2}$/.test(text) ? Number(text) : NaN;
  if (!(logN >= 4 && logN <= 20)) {
    throw new StartRefusal('SINKWELL_SCRYPT_COST: expected the exponent of N, 4 to 20');
  }
  const cost = { ...SHIPPED_SCRYPT, logN };
  if (secure && isCheap(cost)) {
    throw new StartRefusal(
      `SINKWELL_SCRYPT_COST: below ${SHIPPED_SCRYPT.logN} passwords are guessed too fast; only a server on loopback may have it`,
    );
  }
  return cost;
}

/** Whether a hash costs less than the shipped one. */
export function isCheap({ logN }: ScryptCost): boolean {
  return logN < SHIPPED_SCRYPT.logN;
}
