import { StageInput, type StageFile } from '../../shared/stage/stage-input.ts';

/** 2N3904 by onsemi 2N3903/D, Rev. 9, maximum ratings and electrical characteristics. */
export const TYPE_2N3904 = {
  partNumber: '2N3904',
  polarity: 'npn',
  package: 'TO-92',
  limits: { vceoV: 40, vcboV: 60, veboV: 6, icA: 0.2, powerW: 0.625, tjMaxDegC: 150 },
  thermal: { rthJaKPerW: 200, rthJcKPerW: 83.3 },
  gain: [
    { icA: 1e-4, vceV: 1, min: 40 },
    { icA: 1e-3, vceV: 1, min: 70 },
    { icA: 0.01, vceV: 1, min: 100, max: 300 },
    { icA: 0.05, vceV: 1, min: 60 },
    { icA: 0.1, vceV: 1, min: 30 },
  ],
  saturation: [
    { icA: 0.01, ibA: 0.001, maxV: 0.2 },
    { icA: 0.05, ibA: 0.005, maxV: 0.3 },
  ],
  baseEmitter: [
    { icA: 0.01, ibA: 0.001, minV: 0.65, maxV: 0.85 },
    { icA: 0.05, ibA: 0.005, maxV: 0.95 },
  ],
  leakage: [{ kind: 'icex', currentA: 5e-8, voltageV: 30 }],
  switching: {
    tdSec: 3.5e-8,
    trSec: 3.5e-8,
    tsSec: 2e-7,
    tfSec: 5e-8,
    icA: 0.01,
    ib1A: 0.001,
    ib2A: 0.001,
  },
  capacitanceF: 4e-12,
} satisfies StageFile['transistor'];

/** 2N3906 by ON Semiconductor 2N3906/D, Rev. 4: the PNP sister, figures as magnitudes. */
export const TYPE_2N3906 = {
  ...TYPE_2N3904,
  partNumber: '2N3906',
  polarity: 'pnp',
  limits: { ...TYPE_2N3904.limits, vcboV: 40, veboV: 5 },
  gain: [
    { icA: 1e-4, vceV: 1, min: 60 },
    { icA: 1e-3, vceV: 1, min: 80 },
    { icA: 0.01, vceV: 1, min: 100, max: 300 },
    { icA: 0.05, vceV: 1, min: 60 },
    { icA: 0.1, vceV: 1, min: 30 },
  ],
  saturation: [
    { icA: 0.01, ibA: 0.001, maxV: 0.25 },
    { icA: 0.05, ibA: 0.005, maxV: 0.4 },
  ],
} satisfies StageFile['transistor'];

/** A 24 V pilot relay on a 3.3 V output: the stage most engine tests start from. */
export const RELAY_FILE = {
  format: 'sinkwell-stage/1',
  reference: 'Q12',
  title: 'Pilot relay',
  topology: 'low-side-npn',
  supplyV: { min: 21.6, max: 26.4 },
  ambientDegC: { min: -20, max: 60 },
  drive: {
    kind: 'push-pull',
    railV: { min: 3, max: 3.6 },
    high: { dropV: 0.6, currentA: 0.008 },
    low: { levelV: 0.4, currentA: 0.008, unloadedV: 0.1 },
    sourceLimitA: 0.02,
    sinkLimitA: 0.02,
  },
  load: {
    kind: 'coil',
    resistanceOhm: 1440,
    tolerance: 0.1,
    referenceDegC: 20,
    temperatureRiseK: 20,
    inductanceH: 4,
    operateV: 16.8,
    releaseV: 2.4,
    maximumV: null,
  },
  baseResistor: { valueOhm: 1000, tolerance: 0.05, ratingW: 0.1 },
  shuntResistor: { valueOhm: 22000, tolerance: 0.05, ratingW: 0.1 },
  clamp: { kind: 'diode', forwardV: 1, reverseV: 75, currentRatingA: 0.2 },
  transistor: TYPE_2N3904,
  policy: { name: 'General practice' },
} satisfies StageFile;

/** The same relay on a PNP from a 24 V open drain: low turns it on. */
export const HIGH_SIDE_FILE = {
  ...RELAY_FILE,
  topology: 'high-side-pnp',
  drive: {
    kind: 'open-collector',
    railV: { min: 21.6, max: 26.4 },
    railTracksSupply: true,
    low: { levelV: 0.4, currentA: 0.01 },
    sourceLimitA: null,
    sinkLimitA: 0.02,
    leakageA: 1e-6,
    maximumV: 40,
    pullUp: { valueOhm: 47000, tolerance: 0.05, ratingW: 0.1 },
  },
  baseResistor: { valueOhm: 6800, tolerance: 0.05, ratingW: 0.25 },
  transistor: TYPE_2N3906,
} satisfies StageFile;

type Part = Partial<Record<keyof StageFile, unknown>>;

/** The relay stage with some top-level keys replaced; parsed, so every key is there. */
export function relayStage(changes: Part = {}): StageInput {
  return StageInput.parse({ ...RELAY_FILE, ...changes });
}

/** The PNP stage with some top-level keys replaced. */
export function highSideStage(changes: Part = {}): StageInput {
  return StageInput.parse({ ...HIGH_SIDE_FILE, ...changes });
}

/**
 * The relay stage with the 620 Ω that leave its coil voltage marginal and everything else passing: what is drawn, saved,
 * reviewed and bought in the suites.
 */
export function relayDriver(changes: Partial<StageFile> = {}): StageFile {
  return {
    ...RELAY_FILE,
    title: 'Brine agitator contactor pilot relay',
    load: { ...RELAY_FILE.load, maximumV: 31 },
    baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: 620 },
    clamp: { kind: 'diode', forwardV: 1, currentRatingA: 0.2 },
    ...changes,
  };
}
