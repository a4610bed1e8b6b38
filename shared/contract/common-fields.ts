import * as z from 'zod';

/** Ids are made by the server: UUIDs, opaque to everybody. */
export const Id = z.uuid({ error: 'expected an id' });

/** UTC, milliseconds since 1970. */
export const TimeMs = z.int();

export const PersonRef = z.object({ id: Id, name: z.string() });
export type PersonRef = z.infer<typeof PersonRef>;

export const Email = z
  .string({ error: 'expected an e-mail address' })
  .trim()
  .toLowerCase()
  .max(254, 'expected at most 254 characters')
  .regex(
    /^[^\s@<>()[\],;:"\\]+@[a-z0-9.-]+$/,
    'expected an e-mail address such as name@firm.example',
  );

export const PersonName = z
  .string({ error: 'expected a name' })
  .trim()
  .min(1, 'expected a name')
  .max(80, 'expected at most 80 characters')
  // eslint-disable-next-line no-control-regex -- control characters are what is refused
  .regex(/^[^\u0000-\u001f\u007f]*$/, 'expected one line');

/** Length is checked in code points by the server after NFKC; the block list too. */
export const Password = z.string({ error: 'expected a password' }).min(1).max(1024);

/** Several lines of plain text. */
export const Prose = (max: number) =>
  z.string({ error: 'expected text' }).trim().max(max, `expected at most ${max} characters`);
