import {
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  resource,
  signal,
  viewChild,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import {
  MatAutocompleteModule,
  type MatAutocompleteSelectedEvent,
} from '@angular/material/autocomplete';
import { Router } from '@angular/router';
import { debounceTime } from 'rxjs';
import type * as z from 'zod';
import { search, type SearchHit } from '../../shared/contract/search.ts';
import { ApiClient } from './api/api-client.ts';
import { Appearance } from './session/appearance.ts';
import { Icon } from './ui/icon.ts';

const KINDS = {
  project: 'Project',
  stage: 'Stage',
  part: 'Part',
  'bom-note': 'BOM note',
} as const;

/** Finds stages, projects, parts and notes by name; `/` goes there from anywhere. */
@Component({
  selector: 'app-search',
  imports: [Icon, MatAutocompleteModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './app-search.html',
  styleUrl: './app-search.scss',
  host: { role: 'search', '(document:keydown)': 'focusByKey($event)' },
})
export class Search {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly appearance = inject(Appearance);
  private readonly box = viewChild.required<ElementRef<HTMLInputElement>>('box');

  protected readonly kinds = KINDS;
  protected readonly shortcuts = this.appearance.shortcuts;
  protected readonly text = signal('');
  private readonly settled = toSignal(toObservable(this.text).pipe(debounceTime(200)));
  /** Undefined, which asks nothing, while the box is empty. */
  private readonly wanted = computed(() => {
    const text = this.settled()?.trim() ?? '';
    return text === '' ? undefined : text;
  });
  protected readonly hits = resource({
    params: () => this.wanted(),
    loader: async ({ params: text }) =>
      (await this.api.send(search, { query: { text } })).value.hits,
  });

  protected openHit(event: MatAutocompleteSelectedEvent): void {
    const hit = event.option.value as z.infer<typeof SearchHit>;
    event.option.deselect();
    this.text.set('');
    this.box().nativeElement.value = '';
    void this.router.navigateByUrl(hit.link);
  }

  protected focusByKey(event: KeyboardEvent): void {
    if (event.key !== '/' || !this.appearance.shortcutApplies(event)) return;
    event.preventDefault();
    this.box().nativeElement.focus();
  }
}
