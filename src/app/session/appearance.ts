import { DOCUMENT, effect, inject, Injectable, signal } from '@angular/core';

export const SCHEMES = ['system', 'light', 'dark'] as const;
export type Scheme = (typeof SCHEMES)[number];
export const DENSITIES = ['comfortable', 'standard', 'tight'] as const;
export type Density = (typeof DENSITIES)[number];

interface Choice {
  scheme: Scheme;
  density: Density;
  /** Whether `/` and `?` act as shortcuts. */
  shortcuts: boolean;
}

const KEY = 'sinkwell.appearance';

/** How this browser shows the application; kept in its local storage. */
@Injectable({ providedIn: 'root' })
export class Appearance {
  private readonly document = inject(DOCUMENT);
  readonly scheme = signal<Scheme>('system');
  readonly density = signal<Density>('standard');
  readonly shortcuts = signal(true);

  constructor() {
    const stored = this.read();
    this.scheme.set(SCHEMES.find((each) => each === stored.scheme) ?? 'system');
    this.density.set(DENSITIES.find((each) => each === stored.density) ?? 'standard');
    this.shortcuts.set(stored.shortcuts !== false);
    effect(() => {
      const root = this.document.documentElement;
      root.dataset['scheme'] = this.scheme();
      root.dataset['density'] = this.density();
      this.write({
        scheme: this.scheme(),
        density: this.density(),
        shortcuts: this.shortcuts(),
      });
    });
  }

  /** Whether a single key may act: shortcuts are on, no modifier is held, and nothing is being typed. */
  shortcutApplies(event: KeyboardEvent): boolean {
    if (!this.shortcuts() || event.ctrlKey || event.metaKey || event.altKey) return false;
    const target = event.target as HTMLElement | null;
    return target?.closest('input, textarea, select, [contenteditable], [role="dialog"]') === null;
  }

  /** A browser may refuse storage, and anybody may have edited it: then the defaults stand. */
  private read(): Partial<Record<keyof Choice, unknown>> {
    try {
      const stored: unknown = JSON.parse(localStorage.getItem(KEY) ?? '{}');
      return typeof stored === 'object' && stored !== null ? stored : {};
    } catch {
      return {};
    }
  }

  private write(choice: Choice): void {
    try {
      localStorage.setItem(KEY, JSON.stringify(choice));
    } catch {
      // without storage the choice lasts as long as the page
    }
  }
}
