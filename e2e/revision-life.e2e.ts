import { expect, type Page } from '@playwright/test';
import { DEMO_PEOPLE } from '../server/seed/demo-accounts.ts';
import { test } from './demo-test.ts';
import { relayDriver } from './relay-driver.ts';
import { StageSheet } from './stage-sheet.ts';

/** A project of its own, made by the designer, with the roles of the two others; its page is on show. */
async function projectOf(
  page: Page,
  code: string,
  members: readonly (readonly [name: string, roles: readonly string[]])[],
): Promise<void> {
  await page.goto('/projects/new');
  await page.getByLabel('Code').fill(code);
  await page.getByLabel('Title', { exact: true }).fill('Ventilation unit, driver board');
  await page.getByRole('button', { name: 'Create project' }).click();
  await page.getByRole('tab', { name: 'Members' }).click();
  for (const [name, roles] of members) {
    await page.getByRole('combobox', { name: 'Add a person' }).click();
    await page.getByRole('option', { name }).click();
    for (const role of roles) await page.getByLabel(`${name} is ${role}`).check();
  }
  await page.getByRole('button', { name: 'Save members' }).click();
  await expect(page.getByText('Saved', { exact: false }).first()).toBeVisible();
}

async function openStage(page: Page, code: string, reference: string): Promise<void> {
  await page.goto('/projects');
  await page.getByRole('link', { name: code, exact: true }).click();
  await page.getByRole('link', { name: reference, exact: true }).click();
}

test('a revision is returned with a finding, answered, passed, locked, followed and withdrawn', async ({
  signedIn,
}) => {
  test.slow();
  const designer = await signedIn('designer');
  await projectOf(designer, 'VU-1', [
    ['B. Checker', ['checker']],
    ['C. Approver', ['approver']],
  ]);
  await designer.getByRole('tab', { name: 'Stages' }).click();
  const sheet = await StageSheet.fromFile(designer, relayDriver('Q1', 680));
  await designer.getByRole('button', { name: 'Submit for check' }).click();
  await expect(designer.getByText('In check').first()).toBeVisible();

  const checker = await signedIn('checker');
  await checker.getByRole('link', { name: 'Start check Q1 A' }).last().click();
  await checker.getByRole('button', { name: 'New finding' }).click();
  await checker.getByLabel('About').selectOption({ label: 'Forced β' });
  await checker.getByLabel('Title').fill('Forced β is marginal');
  await checker.getByLabel('What is wrong, and what would settle it').fill('Take the next value.');
  await checker.getByRole('button', { name: 'Raise finding' }).click();
  await expect(checker.getByRole('heading', { name: /Forced β is marginal/ })).toBeVisible();
  await checker.getByRole('button', { name: 'Return with findings' }).click();
  const reason = checker.getByRole('dialog');
  await reason.getByRole('button', { name: 'Return to draft' }).click();
  await expect(reason).toContainText('Give a reason');
  await reason.getByLabel('Reason').fill('Finding 1 asks for a smaller base resistor.');
  await reason.getByRole('button', { name: 'Return to draft' }).click();
  await expect(reason).toBeHidden();

  await designer.goto('/desk');
  await designer.getByRole('link', { name: 'Answer Q1 A' }).first().click();
  await designer.getByLabel('Your answer').fill('620 Ω is taken.');
  await designer.getByRole('button', { name: 'Answer finding 1' }).click();
  await expect(designer.getByText('620 Ω is taken.')).toBeVisible();
  await openStage(designer, 'VU-1', 'Q1');
  await sheet.rung('620 Ω').click();
  await sheet.saved();
  await designer.getByRole('button', { name: 'Submit for check' }).click();
  await expect(designer.getByText('In check').first()).toBeVisible();

  await checker.goto('/desk');
  await checker.getByRole('link', { name: 'Read answer Q1 A' }).click();
  await checker.getByRole('button', { name: 'Keep open' }).click();
  await checker.getByLabel('What is still missing').fill('Say why the pin stands it.');
  await checker.getByRole('button', { name: 'Keep it open' }).click();
  await expect(checker.getByText('Say why the pin stands it.')).toBeVisible();

  await designer.goto('/desk');
  await designer.getByRole('link', { name: 'Answer Q1 A' }).first().click();
  await designer.getByLabel('Your answer').fill('5.1 mA of 16 mA, see drive current.');
  await designer.getByRole('button', { name: 'Answer finding 1' }).click();

  await checker.goto('/desk');
  await checker.getByRole('link', { name: 'Read answer Q1 A' }).click();
  await checker.getByRole('button', { name: 'Close finding' }).click();
  await expect(checker.getByText('Closed', { exact: true })).toBeVisible();
  await checker.getByRole('radio', { name: 'By hand' }).click();
  await checker.getByLabel('My figure').fill('5.7');
  await checker.getByRole('textbox', { name: 'Note' }).fill('By the printed gain rows.');
  const criteria = checker.getByRole('table', { name: 'Criteria' });
  for (const box of await criteria.getByRole('checkbox').all()) await box.check();
  await checker.getByRole('textbox', { name: 'Justification, coil voltage' }).fill('Seen at 19 V.');
  await checker.getByRole('button', { name: 'Pass', exact: true }).click();
  await expect(checker.getByRole('link', { name: 'Go to approval' })).toBeVisible();

  const approver = await signedIn('approver');
  await approver.getByRole('link', { name: 'Read and lock Q1 A' }).click();
  await approver.getByLabel('Your password, again').fill(DEMO_PEOPLE.approver.password);
  await approver.getByRole('button', { name: 'Sign and lock A' }).click();
  await expect(approver.getByRole('heading', { name: 'Revision A is locked' })).toBeVisible();

  await openStage(designer, 'VU-1', 'Q1');
  await designer.getByRole('button', { name: 'Start next revision' }).click();
  await expect(designer).toHaveTitle(/Q1/);
  await expect(designer.getByRole('button', { name: 'Compare with A' })).toBeVisible();
  await designer.getByRole('button').filter({ hasText: 'Stage file' }).click();
  await designer.getByRole('menuitem', { name: 'Withdraw this revision' }).click();
  await designer.getByRole('dialog').getByLabel('Reason').fill('Not needed after all.');
  await designer.getByRole('dialog').getByRole('button', { name: 'Withdraw' }).click();
  await expect(designer.getByText('Withdrawn').first()).toBeVisible();
});

test('two designers change one draft: the later one sees whose change it met', async ({
  signedIn,
}) => {
  const first = await signedIn('designer');
  await projectOf(first, 'VU-2', [['B. Checker', ['designer']]]);
  await first.getByRole('tab', { name: 'Stages' }).click();
  const sheet = await StageSheet.fromFile(first, relayDriver('Q1', 620));
  const other = new StageSheet(await signedIn('checker'));
  await other.page.goto(first.url());
  await expect(other.heading).toContainText('Q1');

  await sheet.enter('Base network', { RBE: '15 kΩ' });
  await sheet.saved();
  await other.enter('Base network', { RBE: '18 kΩ' });
  const dialog = other.page.getByRole('dialog', { name: 'Somebody else saved in the meantime' });
  await expect(dialog).toContainText('A. Designer saved this revision');
  await dialog.getByRole('radio', { name: /^Yours: 18/ }).check();
  await dialog.getByRole('button', { name: 'Take the result' }).click();
  await other.saved();
  await first.reload();
  await expect(sheet.field('Base network', 'RBE')).toHaveValue('18');
});
