import { StartRefusal } from '../start-refusal.ts';

/** How often one may ask. Suites put smaller or larger figures in. */
export interface Limits {
  /** Requests a minute to the API: by person, or by address when signed out. */
  readonly apiPerMinute: number;
  /** Wrong passwords for one account from one address before waits begin. */
  readonly signInFailures: number;
  /** Wrong passwords from one address, whatever the account. */
  readonly signInFailuresPerAddress: number;
  /** Over how long wrong passwords count, s. */
  readonly signInWindowSec: number;
  /** First wait after too many wrong passwords, s; doubles with each further one up to the window. */
  readonly signInFirstWaitSec: number;
  /** Wrong passwords in a row, from anywhere, after which only a password reset helps (NIST SP 800-63B-4: at most 100). */
  readonly signInFailuresInARow: number;
  /** Mails with links (reset, e-mail change) one address may ask for in an hour. */
  readonly linkMailsPerHour: number;
}

export const SHIPPED_LIMITS: Limits = {
  apiPerMinute: 300,
  signInFailures: 5,
  signInFailuresPerAddress: 50,
  signInWindowSec: 15 * 60,
  signInFirstWaitSec: 30,
  signInFailuresInARow: 100,
  linkMailsPerHour: 10,
};

/**
 * @param perMinute requests to the API for one person; undefined: as shipped
 * @throws {StartRefusal} if it is no number of 10 or more
 */
export function readLimits(perMinute: string | undefined): Limits {
  if (perMinute === undefined || perMinute === '') return SHIPPED_LIMITS;
  const apiPerMinute = /^\d{2,6}$/.test(perMinute) ? Number(perMinute) : NaN;
  if (apiPerMinute >= 10) return { ...SHIPPED_LIMITS, apiPerMinute };
  throw new StartRefusal('SINKWELL_REQUESTS_PER_MINUTE: expected a number from 10 to 999999');
}
