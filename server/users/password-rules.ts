import { ApiError } from '../http/api-error.ts';
import { commonPasswords } from './common-passwords.ts';

/** NIST SP 800-63B-4, 3.1.1.2: at least 15 where the password is the only factor. */
const SHORTEST = 15;
const LONGEST = 128;
/** What has to be left when names that others know are taken out. */
const LEAST_OWN = 8;
const LEAST_DIFFERENT = 6;
const PRODUCT_WORDS = ['sinkwell', 'transistor', 'saturation', 'stage', 'password'];
const KEYBOARD_ROWS = [
  ...['qwertyuiop', 'asdfghjkl', 'zxcvbnm', 'qwertzuiop', 'yxcvbnm', 'azertyuiop', 'qsdfghjklm'],
  ...['1234567890', '0123456789', 'abcdefghijklmnopqrstuvwxyz', '1qaz2wsx3edc4rfv5tgb6yhn7ujm'],
  ...['qazwsxedcrfvtgbyhnujmikolp', '1q2w3e4r5t6y7u8i9o0p', 'zaq12wsxcde34rfvbgt56yhn'],
];
const LONGEST_RUN = 5;

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
  const text = password.normalize('NFKC');
  const length = Array.from(text).length;
  if (length < SHORTEST) return `needs at least ${SHORTEST} characters`;
  if (length > LONGEST) return `has more than ${LONGEST} characters`;
  const lower = text.toLowerCase();
  if (isCommon(lower)) return 'is one of those everybody tries first';
  if (new Set(lower).size < LEAST_DIFFERENT || repeatsItself(lower)) return 'repeats itself';
  const own = without(lower, [...PRODUCT_WORDS, ...ownWords.flatMap(wordsOf)]);
  if (own.length < LEAST_OWN) return 'is little more than names that others know';
  if (withoutRuns(own).length < LEAST_OWN) return 'follows the keyboard or the alphabet';
  return null;
}

function isCommon(lower: string): boolean {
  const plain = lower.replace(/[\s._-]/g, '');
  const spelled = plain.replace(/[@4]/g, 'a').replace(/[$5]/g, 's').replaceAll('0', 'o');
  const letters = spelled.replaceAll('3', 'e').replaceAll('1', 'i').replaceAll('7', 't');
  const list = commonPasswords();
  return [lower, plain, spelled, letters, plain.replace(/[\d!?.*#]{1,8}$/, '')].some((entry) =>
    list.has(entry),
  );
}

/** Whether it is one short piece over and over. */
function repeatsItself(lower: string): boolean {
  const inside = (lower + lower).indexOf(lower, 1);
  return inside <= lower.length / 2 && inside < lower.length;
}

function wordsOf(text: string): string[] {
  const lower = text.normalize('NFKC').toLowerCase();
  return [lower, ...lower.split(/[^\p{L}\p{N}]+/u)].filter((word) => word.length >= 3);
}

function without(lower: string, words: readonly string[]): string {
  const longestFirst = [...words].sort((a, b) => b.length - a.length);
  return longestFirst
    .reduce((left, word) => left.replaceAll(word, ''), lower)
    .replace(/[\s\p{P}]/gu, '');
}

/** Takes out every piece of six and more characters that lies in a row of keys or the alphabet, either way round. */
function withoutRuns(text: string): string {
  const rows = [
    ...KEYBOARD_ROWS,
    ...KEYBOARD_ROWS.map((row) => Array.from(row).reverse().join('')),
  ];
  let left = text;
  for (let start = 0; start + LONGEST_RUN < left.length;) {
    let end = start;
    while (end < left.length && rows.some((row) => row.includes(left.slice(start, end + 1)))) end++;
    if (end - start > LONGEST_RUN) left = left.slice(0, start) + left.slice(end);
    else start += 1;
  }
  return left;
}
