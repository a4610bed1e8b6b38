/** What the rules take by judgement, and how far the rest is proven. */
export interface Judgement {
  readonly id: string;
  readonly title: string;
  readonly text: string;
}

export const JUDGEMENTS: readonly Judgement[] = [
  {
    id: 'pin-slope',
    title: 'Output beyond its tested current',
    text: 'Three times the tested slope. No sheet promises it, so the figure counts as outside the tested range.',
  },
  {
    id: 'vbe-substitutes',
    title: 'Missing VBE(sat) limits',
    text: 'VBE(on) plus 0.05 V or the typical figure plus 0.15 V for the maximum; typical less 0.1 V or 0.55 V for the minimum. Overdrive factor and forced β are then at best marginal.',
  },
  {
    id: 'storage-warm',
    title: 'Storage time when warm',
    text: '0.5 % more for every kelvin above 25 °C.',
  },
  {
    id: 'averaging-bound',
    title: 'Where the duty counts',
    text: 'From 100 Hz on the mean power heats the junction; below, each pulse counts as lasting.',
  },
  {
    id: 'cold-input',
    title: 'VI(on) of a pre-biased part in the cold',
    text: 'The junction takes 0.75 V and 2 mV/K of it, the rest goes with the gain.',
  },
  {
    id: 'lamp-exponents',
    title: 'Filament lamps',
    text: 'Current with the 0.55th power of the voltage, cold resistance with the 1.2th power of the absolute temperature.',
  },
];

export const PROOF: readonly Judgement[] = [
  {
    id: 'proof-currents',
    title: 'Currents',
    text: 'IC and IB within 0.2 % of a numerical circuit solver, on randomly made devices measured at IC/IB = 10.',
  },
  {
    id: 'proof-saturation',
    title: 'VCE(sat)',
    text: 'Within 3 % for forced β 8 to 14; for 18 to 45 it is 2 to 6 % high with βR = 0.5, and within 1.5 % with the part’s own βR.',
  },
  {
    id: 'proof-storage',
    title: 'Storage time',
    text: '13 to 37 % high: the safe side.',
  },
  {
    id: 'proof-release',
    title: 'Release time',
    text: '9.0 ms where a solved diode clamp gives 8.72 ms.',
  },
];
