import { LiveAnnouncer } from '@angular/cdk/a11y';
import {
  afterNextRender,
  DestroyRef,
  Directive,
  ElementRef,
  inject,
  Injectable,
  Injector,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router } from '@angular/router';
import { PageTitle } from './page-title.ts';

/** After a change of page, focus goes to its heading and the new title is announced once. */
@Injectable({ providedIn: 'root' })
export class PageFocus {
  private readonly announcer = inject(LiveAnnouncer);
  private readonly pageTitle = inject(PageTitle);
  private readonly injector = inject(Injector);
  private headings: HTMLElement[] = [];
  private path: string | null = null;
  private waiting = false;

  constructor() {
    inject(Router)
      .events.pipe(takeUntilDestroyed())
      .subscribe((event) => {
        if (event instanceof NavigationEnd) this.arrive(event.urlAfterRedirects);
      });
  }

  /** A heading has come into being; returns how to take it back. */
  add(heading: HTMLElement): () => void {
    this.headings.push(heading);
    this.settle();
    return () => {
      this.headings = this.headings.filter((each) => each !== heading);
    };
  }

  /** Filters and sorting live in the query: they move nothing. The first page keeps the browser's own focus. */
  private arrive(url: string): void {
    const path = url.split(/[?#]/)[0] ?? '';
    const first = this.path === null;
    if (path === this.path) return;
    this.path = path;
    if (first) return;
    this.waiting = true;
    this.settle();
  }

  private settle(): void {
    if (!this.waiting) return;
    afterNextRender(
      () => {
        const heading = this.headings.at(-1);
        if (!this.waiting || !heading) return;
        this.waiting = false;
        heading.focus();
        void this.announcer.announce(this.pageTitle.title(), 'polite');
      },
      { injector: this.injector },
    );
  }
}

/** Marks the one `h1` of a page. */
@Directive({ selector: 'h1[appPageHeading]', host: { tabindex: '-1' } })
export class PageHeading {
  constructor() {
    const element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    inject(DestroyRef).onDestroy(inject(PageFocus).add(element));
  }
}
