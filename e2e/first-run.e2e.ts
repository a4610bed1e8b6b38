import { expect, test, type Page } from '@playwright/test';
import { PageWatch } from './page-watch.ts';
import { startServer, type RunningServer } from './server.ts';

const FIRST = {
  name: 'Ada Berg',
  email: 'ada.berg@firm.example',
  password: 'lamp-gravel-tulip-19',
};
const SECOND = {
  name: 'Carl Dorn',
  email: 'carl.dorn@firm.example',
  password: 'river-candle-moss-73',
};

let server: RunningServer;

test.beforeEach(async () => {
  server = await startServer(false);
});

test.afterEach(async () => {
  await server.stop();
});

async function setUp(page: Page): Promise<void> {
  const code = /Set-up code, shown this once: (\S+)/.exec(server.output())?.[1] ?? '';
  await page.goto(server.url);
  await expect(page.getByRole('heading', { name: 'Set up' })).toBeVisible();
  await page.getByLabel('Set-up code').fill(code);
  await page.getByLabel('Legal owner').fill('Firm of the first run');
  await page.getByLabel('Your name').fill(FIRST.name);
  await page.getByLabel('E-mail').fill(FIRST.email);
  await page.getByLabel('Password', { exact: true }).fill(FIRST.password);
  await page.getByRole('button', { name: 'Make the administrator' }).click();
  await expect(page.getByRole('heading', { name: 'My desk' })).toBeVisible();
}

/** @returns the link of the invitation, as the mail has it */
async function invite(page: Page): Promise<string> {
  await page.getByRole('button', { name: FIRST.name }).click();
  await page.getByRole('menuitem', { name: 'People' }).click();
  await page.getByLabel('Name', { exact: true }).fill(SECOND.name);
  await page.getByLabel('E-mail').fill(SECOND.email);
  await page.getByRole('button', { name: 'Invite' }).click();
  await expect(page.getByRole('row').filter({ hasText: SECOND.email })).toContainText('Invited');
  const mail = page.getByRole('article').filter({ hasText: `to ${SECOND.name}` });
  await expect(async () => {
    await page.goto(`${server.url}/admin/mailbox`);
    await expect(mail).toBeVisible({ timeout: 2000 });
  }).toPass();
  return /http\S+/.exec(await mail.innerText())?.[0] ?? '';
}

test('the printed code makes the first administrator, whose invitation brings in the second person', async ({
  page,
  browser,
}) => {
  await setUp(page);
  const link = await invite(page);
  const other = await (await browser.newContext()).newPage();
  await other.goto(link);
  await expect(other.getByRole('heading', { name: 'Take up the invitation' })).toBeVisible();
  await other.getByLabel('New password').fill(SECOND.password);
  await other.getByRole('button', { name: 'Set the password' }).click();
  await other.getByRole('link', { name: 'Sign in' }).click();
  await other.getByLabel('E-mail').fill(SECOND.email);
  await other.getByLabel('Password', { exact: true }).fill(SECOND.password);
  await other.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(other.getByRole('heading', { name: 'My desk' })).toBeVisible();
  await expect(other.getByRole('button', { name: SECOND.name })).toBeVisible();
  await other.context().close();
});

test('the set-up page is accessible in light and dark, quiet, no wider than 320 px', async ({
  page,
}) => {
  const watch = await PageWatch.over(page);
  await page.goto(server.url);
  await expect(page.getByRole('heading', { name: 'Set up' })).toBeVisible();
  await watch.expectSound();
});

test('a wrong set-up code is refused and makes nobody', async ({ page }) => {
  await page.goto(server.url);
  await page.getByLabel('Set-up code').fill('WRONG-CODE-0000');
  await page.getByLabel('Legal owner').fill('Firm of the first run');
  await page.getByLabel('Your name').fill(FIRST.name);
  await page.getByLabel('E-mail').fill(FIRST.email);
  await page.getByLabel('Password', { exact: true }).fill(FIRST.password);
  await page.getByRole('button', { name: 'Make the administrator' }).click();
  await expect(page.getByLabel('Set-up code')).toHaveAccessibleDescription(
    'Is not the one the server printed.',
  );
  await page.goto(server.url);
  await expect(page.getByRole('heading', { name: 'Set up' })).toBeVisible();
});
