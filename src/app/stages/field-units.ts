import type { QuantitySpec, SpanSpec } from './field-spec.ts';

type Rest = Omit<QuantitySpec, 'kind' | 'optional' | 'unit' | 'min' | 'max'>;

/** Bounds of the stage file by kind of quantity, so that no field repeats them. */
const BOUNDS = {
  volt: { unit: 'V', min: 0.001, max: 2000 },
  voltOrZero: { unit: 'V', min: 0, max: 2000 },
  shift: { unit: 'V', min: -100, max: 100 },
  ampere: { unit: 'A', min: 1e-9, max: 1000 },
  ampereOrZero: { unit: 'A', min: 0, max: 1000 },
  ohm: { unit: 'Ohm', min: 0.001, max: 1e12 },
  ohmOrZero: { unit: 'Ohm', min: 0, max: 1e12 },
  factor: { unit: '1', min: 0.001, max: 1e6 },
  watt: { unit: 'W', min: 1e-6, max: 1e5 },
  celsius: { unit: '°C', min: -200, max: 500 },
  kelvin: { unit: 'K', min: 0, max: 500 },
  henry: { unit: 'H', min: 0, max: 1e4 },
  farad: { unit: 'F', min: 0, max: 10 },
  hertz: { unit: 'Hz', min: 0, max: 1e9 },
  second: { unit: 's', min: 0, max: 1e4 },
  tolerance: { unit: '%', min: 0, max: 0.999 },
  share: { unit: '%', min: 0.0001, max: 1 },
  count: { unit: '1', min: 1, max: 100000 },
} as const;
type Bound = keyof typeof BOUNDS;

type Required = QuantitySpec & { readonly optional: false };
type Optional = QuantitySpec & { readonly optional: true };

/** A quantity that must be given. */
export const needed = (bound: Bound, rest: Rest): Required => ({
  kind: 'quantity',
  optional: false,
  ...BOUNDS[bound],
  ...rest,
});

/** A quantity that may be left empty. */
export const perhaps = (bound: Bound, rest: Rest): Optional => ({
  kind: 'quantity',
  optional: true,
  ...BOUNDS[bound],
  ...rest,
});

/** A min…max pair. */
export const pair = (bound: Bound, rest: Omit<Rest, 'preferred'>): SpanSpec => ({
  kind: 'span',
  ...BOUNDS[bound],
  ...rest,
});
