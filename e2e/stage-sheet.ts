import { expect, type Locator, type Page } from '@playwright/test';
import type { StageFile } from '../shared/stage/stage-input.ts';

/** The stage sheet as its user finds it: fields by group and label, verdicts by criterion. */
export class StageSheet {
  constructor(readonly page: Page) {}

  /** Makes a stage of the project on show from a stage file. */
  static async fromFile(page: Page, stage: StageFile): Promise<StageSheet> {
    await page.getByRole('link', { name: 'New stage' }).click();
    await page.getByLabel('Stage file').setInputFiles({
      name: `${stage.reference}.json`,
      mimeType: 'application/json',
      buffer: Buffer.from(JSON.stringify(stage)),
    });
    const sheet = new StageSheet(page);
    await expect(sheet.heading).toContainText(stage.reference);
    return sheet;
  }

  get heading(): Locator {
    return this.page.getByRole('heading', { level: 1 });
  }

  /** @param name of a group of the form, such as `Load` */
  group(name: string): Locator {
    return this.page.getByRole('region', { name: new RegExp(`^${name}`) });
  }

  /** @param label without the designator that may follow it: `RB` finds `RB, R30` */
  field(group: string, label: string): Locator {
    const words = new RegExp(`^\\s*${label.replaceAll(' ', '\\s')}(, [A-Z]+\\d+)?\\s*$`);
    return this.group(group).getByLabel(words);
  }

  async enter(group: string, values: Readonly<Record<string, string>>): Promise<void> {
    for (const [label, text] of Object.entries(values)) await this.field(group, label).fill(text);
  }

  async unfold(group: string): Promise<void> {
    await this.group(group)
      .getByRole('button', { name: `More of ${group}` })
      .click();
  }

  /** The line of a criterion with value, limit and margin. */
  criterion(name: string): Locator {
    return this.page.getByRole('listitem').filter({
      has: this.page.getByRole('button', { name: `${name}: show on the circuit` }),
    });
  }

  /** The word at the head of the verdicts. */
  get verdict(): Locator {
    return this.page.locator('app-verdict-panel .headline app-verdict-mark');
  }

  get ladder(): Locator {
    return this.page.getByRole('toolbar', { name: 'Values for the base resistor' });
  }

  rung(value: string): Locator {
    return this.ladder.getByRole('button', { name: new RegExp(`^${value},`) });
  }

  /** The server holds what is on the sheet. */
  async saved(): Promise<void> {
    await expect(this.page.getByRole('status').filter({ hasText: /^\s*Saved\s*\d/ })).toBeVisible();
  }
}
