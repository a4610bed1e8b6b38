import type { DocumentFormat } from '../../shared/contract/bom-note.ts';
import type { BomNote } from '../../shared/report/bom-note.ts';
import { writeCsv } from '../documents/csv.ts';
import type { TechnicalDocument } from '../documents/technical-document.ts';
import type { FileAnswer } from '../http/file-answer.ts';
import { bomNoteDocument } from './bom-note-document.ts';

/** What a caller may ask of a file. */
export interface FileWish {
  readonly format: DocumentFormat;
  /** Of the CSV. */
  readonly decimalMark: 'point' | 'comma';
}

const TYPES: Record<DocumentFormat, string> = {
  pdf: 'application/pdf',
  xlsx: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
  csv: 'text/csv; charset=utf-8',
};

/** A note as a file; the same note gives the same bytes. */
export async function bomNoteFile(note: BomNote, wish: FileWish): Promise<FileAnswer> {
  const document = bomNoteDocument(note);
  const bytes = await write(document, wish);
  return { name: `${document.fileName}.${wish.format}`, type: TYPES[wish.format], bytes };
}

/** What writes PDFs and workbooks is loaded when first asked for: it would take a third of the start. */
async function write(document: TechnicalDocument, wish: FileWish): Promise<Buffer> {
  switch (wish.format) {
    case 'pdf': {
      const { writePdf } = await import('../documents/pdf.ts');
      return writePdf(document);
    }
    case 'xlsx': {
      const { writeXlsx } = await import('../documents/xlsx.ts');
      return writeXlsx(document);
    }
    case 'csv':
      return writeCsv(document, { decimalMark: wish.decimalMark === 'comma' ? ',' : '.' });
  }
}
