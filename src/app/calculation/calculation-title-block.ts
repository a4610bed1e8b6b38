import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import { NOTHING, utcDate } from '../../../shared/report/bom-note-text.ts';
import {
  calculationContent,
  type CalculationHead,
  calculationIdentification,
} from '../../../shared/report/calculation-facts.ts';

interface BlockField {
  readonly label: string;
  readonly value: string;
  readonly flagged?: boolean;
}

/** The title block of ISO 7200, and below it what vouches for the content; in print at the foot of every page. */
@Component({
  selector: 'app-calculation-title-block',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<dl>
      @for (field of fields(); track field.label) {
        <div>
          <dt>{{ field.label }}</dt>
          <dd [class.flagged]="field.flagged">{{ field.value }}</dd>
        </div>
      }
    </dl>
    <p class="small">
      <span>Sinkwell, engine {{ evaluation().engine }}</span> <span>{{ content() }}</span>
    </p>`,
  styles: `
    :host {
      display: block;
      break-inside: avoid;
    }

    dl {
      display: grid;
      grid-template-columns: repeat(4, minmax(0, 1fr));
      border: 1px solid var(--app-ink);
      border-width: 1px 0 0 1px;
    }

    div {
      min-width: 0;
      padding: 4px 8px 6px;
      border: 1px solid var(--app-ink);
      border-width: 0 1px 1px 0;
      overflow-wrap: anywhere;
    }

    dt {
      color: var(--mat-sys-on-surface-variant);
      font-size: 12px;
      line-height: 16px;
    }

    dd {
      font-weight: 600;
    }

    .flagged {
      color: var(--app-fail);
    }

    p {
      display: flex;
      flex-wrap: wrap;
      gap: 4px 16px;
      justify-content: space-between;
      margin-top: 8px;
    }

    @media screen and (width < 700px) {
      dl {
        grid-template-columns: repeat(2, minmax(0, 1fr));
      }
    }

    @media print {
      div {
        padding: 2px 6px 3px;
      }

      dt {
        font-size: 7pt;
        line-height: 9pt;
      }

      dd {
        font-size: 9pt;
        line-height: 11pt;
      }

      p {
        margin-top: 4px;
        font-size: 8pt;
      }
    }
  `,
})
export class CalculationTitleBlock {
  readonly head = input.required<CalculationHead>();
  readonly evaluation = input.required<Evaluation>();

  protected readonly content = computed(
    () => calculationContent(this.head(), this.evaluation()).short,
  );
  protected readonly fields = computed<readonly BlockField[]>(() => {
    const head = this.head();
    const { lock } = head;
    const status = lock === null ? `Not released (${head.stateWord})` : head.stateWord;
    return [
      { label: 'Legal owner', value: head.legalOwner },
      { label: 'Creator', value: head.designer },
      { label: 'Checker', value: head.checker ?? 'none' },
      { label: 'Document type', value: 'Calculation sheet' },
      { label: 'Responsible department', value: head.department ?? NOTHING },
      { label: 'Approval person', value: lock?.approver ?? 'none' },
      { label: 'Document status', value: status, flagged: lock === null },
      { label: 'Date of issue', value: lock === null ? 'none' : utcDate(lock.signedAtMs) },
      { label: 'Title', value: `${head.reference} ${head.title}` },
      { label: 'Supplementary title', value: `${head.projectCode} ${head.projectTitle}` },
      { label: 'Identification number', value: calculationIdentification(head) },
      { label: 'Revision, language', value: `${head.letter}, en` },
    ];
  });
}
