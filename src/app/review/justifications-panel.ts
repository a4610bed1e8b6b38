import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Criterion } from '../../../shared/checks/evaluation.ts';
import { criterionName } from '../../../shared/report/criterion-name.ts';
import { formatPercent } from '../../../shared/units/engineering-notation.ts';
import { CheckEditor } from './check-editor.ts';
import { PanelHead } from './panel-head.ts';

/** For every marginal or open criterion, why it is acceptable, in the checker's words. */
@Component({
  selector: 'app-justifications-panel',
  imports: [PanelHead],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@for (asked of asked(); track asked.id) {
    <section [attr.aria-labelledby]="'justify-' + asked.id">
      <app-panel-head
        [heading]="'Justification, ' + asked.name"
        [headingId]="'justify-' + asked.id"
        [icon]="asked.open ? 'circle-dashed' : 'triangle'"
        [tone]="asked.open ? 'info' : 'warn'"
      >
        <span class="mono">{{ asked.margin }}</span>
      </app-panel-head>
      <div class="body">
        @if (editable()) {
          <textarea
            class="box"
            rows="4"
            maxlength="4000"
            [attr.aria-labelledby]="'justify-' + asked.id"
            [placeholder]="asked.open ? 'Why it may stay open' : 'Why this margin is enough'"
            [value]="draft().justifications[asked.id] ?? ''"
            (input)="write(asked.id, $event)"
          ></textarea>
        } @else {
          <p class="prose">{{ draft().justifications[asked.id] || 'Not justified' }}</p>
        }
      </div>
    </section>
  }`,
  styles: `
    @use '../../theme/entry';

    section + section {
      border-top: 1px solid var(--mat-sys-outline-variant);
    }

    .body {
      padding: 12px 20px;
    }
  `,
})
export class JustificationsPanel {
  private readonly editor = inject(CheckEditor);

  readonly criteria = input.required<readonly Criterion[]>();
  readonly editable = input.required<boolean>();

  protected readonly draft = this.editor.draft;
  protected readonly asked = computed(() =>
    this.criteria()
      .filter(({ status }) => status === 'marginal' || status === 'open')
      .map(({ id, status, margin }) => ({
        id,
        name: lowerStart(criterionName(id)),
        open: status === 'open',
        margin: status === 'open' || margin === null ? '' : formatPercent(margin, { digits: 2 }),
      })),
  );

  protected write(id: string, event: Event): void {
    this.editor.justify(id, (event.target as HTMLTextAreaElement).value);
  }
}

/** A word goes small inside a heading, a symbol such as VCE stays. */
function lowerStart(name: string): string {
  return /^[A-Z][a-z]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name;
}
