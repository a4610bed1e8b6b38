import { expect, type Page } from '@playwright/test';
import type { DemoRole } from '../server/seed/demo-accounts.ts';
import { signIn, test } from './demo-test.ts';
import { PageWatch } from './page-watch.ts';

/** A page of the application, and how one gets to it from the desk (or, signed out, from nowhere). */
interface VisitedPage {
  readonly name: string;
  readonly who: DemoRole | null;
  readonly open: (page: Page) => Promise<void>;
  /** What the heading says. */
  readonly heading: RegExp;
  /** Parts, by selector, that only repeat others: looked at where they scroll, not by their rules. */
  readonly repeats?: string;
}

const at = (path: string) => async (page: Page) => {
  await page.goto(path);
};

/** From an address along links and tabs, by their names. */
const along =
  (start: string, ...links: readonly (string | RegExp)[]) =>
  async (page: Page) => {
    await page.goto(start);
    for (const name of links) {
      const exact = typeof name === 'string';
      const link = page.getByRole('link', { name, exact });
      await link.or(page.getByRole('tab', { name, exact })).first().click();
    }
  };

const inProject = (...links: readonly (string | RegExp)[]) => along('/projects', 'CR-40', ...links);
const ofPart = (...links: readonly string[]) => along('/parts?search=2N3904', '2N3904', ...links);

const PAGES: readonly VisitedPage[] = [
  { name: 'sign-in', who: null, open: at('/sign-in'), heading: /Sign in/ },
  { name: 'reset', who: null, open: at('/reset'), heading: /password/i },
  { name: 'new password', who: null, open: at('/reset-password#x'), heading: /new password/ },
  { name: 'invitation', who: null, open: at('/accept-invitation#x'), heading: /invitation/ },
  { name: 'new address', who: null, open: at('/confirm-email#x'), heading: /Confirm/ },
  { name: 'desk', who: 'designer', open: at('/desk'), heading: /My desk/ },
  { name: 'projects', who: 'designer', open: at('/projects'), heading: /Projects/ },
  { name: 'new project', who: 'designer', open: at('/projects/new'), heading: /New project/ },
  { name: 'stages', who: 'designer', open: inProject(), heading: /CR-40/ },
  { name: 'BOM note', who: 'exporter', open: inProject('BOM note'), heading: /CR-40/ },
  {
    name: 'issued BOM note',
    who: 'exporter',
    open: inProject('BOM note', /^CR-40-BOM-0001/),
    heading: /CR-40/,
  },
  { name: 'policy', who: 'designer', open: inProject('Policy'), heading: /CR-40/ },
  { name: 'members', who: 'designer', open: inProject('Members'), heading: /CR-40/ },
  { name: 'activity', who: 'designer', open: inProject('Activity'), heading: /CR-40/ },
  { name: 'new stage', who: 'designer', open: inProject('New stage'), heading: /New stage/ },
  { name: 'draft', who: 'designer', open: inProject('Q12'), heading: /Q12/ },
  { name: 'locked stage', who: 'designer', open: inProject('Q1'), heading: /Q1/ },
  {
    name: 'calculation',
    who: 'designer',
    open: inProject('Q1', 'Calculation'),
    heading: /Calculation sheet/,
    // Some thirty sections of lines alike.
    repeats: 'article section:nth-of-type(n + 4)',
  },
  { name: 'check', who: 'checker', open: along('/desk', /^Continue Q5/), heading: /Q5/ },
  { name: 'approval', who: 'approver', open: along('/desk', /^Read and lock Q4/), heading: /Q4/ },
  { name: 'parts', who: 'designer', open: at('/parts'), heading: /Parts/ },
  { name: 'part', who: 'designer', open: ofPart(), heading: /2N3904/ },
  { name: 'part in work', who: 'designer', open: ofPart('New revision'), heading: /2N3904/ },
  { name: 'new part', who: 'designer', open: at('/parts/new'), heading: /New part/ },
  { name: 'method', who: 'designer', open: at('/method'), heading: /Method/ },
  { name: 'account', who: 'designer', open: at('/account'), heading: /Account/ },
  { name: 'people', who: 'administrator', open: at('/admin/people'), heading: /People/ },
  { name: 'audit trail', who: 'administrator', open: at('/admin/audit'), heading: /Audit trail/ },
  { name: 'mailbox', who: 'administrator', open: at('/admin/mailbox'), heading: /Mailbox/ },
  { name: 'unknown address', who: 'designer', open: at('/nowhere'), heading: /No such page/ },
];

/** There, and whatever it loads has come. */
async function settle(page: Page, heading: RegExp): Promise<void> {
  await expect(page.getByRole('heading', { level: 1 })).toContainText(heading);
  await expect(page.getByRole('progressbar')).toHaveCount(0);
  await expect(page.getByText('Loading', { exact: true })).toHaveCount(0);
}

for (const { name, who, open, heading, repeats } of PAGES) {
  test(`${name}: accessible in light and dark, quiet, no wider than 320 px`, async ({ page }) => {
    test.slow();
    if (who !== null) await signIn(page, who);
    const watch = await PageWatch.over(page);
    await open(page);
    await settle(page, heading);
    await watch.expectSound(repeats);
  });
}

test('every page has a title of its own', async ({ signedIn, page }) => {
  test.slow();
  const people = new Map<DemoRole | null, Page>([[null, page]]);
  const titles: string[] = [];
  for (const { who, open, heading } of PAGES) {
    if (who !== null && !people.has(who)) people.set(who, await signedIn(who));
    const visitor = people.get(who) ?? page;
    await open(visitor);
    await settle(visitor, heading);
    await expect.poll(async () => titles.includes(await visitor.title())).toBe(false);
    titles.push(await visitor.title());
  }
  for (const title of titles) expect(title).toMatch(/^\S.* - Sinkwell$/);
});

test('after a change of page the focus is on its heading', async ({ signedIn }) => {
  const page = await signedIn('designer');
  const heading = page.getByRole('heading', { level: 1 });
  const follow = async (name: string | RegExp, shows: RegExp) => {
    await page
      .getByRole('link', { name, exact: typeof name === 'string' })
      .first()
      .click();
    await expect(heading).toContainText(shows);
    await expect(heading).toBeFocused();
  };
  await follow('Projects', /Projects/);
  await follow('CR-40', /CR-40/);
  await follow('New stage', /New stage/);
  await follow('Cancel', /CR-40/);
  await follow('Q12', /Q12/);
  await follow(/^My desk/, /My desk/);
});
