import { ChangeDetectionStrategy, Component, inject, resource } from '@angular/core';
import { listMailbox } from '../../../shared/contract/people.ts';
import { ApiClient } from '../api/api-client.ts';
import { EmptyState } from '../ui/empty-state.ts';
import { LoadState } from '../ui/load-state.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { dateAndTime } from '../ui/time-text.ts';

/** What the local fake kept in place of a mail server: demo and development only. */
@Component({
  selector: 'app-mailbox-page',
  imports: [EmptyState, LoadState, PageHeading],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<div class="page">
    <h1 appPageHeading>Mailbox</h1>
    <p class="intro">Mail that was kept here and sent to nobody.</p>
    <div class="sheet">
      @if (mails.hasValue()) {
        @for (mail of mails.value(); track $index) {
          <article class="panel">
            <h2>{{ mail.subject }}</h2>
            <p class="small">to {{ mail.to }}, {{ dateAndTime(mail.atMs) }}</p>
            <pre>{{ mail.text }}</pre>
          </article>
        } @empty {
          <app-empty-state
            icon="mail"
            heading="No mail yet"
            text="Invitations, password resets and notices appear here."
          />
        }
      } @else {
        <app-load-state [resource]="mails" what="The mailbox" />
      }
    </div>
  </div>`,
  styles: `
    h1 {
      margin-top: 8px;
    }

    .intro {
      margin-bottom: 16px;
      color: var(--mat-sys-on-surface-variant);
    }

    article + article {
      border-top: 1px solid var(--app-line);
    }

    h2 {
      font: 600 16px/1.4 var(--app-text);
    }

    pre {
      margin: 8px 0 0;
      font: 400 14px/1.45 var(--app-text);
      white-space: pre-wrap;
      overflow-wrap: anywhere;
    }
  `,
})
export class MailboxPage {
  private readonly api = inject(ApiClient);

  protected readonly mails = resource({
    loader: async () => (await this.api.send(listMailbox)).value.mails,
  });
  protected readonly dateAndTime = dateAndTime;
}
