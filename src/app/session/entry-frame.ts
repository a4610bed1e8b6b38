import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { BrandMark } from '../ui/brand-mark.ts';
import { PageFocus, PageHeading } from '../ui/page-focus.ts';

/** The page before one is signed in: the idea as a drawing at the left, mark and form at the right. */
@Component({
  selector: 'app-entry-frame',
  imports: [BrandMark, PageHeading],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './entry-frame.html',
  styleUrl: './entry-frame.scss',
})
export class EntryFrame {
  readonly heading = input.required<string>();
  readonly where = input('');

  constructor() {
    inject(PageFocus);
  }

  /** Collector current of six base currents over the collector voltage, drawn; no figures are meant. */
  protected readonly curves = [
    'M201 680L207 632Q208 626 214 626L706 623',
    'M201 680L210 580Q211 573 217 573L709 566',
    'M201 680L213 526Q214 520 220 520L711 509',
    'M201 680L215 473Q216 467 222 467L711 453',
    'M201 680L217 420Q218 414 224 413L711 396',
    'M201 680L219 366Q220 360 226 360L709 339',
  ];
}
