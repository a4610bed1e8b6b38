import ExcelJS from 'exceljs';
import { describe, expect, it } from 'vitest';
import { bomNoteDocument } from '../../../server/bom-notes/bom-note-document.ts';
import { writeCsv } from '../../../server/documents/csv.ts';
import { writePdf } from '../../../server/documents/pdf.ts';
import { writeXlsx } from '../../../server/documents/xlsx.ts';
import type { BomNote } from '../../../shared/report/bom-note.ts';
import { buildBomNote } from '../../../shared/report/bom-note-build.ts';
import { ratingText, shortHash, valueText } from '../../../shared/report/bom-note-text.ts';
import {
  ISSUE,
  PREVIEW,
  PROJECT,
  Q1,
  Q12,
  Q12_IN_CHECK,
  Q2,
  source,
} from '../../shared/report/bom-note-fixture.ts';
import { readCsv } from '../documents/read-csv.ts';
import { readPdf, textOf } from '../documents/read-pdf.ts';

const hash = '3be890d1f27c66a4'.repeat(4);
const released: BomNote = { ...buildBomNote(PROJECT, [Q1, Q2, Q12], ISSUE), contentHash: hash };
const notReleased = buildBomNote(PROJECT, [Q1, Q2, Q12_IN_CHECK], PREVIEW);

const plain = (text: string) => text.replaceAll('\u00a0', ' ');
const pdfText = async (note: BomNote) =>
  (await readPdf(await writePdf(bomNoteDocument(note)))).map(textOf).join(' ');
const csvRecords = (note: BomNote) =>
  readCsv(writeCsv(bomNoteDocument(note), { decimalMark: '.' }).toString('utf8'));

async function workbookOf(note: BomNote): Promise<ExcelJS.Workbook> {
  const workbook = new ExcelJS.Workbook();
  const bytes = await writeXlsx(bomNoteDocument(note));
  await workbook.xlsx.load(bytes as unknown as ArrayBuffer);
  return workbook;
}

