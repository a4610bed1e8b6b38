import { ApiError } from '../http/api-error.ts';

/** NIST SP 800-63B-4, 3.1.1.2: at least 15 where the password is the only factor. */
const SHORTEST = 15;
const LONGEST = 128;

/**
 * Refuses a password that is too short, too long or easily guessed; no rule on kinds of characters.
 *
 * @param ownWords what the person is called and works with: name, address, workspace, project codes
 * @param pointer the field at fault
 * @throws {ApiError} invalid-input
 */
export function requireGoodPassword(
  password: string,
  ownWords: readonly string[],
  pointer: string,
): void {
  const message = passwordFault(password, ownWords);
  if (message === null) return;
  throw new ApiError('invalid-input', `The password ${message}.`, {
    fields: [{ pointer, message }],
  });
}

/** What is wrong with a password, as the end of a sentence; null when nothing is. */
export function passwordFault(password: string, ownWords: readonly string[]): string | null {
  const length = Array.from(password.normalize('NFKC')).length;
  if (length < SHORTEST) return `needs at least ${SHORTEST} characters`;
  if (length > LONGEST) return `has more than ${LONGEST} characters`;
  const lower = password.normalize('NFKC').toLowerCase();
  const own = ownWords.find((word) => word.length >= 4 && lower.includes(word.toLowerCase()));
  return own === undefined ? null : 'contains a name that others know';
}
