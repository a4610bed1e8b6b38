import type { StageInput } from './stage-input.ts';
import type { Writable } from './writable.ts';

/**
 * The logic output as the base resistor sees it: a voltage behind a resistance, and a steeper resistance
 * beyond the last current its data sheet tests.
 */
export interface DriveSource {
  readonly openV: number;
  readonly sourceOhm: number;
  /** Last tested current, A; Infinity where nothing is tested against it. */
  readonly testedA: number;
  readonly beyondOhm: number;
}

/** Judgement, not measurement: how much steeper the output is beyond its tested current. */
const BEYOND_TESTED = 3;

/** A voltage without resistance, tested against nothing. */
export const stiffSource = (openV: number): DriveSource => ({
  openV,
  sourceOhm: 0,
  testedA: Infinity,
  beyondOhm: 0,
});

/** Whether the transistor hangs at the positive supply and a low output turns it on. */
export function isHighSide(input: StageInput): boolean {
  return input.topology === 'high-side-pnp';
}

/**
 * The output while it turns the transistor on.
 *
 * @param supplyV load supply of the corner, V
 * @param railV rail of the corner, V; ignored where the rail tracks the supply
 * @param strong strong output: highest level, no resistance, lowest pull-up
 * @param pullUpSign end of the pull-up's tolerance for open collector: 1, −1, or 0 for nominal
 */
export function driveSource(
  input: StageInput,
  supplyV: number,
  railV: number,
  strong: boolean,
  pullUpSign: number,
): DriveSource {
  const source = stiffSource(0);
  setDriveSource(source, input, supplyV, railV, strong, pullUpSign);
  return source;
}

/** Writes the output as `driveSource` gives it. */
export function setDriveSource(
  source: Writable<DriveSource>,
  input: StageInput,
  supplyV: number,
  railV: number,
  strong: boolean,
  pullUpSign: number,
): void {
  const { drive } = input;
  const rail = drive.railTracksSupply ? supplyV : railV;
  source.sourceOhm = 0;
  source.testedA = Infinity;
  source.beyondOhm = 0;
  if (isHighSide(input)) {
    source.openV = supplyV;
    if (!strong) setTested(source, drive.low.levelV, 0, drive.low.currentA);
  } else if (drive.kind === 'open-collector') {
    const pullUpOhm = drive.pullUp.valueOhm * (1 + pullUpSign * drive.pullUp.tolerance);
    source.openV = rail - (strong ? 0 : drive.leakageA * pullUpOhm);
    source.sourceOhm = pullUpOhm;
  } else if (strong) source.openV = rail;
  else {
    const { dropV, unloadedDropV, currentA } = drive.high;
    source.openV = rail - unloadedDropV - drive.groundShiftV;
    setTested(source, dropV, unloadedDropV, currentA);
  }
}

/** An output with one tested point: `dropV` at `currentA`, `unloadedV` at no load. */
function setTested(
  source: Writable<DriveSource>,
  dropV: number,
  unloadedV: number,
  currentA: number,
): void {
  source.sourceOhm = Math.max(0, dropV - unloadedV) / currentA;
  source.testedA = currentA;
  source.beyondOhm = (BEYOND_TESTED * dropV) / currentA;
}
