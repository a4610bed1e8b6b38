import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Revision } from '../../../shared/contract/revision.ts';
import { CAUTIONS } from '../../../shared/method/cautions.ts';
import { criterionName } from '../../../shared/report/criterion-name.ts';
import { portSentence } from '../../../shared/report/port-sentence.ts';
import { formatNumber, formatPercent } from '../../../shared/units/engineering-notation.ts';
import { Icon } from '../ui/icon.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { STATUS_ICONS } from '../ui/verdict-mark.ts';
import { LeastMargins } from './least-margins.ts';
import { lockedValues } from './locked-values.ts';
import { SectionHead } from './section-head.ts';

/** What an approver reads before signing: values, verdict, check record, standing of the part data, cautions. */
@Component({
  selector: 'app-lock-evidence',
  imports: [Icon, LeastMargins, SectionHead, SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './lock-evidence.html',
  styleUrl: './lock-evidence.scss',
})
export class LockEvidence {
  readonly revision = input.required<Revision>();

  protected readonly cautions = CAUTIONS;
  protected readonly values = computed(() => lockedValues(this.revision()));
  protected readonly engine = computed(() => {
    const { engine, corners } = this.revision().evaluation;
    return `engine ${engine}, ${corners} corners`;
  });
  protected readonly figure = computed(() => {
    const { check, evaluation } = this.revision();
    if (check === null) return null;
    const tool = evaluation.criteria.find(({ id }) => id === 'overdrive-factor')?.value ?? null;
    return {
      how: check.method === 'bench' ? 'bench reading' : 'by hand',
      own: formatNumber(check.overdriveFactor, { digits: 4 }),
      tool: formatNumber(tool, { pad: true }),
      difference:
        check.difference === null ? '–' : formatPercent(Math.abs(check.difference), { digits: 2 }),
      note: check.note,
      reason: check.reason,
    };
  });
  protected readonly justifications = computed(() =>
    Object.entries(this.revision().check?.justifications ?? {}).map(([id, text]) => ({
      id,
      name: criterionName(id),
      text,
    })),
  );
  protected readonly findings = computed(() => {
    const { findings } = this.revision();
    const acted = (act: 'answered' | 'closed') =>
      findings.filter(({ history }) => history.some((event) => event.act === act)).length;
    return { raised: findings.length, answered: acted('answered'), closed: acted('closed') };
  });
  protected readonly port = computed(() => {
    const { port } = this.revision();
    if (port === null) return null;
    const { status } = port.criterion;
    const tone = { pass: 'ok', fail: 'fail', marginal: 'warn', open: 'warn', stated: '' }[status];
    return { text: portSentence(port), icon: STATUS_ICONS[status], tone };
  });
  protected readonly parts = computed(() =>
    this.revision().partStanding.map((part) => ({
      ...part,
      text:
        `${part.partNumber} data: library revision ${part.revision}, ` +
        (part.verified ? 'verified' : 'unverified'),
      changed:
        part.latestRevision > part.revision
          ? `The library now has revision ${part.latestRevision}.`
          : null,
    })),
  );
}
