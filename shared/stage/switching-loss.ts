import type { OperatingPoint } from './operating-point.ts';

/**
 * Mean loss of the edges at the stage's frequency, W; 0 for a static stage or without a switching row.
 *
 * Resistive load: f·VS·IC·(tr + tf)/6. Clamped coil: f·½·V_peak·I0·tf, plus f·½·VS·I0·tr where the coil
 * still carries current at turn-on. The rise takes longer where the drive is weaker than the row's.
 */
export function switchingLossW(point: OperatingPoint): number {
  const { input, clamp } = point.model;
  const row = input.transistor.switching;
  if (input.frequencyHz <= 0 || row?.tfSec == null || row.trSec === null) return 0;
  const { supplyV, loadOhm } = point.condition;
  const rowBeta = row.icA === null || row.ib1A === null ? Infinity : row.icA / row.ib1A;
  const slower = Number.isFinite(point.forcedBeta) ? Math.max(1, point.forcedBeta / rowBeta) : 1;
  const riseSec = row.trSec * slower;
  if (input.load.kind !== 'coil') {
    return (input.frequencyHz * supplyV * point.icA * (riseSec + row.tfSec)) / 6;
  }
  const peakV = clamp === null ? supplyV : clamp.peakV;
  const offSec = (1 - input.duty) / input.frequencyHz;
  const falls = clamp !== null && clamp.smallestV > 0 && input.load.inductanceH !== null;
  const deadSec = falls
    ? ((input.load.inductanceH ?? 0) / loadOhm) *
      Math.log1p((point.icA * loadOhm) / clamp.smallestV)
    : Infinity;
  const stillOn = deadSec > offSec ? supplyV * riseSec : 0;
  return (input.frequencyHz * point.icA * (peakV * row.tfSec + stillOn)) / 2;
}
