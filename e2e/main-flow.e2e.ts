import { readFile } from 'node:fs/promises';
import { expect, type Page } from '@playwright/test';
import { DEMO_PEOPLE } from '../server/seed/demo-accounts.ts';
import { readCsv } from '../spec/server/documents/read-csv.ts';
import { readPdf } from '../spec/server/documents/read-pdf.ts';
import { test } from './demo-test.ts';
import { StageSheet } from './stage-sheet.ts';

const REFERENCE = 'Q40';
const TITLE = 'Agitator contactor pilot relay, second line';
const PROJECT = 'CR-40';

async function openProject(page: Page): Promise<void> {
  await page.getByRole('navigation', { name: 'Main' }).getByText('Projects').click();
  await page
    .getByRole('table', { name: 'Projects' })
    .getByRole('link', { name: PROJECT, exact: true })
    .click();
}

/** The stage as its data stand in the order of the form, in the notations people type. */
async function enterStage(sheet: StageSheet): Promise<void> {
  await sheet.enter('Supply & ambient', {
    'Supply at load, smallest': '21.6',
    'Supply at load, largest': '26.4 V',
    'Ambient, smallest': '-20',
    'Ambient, largest': '60',
  });
  await sheet.unfold('Drive');
  await sheet.enter('Drive', {
    'Logic rail, smallest': '3.0',
    'Logic rail, largest': '3.6',
    'High drop at 8 mA': '600 mV',
    'High test current': '8 mA',
    'Low level at 8 mA': '0.4 V',
    'Low test current': '8mA',
    'Low level, unloaded': '0.1',
    'Source limit': '20 mA',
    'Sink limit': '0.02',
  });
  await sheet.unfold('Load');
  await sheet.enter('Load', {
    Resistance: '1k44',
    Tolerance: '10 %',
    'Resistance at': '20',
    'Temperature rise': '20 K',
    Inductance: '4 H',
    'Must operate at': '16.8 V',
    'Must release at': '2.4 V',
    'Coil maximum': '31 V',
    'Coil maximum, at': '60',
    'Hottest coil': '130',
  });
  await sheet.unfold('Base network');
  await sheet.enter('Base network', {
    RB: '1k',
    'RB tolerance': '5 %',
    'RB rating': '100 mW',
    RBE: '22 kΩ',
    'RBE tolerance': '5%',
    'RBE rating': '0.1 W',
  });
  await sheet.unfold('Clamp');
  await sheet.enter('Clamp', {
    'Forward voltage': '1.0',
    'Current rating': '200 mA',
    'Reverse rating': '75 V',
  });
}

async function takeTransistor(sheet: StageSheet): Promise<void> {
  await sheet.group('Transistor').getByRole('button', { name: 'not chosen' }).click();
  const dialog = sheet.page.getByRole('dialog', { name: 'Choose a transistor' });
  await dialog.getByLabel('Search the library').fill('2N3904');
  await dialog
    .getByRole('list', { name: 'Parts' })
    .getByRole('button', { name: /^2N3904/ })
    .click();
  await dialog.getByRole('button', { name: 'Take this part' }).click();
  await expect(dialog).toBeHidden();
}

/** @returns the designator of the base resistor */
async function design(page: Page): Promise<string> {
  await openProject(page);
  await page.getByRole('link', { name: 'New stage' }).click();
  await page.getByLabel('Designator').fill(REFERENCE);
  await page.getByLabel('Title').fill(TITLE);
  await page.getByLabel('Topology').selectOption('low-side-npn');
  await page.getByRole('button', { name: 'Open the sheet' }).click();
  const sheet = new StageSheet(page);
  await expect(sheet.heading).toContainText(REFERENCE);
  await takeTransistor(sheet);
  await enterStage(sheet);

  await expect(sheet.criterion('Overdrive factor')).toContainText('3.66');
  await expect(sheet.criterion('Forced β')).toContainText('13.9');
  await expect(sheet.criterion('Forced β')).toContainText('Fail');

  await sheet.rung('620 Ω').click();
  await expect(sheet.criterion('Overdrive factor')).toContainText('5.73');
  await expect(sheet.criterion('Forced β')).toContainText('8.90');
  await expect(sheet.criterion('Coil voltage')).toContainText('Marginal');
  await expect(sheet.criterion('Coil voltage')).toContainText('21.37\u00a0V');
  await expect(sheet.criterion('Coil voltage')).toContainText('≥\u00a020.76\u00a0V');
  await sheet.saved();
  await page.getByRole('button', { name: 'Submit for check' }).click();
  await expect(page.getByText('In check').first()).toBeVisible();
  const drawn = page.getByRole('button', { name: /^R\d+, base resistor, 620/ });
  return /^R\d+/.exec((await drawn.getAttribute('aria-label')) ?? '')?.[0] ?? '';
}

