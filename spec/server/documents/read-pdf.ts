import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs';

export interface PrintedText {
  readonly text: string;
  /** Edges from the left and from the bottom of the sheet, pt. */
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
}

/** Every piece of text of every page, as an outside reader finds it. */
export async function readPdf(bytes: Buffer): Promise<PrintedText[][]> {
  const task = getDocument({ data: new Uint8Array(bytes), verbosity: 0 });
  const pdf = await task.promise;
  const pages: PrintedText[][] = [];
  for (let number = 1; number <= pdf.numPages; number += 1) {
    const page = await pdf.getPage(number);
    const { items } = await page.getTextContent({ disableNormalization: true });
    pages.push(
      items.flatMap((item) => {
        if (!('str' in item)) return [];
        const [left = 0, bottom = 0] = (item.transform as number[]).slice(4);
        return [{ text: item.str, left, right: left + item.width, bottom }];
      }),
    );
  }
  await task.destroy();
  return pages;
}

/** All text of one page with single spaces; pieces that touch on one line are one word. */
export function textOf(page: readonly PrintedText[]): string {
  let text = '';
  let last: PrintedText | undefined;
  for (const piece of page.filter(({ text }) => text !== '')) {
    const touches = last?.bottom === piece.bottom && Math.abs(piece.left - last.right) < 0.5;
    text += (touches ? '' : ' ') + piece.text;
    last = piece;
  }
  return text.trim().replace(/[\s\u00a0]+/g, ' ');
}
