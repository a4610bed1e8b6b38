import * as z from 'zod';
import { current, optional, power, span, voltage } from './ranges.ts';

export const CLAMP_KINDS = [
  'none',
  'diode',
  'diode-zener',
  'zener-across-transistor',
  'tvs-across-transistor',
] as const;

/** Keys each kind cannot do without. A TVS gives its clamping voltage as `zenerV.max`. */
const NEEDS = {
  none: [],
  diode: ['forwardV'],
  'diode-zener': ['forwardV', 'zenerV'],
  'zener-across-transistor': ['zenerV'],
  'tvs-across-transistor': ['zenerV', 'standOffV'],
} as const satisfies Record<(typeof CLAMP_KINDS)[number], readonly string[]>;

/** What takes the coil's energy at turn-off. */
export const Clamp = z
  .strictObject({
    kind: z.enum(CLAMP_KINDS, { error: `expected one of ${CLAMP_KINDS.join(', ')}` }),
    forwardV: optional(voltage),
    zenerV: optional(span(voltage)),
    standOffV: optional(voltage),
    reverseV: optional(voltage),
    currentRatingA: optional(current),
    powerRatingW: optional(power),
  })
  .check((context) => {
    const clamp = context.value;
    for (const key of NEEDS[clamp.kind]) {
      if (clamp[key] === null) {
        context.issues.push({
          code: 'custom',
          path: [key],
          message: `expected a value: a clamp of kind ${clamp.kind} needs it`,
          input: clamp[key],
        });
      }
    }
  });
export type Clamp = z.infer<typeof Clamp>;

export const NO_CLAMP: Clamp = {
  kind: 'none',
  forwardV: null,
  zenerV: null,
  standOffV: null,
  reverseV: null,
  currentRatingA: null,
  powerRatingW: null,
};
