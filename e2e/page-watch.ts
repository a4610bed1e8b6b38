import { AxeBuilder } from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';

const LEVELS = ['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa'];

/** Everything a page says against itself: errors, console messages, breaches of its own policy. */
export class PageWatch {
  readonly complaints: string[] = [];

  private constructor(private readonly page: Page) {}

  static async over(page: Page): Promise<PageWatch> {
    const watch = new PageWatch(page);
    page.on('pageerror', (error) => watch.complaints.push(`error: ${error.message}`));
    page.on('console', (message) => {
      if (message.type() === 'error') watch.complaints.push(`console: ${message.text()}`);
    });
    await page.exposeFunction('tellBreach', (breach: string) => watch.complaints.push(breach));
    await page.addInitScript(() => {
      document.addEventListener('securitypolicyviolation', ({ violatedDirective, blockedURI }) => {
        const { tellBreach } = window as unknown as { tellBreach: (breach: string) => void };
        tellBreach(`policy: ${violatedDirective} against ${blockedURI}`);
      });
    });
    return watch;
  }

  /**
   * Accessible in light on a wide screen and in dark on a narrow one, which needs no sideways scrolling, and nothing to
   * complain of. Scheme and width change different rules, so two passes see what four would.
   *
   * @param repeats selector of parts alike to others, which are passed over
   */
  async expectSound(repeats?: string): Promise<void> {
    await this.page.emulateMedia({ colorScheme: 'light' });
    await this.expectAccessible(repeats);
    await this.page.emulateMedia({ colorScheme: 'dark' });
    await this.expectNoSidewaysScroll();
    await this.expectAccessible(repeats);
    expect(this.complaints).toEqual([]);
  }

  /** WCAG 2.2 AA as far as a machine can tell, once nothing moves any more. */
  private async expectAccessible(repeats?: string): Promise<void> {
    await this.page.evaluate(() =>
      Promise.all(document.getAnimations().map(({ finished }) => finished.catch(() => null))),
    );
    const axe = new AxeBuilder({ page: this.page }).withTags(LEVELS);
    if (repeats !== undefined) axe.exclude(repeats);
    const { violations } = await axe.analyze();
    const found = violations.map(({ id, nodes }) => ({
      id,
      at: nodes.map(({ html, failureSummary }) => `${html.slice(0, 160)} ${failureSummary ?? ''}`),
    }));
    expect(found).toEqual([]);
  }

  /** WCAG 1.4.10: a window of 320 px, which it becomes, needs no scrolling sideways. */
  private async expectNoSidewaysScroll(): Promise<void> {
    await this.page.setViewportSize({ width: 320, height: 720 });
    const widthPx = await this.page.evaluate(() => document.documentElement.scrollWidth);
    expect(widthPx).toBeLessThanOrEqual(320);
  }
}
