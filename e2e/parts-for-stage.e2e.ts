import { expect } from '@playwright/test';
import { test } from './demo-test.ts';
import { relayDriver } from './relay-driver.ts';
import { StageSheet } from './stage-sheet.ts';

/** Ranking the shipped library takes well under this on a quiet machine; a shared one gets more. */
const RANKING_MS = 15_000;

test('all transistors are judged for the stage, and one is taken with its link', async ({
  signedIn,
}) => {
  const page = await signedIn('designer');
  await page.goto('/projects');
  await page.getByRole('link', { name: 'IR-8', exact: true }).click();
  const sheet = await StageSheet.fromFile(page, relayDriver('Q71', 620));

  await page.getByRole('button', { name: 'Judge all transistors' }).click();
  await expect(page.getByText('36 parts judged')).toBeVisible({ timeout: RANKING_MS });
  const best = page.getByRole('list', { name: 'Transistors that can do it, best first' });
  await expect(best.getByRole('listitem').filter({ hasText: 'in use' })).toContainText('2N3904');
  const row = best.getByRole('listitem').filter({ hasText: '2N2222A' });
  await expect(row.first()).toContainText('510');
  await page.getByText('cannot stand in this stage').click();
  await expect(page.getByText(/2N3906 is PNP/)).toBeVisible();

  await page.getByRole('button', { name: 'Take 2N2222A', exact: true }).click();
  await expect(sheet.field('Base network', 'RB')).toHaveValue('510');
  await expect(sheet.group('Transistor')).toContainText('2N2222A');
  await sheet.saved();
  const revisionId = page.url().split('/').at(-1) ?? '';
  const revision = await page.request.get(`/api/revisions/${revisionId}`);
  expect(await revision.json()).toMatchObject({
    definition: { transistor: { partNumber: '2N2222A' } },
    parts: { transistor: { partRevisionId: expect.any(String) as unknown } },
  });
});

test('the recommended base–emitter resistor stands at its field and can be taken', async ({
  signedIn,
}) => {
  const page = await signedIn('designer');
  await page.goto('/projects');
  await page.getByRole('link', { name: 'IR-8', exact: true }).click();
  const sheet = await StageSheet.fromFile(page, relayDriver('Q72', 620));
  const base = sheet.group('Base network');
  await expect(base).toContainText(/Recommended \d+\s?kΩ: the largest that keeps the stage off/);
  await base.getByRole('button', { name: 'Take it' }).click();
  await expect(sheet.field('Base network', 'RBE')).toHaveValue(/^\d{3}$/);
  await expect(base.getByRole('button', { name: 'Take it' })).toBeHidden();
});
