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
 * Cheaper hashes are for suites that sign in often; the server says so in its log.
 *
 * @param text exponent of N, 4 … 20; undefined: the shipped cost
 * @throws {StartRefusal} if it is no such number
 */
export function readScryptCost(text: string | undefined): ScryptCost {
  if (text === undefined || text === '') return SHIPPED_SCRYPT;
  const logN = /^\d{1,2}$/.test(text) ? Number(text) : NaN;
  if (logN >= 4 && logN <= 20) return { ...SHIPPED_SCRYPT, logN };
  throw new StartRefusal('SINKWELL_SCRYPT_COST: expected the exponent of N, 4 to 20');
}
