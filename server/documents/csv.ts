import { stringify } from 'csv-stringify/sync';
import { dataTables, type DataValue } from './data-tables.ts';
import type { TechnicalDocument } from './technical-document.ts';

/** Comma with decimal point, or semicolon with decimal comma. */
export interface CsvStyle {
  readonly decimalMark: '.' | ',';
}

/**
 * A document as CSV by RFC 4180: UTF-8 with byte order mark, CRLF, every record of equal length. The first
 * table begins in row 1, so that machines can read it; the others follow, each behind an empty row.
 */
export function writeCsv(document: TechnicalDocument, style: CsvStyle): Buffer {
  const tables = dataTables(document);
  const rows = tables.flatMap((table, index) => [
    ...(index === 0 ? [] : [[], [table.name]]),
    table.header,
    ...table.records,
  ]);
  const width = Math.max(...rows.map((row) => row.length));
  const text = stringify(
    rows.map((row) => [...row, ...Array<string>(width - row.length).fill('')].map(written(style))),
    {
      delimiter: style.decimalMark === ',' ? ';' : ',',
      record_delimiter: '\r\n',
      quoted_match: /[\r\n]/,
      bom: true,
    },
  );
  return Buffer.from(text, 'utf8');
}

const written =
  ({ decimalMark }: CsvStyle) =>
  (value: DataValue): string =>
    typeof value === 'number' ? String(value).replace('.', decimalMark) : value;
