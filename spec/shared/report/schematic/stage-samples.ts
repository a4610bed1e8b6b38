import type { CornerFigures } from '../../../../shared/checks/evaluation.ts';
import { StageInput, type StageFile } from '../../../../shared/stage/stage-input.ts';
import { relayDriver } from '../../relay-stage.ts';

export const RELAY_DRIVER = relayDriver();

/** A parsed stage made from the relay driver. */
export const stageWith = (change: Partial<StageFile> = {}): StageInput =>
  StageInput.parse({ ...RELAY_DRIVER, ...change });

export const PULL_UP_DRIVE: StageFile['drive'] = {
  kind: 'open-collector',
  railV: { min: 4.75, max: 5.25 },
  low: { levelV: 0.4, currentA: 0.004 },
  sourceLimitA: null,
  sinkLimitA: 0.01,
  pullUp: { valueOhm: 4700, tolerance: 0.05, ratingW: 0.1 },
};

export const FIGURES: CornerFigures = {
  corner: {
    supply: 'max',
    ambient: 'min',
    drive: 'weak',
    rb: '+',
    rbe: '-',
    load: '-',
    gain: 'min',
  },
  supplyV: 26.4,
  ambientDegC: -20,
  outputV: 2.79,
  driveA: 0.00276,
  ibA: 0.00271,
  shuntA: 48e-6,
  icA: 0.024,
  vceV: 0.235,
  vbeV: 0.995,
  forcedBeta: 8.9,
  overdriveFactor: 5.73,
  powerW: 0.0083,
  tjDegC: -18,
  saturated: true,
};

export const DESIGNATORS = {
  baseResistor: 'R30',
  shuntResistor: 'R31',
  pullUp: 'R29',
  speedUpCapacitor: 'C8',
  load: 'K4',
  clamp: 'D7',
  clampZener: 'D8',
  drive: 'U4',
  loadResistor: 'R33',
  preDriver: 'Q13',
  preBaseResistor: 'R34',
  preShuntResistor: 'R35',
};
export const NO_DESIGNATORS = {
  baseResistor: null,
  shuntResistor: null,
  pullUp: null,
  speedUpCapacitor: null,
  load: null,
  clamp: null,
  clampZener: null,
  drive: null,
  loadResistor: null,
  preDriver: null,
  preBaseResistor: null,
  preShuntResistor: null,
};
