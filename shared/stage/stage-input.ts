import * as z from 'zod';
import { Clamp, NO_CLAMP } from './clamp.ts';
import { Drive, FittedResistor } from './drive.ts';
import { Load } from './load.ts';
import { PolicyOfFile } from './policy.ts';
import {
  capacitance,
  celsius,
  count,
  fraction,
  frequency,
  line,
  optional,
  orElse,
  power,
  resistanceOrZero,
  span,
  time,
  tolerance,
  voltage,
} from './ranges.ts';
import { TransistorData } from './transistor-data.ts';

export const STAGE_FORMAT = 'sinkwell-stage/1';

export const TOPOLOGIES = [
  'low-side-npn',
  'high-side-pnp',
  'two-transistor-high-side',
  'low-side-darlington',
  'low-side-pre-biased',
  'level-translator',
] as const;
export type Topology = (typeof TOPOLOGIES)[number];

/** The base resistor; `valueOhm: null` asks for the recommended value, 0 is a wire to a pre-biased part. */
const BaseResistor = z.strictObject({
  valueOhm: resistanceOrZero.nullable(),
  tolerance,
  ratingW: optional(power),
});

const PreDriver = z.strictObject({
  transistor: TransistorData,
  baseResistor: FittedResistor,
  shuntResistor: optional(FittedResistor),
});

/**
 * One switching stage, self-contained: the shape of the stage file, of the wire, of the database document
 * and of what the engine is given. Every number is in the unit its name ends with. Parsing fills what was
 * left out, so a parsed stage has every key.
 */
export const StageInput = z
  .strictObject({
    format: z.literal(STAGE_FORMAT, { error: `expected "${STAGE_FORMAT}"` }),
    reference: z
      .string({ error: 'expected a designator such as Q12' })
      .regex(/^[A-Za-z][A-Za-z0-9._/-]{0,19}$/, 'expected a designator such as Q12'),
    title: line(120),
    quantity: orElse(count, 1),
    topology: z.enum(TOPOLOGIES, { error: `expected one of ${TOPOLOGIES.join(', ')}` }),
    supplyV: z
      .strictObject({
        min: voltage,
        max: voltage,
        surge: optional(voltage),
        dip: optional(voltage),
      })
      .refine((supply) => supply.min <= supply.max, { error: 'expected min not above max' }),
    ambientDegC: span(celsius),
    frequencyHz: orElse(frequency, 0),
    duty: orElse(fraction, 1),
    storageTimeLimitSec: optional(time),
    drive: Drive,
    load: Load,
    baseResistor: BaseResistor,
    shuntResistor: optional(FittedResistor),
    speedUpCapacitorF: optional(capacitance),
    clamp: Clamp.nullish().transform((clamp) => clamp ?? NO_CLAMP),
    saturationLimitV: optional(voltage),
    transistor: TransistorData,
    preDriver: optional(PreDriver),
    policy: PolicyOfFile,
  })
  .check((context) => {
    const stage = context.value;
    const expect = (path: string[], message: string) => {
      context.issues.push({ code: 'custom', path, message, input: stage });
    };
    if (stage.topology === 'two-transistor-high-side' && stage.preDriver === null) {
      expect(['preDriver'], 'expected the NPN in front: a two-transistor high side needs it');
    }
    if (stage.baseResistor.valueOhm === 0 && stage.topology !== 'low-side-pre-biased') {
      expect(
        ['baseResistor', 'valueOhm'],
        'expected a resistance above 0 and up to 1000000000000 Ω: only a pre-biased part does without',
      );
    }
    if (stage.topology === 'level-translator' && stage.load.kind !== 'logic-input') {
      expect(['load', 'kind'], 'expected "logic-input": a level translator drives logic inputs');
    }
    if (stage.topology === 'low-side-pre-biased' && stage.transistor.internal === null) {
      expect(['transistor', 'internal'], 'expected the resistors inside the pre-biased part');
    }
  });
export type StageInput = z.infer<typeof StageInput>;
/** What a caller may send: optional keys left out. */
export type StageFile = z.input<typeof StageInput>;
