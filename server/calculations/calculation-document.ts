import type { Evaluation } from '../../shared/checks/evaluation.ts';
import type { FormulaRun } from '../../shared/method/formula-text.ts';
import { NOTHING, utcDate } from '../../shared/report/bom-note-text.ts';
import {
  calculationAtMs,
  calculationContent,
  calculationFacts,
  calculationFileName,
  type CalculationHead,
  calculationIdentification,
  calculationOccasion,
} from '../../shared/report/calculation-facts.ts';
import type { CalculationSheet, CriterionBlock } from '../../shared/report/calculation-sheet.ts';
import {
  cornerHeading,
  cornerReference,
  cornerSentence,
  criterionHeading,
  criterionSentence,
  lineText,
} from '../../shared/report/calculation-text.ts';
import type { SheetLine } from '../../shared/report/calculation/worksheet.ts';
import type {
  Cell,
  Column,
  Run,
  Section,
  TechnicalDocument,
  TitleBlock,
} from '../documents/technical-document.ts';

/** A revision’s calculation, as the document builder needs it. */
export interface CalculationSource {
  readonly head: CalculationHead;
  readonly evaluation: Evaluation;
  /** null where the stage cannot be judged. */
  readonly sheet: CalculationSheet | null;
  readonly program: string;
}

const SHEET_PX = 680;

/** The calculation sheet laid out for the document builder; follows from its source alone. */
export function calculationDocument(source: CalculationSource): TechnicalDocument {
  const { head, evaluation, sheet, program } = source;
  return {
    heading: 'Calculation sheet',
    subject: `${head.reference} ${head.title}: every criterion at its worst corner`,
    identification: calculationIdentification(head),
    occasion: calculationOccasion(head),
    stamp: head.lock === null ? 'NOT RELEASED' : null,
    facts: calculationFacts(head, evaluation, sheet),
    rows: sheet === null ? [[notJudged(evaluation)]] : sections(sheet).map((each) => [each]),
    titleBlock: block(head),
    program,
    content: calculationContent(head, evaluation),
    atMs: calculationAtMs(head),
    fileName: calculationFileName(head),
  };
}

function notJudged({ findings }: Evaluation): Section {
  return {
    kind: 'list',
    heading: 'Not judged',
    widthPx: SHEET_PX,
    items: findings.map(({ text }) => ({ text, flagged: true })),
  };
}

function sections(sheet: CalculationSheet): Section[] {
  return [
    ...sheet.criteria.map((block) =>
      section(criterionHeading(block), sentencesOf(block), block.lines),
    ),
    ...sheet.corners.map((block) =>
      section(cornerHeading(block), `Operating point at ${cornerSentence(block)}.`, block.lines),
    ),
  ];
}

function sentencesOf(block: CriterionBlock): string {
  const reference = cornerReference(block);
  return criterionSentence(block) + (reference === '' ? '' : ` ${reference}.`);
}

function section(heading: string, sentence: string, lines: readonly SheetLine[]): Section {
  if (lines.length === 0) {
    const items = [{ text: sentence, flagged: false }];
    return { kind: 'list', heading, widthPx: SHEET_PX, items };
  }
  return {
    kind: 'table',
    heading: `${heading}: ${sentence}`,
    headingInTable: true,
    widthPx: SHEET_PX,
    columns: COLUMNS,
    records: lines.map(record),
  };
}

const column = (heading: string, widthPx: number, style: Partial<Column> = {}): Column => ({
  heading,
  widthPx,
  data: true,
  ...style,
});

const COLUMNS: readonly Column[] = [
  column('Line', 24, { right: true }),
  column('Figure', 120),
  column('Formula and numbers put in', 256),
  column('Result', 74, { right: true, strong: true }),
  column('Numbers from; source of the law', 158),
];

function record(line: SheetLine): Cell[] {
  const text = lineText(line);
  return [
    { text: String(text.number), number: text.number },
    cell([...set(text.symbol), plain(`  ${text.name}`)]),
    cell([...set(text.formula), plain('\n'), ...set(text.numbers)]),
    { text: text.value, flagged: !text.agrees },
    cell([...set(text.from), plain(text.from.length === 0 ? text.source : `\n${text.source}`)]),
  ];
}

const plain = (text: string): Run => ({ text, flagged: false });

const set = (runs: readonly FormulaRun[]): Run[] =>
  runs.map(({ text, level }) => ({ text, flagged: false, level }));

const cell = (runs: readonly Run[]): Cell => ({
  text: runs.map(({ text }) => text).join(''),
  runs,
});

function block(head: CalculationHead): TitleBlock {
  const { lock } = head;
  return {
    legalOwner: head.legalOwner,
    department: head.department ?? NOTHING,
    creator: head.designer,
    checker: head.checker ?? 'none',
    approver: lock?.approver ?? 'none',
    documentType: 'Calculation sheet',
    status: lock === null ? `Not released (${head.stateWord})` : head.stateWord,
    statusFlagged: lock === null,
    dateOfIssue: lock === null ? 'none' : utcDate(lock.signedAtMs),
    title: `${head.reference} ${head.title}`,
    supplementaryTitle: `${head.projectCode} ${head.projectTitle}`,
    revision: head.letter,
    language: 'en',
  };
}
