import type { StageInput } from '../stage/stage-input.ts';
import { obstacleTo } from './applicability.ts';
import { nominalOf, unknownNominal } from './corner-figures.ts';
import { PRE } from './criteria.ts';
import {
  type Criterion,
  ENGINE_VERSION,
  type Evaluation,
  type Finding,
  type Verdict,
} from './evaluation.ts';
import { type Remark, remarksOn } from './findings.ts';
import { verdictOf, worseOf } from './margin.ts';
import { type Judge, judgeFor } from './judge.ts';

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
  const judge = judgeFor(input);
  const criteria = judge.criteria(rbOhm);
  const remarks = [
    ...remarksOn(judge.model, judge.traits(), criteria),
    ...remarksInFront(judge, criteria),
  ];
  const verdict = verdictOf(criteria.map(({ status }) => status));
  judge.point.placeNominal(rbOhm);
  judge.point.settle(judge.point.condition.ambientDegC);
  return {
    reference: input.reference,
    verdict: remarks.some(({ fails }) => fails) ? worseOf(verdict, 'fail') : verdict,
    engine: ENGINE_VERSION,
    corners: judge.cornerCount,
    baseResistorOhm: rbOhm,
    criteria,
    nominal: nominalOf(judge.point),
    findings: remarks.map(({ finding }) => finding),
  };
}

/** What there is to say of the transistor in front of a two-transistor high side. */
function remarksInFront({ preJudge }: Judge, criteria: readonly Criterion[]): Remark[] {
  if (preJudge == null) return [];
  const own = criteria
    .filter(({ id }) => id.startsWith(PRE))
    .map((criterion) => ({ ...criterion, id: criterion.id.slice(PRE.length) }));
  return remarksOn(preJudge.model, preJudge.traits(), own).map(({ finding, fails }) => ({
    finding: { id: PRE + finding.id, text: `Pre-driver: ${finding.text}` },
    fails,
  }));
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
