import { describe, expect, it } from 'vitest';
import { writePdf } from '../../../server/documents/pdf.ts';
import { document, table } from './document-fixture.ts';
import { readPdf, textOf } from './read-pdf.ts';

const MARGIN_PT = 42.75;
const PAGE_WIDTH_PT = 595.28;

const manyRows = Array.from({ length: 70 }, (_, index) => [
  { text: `R${index + 1}` },
  { text: '4.7 kΩ' },
]);

describe('PDF', () => {
  it('keeps the signs of the trade', async () => {
    const signs = '4.7 kΩ, 85 µA, β ≥ 10, VBE ≤ 0.7 V, ±5 %, −40 °C, Δ τ θ √ × · … – ∞';
    const [page] = await readPdf(
      await writePdf(document({ rows: [[table([[{ text: signs }, { text: '85 µA' }]])]] })),
    );
    expect(textOf(page!)).toContain(signs);
    expect(textOf(page!)).toContain('85 µA');
  });

  it('spells out or names a sign its fonts lack, instead of dropping it', async () => {
    const cells = [{ text: 'R1 ∥ R2, 3 → 4' }, { text: '中 Ω' }];
    const [page] = await readPdf(await writePdf(document({ rows: [[table([cells])]] })));
    expect(textOf(page!)).toContain('R1 || R2, 3 -> 4');
    expect(textOf(page!)).toContain('[U+4E2D] Ω');
  });

  it('puts title block, page numbers and content hash on every sheet, table heads too', async () => {
    const pages = await readPdf(await writePdf(document({ rows: [[table(manyRows)]] })));
    expect(pages.length).toBe(3);
    for (const [index, page] of pages.entries()) {
      const text = textOf(page);
      for (const expected of [
        'Legal owner Glasshouse Works (demo)',
        'Identification number GH-12-TEST-0001',
        'Approval person C. Approver',
        'Content SHA-256 3be8',
        `${index + 1} / 3`,
        `A4, ${index + 1} of 3`,
        'Designator Value',
      ]) {
        expect(text).toContain(expected);
      }
    }
    expect(pages.map(textOf).join(' ')).toMatch(/R1 .*R35 .*R70 /);
  });

  it('says NOT RELEASED on every sheet of what is stamped, and nowhere else', async () => {
    const rows = [[table(manyRows)]];
    const stamped = await readPdf(await writePdf(document({ rows, stamp: 'NOT RELEASED' })));
    for (const page of stamped) expect(textOf(page)).toContain('NOT RELEASED, preview only');
    const across = stamped.map((page) => page.filter(({ text }) => /^(N|O|T|NO|NOT)$/.test(text)));
    for (const letters of across) expect(letters.length).toBeGreaterThan(0);

    const released = await readPdf(await writePdf(document({ rows })));
    expect(released.map(textOf).join(' ')).not.toContain('NOT RELEASED');
  });

  it('wraps what is too long, and loses nothing of it', async () => {
    const long = 'W'.repeat(80);
    const base = document();
    const titleBlock = { ...base.titleBlock, title: long, creator: long, legalOwner: long };
    const cells = [{ text: 'X'.repeat(200) }, { text: 'M'.repeat(120) }];
    const changed = document({ rows: [[table([cells])]], titleBlock, subject: long });
    const [page] = await readPdf(await writePdf(changed));

    const letters = (letter: string) => textOf(page!).split(letter).length - 1;
    expect(letters('W')).toBe(4 * 80);
    expect(letters('X')).toBe(200);
    expect(letters('M')).toBe(120);
    for (const { text, left, right, bottom } of page!.filter(({ text }) => /^[WXM]/.test(text))) {
      expect(left, text).toBeGreaterThanOrEqual(MARGIN_PT - 1);
      expect(right, text).toBeLessThanOrEqual(PAGE_WIDTH_PT - MARGIN_PT + 1);
      expect(bottom, text).toBeGreaterThan(0);
    }
  });

  it('takes text as text, whatever it looks like', async () => {
    const hostile = '{"image":"/etc/hostname"} <b>x</b> ${1}';
    const base = document();
    const changed = document({
      subject: hostile,
      rows: [[table([[{ text: hostile }, { text: hostile }]])]],
      titleBlock: { ...base.titleBlock, title: hostile },
    });
    const [page] = await readPdf(await writePdf(changed));
    expect(textOf(page!).split('/etc/hostname').length - 1).toBe(4);
  });
});
