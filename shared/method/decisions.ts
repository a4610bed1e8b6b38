import { SAMPLING_DECISIONS } from './sampling-decisions.ts';

/** A place where the rules leave a choice, what was chosen and why; shown on the method page. */
export interface MethodDecision {
  readonly id: string;
  readonly title: string;
  readonly text: string;
}

export const DECISIONS: readonly MethodDecision[] = [
  {
    id: 'base-current-at-full-load',
    title: 'VBE, IB and hFE of a corner are taken once, at the full load current',
    text: 'A corner has one base–emitter voltage, one base current and one gain: those at the load current with VCE = 0. They serve the saturation decision, forced β, the overdrive factor, the Ebers–Moll difference, the dissipation and, where the transistor is not saturated, IC = hFE·IB. The load current that VCE(sat) takes away moves VBE by well under 1 mV.',
  },
  {
    id: 'conduction-off',
    title: 'A corner that cannot turn on',
    text: 'Where the shunt resistor takes all the drive current, IB and IC are 0, VCE is the whole supply, the overdrive factor is 0 and forced β infinite. The drive current is still counted with VBE at the base.',
  },
  {
    id: 'gain-maximum-per-row',
    title: 'A missing hFE maximum is three times the minimum as printed',
    text: 'The factor is applied to each printed row before rows of equal current are merged and before minima measured at a higher VCE are cut, so that the maximum is never understated.',
  },
  {
    id: 'vbe-table',
    title: 'VBE(sat) limits come from the rows that print them',
    text: 'If any VBE(sat) row prints a maximum, only such rows make the maximum line, and likewise the minimum line. Substitutes come in only where no row prints the limit: for the maximum each VBE(sat) row takes VBE(on) of the same current plus 0.05 V, else its own typical figure plus 0.15 V; parts without VBE(sat) rows take their VBE(on) rows in the same way.',
  },
  {
    id: 'tested-beta-below-first-row',
    title: 'β_test below the first VCE(sat) row',
    text: 'The piece of the line below the first row runs from the intrinsic drop to that row, so it carries that row’s IC/IB; every other piece carries the smaller IC/IB of the two rows it joins. Corners with VCE = 0 use the piece at the full load current.',
  },
  {
    id: 'hot-gap-between-pieces',
    title: 'Pieces of the VCE(sat) line that do not meet once hot',
    text: 'Offset and slope have different temperature factors, so two pieces that meet at 25 °C may leave a gap at a row when hot. Where the load line falls into such a gap the collector current is that of the row.',
  },
  {
    id: 'equal-corners',
    title: 'Equal worst corners',
    text: 'Corners whose margins differ by less than one part in a thousand million count as equal and the first in the stated order is reported. A margin that only rounding keeps off the edge of its status lies on it: exactly 10 % is a pass. The junction temperature is solved to 0.1 µK, far finer than the 1 mK asked for, so that numerical noise decides nothing.',
  },
  {
    id: 'junction-balance',
    title: 'How the junction temperature is found',
    text: 'By the secant method from the dissipation of the same corner before it warmed up; where that fails, the lowest of 64 steps up to 400 °C at which the balance changes sign, refined by halving. No change of sign below 400 °C is a thermal runaway.',
  },
  {
    id: 'static-corners',
    title: 'Figures that only the supply moves',
    text: 'Peak VCE is reported at the first corner with the highest supply. Holding voltage, surge and the tested range belong to no corner.',
  },
  {
    id: 'tested-range-margin',
    title: 'The tested range has no margin',
    text: 'Its limit is 0 and a fraction of nothing has no meaning: it passes at 0 and is open above, with the margin left empty.',
  },
  {
    id: 'off-state-corners',
    title: 'Which corners the off state is judged at',
    text: 'At the corners with the highest supply and the settled junction, which are the conditions the rules name. The corner’s ends for drive, gain, VBE and VCE(sat) matter only through the junction temperature.',
  },
  {
    id: 'reset-two-limits',
    title: 'Reset is held to both limits of the off state',
    text: 'With a base–emitter resistor the base voltage is reported as reset-off and the collector current beside it as reset-off-current. With an open base there is no voltage to judge: reset-off is then the collector current. A reset pull-up without a value leaves the criterion open.',
  },
  {
    id: 'open-base-voltage',
    title: 'An open base has no off-state voltage',
    text: 'A PNP on an open drain without base–emitter resistor is judged by its collector current only.',
  },
  {
    id: 'reverse-base-voltage',
    title: 'Reverse base–emitter voltage',
    text: 'An NPN is reversed by a logic ground below the load return, a PNP by a push-pull or pull-up rail above the lowest supply, each divided by RB and RBE. A speed-up capacitor adds the voltage it was charged to across RB, undivided.',
  },
  {
    id: 'cut-off-anchor',
    title: 'The anchor of the off-state exponential',
    text: 'The row with the lowest printed VBE minimum at no more than a tenth of the rated collector current, VBE(sat) and VBE(on) rows alike; of equal minima the larger current.',
  },
  {
    id: 'clamp-largest-voltage',
    title: 'Clamp power and surge take the largest clamp voltage',
    text: 'Release time takes the smallest clamp voltage, because that is the slow side. The energy the clamp takes and what it adds to a surge grow with the voltage, so there the largest counts: VF, VF + VZ max, or VZ max across the transistor.',
  },
  {
    id: 'clamp-findings',
    title: 'Clamp faults without a margin',
    text: 'A missing clamp, a clamp across the transistor that conducts at the highest supply and a diode rated below twice the supply are findings that fail the stage by themselves; a diode without a stated rating is a finding only.',
  },
  {
    id: 'clamp-power-at-frequency',
    title: 'Clamp power needs a frequency',
    text: 'A stage without switching frequency puts no mean power into its clamp, so the criterion appears with a frequency only.',
  },
  {
    id: 'coil-at-frequency',
    title: 'A coil driven at a frequency',
    text: 'Its mean voltage, duty times supply, is compared with the holding voltage in place of the operate voltage; without a stated holding voltage the figure is reported only. A supply dip is compared with the holding voltage as it stands.',
  },
  {
    id: 'overvoltage-reference',
    title: 'Reference of the coil’s maximum voltage',
    text: 'Where no temperature is stated for it, the reference temperature of the coil resistance is taken.',
  },
  {
    id: 'peak-current',
    title: 'Peak collector current of coils and resistors',
    text: 'These loads draw no more at switch-on than later, so the peak is the largest collector current, held against ICM where printed, else against IC.',
  },
  {
    id: 'storage-per-corner',
    title: 'Storage time at each corner',
    text: 'The on-current is that corner’s base current, so the largest comes up by itself; the turn-off current always takes the smallest VBE and the largest resistors, the gain always its maximum. Without a rise or fall time in the switching row, dissipation and junction temperature are at best open at a frequency.',
  },
  {
    id: 'missing-rows',
    title: 'What missing rows leave open',
    text: 'Without gain rows a stage is taken as saturated and the overdrive factor is open. Without VCE(sat) rows load voltage, dissipation, junction temperature and forced β are open. Without any VBE figure overdrive factor and forced β are open. A figure that fails on the rest of the data still fails.',
  },
  {
    id: 'rb-dependent',
    title: 'Which criteria depend on RB',
    text: 'The window decides which criteria move between its ends, and they decide the window: the two are taken in turn, starting from what RB decides by nature, until they agree. Where the window is empty or a single value, the movement over all judged values counts, and overdrive, VI(on) or forced β count where they fail at every one of them. The tested range always counts.',
  },
  {
    id: 'can-pass',
    title: 'Which preferred values are judged',
    text: 'A value is left out only if a few cold-start corners already refute it by overdrive, forced β, pin current, base current, its own dissipation or the tested pin current. All others, and three neighbours at each end, are judged at every corner.',
  },
  {
    id: 'window-ends',
    title: 'What sets the ends of the window',
    text: 'The criterion that fails at the next preferred value outside, the one with the smallest margin if several do, else the one that is open there. An end at the limit of the series has none.',
  },
  {
    id: 'candidate-verdict',
    title: 'Verdict of a candidate',
    text: 'Margin, worst criterion and verdict of a preferred value count its RB-dependent criteria only; what RB cannot change is shown in the list of criteria.',
  },
  {
    id: 'empty-window',
    title: 'What would open an empty window',
    text: 'Named are the criterion that asks most for a smaller base resistor and the one that asks most for a larger, at the value that comes nearest. What each needs is read at the last value that still meets the other. Shortfalls are compared as value over limit or limit over value, whichever is above 1.',
  },
  {
    id: 'shunt-sizing',
    title: 'Sizing of the base–emitter resistor',
    text: 'Judged at the stage’s own RB, by those off-state criteria that RBE decides; VCE and the rating of an open output it does not. The tenth of the drive is counted at the corner where RBE takes most. Where the stage says nothing of reset, the pin is taken to float with 1 µA: holding the base then is what the resistor is for. A smaller value would cost more drive, so where the largest that keeps the stage off costs more than a tenth there is no recommendation.',
  },
  {
    id: 'part-ranking',
    title: 'Which parts can do a stage',
    text: 'Each transistor of the library stands in the stage with a base resistor sized for it, with the safest figures of all makers and no gain group. A low-side stage changes to the topology of a Darlington or a pre-biased part; the latter gives up its outer base–emitter resistor. Ranked by verdict, then by the smallest margin of all criteria. Where no value can be recommended the part is judged at the value that comes nearest.',
  },
  {
    id: 'capacitor-across-coil',
    title: 'Capacitor across a coil',
    text: 'A stage file cannot describe one, so the calculation cannot find it. It draws a current peak at turn-on and rings with the coil at turn-off: use a diode.',
  },
  {
    id: 'led-lamp-load-line',
    title: 'Load lines of LEDs, lamps and logic inputs',
    text: 'An LED string is a fixed voltage and its resistor. A lamp is a resistance through its steady current at the supply of the corner. Logic inputs add their low current, which is the same as a higher supply behind RC.',
  },
  {
    id: 'lamp-inrush-gain',
    title: 'Inrush of a lamp',
    text: 'The inrush is taken at each corner with that corner’s base current, the gain limits at the inrush current and the junction temperature of the corner. An inrush above the last hFE row counts as used above the tested range.',
  },
  {
    id: 'led-corner-order',
    title: 'Forward voltage comes last in the order of corners',
    text: 'Corners of an LED string are run through as for any other load, each with the lowest and then the highest forward voltage.',
  },
  {
    id: 'logic-input-capacitance',
    title: 'Capacitance of logic inputs',
    text: 'The stated input capacitance is that of all inputs together; wiring and output capacitance add to it, and count as nothing where they are not stated.',
  },
  {
    id: 'low-to-high-delay',
    title: 'Low-to-high delay of a translator',
    text: 'It is computed at every corner from that corner’s storage time, low level and supply, with the largest RC and all capacitance, and reported as low-to-high-delay. A stage file has no limit for it, so it is stated and touches no verdict; without a printed storage time or a stated capacitance the figure is missing.',
  },
  {
    id: 'input-levels-in-volts',
    title: 'Input levels that are a fraction of the supply',
    text: 'A stage file states VIL and VIH in volts. Where the input’s sheet prints a fraction, enter that fraction of the lowest supply: the high level is judged at the lowest supply, so the result is that of the fraction at the same corner, and the low level is judged on the safe side.',
  },
  {
    id: 'pull-up-to-a-lower-rail',
    title: 'Pull-up of an open output to a rail below a PNP’s supply',
    text: 'The off-state base voltage counts leakage across RBE alone, as for a pull-up at the load’s own supply. A pull-up to a lower rail draws base current through RB for as long as the output is off. That is a finding, pull-up-below-supply, with the current; it changes no figure.',
  },
  {
    id: 'reset-turns-on',
    title: 'A reset that turns the load on',
    text: 'The criteria of reset judge an NPN whose pin leaks or is pulled up. A PNP whose pin starts up low, and an NPN on an open output with a pull-up, are on until the controller has started: the finding on-in-reset says so.',
  },
  {
    id: 'darlington-forced-beta',
    title: 'Forced β of a Darlington',
    text: 'It is held to the smaller IC/IB of the VCE(sat) rows in use, whatever the policy’s forced β: that is a figure for single transistors.',
  },
  {
    id: 'darlington-leakage',
    title: 'A Darlington without collector leakage row',
    text: 'If only ICBO is printed nothing is guaranteed about the collector current of the whole device, so its off-state current is open. The base voltage needs no leakage figure.',
  },
  {
    id: 'pre-biased-resistors',
    title: 'Resistors around a pre-biased part',
    text: 'RB of the stage is an outer resistor in series with R1. A resistor outside from the input to ground is not counted: R2 inside is what holds the base off. With a printed VI(on) the gain rows are not used, the input current is the drive and base current, and the forced-β difference is not added to VO(on).',
  },
  {
    id: 'pre-biased-input-test',
    title: 'Load current above the test of VI(on)',
    text: 'The full load current is compared with the tested one; without a stated test current every load counts as above it. Without a printed GI nothing is added and the criterion is open all the same.',
  },
  {
    id: 'pre-biased-off',
    title: 'Off state of a pre-biased part',
    text: 'The low level is held to VI(off) as input-off, which takes the place of the off-state base voltage. The collector current is computed behind RB + R1 and R2.',
  },
  {
    id: 'two-transistor-passes',
    title: 'What the two transistors of a high side know of each other',
    text: 'VEB behind the NPN is the smallest and largest over all corners of the PNP with its base resistor pulled to 0 V, at the same supply and ambient, start and settled alike. The drop of the NPN is its largest over all its corners there. The PNP is held off against the largest off-state current of the NPN at any corner. The pin is judged at the NPN, so the PNP has no drive current of its own; each transistor counts its own tested range.',
  },
  {
    id: 'two-transistor-nominal',
    title: 'Nominal figures of a two-transistor high side',
    text: 'Those of the PNP, with the nominal drop of the NPN as its low level; the drive current is that of RB.',
  },
  {
    id: 'expected-device',
    title: 'The expected device and how it is fitted',
    text: 'Curves marked expected come from the Ebers–Moll equations in transport form with Early effect and a collector resistance, for the specimen halfway between the gain limits; they decide no verdict. Model figures of the part record come first. Else RC is the slope of the typical VCE(sat) rows over IC by least squares (0.7 of the maximum stands in for a typical figure that is not printed), and βR, between 0.05 and 5, is what their offset then leaves; with one row βR is 0.5 and RC what that row leaves. IS is set by the VBE row of the lowest current, 0.1 V below its maximum where no typical figure is printed; what lies above 0.8 V is taken for resistance. VA is 75 V where the record gives none, the middle of what textbooks state for small-signal transistors. A part without gain rows is drawn with 100.',
  },
  {
    id: 'expected-device-gain',
    title: 'One gain to each curve',
    text: 'A curve at constant IB has the gain of the collector current which that base current makes in the active region, so that all curves of a device meet at −VA. At constant VBE it is the gain of the corner’s own base current.',
  },
  {
    id: 'expected-darlington',
    title: 'Curves of a Darlington',
    text: 'It is drawn as one transistor with the gain of its rows behind a drop of 0.6 V, with two junctions between base and emitter and twice the gain exponent.',
  },
  {
    id: 'curve-operating-point',
    title: 'Two figures at one load line',
    text: 'The hollow square is the operating point of the selected corner in limit figures, the one the verdict uses. Where the expected curve of the same base current meets the same load line, at the same junction temperature, stands beside it in words.',
  },
  {
    id: 'margin-over-temperature',
    title: 'Margin over ambient temperature',
    text: 'At each temperature the whole stage is judged as if its ambient range were that temperature alone. The ends of the curve are therefore the margins of the verdict wherever a corner of the ambient range is the worst.',
  },
  ...SAMPLING_DECISIONS,
];
