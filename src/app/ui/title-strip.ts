import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { PageHeading } from './page-focus.ts';

/**
 * First row of every record: reference in large mono, then cells with label over value, then acts. It is the
 * page's heading; cells are `app-strip-cell`, acts carry `stripActions`.
 */
@Component({
  selector: 'app-title-strip',
  imports: [PageHeading],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<h1 appPageHeading class="reference">
      <span>{{ reference() }}</span>
      <span class="visually-hidden">, {{ name() }}</span>
    </h1>
    <div class="cells"><ng-content select="app-strip-cell" /></div>
    <div class="acts"><ng-content select="[stripActions]" /></div>`,
  styleUrl: './title-strip.scss',
})
export class TitleStrip {
  readonly reference = input.required<string>();
  /** Read after the reference, for who does not see the cells: title of the record. */
  readonly name = input.required<string>();
}

/** One cell of the strip; a `wide` one takes the room that is left. */
@Component({
  selector: 'app-strip-cell',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<span class="label">{{ label() }}</span> <span class="value"><ng-content /></span>`,
  styleUrl: './strip-cell.scss',
  host: { '[class.wide]': 'wide()', '[class.strong]': 'strong()' },
})
export class StripCell {
  readonly label = input.required<string>();
  readonly wide = input(false);
  /** Set in 16/600, as titles and counts are. */
  readonly strong = input(false);
}
