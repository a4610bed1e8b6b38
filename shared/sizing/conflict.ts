import { type CriterionId, PRE } from '../checks/criteria.ts';
import { criterionInSentence } from '../checks/criterion-in-sentence.ts';
import type { Criterion } from '../checks/evaluation.ts';
import type { Judge } from '../checks/judge.ts';
import { formatNumber, formatPercent, formatQuantity } from '../units/engineering-notation.ts';
import { type JudgedValue, nearnessOf } from './judged-value.ts';
import { DECIDED_BY_RB } from './rb-dependence.ts';
import { sizeShunt } from './size-shunt.ts';
import type { Sizing } from './sizing.ts';

/**
 * Why no value is left: the criterion that asks most for a smaller base resistor and the one that asks most for a larger,
 * and for each by how much it misses where the other is just met.
 *
 * @param values all preferred values, rising
 * @param nearest the value that comes nearest, judged
 * @param dependent ids of the criteria that move with RB
 */
export function conflictAt(
  judge: Judge,
  values: readonly number[],
  nearest: JudgedValue,
  dependent: ReadonlySet<string>,
): Sizing['conflict'] {
  const line = new Line(judge, values);
  const asking = nearest.criteria
    .filter(({ id }) => dependent.has(id) || DECIDED_BY_RB.includes(id as CriterionId))
    .sort((a, b) => nearnessOf(a) - nearnessOf(b))
    .map(({ id }) => ({ id: id as CriterionId, side: line.sideOf(id) }));
  const between = (['smaller', 'larger'] as const)
    .map((side) => asking.find((each) => each.side === side)?.id)
    .filter((id) => id !== undefined);
  const ways = between.flatMap((id, k) => {
    const other = between[1 - k];
    const met = other === undefined ? null : line.lastMeeting(other);
    // Where the other is met only without any drive left, the nearest value says more.
    const [atEdge, atNearest] = [met ?? nearest.valueOhm, nearest.valueOhm];
    return waysOut(judge, id, atEdge) ?? waysOut(judge, id, atNearest) ?? [NO_DRIVE];
  });
  return { between, ways };
}

const NO_DRIVE =
  'No value leaves the base any current: the output must give more voltage, or a transistor in front must take over.';

/** Criteria that more drive always helps, also where they are missed by everything. */
const ASK_FOR_DRIVE = ['overdrive-factor', 'forced-beta', 'input-on'];

/** The preferred values in line: a criterion of a conflict changes once from met to missed along it. */
class Line {
  private readonly judge: Judge;
  private readonly values: readonly number[];
  private readonly judged = new Map<number, readonly Criterion[]>();
  private readonly first: readonly Criterion[];
  private readonly last: readonly Criterion[];

  constructor(judge: Judge, values: readonly number[]) {
    this.judge = judge;
    this.values = values;
    this.first = this.at(0);
    this.last = this.at(values.length - 1);
  }

  /** All criteria at a value, judged once. */
  private at(index: number): readonly Criterion[] {
    const known = this.judged.get(index) ?? this.judge.criteria(this.values[index] ?? NaN);
    this.judged.set(index, known);
    return known;
  }

  /** Which way a criterion asks RB to go; null where it is met at both ends. */
  sideOf(id: string): 'smaller' | 'larger' | null {
    const [small, large] = [this.first, this.last].map((criteria) => nearnessIn(criteria, id));
    if (small === undefined || large === undefined || (small >= 0 && large >= 0)) return null;
    if (small === large) {
      return ASK_FOR_DRIVE.some((own) => id.endsWith(own)) ? 'smaller' : 'larger';
    }
    return small > large ? 'smaller' : 'larger';
  }

