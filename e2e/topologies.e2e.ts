import { expect, type Page } from '@playwright/test';
import { test } from './demo-test.ts';
import { StageSheet } from './stage-sheet.ts';

/** A stage entered by hand: what is chosen, typed and picked, and what the sheet then says. */
interface Entry {
  readonly topology: string;
  readonly loadKind: string;
  readonly drawn: RegExp;
  readonly enter: (sheet: StageSheet) => Promise<void>;
  readonly verdict: 'Pass' | 'Open';
  /** Criterion and the words of its line that only this topology has. */
  readonly judged: readonly [criterion: string, words: string];
}

/** Takes a part of the library for a group of the form. */
async function pick(sheet: StageSheet, group: string, partNumber: string): Promise<void> {
  await sheet.group(group).getByRole('button', { name: 'not chosen' }).click();
  const dialog = sheet.page.getByRole('dialog');
  await dialog
    .getByRole('list', { name: 'Parts' })
    .getByRole('button', { name: new RegExp(`^${partNumber}`) })
    .click();
  await dialog.getByRole('button', { name: 'Take this part' }).click();
  await expect(dialog).toBeHidden();
}

const RELAY = {
  Resistance: '1k1',
  'Must operate at': '14.4 V',
  Inductance: '4 H',
} as const;

async function relay(sheet: StageSheet): Promise<void> {
  await sheet.enter('Load', RELAY);
  await sheet.unfold('Clamp');
  await sheet.enter('Clamp', { 'Current rating': '200 mA', 'Reverse rating': '100 V' });
}

const ENTRIES: readonly Entry[] = [
  {
    topology: 'high-side-pnp',
    loadKind: 'coil',
    drawn: /High-side PNP switch Q51, 2N3906/,
    verdict: 'Pass',
    judged: ['Drive current', '≤\u00a016\u00a0mA'],
    enter: async (sheet) => {
      await pick(sheet, 'Transistor', '2N3906');
      await relay(sheet);
      await sheet.unfold('Drive');
      await sheet.field('Drive', 'Rail is the supply').check();
      await sheet.enter('Drive', { 'Pull-up rating': '250 mW', 'Pin maximum': '40 V' });
      await sheet.unfold('Base network');
      await sheet.enter('Base network', { RB: '6k2', 'RB rating': '0.5 W', RBE: '10k' });
    },
  },
  {
    topology: 'two-transistor-high-side',
    loadKind: 'coil',
    drawn: /pre-driver .*, 2N3904; base resistor of the pre-driver .* 2\.2\skΩ/,
    verdict: 'Pass',
    judged: ['Pre-driver: Overdrive factor', '≥\u00a02'],
    enter: async (sheet) => {
      await pick(sheet, 'Transistor', '2N3906');
      await pick(sheet, 'Pre-driver', '2N3904');
      await relay(sheet);
      await sheet.unfold('Base network');
      await sheet.enter('Base network', { RB: '6k2', 'RB rating': '0.5 W', RBE: '10k' });
      await sheet.enter('Pre-driver', { RB1: '2k2' });
    },
  },
  {
    topology: 'low-side-darlington',
    loadKind: 'coil',
    drawn: /Low-side Darlington switch Q53, MPSA14/,
    // The sheet of this part prints no leakage of the pair through its collector.
    verdict: 'Open',
    judged: ['Forced β', '≤\u00a01000'],
    enter: async (sheet) => {
      await pick(sheet, 'Transistor', 'MPSA14');
      await sheet.enter('Supply & ambient', {
        'Supply at load, smallest': '10.8',
        'Supply at load, largest': '13.2',
      });
      await sheet.enter('Drive', {
        'Logic rail, smallest': '4.75',
        'Logic rail, largest': '5.25',
      });
      await relay(sheet);
      await sheet.unfold('Load');
      await sheet.enter('Load', {
        Resistance: '270',
        'Must operate at': '7.2',
        'Must release at': '1.2',
      });
      await sheet.unfold('Base network');
      await sheet.enter('Base network', { RB: '560', 'RB rating': '0.25', RBE: '47k' });
    },
  },
  {
    topology: 'low-side-pre-biased',
    loadKind: 'led-string',
    drawn: /inside R1 10\skΩ, R2 10\skΩ; load .* 3 LEDs; series resistor .* 2\.4\skΩ/,
    verdict: 'Pass',
    judged: ['Input voltage while on', '≥'],
    enter: async (sheet) => {
      await pick(sheet, 'Transistor', 'DTC114E');
      await sheet.enter('Drive', {
        'Logic rail, smallest': '4.75',
        'Logic rail, largest': '5.25',
      });
      await sheet.enter('Load', {
        'LEDs in series': '3',
        'Forward voltage, smallest': '1.8',
        'Forward voltage, largest': '2.2',
        'Series resistor': '2k4',
        'LED current, highest': '20 mA',
      });
    },
  },
  {
    topology: 'level-translator',
    loadKind: 'logic-input',
    drawn: /Level translator switch Q55, 2N3904.*load .* 2\.2\skΩ.*drives 2 inputs/,
    verdict: 'Pass',
    judged: ['High output level', '≥\u00a03.5\u00a0V'],
    enter: async (sheet) => {
      await pick(sheet, 'Transistor', '2N3904');
      await sheet.enter('Load', { 'Inputs driven': '2', RC: '2k2', VIL: '1.5', VIH: '3.5' });
      await sheet.enter('Base network', { RB: '5k6' });
      await sheet.enter('Switching', { Frequency: '10 kHz' });
      await sheet.enter('Switching', { Duty: '50 %' });
      await expect(sheet.criterion('Storage and fall time')).toContainText('≤\u00a05\u00a0µs');
    },
  },
];

