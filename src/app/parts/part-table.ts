import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { RouterLink } from '@angular/router';
import type * as z from 'zod';
import type { listParts, PartRow } from '../../../shared/contract/part.ts';
import { Icon } from '../ui/icon.ts';
import { Moment } from '../ui/moment.ts';
import { CONFIDENCE_WORDS, KIND_WORDS } from './part-kinds.ts';

type Sort = z.output<typeof listParts.query>['sort'];

/** Parts by their latest revision; a head of a column sorts by it. */
@Component({
  selector: 'app-part-table',
  imports: [Icon, Moment, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './part-table.html',
  styleUrl: './part-table.scss',
})
export class PartTable {
  readonly rows = input.required<readonly PartRow[]>();
  readonly sort = input.required<Sort>();
  readonly direction = input.required<'asc' | 'desc'>();
  readonly sortChosen = output<Sort>();

  protected readonly kinds = KIND_WORDS;
  protected readonly confidences = CONFIDENCE_WORDS;
  protected readonly columns: readonly { readonly sort: Sort | null; readonly text: string }[] = [
    { sort: 'partNumber', text: 'Part number' },
    { sort: null, text: 'Kind' },
    { sort: 'summary', text: 'Description' },
    { sort: 'package', text: 'Package' },
    { sort: null, text: 'Data' },
    { sort: null, text: 'Source' },
    { sort: null, text: 'Revision' },
    { sort: 'changed', text: 'Changed' },
  ];

  protected sortOf(sort: Sort | null): 'ascending' | 'descending' | null {
    if (sort === null || sort !== this.sort()) return null;
    return this.direction() === 'asc' ? 'ascending' : 'descending';
  }
}
