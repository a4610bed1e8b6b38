import ExcelJS from 'exceljs';
import { unzipSync, type Zippable, zipSync } from 'fflate';
import { dataTables, type DataTable } from './data-tables.ts';
import type { TechnicalDocument } from './technical-document.ts';

const LONGEST_SHEET_NAME = 31;
const WIDEST_COLUMN = 60;
const RED = 'FFA6261D';

/**
 * A document as workbook, a sheet for each table. Text is always of string type, so nothing can run as a
 * formula. The same document gives the same bytes: the parts are packed again in order, with a fixed time.
 */
export async function writeXlsx(document: TechnicalDocument): Promise<Buffer> {
  const workbook = new ExcelJS.Workbook();
  workbook.creator = document.program;
  workbook.lastModifiedBy = document.program;
  workbook.title = `${document.heading} ${document.identification}`;
  workbook.created = workbook.modified = new Date(document.atMs);
  for (const table of dataTables(document)) addSheet(workbook, table, document.stamp);
  return repacked(new Uint8Array(await workbook.xlsx.writeBuffer()));
}

function addSheet(workbook: ExcelJS.Workbook, table: DataTable, stamp: string | null): void {
  const sheet = workbook.addWorksheet(table.name.slice(0, LONGEST_SHEET_NAME));
  if (stamp !== null) sheet.addRow([stamp]).font = { bold: true, color: { argb: RED } };
  const header = sheet.addRow([...table.header]);
  header.font = { bold: true };
  header.alignment = { wrapText: true, vertical: 'top' };
  for (const record of table.records) sheet.addRow([...record]);
  sheet.views = [{ state: 'frozen', ySplit: header.number }];
  for (const [index, heading] of table.header.entries()) {
    const texts = [heading, ...table.records.map((record) => String(record[index] ?? ''))];
    const longest = Math.max(...texts.map((text) => text.length));
    sheet.getColumn(index + 1).width = Math.min(longest + 2, WIDEST_COLUMN);
  }
}

/** ZIP times have no zone: this is what every entry says. */
const ZIP_TIME = '1980-01-01T00:00:00';

function repacked(file: Uint8Array): Buffer {
  const parts = unzipSync(file);
  const ordered: Zippable = {};
  for (const name of Object.keys(parts).sort()) {
    ordered[name] = [parts[name] as Uint8Array, { mtime: ZIP_TIME, level: 6, os: 0 }];
  }
  return Buffer.from(zipSync(ordered));
}
