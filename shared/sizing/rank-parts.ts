import { obstacleTo } from '../checks/applicability.ts';
import { CRITERIA, type CriterionId } from '../checks/criteria.ts';
import { criterionInSentence } from '../checks/criterion-in-sentence.ts';
import { decidingCriteria } from '../checks/deciding-criteria.ts';
import { evaluateStage } from '../checks/evaluate-stage.ts';
import { type Criterion, type Evaluation, VERDICTS, type Verdict } from '../checks/evaluation.ts';
import type { Policy } from '../stage/policy.ts';
import type { StageInput, Topology } from '../stage/stage-input.ts';
import type { TransistorData } from '../stage/transistor-data.ts';
import { formatPercent } from '../units/engineering-notation.ts';
import { obstacleAt } from './judged-value.ts';
import { sizedValues } from './size-stage.ts';

/** A transistor in a stage in place of the stage's own. */
export interface JudgedPart {
  /** The stage with the part, its own topology and the base resistor sized for it; null where it cannot stand there. */
  readonly stage: StageInput | null;
  /** null where it cannot stand there. */
  readonly verdict: Verdict | null;
  /** Smallest margin over all criteria; null where a figure is infinite, or there is none. */
  readonly margin: number | null;
  /** Criterion that decides the verdict. */
  readonly worst: string | null;
  /** The recommended value, else the one that comes nearest; 0 for none at a pre-biased part, null where it cannot stand there. */
  readonly baseResistorOhm: number | null;
  /** Whether the base resistor is a recommended one. */
  readonly sized: boolean;
  /** One sentence: why it stands where it does. */
  readonly reason: string;
}

/** Topologies that a low-side NPN stage changes to with the part. */
const LOW_SIDE: readonly Topology[] = [
  'low-side-npn',
  'low-side-darlington',
  'low-side-pre-biased',
];

/**
 * Judges a transistor in a stage, with a base resistor sized for it. A low-side stage takes plain transistors,
 * Darlingtons and pre-biased parts, each in its own topology.
 *
 * @param input the stage; its transistor and the value of its RB are not looked at
 */
export function judgePart(input: StageInput, transistor: TransistorData): JudgedPart {
  const stage = stageWith(input, transistor);
  if (typeof stage === 'string') return unfit(stage);
  const obstacle = obstacleTo(stage);
  if (obstacle !== null) return unfit(obstacle.finding.text);
  return (
    (stage.topology === 'low-side-pre-biased' ? judgedWired(stage) : null) ?? judgedSized(stage)
  );
}

/** A pre-biased part without an outer resistor; null where that fails. */
function judgedWired(stage: StageInput): JudgedPart | null {
  const evaluation = evaluateStage(withRb(stage, 0));
  return evaluation.verdict === 'fail' ? null : judgedAs(withRb(stage, 0), evaluation, true);
}

/** With the recommended base resistor, else with the value that comes nearest. */
function judgedSized(stage: StageInput): JudgedPart {
  const { recommendedOhm, nearest, dependent } = sizedValues(stage);
  const fitted = withRb(stage, recommendedOhm ?? nearest?.valueOhm ?? null);
  const evaluation = evaluateStage(fitted);
  const part = judgedAs(fitted, evaluation, recommendedOhm !== null);
  const lacks = recommendedOhm === null && nearest !== null ? obstacleAt(nearest, dependent) : null;
  if (lacks === null) return part;
  const told = lacks !== 'tested-range' && evaluation.verdict === 'fail';
  const reason = `No base resistor meets ${criterionInSentence(lacks)}.`;
  return { ...part, worst: lacks, reason: told ? reason : part.reason };
}

const withRb = (stage: StageInput, valueOhm: number | null): StageInput => ({
  ...stage,
  baseResistor: { ...stage.baseResistor, valueOhm },
});

function judgedAs(stage: StageInput, evaluation: Evaluation, sized: boolean): JudgedPart {
  return {
    stage,
    verdict: evaluation.verdict,
    margin: leastMargin(evaluation.criteria),
    worst: decidingCriteria(evaluation)[0]?.id ?? null,
    baseResistorOhm: stage.baseResistor.valueOhm,
    sized,
    reason: reasonOf(evaluation, stage.policy),
  };
}

/** The best first: by verdict, then by the smallest margin; what cannot stand there comes last. */
export function rankParts<T extends Pick<JudgedPart, 'verdict' | 'margin'>>(
  parts: readonly T[],
): T[] {
  const place = ({ verdict }: T) =>
    verdict === null ? VERDICTS.length : VERDICTS.indexOf(verdict);
  return [...parts].sort(
    (a, b) => place(a) - place(b) || (b.margin ?? -Infinity) - (a.margin ?? -Infinity),
  );
}

/** The stage with the part in it, or why that is none. */
function stageWith(input: StageInput, transistor: TransistorData): StageInput | string {
  const lowSide = LOW_SIDE.includes(input.topology);
  if (transistor.internal !== null && !lowSide) {
    return `${transistor.partNumber} brings its resistors inside: it stands in low-side stages only.`;
  }
  const topology = lowSide ? lowSideWith(transistor) : input.topology;
  const shuntResistor = topology === 'low-side-pre-biased' ? null : input.shuntResistor;
  return { ...input, topology, transistor, shuntResistor };
}

function lowSideWith({ internal, darlington }: TransistorData): Topology {
  if (internal !== null) return 'low-side-pre-biased';
  return darlington ? 'low-side-darlington' : 'low-side-npn';
}

/** A part that cannot stand in the stage at all, and why. */
export function unfit(reason: string): JudgedPart {
  return {
    stage: null,
    verdict: null,
    margin: null,
    worst: null,
    baseResistorOhm: null,
    sized: false,
    reason,
  };
}

const judged = ({ status }: Criterion) => status !== 'stated' && status !== 'open';

function leastMargin(criteria: readonly Criterion[]): number | null {
  const margins = criteria
    .filter(judged)
    .filter(({ margin, status }) => margin !== null || status === 'fail')
    .map(({ margin }) => margin ?? -Infinity);
  const least = Math.min(...margins);
  return Number.isFinite(least) ? least : null;
}

function reasonOf(evaluation: Evaluation, { marginalBand }: Policy): string {
  const { verdict, findings } = evaluation;
  const [deciding] = decidingCriteria(evaluation);
  if (deciding === undefined) return findings[0]?.text ?? '';
  const { id, margin } = deciding;
  const name = CRITERIA[id as CriterionId].name;
  const by = margin === null ? '' : ` by ${formatPercent(Math.abs(margin), { digits: 2 })}`;
  if (verdict === 'fail') return by === '' ? `${name} is not met.` : `${name} is missed${by}.`;
  const cause = findings.find((each) => each.id === CAUSES[id])?.text;
  if (verdict === 'open') return cause ?? `${name} cannot be judged by the data sheet.`;
  const capped = verdict === 'marginal' && (margin ?? 0) >= marginalBand;
  return (capped ? cause : undefined) ?? `Least margin: ${criterionInSentence(id)} is met${by}.`;
}

/** The finding that says why a criterion is open or at best marginal. */
const CAUSES: Readonly<Record<string, string>> = {
  'tested-range': 'outside-tested-range',
  'overdrive-factor': 'vbe-sat-not-guaranteed',
  'forced-beta': 'vbe-sat-not-guaranteed',
};
