import { ChangeDetectionStrategy, Component, inject, input, resource, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { ActivatedRoute, Router } from '@angular/router';
import { listAudit, verifyAudit, type AuditLine } from '../../../shared/contract/audit.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { EmptyState } from '../ui/empty-state.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { counted, dateAndTime } from '../ui/time-text.ts';

interface ChainCheck {
  readonly whole: boolean;
  readonly text: string;
  readonly faults: readonly string[];
}

/** The audit trail, newest first, and the proof that its chain is whole. Search and place are the query. */
@Component({
  selector: 'app-audit-page',
  imports: [EmptyState, Icon, LoadState, MatButton, PageHeading],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './audit-page.html',
  styleUrl: './audit-page.scss',
})
export class AuditPage {
  private readonly api = inject(ApiClient);
  private readonly announcer = inject(StatusAnnouncer);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);

  readonly search = input<string>();
  readonly before = input<string>();

  protected readonly audit = resource({
    params: () => ({ search: this.search(), before: this.before() }),
    loader: async ({ params }) => (await this.api.send(listAudit, { query: params })).value,
  });
  protected readonly check = signal<ChainCheck | null>(null);
  protected readonly dateAndTime = dateAndTime;

  protected narrow(search: string): void {
    this.go({ search: search === '' ? null : search, before: null });
  }

  protected older(lines: readonly AuditLine[]): void {
    this.go({ before: lines.at(-1)?.sequence ?? null });
  }

  protected newest(): void {
    this.go({ before: null });
  }

  protected detailOf(line: AuditLine): string {
    return JSON.stringify(line.detail, null, 2);
  }

  protected async verify(): Promise<void> {
    try {
      const { value } = await this.api.send(verifyAudit);
      const lines = counted(value.lines, 'line');
      this.check.set({
        whole: value.whole,
        text: value.whole
          ? `The chain is whole: ${lines}, head ${value.head.slice(0, 12)}.`
          : `The chain is broken: ${lines} read.`,
        faults: value.faults.map((fault) => `Line ${fault.sequence}: ${fault.problem}`),
      });
    } catch (error) {
      this.check.set({ whole: false, text: toApiProblem(error).detail, faults: [] });
    }
    this.announcer.say(this.check()?.text ?? '');
  }

  private go(queryParams: Record<string, string | number | null>): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams,
      queryParamsHandling: 'merge',
    });
  }
}
