import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router, RouterLink } from '@angular/router';
import { filter, map } from 'rxjs';
import { DeskCount } from './session/desk-count.ts';
import { Icon } from './ui/icon.ts';

/** The main pages; a rail at the left, a bar at the bottom of narrow windows. */
@Component({
  selector: 'app-rail',
  imports: [Icon, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './app-rail.html',
  styleUrl: './app-rail.scss',
})
export class Rail {
  private readonly router = inject(Router);
  protected readonly waiting = inject(DeskCount).waiting;

  protected readonly pages = [
    { link: '/desk', icon: 'inbox', text: 'My desk' },
    { link: '/projects', icon: 'projects', text: 'Projects' },
    { link: '/parts', icon: 'parts', text: 'Parts' },
    { link: '/method', icon: 'book', text: 'Method' },
  ] as const;

  private readonly path = toSignal(
    this.router.events.pipe(
      filter((event) => event instanceof NavigationEnd),
      map((event) => event.urlAfterRedirects),
    ),
    { initialValue: this.router.url },
  );
  /** The page of the rail on which one is; a project's pages belong to Projects. */
  protected readonly section = computed(() => {
    const first = this.path().split(/[/?#]/)[1] ?? '';
    return first === 'p' ? '/projects' : `/${first}`;
  });
}
