import fc from 'fast-check';
import type { Endpoint } from '../../../server/http/endpoint.ts';
import { leaves, replaced } from '../../document-places.ts';
import { bodyFor } from './route-examples.ts';
import { namesOf, valuesOf } from './schema-arbitrary.ts';

/** One request as drawn by chance, before the ids and versions of a running server are put in. */
export interface HostileRequest {
  /** Place of the route in the list of endpoints. */
  readonly endpoint: number;
  readonly caller: string;
  /** Raw text of each parameter of the path; null: the id of an object that exists. */
  readonly params: Readonly<Record<string, string | null>>;
  /** Raw, with the question mark. */
  readonly query: string;
  /** The If-Match header; `current` stands for the tag that was just read. */
  readonly tag: string;
  readonly headers: Readonly<Record<string, string>>;
  readonly body: Body;
}

type Body =
  | { readonly kind: 'none' }
  /** Bytes, one a character. */
  | { readonly kind: 'bytes'; readonly bytes: string }
  /** The route's example, or a document made from its schema, changed in some places. */
  | { readonly kind: 'document'; readonly start: unknown; readonly edits: readonly Edit[] };

interface Edit {
  /** Counted over the document's leaves, beginning again at its end. */
  readonly place: number;
  readonly act: 'replace' | 'remove' | 'add';
  /** JSON text, perhaps of what JSON.stringify never writes. */
  readonly json: string;
}

const EXAMPLE = 'example';

/** Texts that some layer beneath may take for something else, or not store as they are. */
const HOSTILE_TEXTS = [
  ...['', ' ', '\u0000', 'a\u0000b', '\ud800', '\udfffx', '\u202etxt.exe', '\ufeff', '\u{1f50c}'],
  ...['\r\nBcc: evil@works.example', '\u001b[31m', '\u2028', 'e\u0301'.repeat(50)],
  ...[`' OR 1=1 --`, `"; DROP TABLE person; --`, '%', '_', '\\', '*', '[a-', '(a+)+$', '$where'],
  ...['../../etc/passwd', '..\\', '<script>alert(1)</script>', '{{7*7}}', '${7*7}', '%s%n', '=1+1'],
  ...[
    'NaN',
    'Infinity',
    '-1',
    '1e999',
    '0x10',
    '1,5',
    'true',
    'null',
    'undefined',
    '[object Object]',
  ],
  ...[
    '__proto__',
    'constructor',
    'prototype',
    'toString',
    'hasOwnProperty',
    'length',
    '__defineGetter__',
  ],
  ...['00000000-0000-4000-8000-000000000000', 'x'.repeat(300), 'x'.repeat(5000), '9'.repeat(400)],
];

const HOSTILE_JSON = [
  ...HOSTILE_TEXTS.map((text) => JSON.stringify(text)),
  ...['1e999', '-1e999', '1e-999', '-0', '0', '-1', '0.1', '1e308', '5e-324', '9007199254740993'],
  ...[
    '1'.repeat(400),
    `0.${'3'.repeat(400)}`,
    'true',
    'false',
    'null',
    '[]',
    '{}',
    '[[]]',
    '[null]',
  ],
  ...['{"__proto__":{"polluted":true}}', '{"constructor":{"prototype":{"polluted":true}}}'],
  ...['{"toString":1}', '{"toJSON":"x"}', '{"length":1e9}', '{"then":{}}', '{"$ne":null}'],
  ...[`${'['.repeat(25)}${']'.repeat(25)}`, `${'{"a":'.repeat(25)}1${'}'.repeat(25)}`],
  ...[`[${'0,'.repeat(5000)}0]`, `{${names(3000)}}`, '"\\u0000"', '"\\ud834"', '"\\/\\b\\f"'],
];

const HOSTILE_BYTES = [
  ...['', ' ', '{', '}', '[', '"', '{"a":', '{"a":1,}', "{'a':1}", '{"a":1}{"a":2}', '// x\n{}'],
  ...[
    'null',
    'true',
    '0',
    '"text"',
    '[]',
    '{}',
    '[{}]',
    'NaN',
    'undefined',
    '{"a":NaN}',
    '{"a":01}',
  ],
  ...[
    '\u00ef\u00bb\u00bf{}',
    '\u00ff\u00fe{\u0000}\u0000',
    '{"a":"\u00ff"}',
    '{"a":"\u00ed\u00a0\u0080"}',
  ],
  ...['{"a":"\u0000"}', '\u0000', '\u001f\u008b\u0008\u0000', '{"a":1,"a":2}', '{"":{"":{"":1}}}'],
  ...['['.repeat(100_000), '[1,'.repeat(20_000), '{"a":'.repeat(20_000), '0'.repeat(200_000)],
  ...[`{"a":"${'x'.repeat(270_000)}"}`, 'a=1&b=2', '--x\r\nContent-Disposition: form-data\r\n\r\n'],
];

