import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { MatMenuModule } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { Search } from './app-search.ts';
import { Appearance } from './session/appearance.ts';
import { SessionStore } from './session/session-store.ts';
import { BrandMark } from './ui/brand-mark.ts';
import { Icon } from './ui/icon.ts';
import { PageTitle } from './ui/page-title.ts';

/** Where one is, the search, help and the own account. */
@Component({
  selector: 'app-top-bar',
  imports: [BrandMark, Icon, MatMenuModule, RouterLink, Search],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './app-top-bar.html',
  styleUrl: './app-top-bar.scss',
  host: { '(document:keydown)': 'openHelpByKey($event)' },
})
export class TopBar {
  private readonly dialog = inject(MatDialog);
  private readonly session = inject(SessionStore);
  private readonly appearance = inject(Appearance);

  protected readonly trail = inject(PageTitle).trail;
  protected readonly person = this.session.person;
  protected readonly administrator = computed(() => this.person()?.administrator === true);
  protected readonly demo = computed(() => this.session.session()?.demo === true);
  protected readonly initials = computed(() => initialsOf(this.person()?.name ?? ''));
  protected readonly parent = computed(() => this.trail().at(-2));

  protected async openHelp(): Promise<void> {
    const { Help } = await import('./app-help.ts');
    this.dialog.open(Help);
  }

  protected openHelpByKey(event: KeyboardEvent): void {
    if (event.key !== '?' || !this.appearance.shortcutApplies(event)) return;
    event.preventDefault();
    void this.openHelp();
  }

  protected signOut(): void {
    void this.session.signOut();
  }
}

/** First letters of the first and the last word of a name. */
function initialsOf(name: string): string {
  const words = name.split(/[\s.]+/).filter((word) => word !== '');
  return [words[0], words.length > 1 ? words.at(-1) : undefined]
    .map((word) => word?.[0]?.toUpperCase() ?? '')
    .join('');
}