async function check(page: Page): Promise<void> {
  await page.getByRole('link', { name: `Start check ${REFERENCE} A` }).click();
  await page.getByRole('radio', { name: 'By hand' }).click();
  await page.getByLabel('My figure').fill('5.6');
  await page
    .getByRole('textbox', { name: 'Note' })
    .fill('Gain rows at 10 mA and 50 mA, line on logarithmic axes, 33 °C colder by the exponent.');
  const criteria = page.getByRole('table', { name: 'Criteria' });
  for (const box of await criteria.getByRole('checkbox').all()) await box.check();
  await page
    .getByRole('textbox', { name: 'Justification, coil voltage' })
    .fill('The cabinet supply holds 23 V at least; pull-in was seen at 19 V and 60 °C.');
  await page.getByRole('button', { name: 'Pass', exact: true }).click();
  await expect(page.getByRole('link', { name: 'Go to approval' })).toBeVisible();
}

/** @returns the signed hash */
async function lock(page: Page): Promise<string> {
  await page.getByRole('link', { name: `Read and lock ${REFERENCE} A` }).click();
  await page.getByLabel('Your password, again').fill(DEMO_PEOPLE.approver.password);
  await page.getByRole('button', { name: 'Sign and lock A' }).click();
  await expect(page.getByRole('heading', { name: 'Revision A is locked' })).toBeVisible();
  await page.getByRole('button', { name: 'Verify' }).click();
  await expect(page.getByRole('status').filter({ hasText: 'Whole' })).toBeVisible();
  const text = (await page.getByRole('main').innerText()).replace(/\s+/g, '');
  const hash = /engine([0-9a-f]{64})/.exec(text)?.[1];
  expect(hash, 'the hash in full on the page').toBeDefined();
  return hash ?? '';
}

async function download(page: Page, format: string): Promise<Buffer> {
  const [file] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: format, exact: true }).click(),
  ]);
  return readFile(await file.path());
}

/** @returns CSV records and the letters of the PDF without any space */
async function issueNote(page: Page): Promise<{ records: string[][]; pdf: string }> {
  await openProject(page);
  await page.getByRole('tab', { name: 'BOM note' }).click();
  await expect(page.getByRole('checkbox', { name: `${REFERENCE} A` })).toBeChecked();
  await page.getByRole('button', { name: 'Issue note' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Issue note' }).click();
  await expect(page.getByText('Content and hash fit.')).toBeVisible();
  const csv = await download(page, 'CSV');
  const pages = await readPdf(await download(page, 'PDF'));
  const pdf = pages.flat().map(({ text }) => text);
  return { records: readCsv(csv.toString('utf8')), pdf: pdf.join('').replaceAll(/\s/g, '') };
}

test('four people take one stage from the form to the BOM note', async ({ signedIn }) => {
  test.slow();
  const resistor = await design(await signedIn('designer'));
  await check(await signedIn('checker'));
  const hash = await lock(await signedIn('approver'));
  const { records, pdf } = await issueNote(await signedIn('exporter'));

  const lineOf = (designator: string) =>
    records.find(([, , designators = '']) => designators.split(', ').includes(designator));
  expect(lineOf(REFERENCE)).toEqual(
    expect.arrayContaining(['Transistor, NPN', '2N3904', 'verified']),
  );
  expect(lineOf(resistor)).toEqual(
    expect.arrayContaining(['Resistor', '620\u00a0Ω', '±5\u00a0%, 0.1\u00a0W']),
  );
  const standsOn = records.find(([stage, , title]) => stage === REFERENCE && title === TITLE);
  expect(standsOn).toEqual(
    expect.arrayContaining(['A', 'Locked', hash, 'A. Designer', 'B. Checker', 'C. Approver']),
  );
  expect(pdf).toContain('2N3904');
  expect(pdf).toContain('Resistor620Ω±5%,0.1W');
  expect(pdf).toMatch(new RegExp(`${REFERENCE}ALocked\\d{4}-\\d\\d-\\d\\d${hash.slice(0, 12)}`));
});
