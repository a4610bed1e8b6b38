import { readFile } from 'node:fs/promises';
import { expect } from '@playwright/test';
import { readPdf } from '../spec/server/documents/read-pdf.ts';
import { test } from './demo-test.ts';

test('a checker follows one line of a calculation and takes the PDF along', async ({
  signedIn,
}) => {
  test.slow();
  const page = await signedIn('checker');
  await page.goto('/projects');
  await page.getByRole('link', { name: 'CR-40', exact: true }).first().click();
  await page.getByRole('link', { name: 'Q1', exact: true }).first().click();
  const way = page.getByRole('link', { name: 'Overdrive factor, method' });
  await expect(way).toHaveAttribute('href', '/method#overdrive-factor');
  await page.getByRole('link', { name: 'Calculation', exact: true }).click();
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Calculation sheet');
  await expect(page.getByText(/^\d+ lines, each within 1e−9 of the engine$/)).toBeVisible();

  const line = page.getByRole('table', { name: 'Overdrive factor' }).getByRole('row').nth(1);
  const text = (await line.innerText()).replaceAll(/[\s\u200b]+/g, ' ');
  const put = /= ([\d.]+)· ?([\d.]+) mA \/ ([\d.]+) mA/.exec(text);
  expect(put, text).not.toBeNull();
  const [gain, baseMa, fullMa] = (put ?? []).slice(1).map(Number);
  const byHand = ((gain ?? NaN) * (baseMa ?? NaN)) / (fullMa ?? NaN);
  const shown = Number(await line.getByRole('cell').nth(2).innerText());
  expect(Math.abs(byHand / shown - 1)).toBeLessThan(2e-5);

  const [file] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'PDF', exact: true }).click(),
  ]);
  expect(file.suggestedFilename()).toMatch(/^CR-40_Q1-[A-Z]-CALC_\d{8}\.pdf$/);
  const pages = await readPdf(await readFile(await file.path()));
  const letters = pages
    .map((each) => each.map((piece) => piece.text).join(''))
    .map((each) => each.replaceAll(/\s/g, ''));
  expect(letters.join('')).toContain(`Overdrivefactor:${shown}`);
  for (const each of letters) expect(each).toMatch(/CR-40-Q1-[A-Z]-CALC/);
});
