import fc from 'fast-check';
import { all, create } from 'mathjs';
import { describe, expect, it } from 'vitest';
import {
  COLD_ROOM,
  demoDefinition,
  type DemoStage,
  IRRIGATION,
} from '../../../server/seed/demo-stages.ts';
import { criterionIds, ownCriterionIds, PRE } from '../../../shared/checks/criteria.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { CRITERION_LAWS_OF, SHARED_LAWS } from '../../../shared/method/criterion-laws.ts';
import { LAWS } from '../../../shared/method/laws.ts';
import { calculationSheet } from '../../../shared/report/calculation-sheet.ts';
import { sameFigure, type SheetLine } from '../../../shared/report/calculation/worksheet.ts';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { judgeStage } from '../../../shared/sizing/judge-stage.ts';
import { repeats, seed } from '../../long-run.ts';
import { find, transistors } from '../parts/library-file.ts';
import { highSideStage, relayStage } from '../relay-stage.ts';
import { everyTopology } from './random-stages.ts';

const STAGES = repeats(300, 20_000);
const SEED = seed(20261201);

const math = create(all ?? {});
const COMPILED = new Map<string, { evaluate: (scope: object) => unknown }>();

/** What mathjs makes of a line with the numbers the sheet puts in. */
function byMathjs({ law, inputs }: SheetLine): number {
  const { formula } = LAWS[law];
  const code = COMPILED.get(formula) ?? math.compile(formula);
  COMPILED.set(formula, code);
  const scope = Object.fromEntries(inputs.map(({ symbol, value }) => [symbol, value]));
  return Number(code.evaluate(scope));
}

/** Lines that mathjs does not bring to the engine’s figure, in words. */
function faultsOf(input: StageInput): string[] {
  const evaluation = evaluateStage(input);
  const sheet = calculationSheet(input, input.baseResistor.valueOhm ?? NaN);
  if (sheet === null) return evaluation.criteria.length === 0 ? [] : ['no sheet'];
  const faults: string[] = [];
  const blocks = [...sheet.corners, ...sheet.criteria];
  const lines = blocks.flatMap((block) => block.lines);
  const byNumber = new Map(lines.map((line) => [line.number, line]));
  for (const line of lines) {
    const found = byMathjs(line);
    if (!sameFigure(found, line.value, line.unit) || !line.agrees) {
      faults.push(
        `${line.number} ${line.law}: ${found} for ${line.value} ${JSON.stringify(line.inputs)}`,
      );
    }
    for (const put of line.inputs) {
      if (put.line !== null && byNumber.get(put.line)?.value !== put.value) {
        faults.push(`${line.number} ${line.law}: ${put.symbol} is not what line ${put.line} gave`);
      }
    }
  }
  for (const { criterion, lines: own, figure } of sheet.criteria) {
    const judged = evaluation.criteria.find(({ id }) => id === criterion.id);
    if (JSON.stringify(judged) !== JSON.stringify(criterion))
      faults.push(`${criterion.id} differs`);
    if (criterion.value !== null && figure === null) faults.push(`${criterion.id} is not worked`);
    const last = own.findLast(({ result }) => result === figure);
    if (last !== undefined && !sameFigure(last.value, criterion.value ?? NaN, criterion.unit)) {
      faults.push(`${criterion.id}: ${last.value} for ${criterion.value ?? 'none'}`);
    }
    const id = criterion.id.replace(PRE, '');
    const shown = [...(CRITERION_LAWS_OF[id] ?? []), ...SHARED_LAWS.flatMap(({ laws }) => laws)];
    for (const { law } of own) {
      if (!shown.includes(law)) faults.push(`${criterion.id}: ${law} is not on the method page`);
    }
    const margin = own.find(({ result }) => result === 'm');
    if (criterion.margin !== null && (criterion.limit ?? 0) > 0 && margin === undefined) {
      faults.push(`${criterion.id} has no margin line`);
    }
  }
  return faults;
}

describe('calculation sheet', { timeout: 300_000 }, () => {
  it(`comes to the engine’s figures a second time, by mathjs, over ${STAGES} random stages (seed ${SEED})`, () => {
    const worked = new Set<string>();
    fc.assert(
      fc.property(everyTopology, (input) => {
        expect(faultsOf(input)).toEqual([]);
        const sheet = calculationSheet(input, input.baseResistor.valueOhm ?? NaN);
        for (const { criterion, lines } of sheet?.criteria ?? []) {
          if (lines.length > 0) worked.add(criterion.id);
        }
      }),
      { seed: SEED, numRuns: STAGES, endOnFailure: true },
    );
    const own = ownCriterionIds().filter((id) => !worked.has(id));
    // A port is judged over all stages of a project: its terms are the drive currents of their sheets.
    expect(own).toEqual(['port-current']);
    const inFront = criterionIds().filter((id) => id.startsWith(PRE) && worked.has(id));
    expect(inFront.length).toBeGreaterThan(10);
  });

  it('works the relay stage from its file and its data sheet to every figure', () => {
    expect(faultsOf(relayStage())).toEqual([]);
    expect(faultsOf(highSideStage())).toEqual([]);
  });

  it.each<DemoStage>([...Object.values(COLD_ROOM), ...Object.values(IRRIGATION)])(
    'works the shipped demo stage $file.reference $file.title',
    (stage) => {
      const input = demoDefinition(stage, (partNumber) => {
        const part = deriveTransistor(find(transistors, partNumber));
        if (!part.ok) throw new Error(part.reason);
        return part.data;
      });
      const { baseResistorOhm } = judgeStage(input).evaluation;
      const judged = {
        ...input,
        baseResistor: { ...input.baseResistor, valueOhm: baseResistorOhm },
      };
      expect(faultsOf(judged)).toEqual([]);
    },
  );

  it('puts the printed figures of the 2N3904 in, row by row', () => {
    const sheet = calculationSheet(relayStage(), 1000);
    const block = sheet?.criteria.find(({ criterion }) => criterion.id === 'overdrive-factor');
    const corner = sheet?.corners.find(({ letter }) => letter === block?.corner);
    const gain = corner?.lines.find(({ law }) => law === 'gain-between');
    const rows = gain?.inputs.filter(({ source }) => source?.startsWith('hFE min')) ?? [];
    // 2N3903/D, Rev. 9: hFE min 100 at 10 mA, 60 at 50 mA.
    expect(rows.map(({ symbol, value }) => [symbol, value])).toEqual([
      ['h_1', 100],
      ['h_2', 60],
      ['I_2', 0.05],
      ['I_1', 0.01],
    ]);
    expect(corner?.corner).toEqual(block?.criterion.corner);
    expect(block?.lines.map(({ law }) => law)).toEqual(['overdrive', 'margin-at-least']);
  });

  it('has no sheet for a stage that cannot be judged', () => {
    expect(
      calculationSheet(highSideStage({ transistor: relayStage().transistor }), 1000),
    ).toBeNull();
  });
});
