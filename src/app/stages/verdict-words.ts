import {
  CRITERIA,
  type CriterionGroup,
  type CriterionId,
  PRE,
} from '../../../shared/checks/criteria.ts';
import { decidingCriteria } from '../../../shared/checks/deciding-criteria.ts';
import type { Criterion, Evaluation } from '../../../shared/checks/evaluation.ts';
import { CRITERIA_TEXT } from '../../../shared/method/criteria-text.ts';
import { cornerWords } from '../../../shared/report/corner-words.ts';
import {
  formatNumber,
  formatPercent,
  formatQuantity,
} from '../../../shared/units/engineering-notation.ts';
import { criterionName } from '../../../shared/report/criterion-name.ts';

export const GROUP_NAMES: Readonly<Record<CriterionGroup, string>> = {
  'on-state': 'On state',
  'off-state': 'Off state',
  'turn-off': 'Turn-off',
  switching: 'Switching',
  data: 'Data',
};

/** The criteria a designer looks at first; the others stand behind "Show all" while they are met. */
const FIRST = new Set<string>([
  'overdrive-factor',
  'input-on',
  'pre-overdrive-factor',
  'pre-forced-beta',
  'pre-drive-current',
  'forced-beta',
  'load-voltage',
  'load-current',
  'inrush-saturation',
  'output-low',
  'output-high',
  'input-off',
  'saturation-voltage',
  'drive-current',
  'collector-current',
  'junction-temperature',
  'off-base-voltage',
  'peak-collector-voltage',
  'release-time',
  'storage-time',
] satisfies CriterionId[]);

export interface VerdictGroup {
  readonly name: string;
  readonly criteria: readonly Criterion[];
}

const groupOf = ({ id }: Criterion): CriterionGroup =>
  Object.hasOwn(CRITERIA, id) ? CRITERIA[id as CriterionId].group : 'data';

/** Whether a criterion stands in the short list: the usual ones, and whatever is not simply met. */
export const standsFirst = ({ id, status }: Criterion): boolean =>
  FIRST.has(id) || (status !== 'pass' && status !== 'stated');

/** Criteria by group, in the order of the groups. */
export function verdictGroups(criteria: readonly Criterion[]): readonly VerdictGroup[] {
  return (Object.keys(GROUP_NAMES) as CriterionGroup[])
    .map((group) => ({
      name: GROUP_NAMES[group],
      criteria: criteria.filter((criterion) => groupOf(criterion) === group),
    }))
    .filter((group) => group.criteria.length > 0);
}

const CLOSE = 0.05;

/** One more digit where value and limit lie close together. */
const digitsOf = ({ margin }: Criterion) => (margin !== null && Math.abs(margin) < CLOSE ? 4 : 3);

const LEAST_VOLTS = 0.001;

/** Volts without a prefix and with at most three decimals, so that the column reads at sight. */
function voltText(valueV: number, digits: number, pad: boolean): string {
  if (valueV !== 0 && Math.abs(valueV) < LEAST_VOLTS)
    return formatQuantity(valueV, 'V', { digits });
  return Math.abs(valueV) < 1
    ? `${formatNumber(Number(valueV.toFixed(3)), { digits: 3, pad: pad && Math.abs(valueV) >= 0.1 })}\u00a0V`
    : `${formatNumber(valueV, { digits, pad })}\u00a0V`;
}

/** The value of a criterion at its worst corner. */
export function figureText(criterion: Criterion, value: number | null): string {
  if (value === null) return criterion.status === 'fail' ? '∞' : '–';
  const { unit } = criterion;
  const digits = digitsOf(criterion);
  return unit === 'V'
    ? voltText(value, digits, true)
    : formatQuantity(value, unit, { digits, pad: true });
}

/** `≥ 2`, or that no limit is set. */
export function limitText(criterion: Criterion): string {
  if (criterion.limit === null) return 'no limit set';
  const { limit, unit } = criterion;
  const digits = digitsOf(criterion);
  const shown =
    unit === 'V' ? voltText(limit, digits, false) : formatQuantity(limit, unit, { digits });
  return `${criterion.relation === '>=' ? '≥' : '≤'}\u00a0${shown}`;
}

export const marginText = (margin: number | null): string =>
  margin === null ? '' : formatPercent(margin, { digits: 2 });

/** The whole worst corner in words; where nothing varies, that. */
export const cornerText = ({ corner, id }: Criterion): string =>
  corner === null ? 'at every corner' : cornerWords(corner, id);

const SHORT_WORDS = 3;
const JUST_OFF = 'just switched off';

/** What decides the corner most, in one line of the list. */
export function shortCornerText(criterion: Criterion): string {
  const words = cornerText(criterion).split(', ');
  return words.at(-1) === JUST_OFF
    ? [words[0], JUST_OFF].join(', ')
    : words.slice(0, SHORT_WORDS).join(', ');
}

/** The verdict in one sentence: which criterion decides it, and by how much. */
export function verdictSentence(evaluation: Evaluation): string {
  const { verdict } = evaluation;
  const deciding = decidingCriteria(evaluation);
  const [worst] = deciding;
  if (worst === undefined) return evaluation.findings[0]?.text ?? '';
  const name = criterionName(worst.id);
  const margin =
    worst.margin === null ? null : formatPercent(Math.abs(worst.margin), { digits: 2 });
  const others = deciding.length - 1;
  const more = others === 0 ? '' : ` ${others} more ${others === 1 ? 'is' : 'are'} ${verdict}.`;
  switch (verdict) {
    case 'fail':
      return `${name} ${margin === null ? 'is not met' : `is missed by ${margin}`}.${more}`;
    case 'marginal':
      return `${name} met by ${margin ?? '–'}; under 10\u00a0% is marginal.${more}`;
    case 'open':
      return `${name} cannot be judged to the limit of the data sheet.${more}`;
    case 'pass':
      return `Every criterion is met; least margin ${margin ?? '–'}, ${name}.`;
  }
}

/** What helps a criterion that fails; nothing to say of the others. */
export function cureText({ id, status }: Criterion): string | null {
  if (status !== 'fail') return null;
  return CRITERIA_TEXT[id.startsWith(PRE) ? id.slice(PRE.length) : id]?.cure ?? null;
}

/** How many have which status: `10 pass, 1 stated`. */
export function countWords(criteria: readonly Criterion[]): string {
  const counts = new Map<string, number>();
  for (const { status } of criteria) counts.set(status, (counts.get(status) ?? 0) + 1);
  return [...counts].map(([status, count]) => `${count} ${status}`).join(', ');
}
