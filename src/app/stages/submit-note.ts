import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import type { Revision } from '../../../shared/contract/revision.ts';

const count = (number: number, one: string, many: string) =>
  number === 1 ? `One ${one}` : `${number} ${many}`;

/** What a checker will meet: findings still open, criteria that need a written justification. */
export function submitNote({ findings, port, state }: Revision, { criteria }: Evaluation): string {
  if (state !== 'draft') return '';
  const open = findings.filter((finding) => finding.state !== 'closed').length;
  const failing = criteria.filter(({ status }) => status === 'fail').length;
  const weak = criteria.filter(({ status }) => status === 'marginal' || status === 'open').length;
  const about =
    open === 0 ? 'No open findings.' : `${count(open, 'finding', 'findings')} to answer.`;
  if (failing === 0 && port?.criterion.status === 'fail') {
    return `${about} Port ${port.port} is overloaded: none of its stages can be locked.`;
  }
  if (failing > 0) {
    return `${about} ${count(failing, 'criterion fails', 'criteria fail')} and cannot pass a check.`;
  }
  return weak === 0
    ? about
    : `${about} ${count(weak, 'criterion needs', 'criteria need')} a justification at check.`;
}
