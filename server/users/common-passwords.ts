/**
 * Words that lists of leaked passwords are full of, put together from general knowledge rather than copied from
 * one list; at 15 characters and more such passwords are joins and repeats of them.
 */
const WORDS = (
  'password passw0rd admin administrator root user guest login welcome letmein qwerty qwertz azerty abc123 ' +
  'iloveyou monkey dragon football baseball basketball soccer hockey superman batman spiderman pokemon naruto ' +
  'starwars princess sunshine shadow master killer hunter ranger jordan michael michelle jessica ashley daniel ' +
  'andrew joshua matthew thomas robert charlie george maggie ginger pepper cookie banana orange cheese chocolate ' +
  'butterfly flower summer winter spring autumn january february december monday friday secret freedom computer ' +
  'internet google facebook windows samsung apple whatever nothing forever trustno1 access mustang ferrari porsche ' +
  'mercedes yankees liverpool arsenal chelsea barcelona america london paris blessed jesus angel heaven lovely ' +
  'sweetheart babygirl family friends hello goodbye changeme default company office work test testing 12345 123456 ' +
  '1234567 12345678 123456789 1234567890 111111 000000 654321 qwe123 1q2w3e 1qaz2wsx zaq12wsx asdfgh zxcvbn'
).split(' ');

const JOINS = ['', '1', '123'];
const PHRASES = [
  'correcthorsebatterystaple',
  'tobeornottobe',
  'maytheforcebewithyou',
  'thequickbrownfox',
];

let list: ReadonlySet<string> | undefined;

/** Tens of thousands of common passwords, lower case, made on first use. */
export function commonPasswords(): ReadonlySet<string> {
  list ??= new Set([...PHRASES, ...pairs(), ...repeats()]);
  return list;
}

function pairs(): string[] {
  return WORDS.flatMap((first) =>
    WORDS.flatMap((second) => JOINS.map((join) => `${first}${second}${join}`)),
  );
}

function repeats(): string[] {
  return WORDS.flatMap((word) => [2, 3, 4, 5].map((times) => word.repeat(times)));
}
