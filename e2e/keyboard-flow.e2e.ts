import { expect, type Locator, type Page } from '@playwright/test';
import { DEMO_PEOPLE, type DemoRole } from '../server/seed/demo-accounts.ts';
import { test } from './demo-test.ts';
import { relayDriver } from './relay-driver.ts';
import { StageSheet } from './stage-sheet.ts';

const REFERENCE = 'Q41';
/** More stops than the longest page has. */
const MOST_STOPS = 250;

/** Nothing but the keys of a keyboard, at one page. */
class Keyboard {
  constructor(private readonly page: Page) {}

  /** Tab by tab until the element has the focus. */
  async reach(target: Locator, key: 'Tab' | 'Shift+Tab' = 'Tab'): Promise<void> {
    await target.waitFor();
    for (let stops = 0; stops < MOST_STOPS; stops += 1) {
      if (await target.evaluate((element) => element === document.activeElement)) return;
      await this.page.keyboard.press(key);
    }
    throw new Error(`${target.toString()} is not in the order of the Tab key`);
  }

  async press(target: Locator, key = 'Enter'): Promise<void> {
    await this.reach(target);
    await this.page.keyboard.press(key);
  }

  async type(target: Locator, text: string): Promise<void> {
    await this.reach(target);
    await this.page.keyboard.type(text);
  }
}

/** Somebody's own browser, signed in without a mouse. */
async function atTheDesk(page: Page, who: DemoRole): Promise<Keyboard> {
  const keyboard = new Keyboard(page);
  await page.goto('/');
  await keyboard.type(page.getByLabel('E-mail'), DEMO_PEOPLE[who].email);
  await keyboard.type(page.getByLabel('Password', { exact: true }), DEMO_PEOPLE[who].password);
  await page.keyboard.press('Enter');
  await page.getByRole('heading', { name: 'My desk' }).waitFor();
  return keyboard;
}

async function openProject(page: Page, keyboard: Keyboard): Promise<void> {
  await keyboard.press(page.getByRole('link', { name: 'Projects', exact: true }));
  await keyboard.press(page.getByRole('link', { name: 'CR-40', exact: true }));
  await expect(page.getByRole('tab', { name: 'Stages' })).toBeVisible();
}

async function design(page: Page): Promise<void> {
  const keyboard = await atTheDesk(page, 'designer');
  await openProject(page, keyboard);
  await keyboard.press(page.getByRole('link', { name: 'New stage' }));
  const chooser = page.waitForEvent('filechooser');
  await keyboard.press(page.getByRole('button', { name: 'From a stage file' }));
  await (
    await chooser
  ).setFiles({
    name: 'stage.json',
    mimeType: 'application/json',
    buffer: Buffer.from(JSON.stringify(relayDriver(REFERENCE, 1000))),
  });
  const sheet = new StageSheet(page);
  await expect(sheet.criterion('Forced β')).toContainText('13.9');
  // The value in use is the ladder's stop, and arrow keys go along its values.
  await keyboard.reach(sheet.rung('1 kΩ'));
  for (const value of ['910 Ω', '820 Ω', '750 Ω', '680 Ω', '620 Ω']) {
    await page.keyboard.press('ArrowLeft');
    await expect(sheet.rung(value)).toBeFocused();
  }
  await page.keyboard.press('Enter');
  await expect(sheet.criterion('Overdrive factor')).toContainText('5.73');
  await sheet.saved();
  const submit = page.getByRole('button', { name: 'Submit for check' });
  await keyboard.reach(submit, 'Shift+Tab');
  await page.keyboard.press('Enter');
  await expect(submit).toBeHidden();
}

async function check(page: Page): Promise<void> {
  const keyboard = await atTheDesk(page, 'checker');
  await keyboard.press(page.getByRole('link', { name: `Start check ${REFERENCE} A` }));
  const criteria = page.getByRole('table', { name: 'Criteria' });
  await criteria.waitFor();
  for (const box of await criteria.getByRole('checkbox').all()) await keyboard.press(box, 'Space');
  await keyboard.press(page.getByRole('radio', { name: 'By hand' }), 'Space');
  await keyboard.type(page.getByLabel('My figure'), '5.8');
  await keyboard.type(
    page.getByRole('textbox', { name: 'Note' }),
    'From the printed rows, line on logarithmic axes.',
  );
  await keyboard.type(
    page.getByRole('textbox', { name: 'Justification, coil voltage' }),
    'Pull-in was seen at 19 V and 60 °C.',
  );
  await keyboard.press(page.getByRole('button', { name: 'Pass', exact: true }));
  await expect(page.getByRole('link', { name: 'Go to approval' })).toBeVisible();
}

async function lock(page: Page): Promise<void> {
  const keyboard = await atTheDesk(page, 'approver');
  await keyboard.press(page.getByRole('link', { name: `Read and lock ${REFERENCE} A` }));
  await keyboard.type(page.getByLabel('Your password, again'), DEMO_PEOPLE.approver.password);
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { name: 'Revision A is locked' })).toBeVisible();
}

async function issue(page: Page): Promise<void> {
  const keyboard = await atTheDesk(page, 'exporter');
  await openProject(page, keyboard);
  await keyboard.reach(page.getByRole('tab', { name: 'Stages' }));
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('Enter');
  await keyboard.press(page.getByRole('button', { name: 'Issue note' }));
  await keyboard.press(page.getByRole('dialog').getByRole('button', { name: 'Issue note' }));
  await expect(page.getByText('Content and hash fit.')).toBeVisible();
  const download = page.waitForEvent('download');
  await keyboard.press(page.getByRole('button', { name: 'CSV', exact: true }));
  expect((await download).suggestedFilename()).toMatch(/^CR-40_BOM-\d{4}_\d{8}\.csv$/);
}

test('the same stage goes from the sheet to the BOM note by keyboard alone', async ({
  browser,
}) => {
  test.slow();
  for (const step of [design, check, lock, issue]) {
    const context = await browser.newContext();
    await step(await context.newPage());
    await context.close();
  }
});
