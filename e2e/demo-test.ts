import { test as base, type BrowserContext, type Page } from '@playwright/test';
import { DEMO_PEOPLE, type DemoRole } from '../server/seed/demo-accounts.ts';
import { startServer, type RunningServer } from './server.ts';

interface Demo {
  /** Opens a browser of their own for somebody of the demo, signed in and on their desk. */
  readonly signedIn: (who: DemoRole) => Promise<Page>;
}

interface DemoServer {
  /** One for all tests of a run; each makes what it changes. */
  readonly server: RunningServer;
}

/** Tests of the demo: a server with its two projects and five people. */
export const test = base.extend<Demo, DemoServer>({
  server: [
    // eslint-disable-next-line no-empty-pattern -- Playwright asks for the pattern
    async ({}, use) => {
      const server = await startServer(true);
      await use(server);
      await server.stop();
    },
    { scope: 'worker', timeout: 120_000 },
  ],
  baseURL: async ({ server }, use) => {
    await use(server.url);
  },
  signedIn: async ({ browser }, use) => {
    const contexts: BrowserContext[] = [];
    await use(async (who) => {
      const context = await browser.newContext();
      contexts.push(context);
      const page = await context.newPage();
      await signIn(page, who);
      return page;
    });
    for (const context of contexts) await context.close();
  },
});

/** Types e-mail and password into the sign-in page, from whatever page leads there. */
export async function signIn(page: Page, who: DemoRole, from = '/'): Promise<void> {
  const { email, password } = DEMO_PEOPLE[who];
  await page.goto(from);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.getByRole('banner').waitFor();
}