const CONTENT_TYPES = [
  ...['', 'text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x'],
  ...[
    'application/json; charset=utf-16',
    'application/json;',
    'application/jsonp',
    'APPLICATION/JSON',
  ],
  ...['application/problem+json', 'text/json', '\u00ff', 'application/json, text/plain', ';', '/'],
];

/** Header → values that do not fit it. Whatever Node's own parser refuses never reaches the server. */
const HOSTILE_HEADERS: Readonly<Record<string, readonly string[]>> = {
  'Content-Type': CONTENT_TYPES,
  'Content-Encoding': ['gzip', 'br', 'deflate', 'zstd', 'identity', 'x', 'gzip, gzip'],
  'X-XSRF-TOKEN': ['', 'x', '\u00ff', 'x'.repeat(4000)],
  Cookie: [
    '',
    'sid=x',
    'sid=s%3Ax.y',
    'sid=%E0%A4%A',
    'sid=s:__proto__.x',
    ';;=;',
    'x'.repeat(4000),
  ],
  Origin: ['', 'null', 'https://evil.example', 'http://[', '\u00ff'],
  'Sec-Fetch-Site': ['cross-site', 'same-site', '', 'none'],
  Host: ['', 'evil.example', '[', 'a:b:c', '\u00ff'],
  Accept: ['', 'text/html', 'image/*;q=x', '\u00ff'],
  'Accept-Encoding': ['', 'gzip;q=0', 'br, *;q=0', 'identity;q=0', 'x'.repeat(4000)],
  'Accept-Language': ['\u00ff', '*'],
  'User-Agent': ['', 'x'.repeat(4000), '\u00ff'],
  'X-Forwarded-For': ['', '1.2.3.4', '::1', 'x, y', '999.1.1.1'],
  'X-Forwarded-Proto': ['https', 'x'],
  'X-HTTP-Method-Override': ['DELETE', 'GET'],
  Range: ['bytes=0-0', 'bytes=x', 'bytes=-1,-1,-1'],
  'If-None-Match': ['*', '"x"', 'x'],
  'If-Modified-Since': ['x', 'Thu, 01 Jan 1970 00:00:00 GMT'],
  Authorization: ['Basic x', 'Bearer', '\u00ff'],
  'Transfer-Encoding': ['chunked'],
};

const TAGS = [
  ...['', '*', 'x', '""', '"x-1"', 'W/"00000000-0000-4000-8000-000000000000-1"', '"__proto__-1"'],
  ...[
    '"00000000-0000-4000-8000-000000000000-999999999999999"',
    '\u00ff',
    `"${'a'.repeat(4000)}-1"`,
  ],
];

/** Requests to all routes by all callers, a part of them good but for one thing, a part hostile through and through. */
export function hostileRequests(
  endpoints: readonly Endpoint[],
  callers: readonly string[],
): fc.Arbitrary<HostileRequest> {
  return fc.oneof(
    ...endpoints.map((item, endpoint) =>
      fc.record({
        endpoint: fc.constant(endpoint),
        caller: fc.constantFrom(...callers),
        params: paramsOf(item),
        query: queriesOf(item),
        tag: weighted([6, fc.constant('current')], [1, fc.constantFrom(...TAGS)]),
        headers: headers(),
        body: bodiesOf(item),
      }),
    ),
  );
}

/** The text that goes over the wire: bytes, one a character; null: no body at all. */
export function bytesOf(body: Body, item: Endpoint): string | null {
  if (body.kind === 'none') return null;
  if (body.kind === 'bytes') return body.bytes;
  const start = body.start === EXAMPLE ? (bodyFor(item) ?? {}) : body.start;
  return Buffer.from(edited(start, body.edits), 'utf8').toString('latin1');
}

function names(count: number): string {
  return Array.from({ length: count }, (_, i) => `"k${i}":0`).join();
}

/** JSON text of the document with the edits made; what JSON cannot write goes in as text. */
function edited(start: unknown, edits: readonly Edit[]): string {
  let document = start;
  for (const [number, { place, act }] of edits.entries()) {
    const places = leaves(document);
    const found = places[place % Math.max(places.length, 1)] ?? [];
    if (found.length === 0 && act === 'add') continue; // the whole is a number or a text by now
    const mark = `@@${number}@@`;
    if (act === 'replace') document = replaced(document, found, mark);
    else if (act === 'remove') document = replaced(document, found, undefined);
    else document = replaced(document, [...found.slice(0, -1), mark], mark);
  }
  const text = document === undefined ? '' : JSON.stringify(document);
  // a mark that stands for a name needs text, one that stands for a value takes any JSON
  return text
    .replace(/"@@(\d)@@":/g, (_, n: string) => `${asName(edits[Number(n)]?.json ?? '')}:`)
    .replace(/"@@(\d)@@"/g, (_, n: string) => edits[Number(n)]?.json ?? '');
}

