import type { StageInput } from '../stage/stage-input.ts';
import { obstacleTo } from './applicability.ts';
import { nominalOf, unknownNominal } from './corner-figures.ts';
import { ENGINE_VERSION, type Evaluation, type Finding, type Verdict } from './evaluation.ts';
import { remarksOn } from './findings.ts';
import { verdictOf, worseOf } from './margin.ts';
import { StageJudge } from './stage-judge.ts';

/**
 * Judges a stage at all its corners: criteria with value, limit, margin and worst corner, the nominal
 * operating point, findings and the verdict. Pure and total: a stage that cannot work is a `fail`.
 *
 * @param input a parsed stage; with `baseResistor.valueOhm` null the verdict is `fail`
 */
export function evaluateStage(input: StageInput): Evaluation {
  const obstacle = obstacleTo(input);
  if (obstacle !== null) return unjudged(input, obstacle.verdict, obstacle.finding);
  const rbOhm = input.baseResistor.valueOhm;
  if (rbOhm === null) {
    return unjudged(input, 'fail', {
      id: 'no-base-resistor',
      text: 'The base resistor is left open, and no preferred value meets the criteria it decides.',
    });
  }
  const judge = new StageJudge(input);
  const criteria = judge.criteria(rbOhm);
  const remarks = remarksOn(judge.model, judge.traits(), criteria);
  const verdict = verdictOf(criteria.map(({ status }) => status));
  judge.point.placeNominal(rbOhm);
  judge.point.settle(judge.point.condition.ambientDegC);
  return {
    reference: input.reference,
    verdict: remarks.some(({ fails }) => fails) ? worseOf(verdict, 'fail') : verdict,
    engine: ENGINE_VERSION,
    corners: judge.model.corners.count,
    baseResistorOhm: rbOhm,
    criteria,
    nominal: nominalOf(judge.point),
    findings: remarks.map(({ finding }) => finding),
  };
}

function unjudged(input: StageInput, verdict: Verdict, finding: Finding): Evaluation {
  return {
    reference: input.reference,
    verdict,
    engine: ENGINE_VERSION,
    corners: 0,
    baseResistorOhm: input.baseResistor.valueOhm,
    criteria: [],
    nominal: unknownNominal(),
    findings: [finding],
  };
}
