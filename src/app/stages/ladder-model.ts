import type { CriterionStatus, Evaluation } from '../../../shared/checks/evaluation.ts';
import { criterionName } from '../../../shared/report/criterion-name.ts';
import { candidateOf } from '../../../shared/sizing/judged-value.ts';
import { DECIDED_BY_RB } from '../../../shared/sizing/rb-dependence.ts';
import type { Candidate, Sizing } from '../../../shared/sizing/sizing.ts';
import { formatQuantity } from '../../../shared/units/engineering-notation.ts';
import { criterionInSentence } from '../../../shared/checks/criterion-in-sentence.ts';

/** One rung: a preferred value with its smallest margin. */
export interface Rung {
  readonly valueOhm: number;
  /** Figure without its unit: all rungs of a ladder share one where they can. */
  readonly figure: string;
  readonly text: string;
  readonly verdict: CriterionStatus;
  /** Height of the bar, 0 to 1: square root, full at 50 % margin; 0 where not met. */
  readonly height: number;
  readonly margin: number | null;
  readonly worst: string | null;
  readonly inWindow: boolean;
  readonly recommended: boolean;
  readonly inUse: boolean;
  /** Whether it is no preferred value of the window's range, but stands there because it is in use. */
  readonly standIn: boolean;
}

/** Neighbours of one verdict, whose word stands once below them. */
export interface RungGroup {
  readonly verdict: CriterionStatus;
  readonly from: number;
  readonly count: number;
}

export interface Ladder {
  readonly rungs: readonly Rung[];
  readonly groups: readonly RungGroup[];
  /** First and last rung of the window, or null where it is empty. */
  readonly window: { readonly from: number; readonly to: number } | null;
  /** Signs of the longest figure. */
  readonly longestFigure: number;
  readonly lowerEnd: string;
  readonly upperEnd: string;
}

const FULL_MARGIN = 0.5;
/** Height of the 10 % line on the scale of the bars. */
export const BAND_HEIGHT = Math.sqrt(0.1 / FULL_MARGIN);

const near = (a: number | null, b: number | null) =>
  a !== null && b !== null && Math.abs(a - b) <= 1e-6 * Math.abs(b);

/**
 * The window as it is drawn. A value in use that was not sized stands in at its place, with what the verdicts say of it.
 *
 * @param evaluation of the stage on show; null while it is not judged
 */
export function ladder(
  sizing: Sizing,
  inUseOhm: number | null,
  evaluation: Evaluation | null,
): Ladder {
  const extra = standIn(sizing, inUseOhm, evaluation);
  const candidates = [...sizing.candidates, ...extra].sort((a, b) => a.valueOhm - b.valueOhm);
  const rungs = candidates.map((candidate) => ({
    ...rungOf(candidate, sizing, inUseOhm),
    standIn: extra.includes(candidate),
  }));
  const from = rungs.findIndex(({ inWindow }) => inWindow);
  const to = rungs.findLastIndex(({ inWindow }) => inWindow);
  return {
    rungs,
    groups: groupsOf(rungs),
    window: from < 0 ? null : { from, to },
    longestFigure: Math.max(0, ...rungs.map(({ figure }) => figure.length)),
    lowerEnd: endText('Lower end', sizing.setBy.min),
    upperEnd: endText('Upper end', sizing.setBy.max),
  };
}

/** The value in use as a candidate of its own; none where it was sized, or is not judged. */
function standIn(
  { candidates }: Sizing,
  inUseOhm: number | null,
  evaluation: Evaluation | null,
): Candidate[] {
  if (inUseOhm === null || candidates.length === 0 || evaluation === null) return [];
  if (candidates.some(({ valueOhm }) => near(valueOhm, inUseOhm))) return [];
  if (!near(evaluation.baseResistorOhm, inUseOhm) || evaluation.criteria.length === 0) return [];
  const { criteria } = evaluation;
  return [candidateOf({ valueOhm: inUseOhm, criteria }, new Set(DECIDED_BY_RB))];
}

function rungOf(
  candidate: Candidate,
  sizing: Sizing,
  inUseOhm: number | null,
): Omit<Rung, 'standIn'> {
  const { valueOhm, margin, verdict, worst } = candidate;
  const text = formatQuantity(valueOhm, 'Ohm');
  const [figure = text, unit = 'Ω'] = text.split('\u00a0');
  const met = margin !== null && margin > 0 && verdict !== 'open';
  return {
    valueOhm,
    text,
    figure: unit === 'Ω' ? figure : `${figure}${unit.replace('Ω', '')}`,
    verdict,
    height: met ? Math.sqrt(Math.min(1, margin / FULL_MARGIN)) : 0,
    margin,
    worst: worst === null ? null : criterionName(worst),
    inWindow:
      sizing.rbMinOhm !== null &&
      sizing.rbMaxOhm !== null &&
      valueOhm >= sizing.rbMinOhm * (1 - 1e-9) &&
      valueOhm <= sizing.rbMaxOhm * (1 + 1e-9),
    recommended: near(sizing.recommendedOhm, valueOhm),
    inUse: near(inUseOhm, valueOhm),
  };
}

function groupsOf(rungs: readonly Rung[]): readonly RungGroup[] {
  const groups: { verdict: CriterionStatus; from: number; count: number }[] = [];
  rungs.forEach(({ verdict }, index) => {
    const last = groups.at(-1);
    if (last?.verdict === verdict) last.count += 1;
    else groups.push({ verdict, from: index, count: 1 });
  });
  return groups;
}

const endText = (end: string, criterion: string | null) =>
  criterion === null ? '' : `${end}: ${criterionInSentence(criterion)}`;
