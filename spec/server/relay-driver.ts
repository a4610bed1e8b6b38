import type { StageFile } from '../../shared/stage/stage-input.ts';

/**
 * A relay driver: 24 V coil of 1440 Ω behind a 3.3 V output. Transistor rows by onsemi 2N3903/D, Rev. 9,
 * August 2021; the 620 Ω base resistor leaves the coil voltage marginal and everything else passing.
 */
export function relayDriver(changes: Partial<StageFile> = {}): StageFile {
  return {
    format: 'sinkwell-stage/1',
    reference: 'Q12',
    title: 'Brine agitator contactor pilot relay',
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
      maximumV: 31,
    },
    baseResistor: { valueOhm: 620, tolerance: 0.05, ratingW: 0.1 },
    shuntResistor: { valueOhm: 22000, tolerance: 0.05, ratingW: 0.1 },
    clamp: { kind: 'diode', forwardV: 1, currentRatingA: 0.2 },
    transistor: {
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
      capacitanceF: 4e-12,
    },
    policy: { name: 'General practice' },
    ...changes,
  };
}
