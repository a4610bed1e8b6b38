import * as z from 'zod';
import {
  current,
  currentOrZero,
  line,
  optional,
  orElse,
  power,
  resistance,
  signedVoltage,
  span,
  tolerance,
  voltage,
  voltageOrZero,
} from './ranges.ts';

/** A resistor that is fitted: value, tolerance and, where known, its rating at 70 °C. */
export const FittedResistor = z.strictObject({
  valueOhm: resistance,
  tolerance,
  ratingW: optional(power),
});
export type FittedResistor = z.infer<typeof FittedResistor>;

const HighOutput = z.strictObject({
  dropV: voltageOrZero,
  currentA: current,
  unloadedDropV: orElse(voltageOrZero, 0),
});

const LowOutput = z.strictObject({
  levelV: voltageOrZero,
  currentA: current,
  unloadedV: optional(voltageOrZero),
});

const common = {
  railV: span(voltage),
  railTracksSupply: orElse(z.boolean({ error: 'expected true or false' }), false),
  low: LowOutput,
  sourceLimitA: current.nullable(),
  sinkLimitA: current.nullable(),
  leakageA: orElse(currentOrZero, 0),
  reset: optional(
    z.strictObject({
      kind: z.enum(['driven-low', 'high-z', 'pull-up'], {
        error: 'expected "driven-low", "high-z" or "pull-up"',
      }),
      leakageA: orElse(currentOrZero, 1e-6),
      pullUpOhm: optional(resistance),
    }),
  ),
  groundShiftV: orElse(signedVoltage, 0),
  port: optional(line(20)),
  portTotalA: optional(current),
  maximumV: optional(voltage),
};

const PushPullDrive = z.strictObject({
  ...common,
  kind: z.literal('push-pull'),
  high: HighOutput,
  pullUp: optional(FittedResistor),
});

const OpenCollectorDrive = z.strictObject({
  ...common,
  kind: z.literal('open-collector'),
  high: optional(HighOutput),
  pullUp: FittedResistor,
});

/** The logic output in front of the stage; limits are before the policy's derating. */
export const Drive = z.discriminatedUnion('kind', [PushPullDrive, OpenCollectorDrive], {
  error: 'expected a drive kind: push-pull or open-collector',
});
export type Drive = z.infer<typeof Drive>;
