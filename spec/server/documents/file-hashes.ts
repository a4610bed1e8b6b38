import { createHash } from 'node:crypto';
import { writeCsv } from '../../../server/documents/csv.ts';
import { writePdf } from '../../../server/documents/pdf.ts';
import { writeXlsx } from '../../../server/documents/xlsx.ts';
import { document } from './document-fixture.ts';

/** SHA-256 of the three files of one document; runs by itself as well, for a second process. */
export async function fileHashes(): Promise<string[]> {
  const made = document({ stamp: 'NOT RELEASED' });
  const files = [await writePdf(made), await writeXlsx(made), writeCsv(made, { decimalMark: '.' })];
  return files.map((bytes) => createHash('sha256').update(bytes).digest('hex'));
}

if (process.argv[1] === import.meta.filename) {
  process.stdout.write(JSON.stringify(await fileHashes()));
}