async function newStage(page: Page, reference: string, entry: Entry): Promise<StageSheet> {
  await page.getByRole('navigation', { name: 'Main' }).getByText('Projects').click();
  await page
    .getByRole('table', { name: 'Projects' })
    .getByRole('link', { name: 'CR-40', exact: true })
    .click();
  await page.getByRole('link', { name: 'New stage' }).click();
  await page.getByLabel('Designator').fill(reference);
  await page.getByLabel('Title').fill(`Entered by hand, ${entry.topology}`);
  await page.getByLabel('Topology').selectOption(entry.topology);
  await page.getByLabel('Load').selectOption(entry.loadKind);
  await page.getByRole('button', { name: 'Open the sheet' }).click();
  const sheet = new StageSheet(page);
  await expect(sheet.heading).toContainText(reference);
  return sheet;
}

ENTRIES.forEach((entry, index) => {
  test(`a ${entry.topology} stage is entered by hand, judged and stored`, async ({ signedIn }) => {
    const page = await signedIn('designer');
    const sheet = await newStage(page, `Q${51 + index}`, entry);
    await entry.enter(sheet);
    const [criterion, words] = entry.judged;
    await expect(sheet.criterion(criterion)).toContainText(words);
    await expect(sheet.verdict).toHaveText(entry.verdict);
    await expect(page.getByRole('img', { name: entry.drawn })).toBeVisible();
    await sheet.saved();
    await page.reload();
    await expect(page.getByRole('img', { name: entry.drawn })).toBeVisible();
    await expect(sheet.verdict).toHaveText(entry.verdict);
  });
});

test('another topology and load keep what applies, and undo brings the stage back', async ({
  signedIn,
}) => {
  const page = await signedIn('designer');
  const [entry] = ENTRIES;
  if (entry === undefined) throw new Error('nothing to enter');
  const sheet = await newStage(page, 'Q60', { ...entry, topology: 'low-side-npn' });
  await pick(sheet, 'Transistor', '2N3904');
  await sheet.enter('Base network', { RB: '620' });
  const kind = sheet.field('Load', 'Kind');
  const topology = sheet.field('Stage and topology', 'Topology');
  await topology.selectOption('two-transistor-high-side');
  await expect(sheet.field('Pre-driver', 'RB1')).toHaveValue('620');
  await expect(sheet.group('Pre-driver').getByRole('button', { name: '2N3904' })).toBeVisible();
  await kind.selectOption('lamp');
  await expect(sheet.field('Load', 'Nominal voltage')).toHaveValue('24');
  await expect(sheet.group('Clamp')).toBeHidden();
  await expect(kind.getByRole('option', { name: 'Logic input' })).toHaveCount(0);
  for (let steps = 0; steps < 2; steps += 1) {
    await page.getByRole('button', { name: 'Undo' }).click();
  }
  await expect(topology).toHaveValue('low-side-npn');
  await expect(sheet.field('Base network', 'RB')).toHaveValue('620');
  await expect(sheet.group('Transistor').getByRole('button', { name: '2N3904' })).toBeVisible();
});
