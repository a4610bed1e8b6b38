import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

const DAY: Intl.DateTimeFormatOptions = { day: 'numeric', month: 'short' };
const CLOCK: Intl.DateTimeFormatOptions = { hour: '2-digit', minute: '2-digit', hour12: false };

/** How much of a time is shown: `short` 9 Mar 16:40 · `long` 9 Mar 2026, 16:40 CET · `day` 9 Mar 2026 · `clock` 16:40:02. */
const FORMS = {
  short: { ...DAY, ...CLOCK },
  long: { ...DAY, year: 'numeric', ...CLOCK, timeZoneName: 'short' },
  day: { ...DAY, year: 'numeric' },
  clock: { ...CLOCK, second: '2-digit' },
} as const satisfies Record<string, Intl.DateTimeFormatOptions>;

/** A stored UTC time in the viewer's zone; ISO 8601 in UTC stands in the tooltip. */
@Component({
  selector: 'app-moment',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<time class="mono" [attr.datetime]="iso()" [title]="iso()">{{ text() }}</time>`,
  styles: `
    .mono {
      font-size: inherit;
    }
  `,
})
export class Moment {
  /** UTC, milliseconds since 1970. */
  readonly atMs = input.required<number>();
  readonly form = input<keyof typeof FORMS>('short');

  protected readonly iso = computed(() => new Date(this.atMs()).toISOString());
  protected readonly text = computed(() => {
    const text = new Intl.DateTimeFormat('en-GB', FORMS[this.form()]).format(this.atMs());
    return this.form() === 'short' ? text.replace(',', '') : text;
  });
}
