import type { MethodDecision } from './decisions.ts';

/** What was chosen for Monte-Carlo samples and sensitivity. */
export const SAMPLING_DECISIONS: readonly MethodDecision[] = [
  {
    id: 'samples-expected',
    title: 'What a sample of the Monte-Carlo run is',
    text: 'One stage without tolerances: every supply, temperature, resistor and part figure has the one value drawn for it, coil and junction are settled. The same rules judge it as judge a corner, with expected figures: hFE goes with (T/298.15 K)^1.5, squared for a Darlington’s two gains, RCE(sat) and V0 with temperature both ways, a Darlington’s VCE(sat) with −2 mV/K both ways. The junction is brought to 1 mK.',
  },
  {
    id: 'samples-drawn',
    title: 'How the figures of a sample are drawn',
    text: 'Tolerances are ±3 σ and nothing lies beyond: what falls outside is drawn again. The typical VBE lies as far below the largest as the typical rows do, held outside them; where both typical and largest VCE(sat) are drawn a specimen keeps its share at every row, never below 0 V and never falling with IC. Typical figures above the printed maximum count as the maximum.',
  },
  {
    id: 'samples-output',
    title: 'The output of a sample',
    text: 'Its drop at the tested current is drawn evenly from the no-load drop to the printed one, which is a source resistance from 0 to R_OH; no-load drop and ground shift stay as they are, and beyond the tested current the drop drawn counts three times. For a PNP the low level is drawn in the same way. A pull-up is drawn as a resistor, and a rail that tracks the supply follows the supply drawn.',
  },
  {
    id: 'samples-not-drawn',
    title: 'What a sample does not draw',
    text: 'Leakage, the anchor of the off-state exponential, clamp voltages, inductance, release figures, thermal resistance and switching times have no printed spread and stay the limit figures. A lamp has no tolerance. The forward voltage of an LED string is normal between its ends, one value for the string, with −2 mV/K both ways. Internal resistors of a pre-biased part are drawn; its gain stays corrected with the largest R2.',
  },
  {
    id: 'samples-two-transistors',
    title: 'A sample of a two-transistor high side',
    text: 'The two transistors are drawn apart and meet as at the corners: the PNP with its base resistor pulled to 0 V gives VEB, the NPN with that gives its drop and its leakage, and the PNP is judged with both.',
  },
  {
    id: 'samples-yield',
    title: 'When a sample counts as good',
    text: 'It meets every criterion that has a limit and a value at the corners; the tested range is left out, since it counts data and not a figure of the circuit. A junction without balance and the faults that fail a stage by themselves (no clamp, a clamp that conducts at the supply, a diode below twice the supply, LEDs that take the whole supply) count as missed.',
  },
  {
    id: 'samples-percentiles',
    title: 'Percentiles',
    text: 'Straight between the order statistics around rank p·(n − 1), definition 7 of Hyndman and Fan (1996). A percentile that is not finite is left empty.',
  },
  {
    id: 'samples-random',
    title: 'Random numbers',
    text: 'The generator xoshiro128++ of Blackman and Vigna (2021), started anew for each quantity and each block of 1024 samples from the seed, and the ziggurat of Marsaglia and Tsang (2000) for the normal distribution. So a sample depends on the seed and its number only, not on the machine or the number of threads, and a changed resistor leaves all other draws as they were.',
  },
  {
    id: 'sensitivity-at-nominal',
    title: 'Sensitivity',
    text: 'Each input of the nominal stage is moved by 1 % up and down, all other nominal values kept; half the difference is the change for +1 %. Rows of the part move as a whole. The ambient moves by 1 % of its absolute temperature. The nominal stage has limit figures, minimum gain and maximum VBE and VCE(sat).',
  },
];
