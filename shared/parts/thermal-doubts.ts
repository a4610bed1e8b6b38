import { formatQuantity } from '../units/engineering-notation.ts';
import { chosenLimits } from './chosen-limits.ts';
import type { Doubt } from './doubt.ts';
import { limitSetName } from './transistor-limits.ts';
import type { TransistorRecord } from './transistor-record.ts';

const AGREEMENT = 0.1;
const REFERENCE_DEG_C = 25;

/**
 * Thermal resistances that do not follow from Ptot and TJmax at 25 °C, maker by maker. A maker that prints
 * no thermal resistance of its own is not compared with another's.
 */
export function thermalDoubts(record: TransistorRecord): Doubt[] {
  return [record.limits, ...record.alternatives].flatMap((set, index) => {
    const limits = chosenLimits(record, limitSetName(set));
    const tjMaxDegC = limits?.tjMaxDegC ?? null;
    if (limits === null || tjMaxDegC === null) return [];
    const place = index === 0 ? 'limits' : `alternatives.${index - 1}`;
    const riseK = tjMaxDegC - REFERENCE_DEG_C;
    return [
      ...disagreement(`${place}.rthJaKPerW`, set.rthJaKPerW, riseK, limits.powerW),
      ...disagreement(`${place}.rthJcKPerW`, set.rthJcKPerW, riseK, limits.powerCaseW),
    ];
  });
}

function disagreement(
  path: string,
  rthKPerW: number | null,
  riseK: number,
  powerW: number | null,
): Doubt[] {
  if (rthKPerW === null || powerW === null) return [];
  const followsKPerW = riseK / powerW;
  if (Math.abs(rthKPerW - followsKPerW) <= AGREEMENT * followsKPerW) return [];
  const [printed, follows] = [rthKPerW, followsKPerW].map((value) => formatQuantity(value, 'K/W'));
  return [{ path, message: `${printed} is printed, but power and TJ give ${follows}.` }];
}
