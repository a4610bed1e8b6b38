/**
 * Time a saturated transistor needs to leave saturation once the drive is gone.
 *
 *   ts = τs·ln[(IB1 + IB2)/(IC/βF + IB2)]
 *
 * @param onA base current while on, A
 * @param offA current drawn out of the base at turn-off, A, as a magnitude
 * @returns s; 0 where the transistor was not saturated
 * @see Sedra & Smith, Microelectronic Circuits, BJT storage time (charge control)
 */
export function storageTimeSec(
  timeConstantSec: number,
  onA: number,
  offA: number,
  icA: number,
  gain: number,
): number {
  const edgeA = icA / gain;
  if (onA <= edgeA) return 0;
  return timeConstantSec * Math.log((onA + offA) / (edgeA + offA));
}

/**
 * Storage time constant from a printed switching row.
 *
 * @returns s; null where the row's transistor would not have been saturated
 */
export function storageConstantSec(
  row: { tsSec: number; icA: number; ib1A: number; ib2A: number },
  gain: number,
): number | null {
  const share = (row.ib1A + row.ib2A) / (row.icA / gain + row.ib2A);
  return share > 1 ? row.tsSec / Math.log(share) : null;
}
