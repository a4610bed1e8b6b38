import { GENERAL_PRACTICE, type Policy } from '../../../shared/stage/policy.ts';
import { STAGE_FORMAT, StageInput, type Topology } from '../../../shared/stage/stage-input.ts';
import type { TransistorData } from '../../../shared/stage/transistor-data.ts';

/** What the person says about a new stage before its sheet opens. */
export interface NewStageWords {
  readonly reference: string;
  readonly title: string;
  readonly topology: Topology;
  readonly loadKind: 'coil' | 'resistor';
}

/** A transistor without data: the sheet says what is open until one is picked. */
export const noTransistor = (polarity: 'npn' | 'pnp'): TransistorData => ({
  partNumber: 'not chosen',
  polarity,
  darlington: false,
  package: null,
  source: null,
  limits: {
    vceoV: null,
    vcboV: null,
    veboV: null,
    icA: null,
    icPeakA: null,
    ibA: null,
    powerW: null,
    tjMaxDegC: 150,
  },
  thermal: { rthJaKPerW: null, rthJcKPerW: null },
  gain: [],
  saturation: [],
  baseEmitter: [],
  leakage: [],
  switching: null,
  capacitanceF: null,
  model: { earlyV: null, betaR: null, isA: null, rcOhm: null },
  internal: null,
});

/**
 * A stage to start from: 24 V, a small load and a 3.3 V output, usual values of the trade that the designer
 * replaces by the project's own.
 */
export function startingStage(asked: NewStageWords, policy: Policy = GENERAL_PRACTICE): StageInput {
  const highSide = asked.topology === 'high-side-pnp';
  return StageInput.parse({
    format: STAGE_FORMAT,
    reference: asked.reference,
    title: asked.title,
    topology: asked.topology,
    supplyV: { min: 21.6, max: 26.4 },
    ambientDegC: { min: 0, max: 50 },
    drive: {
      kind: highSide ? 'open-collector' : 'push-pull',
      railV: { min: 3.0, max: 3.6 },
      high: highSide ? null : { dropV: 0.6, currentA: 0.008 },
      low: { levelV: 0.4, currentA: 0.008 },
      sourceLimitA: highSide ? null : 0.02,
      sinkLimitA: 0.02,
      ...(highSide ? { pullUp: { valueOhm: 10000, tolerance: 0.05 } } : {}),
    },
    load:
      asked.loadKind === 'coil'
        ? {
            kind: 'coil',
            resistanceOhm: 1440,
            tolerance: 0.1,
            referenceDegC: 20,
            inductanceH: null,
            operateV: 16.8,
            releaseV: 2.4,
            maximumV: null,
          }
        : { kind: 'resistor', resistanceOhm: 1000, tolerance: 0.05 },
    baseResistor: { valueOhm: null, tolerance: 0.05, ratingW: 0.1 },
    shuntResistor: { valueOhm: 22000, tolerance: 0.05, ratingW: 0.1 },
    ...(asked.loadKind === 'coil' ? { clamp: { kind: 'diode', forwardV: 1 } } : {}),
    transistor: noTransistor(highSide ? 'pnp' : 'npn'),
    policy,
  });
}
