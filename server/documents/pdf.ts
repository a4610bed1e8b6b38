import pdfMake from 'pdfmake';
import type { Content, TDocumentDefinitions } from 'pdfmake/interfaces.js';
import { FONTS, isFontFile } from './pdf-fonts.ts';
import { COLOURS, PAGE, points, SIZES } from './pdf-measures.ts';
import { pdfHead, pdfRunningHead, pdfStamp } from './pdf-sheet.ts';
import { pdfTable } from './pdf-table.ts';
import { paragraph } from './pdf-text.ts';
import { pdfFoot, pdfFootHeightPx } from './pdf-title-block.ts';
import type { ListSection, Section, TechnicalDocument } from './technical-document.ts';

pdfMake.setFonts(FONTS);
pdfMake.setUrlAccessPolicy(() => false);
pdfMake.setLocalAccessPolicy(isFontFile);

const GAP_PX = 24;

/**
 * A document as PDF on A4, title block at the foot of every sheet, the stamp across it. Times come from the
 * document alone, so that the same document gives the same bytes.
 */
export async function writePdf(document: TechnicalDocument): Promise<Buffer> {
  const made = new Date(document.atMs);
  const definition: TDocumentDefinitions = {
    pageSize: 'A4',
    pageMargins: [
      points(PAGE.marginPx),
      points(57),
      points(PAGE.marginPx),
      points(pdfFootHeightPx(document)),
    ],
    info: {
      title: `${document.heading} ${document.identification}`,
      subject: document.subject,
      author: document.titleBlock.legalOwner,
      creator: document.program,
      producer: document.program,
      creationDate: made,
      modDate: made,
    },
    language: document.titleBlock.language,
    defaultStyle: { font: 'Roboto', fontSize: points(SIZES.body), color: COLOURS.ink },
    background: () => pdfStamp(document.stamp),
    header: (page) => pdfRunningHead(document, page),
    footer: (page, pages) => pdfFoot(document, page, pages),
    content: [...pdfHead(document), ...document.rows.map((row) => sectionRow(row, document))],
  };
  return pdfMake.createPdf(definition).getBuffer();
}

function sectionRow(row: readonly Section[], document: TechnicalDocument): Content {
  return {
    margin: [0, points(16), 0, 0],
    columnGap: points(GAP_PX),
    columns: row.map((section) => ({
      width: points(section.widthPx),
      stack: [
        ...headingAbove(section),
        section.kind === 'table'
          ? pdfTable(section, document.stamp !== null)
          : bullets(section, document.stamp !== null),
      ],
    })),
  };
}

function headingAbove(section: Section): Content[] {
  if (section.kind === 'table' && section.headingInTable === true) return [];
  const heading = paragraph(section.heading, { sizePx: SIZES.section, strong: true });
  return [{ ...heading, margin: [0, 0, 0, points(4)] }];
}

function bullets({ items, widthPx }: ListSection, flags: boolean): Content {
  return {
    ul: items.map(({ text, flagged }) => {
      const colour = flagged && flags ? COLOURS.red : COLOURS.ink;
      return {
        ...paragraph(text, { colour, widthPx: widthPx - 14 }),
        markerColor: colour,
        margin: [0, 0, 0, points(2)],
        lineHeight: 1.15,
      };
    }),
  };
}