describe('documents of a BOM note', () => {
  it('PDF says what the note says', async () => {
    const text = await pdfText(released);
    for (const line of released.lines) {
      const row = [
        line.line,
        line.quantity,
        line.designators.map((designator) => designator.text).join(', '),
        line.description,
        valueText(line),
        ratingText(line),
        line.package ?? '–',
        line.partNumber ?? '–',
      ];
      expect(text).toContain(plain(row.join(' ')));
    }
    for (const revision of released.revisions) {
      const signed = `${revision.reference} A Locked 2026-02-18 ${shortHash(revision.hash!)}`;
      expect(text).toContain(signed);
    }
    for (const caution of released.cautions) expect(text).toContain(caution.text);
    for (const expected of [
      'GH-12-BOM-0007',
      'Issued 2026-03-10, 14:52 Z by D. Exporter',
      'Stages 3, all locked Lines 6, merged over stages Parts per board 15',
      'Data, all verified unchanged since lock',
      'Legal owner Glasshouse Works (demo)',
      'Document status Released',
      'Content SHA-256 3be8 90d1 f27c 66a4',
      '1.44 kΩ',
      '±10 %, 20 °C',
    ]) {
      expect(text).toContain(expected);
    }
    expect(text).not.toContain('NOT RELEASED');
  });

  it('PDF of what is not locked is marked, without hash and approver', async () => {
    const text = await pdfText(notReleased);
    for (const expected of [
      'NOT RELEASED, preview only',
      'Q12 B In check not signed none',
      'Q12 B is in check. Nothing may be bought or built from this sheet.',
      'Document status Not released',
      'Approval person none',
      'No content hash: not released',
      'Identification number not issued',
    ]) {
      expect(text).toContain(expected);
    }
  });

  it('CSV says what the note says, quantities as numbers under their units', () => {
    const [header, ...records] = csvRecords(released);
    const cell = (record: string[], heading: string) => record[header!.indexOf(heading)];
    for (const [index, line] of released.lines.entries()) {
      const record = records[index]!;
      const ohms = line.value?.unit === 'Ohm' ? String(line.value.max) : '';
      expect(cell(record, 'Line')).toBe(String(line.line));
      expect(cell(record, 'Qty')).toBe(String(line.quantity));
      expect(cell(record, 'Value')).toBe(valueText(line));
      expect(cell(record, 'Resistance, Ω')).toBe(ohms);
      expect(cell(record, 'Part number')).toBe(line.partNumber ?? '–');
    }
    const resistor = records.find(
      (record) => cell(record, 'Value') === valueText(released.lines[1]!),
    );
    expect(cell(resistor!, 'Tolerance, %')).toBe('5');
    expect(cell(resistor!, 'Rated power, W')).toBe('0.1');

    const flat = records.map((record) => record.join('|'));
    for (const { hash: locked, approver } of released.revisions) {
      expect(flat.some((row) => row.includes(`|${locked!}|`) && row.includes(approver!))).toBe(
        true,
      );
    }
    for (const { text } of released.cautions)
      expect(flat.some((row) => row.startsWith(text))).toBe(true);
    for (const expected of [
      'Legal owner|Glasshouse Works (demo)|',
      'Identification number|GH-12-BOM-0007|',
      `Content|SHA-256 ${hash}|`,
    ]) {
      expect(flat.some((row) => row.startsWith(expected))).toBe(true);
    }
  });

  it('CSV of what is not locked is marked in every record and names the designators', () => {
    const [header, first] = csvRecords(notReleased);
    expect(first![0]).toBe('NOT RELEASED');
    expect(first![header!.indexOf('Flagged designators')]).toBe('Q12');
  });

  it('workbook says what the note says', async () => {
    const workbook = await workbookOf(released);
    const lines = workbook.getWorksheet('Merged lines')!;
    const header = lines.getRow(1).values as string[];
    for (const [index, line] of released.lines.entries()) {
      const row = lines.getRow(index + 2);
      expect(row.getCell(header.indexOf('Qty')).value).toBe(line.quantity);
      expect(row.getCell(header.indexOf('Value')).value).toBe(valueText(line));
      const ohms = line.value?.unit === 'Ohm' ? line.value.max : '';
      expect(row.getCell(header.indexOf('Resistance, Ω')).value ?? '').toBe(ohms);
    }
    const texts = workbook.worksheets.flatMap((sheet) =>
      sheet
        .getSheetValues()
        .flat()
        .filter((value) => typeof value === 'string'),
    );
    for (const { text } of released.cautions) expect(texts).toContain(text);
    for (const revision of released.revisions) expect(texts).toContain(revision.hash);
    expect(texts).toContain(`SHA-256 ${hash}`);
    expect(texts).not.toContain('NOT RELEASED');
  });

  it('workbook of what is not locked says so on every sheet', async () => {
    const { worksheets } = await workbookOf(notReleased);
    expect(worksheets.map((sheet) => sheet.getCell('A1').value)).toEqual(
      worksheets.map(() => 'NOT RELEASED'),
    );
  });

  it.each([
    ['an issued note', released, 'GH-12_BOM-0007_20260310'],
    ['a preview', notReleased, 'GH-12_BOM-preview_20260310'],
  ])('are named after the project: %s', (_, note, fileName) => {
    expect(bomNoteDocument(note).fileName).toBe(fileName);
  });

  it('guard a title that a spreadsheet would run', async () => {
    const hostile = '=HYPERLINK("https://attacker.example","x")';
    const note = buildBomNote(
      { ...PROJECT, legalOwner: hostile },
      [source({ reference: 'Q1', title: '@SUM(1,1)' })],
      PREVIEW,
    );
    const texts = csvRecords(note).flat();
    expect(texts).toContain(`'${hostile}`);
    expect(texts).toContain("'@SUM(1,1)");
    const sheet = (await workbookOf(note)).getWorksheet('Title block')!;
    expect(sheet.getRow(2).getCell(2)).toMatchObject({
      type: ExcelJS.ValueType.String,
      value: `'${hostile}`,
    });
  });

  it('names at most two people in the title block before it counts the rest', () => {
    const people = ['A. One', 'B. Two', 'C. Three', 'D. Four'];
    const sources = people.map((designer, index) =>
      source({ reference: `Q${index + 1}` }, {}, { designer }),
    );
    const { titleBlock } = bomNoteDocument(buildBomNote(PROJECT, sources, ISSUE));
    expect(titleBlock.creator).toBe('A. One, B. Two and 2 more');
  });
});