  /** The value that just meets a criterion; null where none or every one does. */
  lastMeeting(id: CriterionId): number | null {
    const [small, large] = [nearnessIn(this.first, id) >= 0, nearnessIn(this.last, id) >= 0];
    if (small === large) return null;
    let inside = small ? 0 : this.values.length - 1;
    let outside = small ? this.values.length - 1 : 0;
    while (Math.abs(inside - outside) > 1) {
      const middle = (inside + outside) >> 1;
      if (nearnessIn(this.at(middle), id) >= 0) inside = middle;
      else outside = middle;
    }
    return this.values[inside] ?? null;
  }
}

function nearnessIn(criteria: readonly Criterion[], id: string): number {
  const found = criteria.find((each) => each.id === id);
  return found === undefined ? Infinity : nearnessOf(found);
}

/**
 * What would take a criterion out of the way, with the figure it needs at a base resistor of `rbOhm`.
 *
 * @returns null where no figure says it there
 */
function waysOut(judge: Judge, id: CriterionId, rbOhm: number): string[] | null {
  const inFront = id.startsWith(PRE);
  const found = inFront
    ? inFrontAt(judge, rbOhm)
    : { judge, criteria: judge.criteria(rbOhm), rbOhm };
  const own = (inFront ? id.slice(PRE.length) : id) as CriterionId;
  const criterion = found?.criteria.find((each) => each.id === own);
  if (found === null || criterion === undefined) return [];
  if (criterion.status === 'pass' || criterion.status === 'stated') return [];
  if (criterion.value === null || (criterion.value <= 0 && criterion.relation === '>='))
    return null;
  const way =
    WAYS[own]?.({ ...found, criterion }) ??
    `${criterionInSentence(own)} is ${figure(criterion)} against ${limitText(criterion)}.`;
  return [
    `At ${formatQuantity(rbOhm, 'Ohm')}${inFront ? ', of the transistor in front,' : ''} ${way}`,
  ];
}

/** The same for the transistor in front of a two-transistor high side, whose own RB stays. */
function inFrontAt(judge: Judge, rbOhm: number): Omit<Case, 'criterion'> | null {
  const criteria = judge.criteria(rbOhm);
  const { preJudge } = judge;
  if (preJudge == null) return null;
  return {
    judge: preJudge,
    criteria: criteria
      .filter(({ id }) => id.startsWith(PRE))
      .map((criterion) => ({ ...criterion, id: criterion.id.slice(PRE.length) })),
    rbOhm: preJudge.model.input.baseResistor.valueOhm ?? rbOhm,
  };
}

interface Case {
  readonly judge: Pick<Judge, 'model' | 'point' | 'traits'>;
  readonly criteria: readonly Criterion[];
  readonly criterion: Criterion;
  readonly rbOhm: number;
}

