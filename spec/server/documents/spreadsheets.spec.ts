import ExcelJS from 'exceljs';
import { describe, expect, it } from 'vitest';
import { writeCsv } from '../../../server/documents/csv.ts';
import { writeXlsx } from '../../../server/documents/xlsx.ts';
import { document, HARMLESS, PAYLOADS, table } from './document-fixture.ts';
import { readCsv } from './read-csv.ts';

const withTexts = (texts: readonly string[]) =>
  document({ rows: [[table(texts.map((text) => [{ text }, { text: '1', number: 1 }]))]] });

const point = { decimalMark: '.' } as const;

async function readXlsx(bytes: Buffer): Promise<ExcelJS.Workbook> {
  const workbook = new ExcelJS.Workbook();
  await workbook.xlsx.load(bytes as unknown as ArrayBuffer);
  return workbook;
}

describe('CSV', () => {
  it('begins with a byte order mark and a header that carries units', () => {
    const text = writeCsv(document(), point).toString('utf8');
    expect(text.startsWith('\ufeffDesignator,"Value, Ω"\r\n')).toBe(true);
  });

  it('has records of one length, ended by CRLF (RFC 4180)', () => {
    const text = writeCsv(withTexts(['a\nb', 'c"d', 'e,f']), point).toString('utf8');
    const records = readCsv(text);
    expect(new Set(records.map((record) => record.length)).size).toBe(1);
    expect(records.slice(1, 4).map(([first]) => first)).toEqual(['a\nb', 'c"d', 'e,f']);
    expect(text.replaceAll('\r\n', '').replace('a\nb', '')).not.toMatch(/[\r\n]/);
  });

  it('carries table, list and title block, numbers as numbers', () => {
    const records = readCsv(writeCsv(document(), point).toString('utf8'));
    expect(records[1]).toEqual(['R4', '4700']);
    const flat = records.map((record) => record.join('|'));
    expect(flat).toContain('Coils store energy.|');
    const heading = flat.indexOf('Cautions|');
    expect(flat.slice(heading, heading + 2)).toEqual(['Cautions|', 'Text|']);
    expect(flat).toContain('Identification number|GH-12-TEST-0001');
    expect(flat).toContain('Content|SHA-256 3be890d1');
  });

  it('writes semicolon and decimal comma where asked', () => {
    const rows = [[table([[{ text: 'R4' }, { text: '0.1', number: 0.1 }]])]];
    const text = writeCsv(document({ rows }), { decimalMark: ',' }).toString('utf8');
    expect(text.split('\r\n')[1]).toBe('R4;0,1');
  });

  it('puts the stamp in front of every record', () => {
    const records = readCsv(writeCsv(document({ stamp: 'NOT RELEASED' }), point).toString('utf8'));
    expect(records[0]?.slice(0, 2)).toEqual(['Status', 'Designator']);
    expect(records[1]?.slice(0, 2)).toEqual(['NOT RELEASED', 'R4']);
    expect(records.filter(([first]) => first === 'NOT RELEASED').length).toBeGreaterThan(10);
  });

  it.each(PAYLOADS)('keeps %j from being run', (payload) => {
    const records = readCsv(writeCsv(withTexts([payload]), point).toString('utf8'));
    expect(records[1]?.[0]).toBe(`'${payload}`);
  });

  it.each(HARMLESS)('leaves %j alone', (text) => {
    expect(readCsv(writeCsv(withTexts([text]), point).toString('utf8'))[1]?.[0]).toBe(text);
  });
});

describe('workbook', () => {
  it('holds only text of string type and numbers of number type', async () => {
    const workbook = await readXlsx(await writeXlsx(withTexts([...PAYLOADS, ...HARMLESS])));
    const types = new Set<ExcelJS.ValueType>();
    workbook.eachSheet((sheet) => {
      sheet.eachRow((row) => {
        row.eachCell((cell) => types.add(cell.type));
      });
    });
    expect([...types].sort()).toEqual([ExcelJS.ValueType.Number, ExcelJS.ValueType.String].sort());
  });

  it('guards text and keeps numbers', async () => {
    const texts = PAYLOADS.filter((payload) => !payload.includes('\u0000'));
    const sheet = (await readXlsx(await writeXlsx(withTexts(texts)))).getWorksheet('Lines')!;
    const cells = texts.map((_, index) => sheet.getRow(index + 2).getCell(1).value);
    // XML turns a carriage return into a line feed
    expect(cells).toEqual(texts.map((text) => `'${text.replaceAll('\r', '\n')}`));
    expect(sheet.getRow(2).getCell(2).value).toBe(1);
  });

  it('has a sheet for each table, list and the title block', async () => {
    const workbook = await readXlsx(await writeXlsx(document()));
    expect(workbook.worksheets.map(({ name }) => name)).toEqual([
      'Lines',
      'Cautions',
      'Title block',
    ]);
    expect(workbook.getWorksheet('Lines')!.getRow(1).values).toEqual([
      undefined,
      'Designator',
      'Value, Ω',
    ]);
    expect(workbook.getWorksheet('Lines')!.getRow(2).values).toEqual([undefined, 'R4', 4700]);
  });

  it('says NOT RELEASED first on every sheet of what is stamped', async () => {
    const workbook = await readXlsx(await writeXlsx(document({ stamp: 'NOT RELEASED' })));
    for (const sheet of workbook.worksheets) {
      expect(sheet.getCell('A1').value).toBe('NOT RELEASED');
      expect(sheet.getCell('A3').value).toBe('NOT RELEASED');
    }
  });
});