function asName(json: string): string {
  return json.startsWith('"') ? json : JSON.stringify(json.slice(0, 40));
}

function weighted<T>(...choices: [number, fc.Arbitrary<T>][]): fc.Arbitrary<T> {
  return fc.oneof(...choices.map(([weight, arbitrary]) => ({ weight, arbitrary })));
}

const hostileText = weighted(
  [3, fc.constantFrom(...HOSTILE_TEXTS)],
  [1, fc.string({ unit: 'binary', maxLength: 80 })],
);

/** A lone surrogate has no UTF-8: sent as the bytes a careless encoder makes of it. */
function percentEncoded(text: string): string {
  return text
    .split(/(\p{Surrogate})/u)
    .map((piece) => (/^\p{Surrogate}$/u.test(piece) ? '%ED%A0%80' : encodeURIComponent(piece)))
    .join('');
}

function paramsOf({ route }: Endpoint): fc.Arbitrary<HostileRequest['params']> {
  const known = route.params === undefined ? fc.constant({}) : valuesOf(route.params);
  const odd = fc.constantFrom(
    '.',
    '..',
    '%00',
    '%2f',
    '%E0%A4%A',
    '%',
    '%ff',
    'a%0d%0ab',
    ';',
    '~',
  );
  const one = weighted<string | null>(
    [8, fc.constant(null)],
    [1, hostileText.map(percentEncoded)],
    [1, odd],
  );
  const named = [...route.path.matchAll(/:(\w+)/g)].map(([, name]) => name!);
  const hostile = fc.record(Object.fromEntries(named.map((name) => [name, one])));
  return weighted([9, hostile], [1, known.map((values) => values as Record<string, string>)]);
}

function queriesOf({ route }: Endpoint): fc.Arbitrary<string> {
  const names = route.query === undefined ? [] : namesOf(route.query);
  const name = weighted(
    [6, fc.constantFrom(...names, 'search')],
    [1, hostileText.map(percentEncoded)],
  );
  const value = hostileText.map(percentEncoded);
  const odd = fc.constantFrom('', '=', '&', '%', '%E0%A4%A', '+', '[]', '[__proto__]=1', '#');
  const hostile = fc
    .array(fc.tuple(name, value), { minLength: 1, maxLength: 3 })
    .map((pairs) => `?${pairs.map(([key, text]) => `${key}=${text}`).join('&')}`);
  const good = route.query === undefined ? fc.constant({}) : valuesOf(route.query);
  return weighted(
    [route.query === undefined ? 8 : 1, fc.constant('')],
    [4, good.map((values) => `?${pairsOf(values as Record<string, unknown>)}`)],
    [2, hostile],
    [1, odd.map((text) => `?${text}`)],
  );
}

function pairsOf(values: Readonly<Record<string, unknown>>): string {
  return Object.entries(values)
    .map(([name, value]) => `${name}=${percentEncoded(String(value))}`)
    .join('&');
}

function headers(): fc.Arbitrary<Readonly<Record<string, string>>> {
  const one = fc
    .constantFrom(...Object.keys(HOSTILE_HEADERS))
    .chain((name) => fc.tuple(fc.constant(name), fc.constantFrom(...HOSTILE_HEADERS[name]!)));
  const some = fc.array(one, { minLength: 1, maxLength: 2 }).map((all) => Object.fromEntries(all));
  return weighted([4, fc.constant({})], [1, some]);
}

function bodiesOf({ route }: Endpoint): fc.Arbitrary<Body> {
  const edit: fc.Arbitrary<Edit> = fc.record({
    place: fc.nat(500),
    act: weighted([4, fc.constant('replace')], [1, fc.constantFrom('remove', 'add')]),
    json: weighted([4, fc.constantFrom(...HOSTILE_JSON)], [1, fc.json({ maxDepth: 3 })]),
  });
  const document = (start: fc.Arbitrary<unknown>, most: number): fc.Arbitrary<Body> =>
    fc.record({
      ...{ kind: fc.constant('document' as const), start },
      edits: fc.array(edit, { maxLength: most }),
    });
  const none = fc.constant<Body>({ kind: 'none' });
  const bytes = fc.record({
    kind: fc.constant('bytes' as const),
    bytes: fc.constantFrom(...HOSTILE_BYTES),
  });
  if (route.body === undefined)
    return weighted([8, none], [1, bytes], [1, document(fc.constant({}), 1)]);
  return weighted(
    [12, document(fc.constant(EXAMPLE), 2)],
    [4, document(valuesOf(route.body), 1)],
    [3, bytes],
    [1, none],
  );
}
