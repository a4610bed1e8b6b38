import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type * as z from 'zod';
import type { Activity } from '../../../shared/contract/audit.ts';
import { clockTime, dayHeading } from './time-text.ts';

export type ActivityLine = z.infer<typeof Activity>;

/** What happened, by day, newest first: time, the square of the mark on a line, a sentence. */
@Component({
  selector: 'app-activity-list',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@for (day of days(); track day.heading) {
      <h3>{{ day.heading }}</h3>
      <ol>
        @for (line of day.lines; track line.sequence) {
          <li>
            <time class="mono">{{ clockTime(line.atMs) }}</time>
            <span class="point" aria-hidden="true"></span>
            <span>
              @if (line.whoId === ownId()) {
                You
              } @else {
                <b>{{ line.who ?? 'The server' }}</b>
              }
              {{ line.summary }}
            </span>
          </li>
        }
      </ol>
    } @empty {
      <p class="small">Nothing has happened yet.</p>
    }`,
  styleUrl: './activity-list.scss',
})
export class ActivityList {
  readonly lines = input.required<readonly ActivityLine[]>();
  /** The reader, who is called "You". */
  readonly ownId = input<string | null>(null);
  readonly nowMs = input(Date.now());

  protected readonly clockTime = clockTime;
  protected readonly days = computed(() => {
    const days: { heading: string; lines: ActivityLine[] }[] = [];
    for (const line of this.lines()) {
      const heading = dayHeading(line.atMs, this.nowMs());
      const last = days.at(-1);
      if (last?.heading === heading) last.lines.push(line);
      else days.push({ heading, lines: [line] });
    }
    return days;
  });
}
