import {
  computed,
  DestroyRef,
  DOCUMENT,
  effect,
  inject,
  Injectable,
  signal,
  type Signal,
} from '@angular/core';
import { TitleStrategy, type RouterStateSnapshot } from '@angular/router';

/** One step of the way to a page; the last one is the page itself and has no link. */
export interface Crumb {
  readonly text: string;
  readonly link?: readonly string[];
}

/**
 * The way to the page on show: breadcrumb of the top bar and title of the window, "what - where - Sinkwell".
 * Until a page knows its names, the title of its route stands.
 */
@Injectable({ providedIn: 'root' })
export class PageTitle extends TitleStrategy {
  private readonly document = inject(DOCUMENT);
  private readonly routeTitle = signal('');
  private readonly pages = signal<readonly Signal<readonly Crumb[]>[]>([]);

  readonly trail = computed<readonly Crumb[]>(() => {
    const named = this.pages().at(-1)?.() ?? [];
    return named.length > 0 ? named : [{ text: this.routeTitle() }];
  });
  readonly title = computed(() =>
    [...this.trail().map((crumb) => crumb.text)]
      .reverse()
      .concat('Sinkwell')
      .filter((text) => text !== '')
      .join(' - '),
  );

  constructor() {
    super();
    effect(() => {
      this.document.title = this.title();
    });
  }

  override updateTitle(snapshot: RouterStateSnapshot): void {
    this.routeTitle.set(this.buildTitle(snapshot) ?? '');
  }

  /** Puts a page on top; the returned function takes it off. */
  enter(trail: Signal<readonly Crumb[]>): () => void {
    this.pages.update((pages) => [...pages, trail]);
    return () => {
      this.pages.update((pages) => pages.filter((page) => page !== trail));
    };
  }
}

/**
 * Declares the way to the page being built, for as long as it lives; call it in a field or constructor.
 *
 * @param trail read again whenever a signal in it changes; empty while names are not known
 */
export function usePageTrail(trail: () => readonly Crumb[]): void {
  const leave = inject(PageTitle).enter(computed(trail));
  inject(DestroyRef).onDestroy(leave);
}
