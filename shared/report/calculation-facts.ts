import type { Evaluation } from '../checks/evaluation.ts';
import type { CalculationSheet } from './calculation-sheet.ts';
import { recomputedText } from './calculation-text.ts';
import { utcDate, utcTime } from './bom-note-text.ts';

/** What the title block of a calculation sheet is filled from. */
export interface CalculationHead {
  readonly projectCode: string;
  readonly projectTitle: string;
  readonly legalOwner: string;
  readonly department: string | null;
  readonly reference: string;
  readonly title: string;
  readonly letter: string;
  /** The state in words, such as `In check`. */
  readonly stateWord: string;
  readonly designer: string;
  readonly checker: string | null;
  /** null while not locked, or where the hash no longer fits. */
  readonly lock: {
    readonly approver: string;
    readonly signedAtMs: number;
    readonly hash: string;
  } | null;
  /** Last save of the revision, UTC, ms since 1970. */
  readonly savedAtMs: number;
}

/** `CR-40-Q12-B-CALC` */
export const calculationIdentification = ({
  projectCode,
  reference,
  letter,
}: CalculationHead): string => `${projectCode}-${reference}-${letter}-CALC`;

/** Time the sheet carries: of the signature, else of the last save. */
export const calculationAtMs = ({ lock, savedAtMs }: CalculationHead): number =>
  lock?.signedAtMs ?? savedAtMs;

/** `CR-40_Q12-B-CALC_20260310` */
export function calculationFileName(head: CalculationHead): string {
  const date = utcDate(calculationAtMs(head)).replaceAll('-', '');
  const reference = head.reference.replace(/[^A-Za-z0-9_-]/g, '-');
  return `${head.projectCode}_${reference}-${head.letter}-CALC_${date}`;
}

/** `Locked 2026-03-10, 14:52 Z`, `Preview of a draft, saved 2026-03-10 14:52 Z` */
export function calculationOccasion(head: CalculationHead): string {
  const atMs = calculationAtMs(head);
  const time = `${utcDate(atMs)}, ${utcTime(atMs)} Z`;
  return head.lock === null ? `Preview, saved ${time}` : `Locked ${time}`;
}

/** What vouches for the content: shortened for the foot of a sheet, and in full. */
export function calculationContent(
  { lock }: CalculationHead,
  { verdict }: Pick<Evaluation, 'verdict'>,
): { short: string; full: string } {
  const judged = `Verdict ${verdict}`;
  if (lock === null) {
    const text = `${judged}. No hash: not locked`;
    return { short: text, full: text };
  }
  const first = (lock.hash.slice(0, 16).match(/.{4}/g) ?? []).join(' ');
  return { short: `${judged}. SHA-256 ${first}`, full: `${judged}. SHA-256 ${lock.hash}` };
}

/** One figure of the row below the heading. */
export interface CalculationFact {
  readonly label: string;
  readonly value: string;
  readonly flagged: boolean;
}

/** Verdict, revision and how the second computation came out. */
export function calculationFacts(
  head: CalculationHead,
  evaluation: Evaluation,
  sheet: CalculationSheet | null,
): CalculationFact[] {
  const { verdict, corners } = evaluation;
  return [
    { label: 'Revision', value: `${head.letter}, ${head.stateWord}`, flagged: head.lock === null },
    {
      label: 'Verdict',
      value: verdict.charAt(0).toUpperCase() + verdict.slice(1),
      flagged: verdict === 'fail' || verdict === 'open',
    },
    { label: 'Corners judged', value: String(corners), flagged: false },
    {
      label: 'Second computation',
      value: sheet === null ? 'none: not judged' : recomputedText(sheet),
      flagged: sheet === null || sheet.differing > 0,
    },
  ];
}
