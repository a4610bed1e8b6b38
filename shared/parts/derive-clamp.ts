import { Clamp } from '../stage/clamp.ts';
import { refused, type Derived } from './derived.ts';
import type { DiodeRecord } from './diode-record.ts';

const KIND_OF_FAMILY = {
  switching: 'diode',
  rectifier: 'diode',
  schottky: 'diode',
  zener: 'zener-across-transistor',
  tvs: 'tvs-across-transistor',
} as const;

/**
 * The stage file's `clamp` from a diode: a free-wheel diode across the coil, or a zener or TVS across
 * the transistor. The forward voltage is the printed maximum at the smallest tested current that reaches
 * the coil's, else the one at the largest.
 *
 * @param coilCurrentA what the diode takes over at turn-off
 * @returns the clamp, or why the record gives none
 */
export function deriveClamp(record: DiodeRecord, coilCurrentA: number): Derived<Clamp> {
  const kind = KIND_OF_FAMILY[record.family];
  const tested = record.forward
    .filter(({ maxV }) => maxV !== null)
    .sort((left, right) => left.currentA - right.currentA);
  const reaching = tested.find(({ currentA }) => currentA >= coilCurrentA);
  const row = reaching ?? tested.at(-1);
  const parsed = Clamp.safeParse({
    kind,
    forwardV: row?.maxV,
    zenerV: zenerSpan(record),
    standOffV: record.breakdown?.standOffV,
    reverseV: record.reverseV,
    currentRatingA: record.currentA ?? record.breakdown?.clampingA,
    powerRatingW: record.powerW,
  });
  if (!parsed.success) return refused(`${record.partNumber} lacks figures a clamp needs.`);
  const beyond = kind === 'diode' && reaching === undefined;
  return {
    ok: true,
    data: parsed.data,
    remarks: beyond ? ['The coil current lies above the largest tested forward current.'] : [],
  };
}

/** A TVS is judged at its clamping voltage, a zener at its breakdown. */
function zenerSpan({ breakdown }: DiodeRecord) {
  if (breakdown === null) return null;
  return { min: breakdown.zenerV.min, max: breakdown.clampingV ?? breakdown.zenerV.max };
}
