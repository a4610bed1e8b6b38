import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { RouterOutlet } from '@angular/router';
import { Rail } from './app-rail.ts';
import { TopBar } from './app-top-bar.ts';
import { PageFocus } from './ui/page-focus.ts';

/** What stands around every page of a signed-in person: bar, rail, page, cautions. */
@Component({
  selector: 'app-shell',
  imports: [Rail, RouterOutlet, TopBar],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './app-shell.html',
  styleUrl: './app-shell.scss',
})
export class AppShell {
  constructor() {
    inject(PageFocus);
  }

  protected skipTo(main: HTMLElement): void {
    main.focus();
  }
}
