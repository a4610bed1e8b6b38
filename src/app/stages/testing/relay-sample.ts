import { StageInput } from '../../../../shared/stage/stage-input.ts';
import { startingStage } from '../sample-stage.ts';

/** A 24 V relay on a 2N3904 with the rows of onsemi 2N3903/D, Rev. 9. */
export function relaySample(change: Partial<StageInput> = {}): StageInput {
  const stage = startingStage({
    reference: 'Q12',
    title: 'Agitator relay',
    topology: 'low-side-npn',
    loadKind: 'coil',
  });
  return StageInput.parse({
    ...stage,
    ambientDegC: { min: -20, max: 60 },
    drive: { ...stage.drive, low: { levelV: 0.4, currentA: 0.008, unloadedV: 0.1 } },
    load: { ...stage.load, temperatureRiseK: 20, inductanceH: 4 },
    baseResistor: { valueOhm: 620, tolerance: 0.05, ratingW: 0.1 },
    transistor: {
      partNumber: '2N3904',
      polarity: 'npn',
      limits: { vceoV: 40, vcboV: 60, veboV: 6, icA: 0.2, powerW: 0.625, tjMaxDegC: 150 },
      thermal: { rthJaKPerW: 200 },
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
    },
    ...change,
  });
}
