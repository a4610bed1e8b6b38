import * as z from 'zod';
import { SERIES_NAMES } from '../units/preferred-values.ts';
import { currentOrZero, factor, fraction, line, resistance, voltage } from './ranges.ts';

const limits = {
  overdriveFactor: factor,
  forcedBeta: factor,
  guaranteedOnly: z.boolean({ error: 'expected true or false' }),
  marginalBand: z.number({ error: 'expected a fraction' }).min(0).lt(1),
  voltageDerating: fraction,
  currentDerating: fraction,
  powerDerating: fraction,
  junctionDerating: fraction,
  resistorDerating: fraction,
  driveDerating: fraction,
  gainExponent: z.number({ error: 'expected an exponent from 0 to 20' }).min(0).max(20),
  vbeTempcoVPerK: z.number({ error: 'expected a slope in V/K' }).min(-0.02).max(0.02),
  vbeMinV: voltage,
  rceTempcoPerK: z.number({ error: 'expected a slope per K' }).min(-0.1).max(0.1),
  leakageDoublingK: z.number({ error: 'expected an interval in K' }).gt(0).max(200),
  offBaseV: voltage,
  offCurrentA: currentOrZero,
  averagingHz: z.number({ error: 'expected a frequency in Hz' }).min(0).max(1e9),
  overdrivenRatio: factor,
  series: z.enum(SERIES_NAMES, { error: `expected one of ${SERIES_NAMES.join(', ')}` }),
  smallestOhm: resistance,
  largestOhm: resistance,
};

/** A complete set of limits. */
export const PolicyLimits = z.strictObject(limits);
export type PolicyLimits = z.infer<typeof PolicyLimits>;
export type Policy = PolicyLimits & { name: string };

export const GENERAL_PRACTICE: Policy = {
  name: 'General practice',
  overdriveFactor: 2,
  forcedBeta: 20,
  guaranteedOnly: true,
  marginalBand: 0.1,
  voltageDerating: 0.8,
  currentDerating: 0.8,
  powerDerating: 0.8,
  junctionDerating: 0.8,
  resistorDerating: 0.5,
  driveDerating: 0.8,
  gainExponent: 2.4,
  vbeTempcoVPerK: -0.002,
  vbeMinV: 0.55,
  rceTempcoPerK: 0.004,
  leakageDoublingK: 10,
  offBaseV: 0.5,
  offCurrentA: 1e-4,
  averagingHz: 100,
  overdrivenRatio: 5,
  series: 'E24',
  smallestOhm: 10,
  largestOhm: 1e7,
};

/**
 * Stricter limits in the manner of public space-agency derating guides: bipolar transistors at 75 % of
 * voltage and current, 60 % of power, junction at 0.8 of its maximum; film resistors at 50 % of power.
 * The classes are those of NASA EEE-INST-002 and ECSS-Q-ST-30-11C; the figures are from memory and
 * marked so on the method page.
 */
export const HIGH_RELIABILITY: Policy = {
  ...GENERAL_PRACTICE,
  name: 'High reliability',
  overdriveFactor: 3,
  forcedBeta: 10,
  voltageDerating: 0.75,
  currentDerating: 0.75,
  powerDerating: 0.6,
  junctionDerating: 0.8,
  resistorDerating: 0.5,
  driveDerating: 0.8,
};

/** A limit that two policies set differently. */
export interface PolicyDifference {
  readonly key: string;
  readonly given: Policy[keyof Policy];
  readonly adopted: Policy[keyof Policy];
}

/** What putting one policy in place of the given one changes, key by key. */
export function policyDifference(given: Policy, adopted: Policy): PolicyDifference[] {
  return (Object.keys(adopted) as (keyof Policy)[])
    .filter((key) => given[key] !== adopted[key])
    .map((key) => ({ key, given: given[key], adopted: adopted[key] }));
}

export const SHIPPED_POLICIES = [GENERAL_PRACTICE, HIGH_RELIABILITY] as const;

/** The policy as a stage file gives it: a name, and whatever differs from the shipped one of that name. */
export const PolicyOfFile = z
  .strictObject({
    name: line(60),
    ...Object.fromEntries(Object.entries(limits).map(([key, schema]) => [key, schema.nullish()])),
  } as { name: z.ZodString } & {
    [K in keyof typeof limits]: z.ZodOptional<z.ZodNullable<(typeof limits)[K]>>;
  })
  .transform((given): Policy => {
    const base = SHIPPED_POLICIES.find((policy) => policy.name === given.name) ?? GENERAL_PRACTICE;
    const set = Object.fromEntries(Object.entries(given).filter(([, value]) => value != null));
    return { ...base, ...set };
  });
