/** A term of the trade as this product uses it. */
export interface GlossaryTerm {
  /** Anchor on the method page. */
  readonly id: string;
  readonly term: string;
  readonly symbol: string | null;
  readonly meaning: string;
}

/** In the order of the alphabet. */
export const GLOSSARY: readonly GlossaryTerm[] = [
  {
    id: 'clamp',
    term: 'Clamp',
    symbol: null,
    meaning:
      'The part that takes over a coil’s current at turn-off: a diode across the coil, a diode with a zener, or a zener or TVS across the transistor. The higher its voltage, the sooner the relay releases.',
  },
  {
    id: 'corner',
    term: 'Corner',
    symbol: null,
    meaning:
      'One combination of the ends of all tolerances: supply, temperature, drive, resistors, load, gain, voltages, and start or settled. Every criterion is judged at every corner; the one with the least margin is reported.',
  },
  {
    id: 'derating',
    term: 'Derating',
    symbol: null,
    meaning:
      'The share of a printed maximum that a policy allows to be used, such as 0.8 of the rated voltage.',
  },
  {
    id: 'expected-figure',
    term: 'Expected figure',
    symbol: null,
    meaning:
      'What a typical part does according to the device model, for curves and for comparison with the bench. It decides no verdict.',
  },
  {
    id: 'forced-beta',
    term: 'Forced β',
    symbol: 'IC/IB',
    meaning:
      'The ratio of collector to base current that the circuit imposes on a saturated transistor. The data sheet states VCE(sat) at one such ratio; at a larger one it promises nothing.',
  },
  {
    id: 'limit-figure',
    term: 'Limit figure',
    symbol: null,
    meaning:
      'What the data sheets guarantee at the worst corner. Penalties of temperature and tolerance are taken, credits never. Verdicts use these alone.',
  },
  {
    id: 'margin',
    term: 'Margin',
    symbol: null,
    meaning:
      'Distance of a value from its limit as a share of the limit, positive when the limit is met. Under 10 % a met limit counts as marginal.',
  },
  {
    id: 'open',
    term: 'Open',
    symbol: null,
    meaning:
      'A criterion that cannot be decided because a figure is missing or was used beyond its tested rows. It needs a justification in writing before a check can pass.',
  },
  {
    id: 'overdrive-factor',
    term: 'Overdrive factor',
    symbol: 'ODF',
    meaning:
      'Base current available over the base current that would just saturate the transistor: guaranteed gain × IB / IC. At 1 it stands on the edge; above, it is saturated.',
  },
  {
    id: 'policy',
    term: 'Policy',
    symbol: null,
    meaning: 'A named and versioned set of limits and deratings that a project adopts.',
  },
  {
    id: 'release-time',
    term: 'Release time',
    symbol: 'trel',
    meaning:
      'Time from turn-off until the coil’s current has fallen to its must-release value, found with the smallest clamp voltage and the largest coil current.',
  },
  {
    id: 'rce-sat',
    term: 'Saturation resistance',
    symbol: 'RCE(sat)',
    meaning:
      'Slope of the saturation voltage over collector current between the rows the data sheet prints. With the offset V0 it gives VCE(sat) at the current in use.',
  },
  {
    id: 'vce-sat',
    term: 'Saturation voltage',
    symbol: 'VCE(sat)',
    meaning:
      'Voltage that stays between collector and emitter of a transistor that is fully on. Times the collector current it is most of the heat.',
  },
  {
    id: 'snapshot',
    term: 'Snapshot',
    symbol: null,
    meaning:
      'The copy of the part data that a revision was judged with. It stays as it was when the library later changes.',
  },
  {
    id: 'stated',
    term: 'Stated',
    symbol: null,
    meaning: 'A figure reported without a limit. It does not touch the verdict.',
  },
  {
    id: 'storage-time',
    term: 'Storage time',
    symbol: 'ts',
    meaning:
      'Time a saturated transistor keeps conducting after its base drive ends, while the stored charge leaves. It grows with overdrive.',
  },
  {
    id: 'tested-range',
    term: 'Tested range',
    symbol: null,
    meaning: 'The currents between the first and the last row the data sheet prints for a figure.',
  },
];