/** By criterion, the sentence after "At 1 kΩ"; null where the figures do not carry one. */
const WAYS: Partial<Record<CriterionId, (found: Case) => string | null>> = {
  'overdrive-factor': ({ criterion, criteria }) => {
    const { value, limit } = criterion;
    if (value === null || limit === null) return null;
    const current = amps(criteria, 'collector-current');
    return `a transistor with ${formatNumber(limit / value)} times the guaranteed gain${current} is needed, or that many times the base current.`;
  },
  'forced-beta': ({ criterion, judge }) => {
    const { value, limit } = criterion;
    if (value === null || limit === null) return null;
    const { policy } = judge.model.input;
    const asked = `VCE(sat) must be guaranteed up to IC/IB of ${formatNumber(value)}, not ${formatNumber(limit)}`;
    return value > policy.forcedBeta
      ? `${asked}, and the policy must allow it (${formatNumber(policy.forcedBeta)} now).`
      : `${asked}: another transistor, or a policy that does not ask for guaranteed rows.`;
  },
  'input-on': ({ criterion }) => {
    const { value, limit } = criterion;
    if (value === null || limit === null) return null;
    return `the output must be ${formatQuantity(limit - value, 'V', { digits: 2 })} higher, or VI(on) of the part as much lower.`;
  },
  'drive-current': ({ criterion, judge }) => {
    const { value, limit } = criterion;
    if (value === null || limit === null) return null;
    const { driveDerating } = judge.model.input.policy;
    return `the output must be rated for ${formatQuantity(value / driveDerating, 'A')} (${formatQuantity(limit / driveDerating, 'A')} now), or a transistor in front must take over.`;
  },
  'base-current': ({ criterion, judge }) => {
    if (criterion.value === null) return null;
    const { currentDerating } = judge.model.input.policy;
    return `a transistor is needed that bears ${formatQuantity(criterion.value / currentDerating, 'A')} at its base.`;
  },
  'rb-dissipation': ({ criterion, judge }) => {
    const { value, limit } = criterion;
    const { ratingW } = judge.model.input.baseResistor;
    if (value === null || limit === null || limit <= 0 || ratingW === null) return null;
    return `the base resistor must be rated for ${formatQuantity((ratingW * value) / limit, 'W')} (${formatQuantity(ratingW, 'W')} now).`;
  },
  'storage-time': ({ criterion }) => {
    const { value, limit } = criterion;
    if (value === null || limit === null || limit <= 0) return null;
    return `storage and fall take ${formatNumber(value / limit)} times what they may: a lower base–emitter resistor, a faster transistor or a lower frequency is needed.`;
  },
  'off-base-voltage': lowerShunt,
  'off-collector-current': lowerShunt,
  'reset-off': lowerShunt,
  'reset-off-current': lowerShunt,
  'tested-range': (found) => {
    const beyond = found.judge.traits().beyondRows;
    const pin = largestWeakPinA(found.judge, found.rbOhm);
    const rows = beyond.filter((quantity) => quantity !== PIN);
    return [
      beyond.includes(PIN)
        ? `the output must be tested up to ${formatQuantity(pin, 'A')}, or a transistor in front must take over.`
        : '',
      rows.length === 0
        ? ''
        : `the transistor needs rows of ${rows.join(', ')}${amps(found.criteria, 'collector-current', 'up to')}.`,
    ]
      .filter((text) => text !== '')
      .join(' Besides, ');
  },
};

const PIN = 'output current';

function lowerShunt({ judge, criterion, rbOhm }: Case): string | null {
  const { input } = judge.model;
  const sized = sizeShunt({ ...input, baseResistor: { ...input.baseResistor, valueOhm: rbOhm } });
  if (sized?.largestOhm == null) return null;
  const costs =
    sized.recommendedOhm !== null
      ? ''
      : sized.driveShare === null || sized.driveShare >= 1
        ? ', and takes all the drive'
        : `, and takes ${formatPercent(sized.driveShare, { digits: 2 })} of the drive`;
  const name = criterionInSentence(criterion.id);
  return `${name} is ${figure(criterion)} against ${limitText(criterion)}: a base–emitter resistor of at most ${formatQuantity(sized.largestOhm, 'Ohm')} brings it down${costs}.`;
}

const figure = ({ value, unit }: Criterion) => formatQuantity(value, unit);
const limitText = ({ limit, unit }: Criterion) =>
  limit === null ? 'no printed limit' : formatQuantity(limit, unit);

/** ` at 24.2 mA`, from the figure of a criterion. */
function amps(criteria: readonly Criterion[], id: CriterionId, word = 'at'): string {
  const value = criteria.find((each) => each.id === id)?.value ?? null;
  return value === null ? '' : ` ${word} ${formatQuantity(value, 'A')}`;
}

/** Largest current a weak pin gives at start, A: what its data sheet would have to test. */
function largestWeakPinA({ point, model }: Case['judge'], rbOhm: number): number {
  const { count, shift } = model.corners;
  let mostA = 0;
  for (let corner = 0; corner < count; corner++) {
    const settled = ((corner >> shift.instant) & 1) === 1;
    if (settled || ((corner >> shift.drive) & 1) === 1) continue;
    point.place(corner, rbOhm);
    point.solve(point.condition.ambientDegC);
    mostA = Math.max(mostA, point.driveA);
  }
  return mostA;
}
