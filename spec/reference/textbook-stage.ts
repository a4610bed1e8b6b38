import { evaluateStage } from '../../shared/checks/evaluate-stage.ts';
import { StageInput } from '../../shared/stage/stage-input.ts';

/** A stage as textbooks draw it: ideal output, exact parts, constant VBE, VCE(sat) and gain, no heating. */
export interface TextbookStage {
  readonly supplyV: number;
  readonly loadOhm: number;
  readonly driveV: number;
  readonly rbOhm: number;
  readonly gain: number;
  readonly vbeV: number;
  readonly vceSatV: number;
}

/** Larger than any current of the examples: their figures then lie below the rows, where they are held. */
const BEYOND_A = 1000;
const NEXT_TO_NOTHING = 1e-9;

export function textbookStage(book: TextbookStage): StageInput {
  const vceSatV = Math.max(NEXT_TO_NOTHING, book.vceSatV);
  const vbeV = Math.max(NEXT_TO_NOTHING, book.vbeV);
  return StageInput.parse({
    format: 'sinkwell-stage/1',
    reference: 'Q1',
    title: 'Worked example',
    topology: 'low-side-npn',
    supplyV: { min: book.supplyV, max: book.supplyV },
    ambientDegC: { min: 25, max: 25 },
    drive: {
      kind: 'push-pull',
      railV: { min: book.driveV, max: book.driveV },
      high: { dropV: 0, currentA: BEYOND_A },
      low: { levelV: 0, currentA: BEYOND_A },
      sourceLimitA: null,
      sinkLimitA: null,
    },
    load: { kind: 'resistor', resistanceOhm: book.loadOhm, tolerance: 0 },
    baseResistor: { valueOhm: book.rbOhm, tolerance: 0 },
    transistor: {
      partNumber: 'ideal',
      polarity: 'npn',
      limits: { vceoV: BEYOND_A, icA: BEYOND_A, powerW: 1e5, tjMaxDegC: 26 },
      thermal: { rthJaKPerW: NEXT_TO_NOTHING },
      gain: [{ icA: BEYOND_A, min: book.gain, max: book.gain }],
      saturation: [
        { icA: BEYOND_A, ibA: NEXT_TO_NOTHING, maxV: vceSatV },
        {
          icA: BEYOND_A / 1e9,
          ibA: NEXT_TO_NOTHING / 1e6,
          maxV: vceSatV,
        },
      ],
      baseEmitter: [{ icA: BEYOND_A, minV: vbeV, maxV: vbeV }],
    },
    policy: { name: 'General practice' },
  });
}

/**
 * What a switched-off stage leaves at its collector: the high level of an inverter without a load of its own, whose collector
 * leakage is all that drops across RC.
 *
 * @param leakageA ICBO or ICEO as the text uses it
 */
export function textbookOffV(book: { supplyV: number; loadOhm: number; leakageA: number }): number {
  const stage = textbookStage({
    ...book,
    ...{ driveV: 5, rbOhm: 1000, gain: 100, vbeV: 0.7, vceSatV: 0.2 },
  });
  const judged = StageInput.parse({
    ...stage,
    topology: 'level-translator',
    load: {
      kind: 'logic-input',
      pullUpOhm: book.loadOhm,
      tolerance: 0,
      ratingW: null,
      count: 1,
      vilV: 0.8,
      vihV: 2,
      leakageA: 0,
      lowCurrentA: 0,
      capacitanceF: null,
      wiringF: null,
      riseTimeLimitSec: null,
    },
    transistor: {
      ...stage.transistor,
      leakage: [{ kind: 'icbo', currentA: book.leakageA, tempDegC: 25 }],
    },
  });
  return evaluateStage(judged).criteria.find(({ id }) => id === 'output-high')?.value ?? NaN;
}
