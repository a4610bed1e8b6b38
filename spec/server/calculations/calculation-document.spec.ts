import { describe, expect, it } from 'vitest';
import {
  calculationDocument,
  type CalculationSource,
} from '../../../server/calculations/calculation-document.ts';
import { writePdf } from '../../../server/documents/pdf.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { calculationSheet } from '../../../shared/report/calculation-sheet.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';
import { highSideStage, relayDriver, relayStage } from '../../shared/relay-stage.ts';
import { readPdf, textOf } from '../documents/read-pdf.ts';

const input = StageInput.parse(relayDriver());
const HEAD = {
  projectCode: 'GH-12',
  projectTitle: 'Irrigation controller',
  legalOwner: 'Glasshouse Works (demo)',
  department: null,
  reference: 'Q12',
  title: input.title,
  letter: 'B',
  stateWord: 'Locked',
  designer: 'A. Designer',
  checker: 'B. Checker',
  savedAtMs: Date.UTC(2026, 1, 17, 9, 0),
  lock: {
    approver: 'C. Approver',
    signedAtMs: Date.UTC(2026, 1, 18, 10, 30),
    hash: '3be890d1f27c66a4'.repeat(4),
  },
} as const;

const source = (changes: Partial<CalculationSource> = {}): CalculationSource => ({
  head: HEAD,
  evaluation: evaluateStage(input),
  sheet: calculationSheet(input, input.baseResistor.valueOhm ?? NaN),
  program: 'Sinkwell, engine 1.0.0',
  ...changes,
});

async function pagesOf(given: CalculationSource): Promise<string[]> {
  return (await readPdf(await writePdf(calculationDocument(given)))).map(textOf);
}

describe('calculation sheet as PDF', { timeout: 60_000 }, () => {
  it('carries the lines of every criterion, and the title block on each sheet', async () => {
    const pages = await pagesOf(source());
    const text = pages.join(' ');
    for (const expected of [
      'GH-12-Q12-B-CALC',
      'Locked 2026-02-18, 10:30 Z',
      'Document status Locked',
      'Verdict marginal. SHA-256 3be8 90d1 f27c 66a4',
      'Approval person C. Approver',
      'each within 1e\u22129 of the engine',
      'Overdrive factor',
      'Corner A',
    ]) {
      expect(text).toContain(expected);
    }
    expect(text).not.toContain('NOT RELEASED');
    expect(text).not.toContain('[U+');
    for (const [index, page] of pages.entries()) {
      expect(page).toContain('Identification number GH-12-Q12-B-CALC');
      expect(page).toContain(`Sheet ${index + 1} / ${pages.length}`);
    }
  });

  it('marks what is not locked on every sheet, without hash and approver', async () => {
    const head = { ...HEAD, stateWord: 'In check', lock: null };
    const pages = await pagesOf(source({ head }));
    for (const page of pages) expect(page).toContain('NOT RELEASED, preview only');
    const text = pages.join(' ');
    expect(text).toContain('Document status Not released (In check)');
    expect(text).toContain('Verdict marginal. No hash: not locked');
    expect(text).toContain('Approval person none');
    expect(text).not.toContain('3be8');
  });

  it('gives the same bytes twice', async () => {
    const twice = await Promise.all([0, 1].map(() => writePdf(calculationDocument(source()))));
    expect(twice[0]!.equals(twice[1]!)).toBe(true);
  });

  it('names its file by project, stage, revision and date', () => {
    expect(calculationDocument(source()).fileName).toBe('GH-12_Q12-B-CALC_20260218');
    const odd = { ...HEAD, reference: 'Q1/2', lock: null };
    expect(calculationDocument(source({ head: odd })).fileName).toBe('GH-12_Q1-2-B-CALC_20260217');
  });

  it('says why a stage has no calculation', async () => {
    const wrong = highSideStage({ transistor: relayStage().transistor });
    const evaluation = evaluateStage(wrong);
    const text = (await pagesOf(source({ evaluation, sheet: null }))).join(' ');
    expect(text).toContain('Not judged');
    expect(text).toContain(evaluation.findings[0]!.text);
  });
});
