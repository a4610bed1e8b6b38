import { mkdir, readdir, readFile, rename, writeFile } from 'node:fs/promises';
import path from 'node:path';
import * as z from 'zod';
import type { Carrier } from './carrier.ts';
import type { Letter } from './letter.ts';

const StoredMail = z.object({
  atMs: z.int(),
  to: z.string(),
  subject: z.string(),
  text: z.string(),
});
type StoredMail = z.infer<typeof StoredMail>;

const MOST_LISTED = 100;

/** Keeps mail as files where no mail server is set up: for the demo and for development. */
export class MailboxCarrier implements Carrier {
  constructor(
    private readonly folder: string,
    private readonly now: () => number,
  ) {}

  async carry(id: string, letter: Letter): Promise<void> {
    await mkdir(this.folder, { recursive: true, mode: 0o700 });
    const atMs = this.now();
    const mail: StoredMail = {
      ...{ atMs, to: `${letter.toName} <${letter.toAddress}>` },
      ...{ subject: letter.subject, text: letter.text },
    };
    const file = path.join(this.folder, `${atMs}-${id}.json`);
    await writeFile(`${file}.part`, JSON.stringify(mail, null, 2), { mode: 0o600 });
    await rename(`${file}.part`, file);
  }

  /** What was kept, newest first. */
  async list(): Promise<StoredMail[]> {
    const names = await readdir(this.folder).catch(() => []);
    const files = names.filter((name) => name.endsWith('.json')).sort();
    const texts = files
      .slice(-MOST_LISTED)
      .map((name) => readFile(path.join(this.folder, name), 'utf8'));
    const mails = (await Promise.all(texts)).map((text) => StoredMail.parse(JSON.parse(text)));
    return mails.reverse();
  }
}
