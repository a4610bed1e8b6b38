import { CRITERIA, type CriterionId } from '../checks/criteria.ts';
import { type JudgedValue, obstacleAt } from './judged-value.ts';
import type { Sizing } from './sizing.ts';

const MORE_GAIN = 'a transistor with more guaranteed gain at this current';
const LOWER_DEMAND =
  'a transistor whose VCE(sat) is guaranteed at a higher IC/IB, or a policy that asks for less';
const STRONGER_DRIVE = 'a stronger output, or a pre-driver in front';

/** What would take a criterion out of the way. */
const CURES: Partial<Record<CriterionId, string>> = {
  'overdrive-factor': MORE_GAIN,
  'forced-beta': LOWER_DEMAND,
  'input-on': 'an output with a higher level, or a part with a lower VI(on)',
  'drive-current': STRONGER_DRIVE,
  'tested-range':
    'an output tested at a higher current, a transistor with rows up to this current, or a pre-driver in front',
  'base-current': 'a transistor that stands more base current',
  'rb-dissipation': 'a base resistor with a higher rating',
  'off-base-voltage': 'a lower base–emitter resistor, or an output with a lower low level',
  'off-collector-current': 'a lower base–emitter resistor, or a transistor with less leakage',
  'reset-off': 'a lower base–emitter resistor',
  'storage-time': 'a lower base–emitter resistor, a faster transistor, or a lower frequency',
};

/**
 * Why no value is left: what stands against a smaller and what against a larger base resistor, next to the
 * value that comes nearest.
 *
 * @param judged neighbouring values, rising
 * @param best index of the value that comes nearest
 */
export function conflictAt(
  judged: readonly JudgedValue[],
  best: number,
  dependent: ReadonlySet<string>,
): Sizing['conflict'] {
  const nearest = judged[best];
  if (nearest === undefined) return null;
  const at = (index: number) => {
    const value = judged[index];
    return value === undefined ? null : obstacleAt(value, dependent);
  };
  const own = at(best);
  const pair = [own, at(best - 1), at(best + 1), at(0), at(judged.length - 1)];
  const between = [...new Set(pair.filter((id) => id !== null))].slice(0, 2);
  const cures = [...new Set(between.map((id) => CURES[id as CriterionId]).filter((cure) => cure))];
  const names = between.map((id) => CRITERIA[id as CriterionId].name).join(' and ');
  const cure =
    cures.length === 0
      ? `No preferred value meets ${names}.`
      : `No preferred value meets ${names}. What would open the window: ${cures.join('; or ')}.`;
  return { between, cure };
}
