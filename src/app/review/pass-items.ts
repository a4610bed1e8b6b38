import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import { DIFFERENCE_NEEDS_REASON, type ReviewFinding } from '../../../shared/contract/check.ts';
import { figureDifference, missingForPass } from '../../../shared/review/pass-conditions.ts';
import { formatPercent } from '../../../shared/units/engineering-notation.ts';
import type { CheckDraft } from './check-draft.ts';

/** One condition of a pass. */
export interface PassItem {
  readonly done: boolean;
  readonly text: string;
  /** Completes "Pass opens once …"; only where it is not done. */
  readonly once: string;
}

/** Everything that must hold before a check can pass, in the order of the page. */
export function passItems(
  draft: CheckDraft,
  evaluation: Evaluation,
  findings: readonly ReviewFinding[],
): PassItem[] {
  return [
    ...failing(evaluation),
    ownFigure(draft, evaluation),
    ...justified(draft, evaluation),
    allRead(draft, evaluation),
    allClosed(findings),
  ];
}

/**
 * Why the check cannot pass yet, as one sentence.
 *
 * @returns null when it can
 */
export function passReason(items: readonly PassItem[]): string | null {
  const open = items.filter(({ done }) => !done).map(({ once }) => once);
  const last = open.pop();
  if (last === undefined) return null;
  return `Pass opens once ${open.length === 0 ? last : `${open.join(', ')} and ${last}`}.`;
}

function failing({ verdict, criteria }: Evaluation): PassItem[] {
  const count = criteria.filter(({ status }) => status === 'fail').length;
  if (count === 0 && verdict !== 'fail') return [];
  const text =
    count === 0
      ? 'The stage fails'
      : `No failing criterion, ${count} fail${count === 1 ? 's' : ''}`;
  return [{ done: false, text, once: 'nothing fails' }];
}

/** The rules of the figure alone: everything else is taken as done. */
function ownFigure(draft: CheckDraft, { criteria }: Evaluation): PassItem {
  const settled = criteria.map((criterion) => ({ ...criterion, status: 'pass' }));
  const read = criteria.map(({ id }) => id);
  const stage = { verdict: 'pass', criteria: settled };
  const missing = missingForPass(trimmed({ ...draft, read }), stage, [], DIFFERENCE_NEEDS_REASON);
  const difference = figureDifference(draft, criteria);
  const shown =
    difference === null ? '' : `, ${formatPercent(Math.abs(difference), { digits: 2 })}`;
  return missing.length === 0
    ? { done: true, text: `Own figure entered${shown}`, once: '' }
    : { done: false, text: missing.join(' '), once: 'your own figure is complete' };
}

function trimmed(draft: CheckDraft): CheckDraft {
  return { ...draft, note: draft.note.trim(), reason: draft.reason.trim() };
}

function justified({ justifications }: CheckDraft, { criteria }: Evaluation): PassItem[] {
  const asked = criteria.filter(({ status }) => status === 'marginal' || status === 'open');
  if (asked.length === 0) return [];
  const open = asked.filter(({ id }) => (justifications[id] ?? '').trim() === '').length;
  const what =
    asked.length === 1
      ? `${asked[0]?.status === 'open' ? 'Open' : 'Marginal'} criterion`
      : `${asked.length} marginal or open criteria`;
  return [
    {
      done: open === 0,
      text: open === 0 ? `${what} justified` : `${what} justified, ${open} to write`,
      once: open === 1 ? 'one justification is written' : `${open} justifications are written`,
    },
  ];
}

function allRead({ read }: CheckDraft, { criteria }: Evaluation): PassItem {
  const ticked = criteria.filter(({ id }) => read.includes(id)).length;
  const done = ticked === criteria.length;
  const text = done
    ? `${criteria.length} criteria read`
    : `${criteria.length} criteria read, ${ticked} so far`;
  return { done, text, once: 'all criteria are read' };
}

function allClosed(findings: readonly ReviewFinding[]): PassItem {
  const open = findings.filter(({ state }) => state !== 'closed');
  const numbers = open.map(({ number }) => number);
  const names =
    numbers.length === 1 ? `finding ${numbers[0] ?? ''} is` : `findings ${numbers.join(', ')} are`;
  return open.length === 0
    ? { done: true, text: 'No open finding', once: '' }
    : { done: false, text: `No open finding, ${open.length} to close`, once: `${names} closed` };
}
