/** A fault as it is met on the bench or in the field, and what of this product shows it before the board is built. */
export interface FieldProblem {
  /** Anchor on the method page. */
  readonly id: string;
  readonly symptom: string;
  readonly cause: string;
  /** Ids of the criteria that miss their limit, or are open, on a stage that has the fault. */
  readonly criteria: readonly string[];
  /** Ids of the findings such a stage gets. */
  readonly findings: readonly string[];
  /** What of it the calculation cannot see, and what to do about that; null where it sees all of it. */
  readonly outside: string | null;
}

const NOTHING = { criteria: [], findings: [], outside: null };

/** Collected from questions of practitioners and from the trade’s common experience. */
export const FIELD_PROBLEMS: readonly FieldProblem[] = [
  {
    ...NOTHING,
    id: 'weak-base-current',
    symptom: 'The relay only buzzes, or the transistor gets hot.',
    cause:
      'The base resistor was found with a typical gain instead of the guaranteed one at this current.',
    criteria: ['overdrive-factor', 'forced-beta'],
  },
  {
    ...NOTHING,
    id: 'reused-resistor',
    symptom: 'What switched an LED does not switch a relay.',
    cause: 'The base resistor was taken over for ten times the current.',
    criteria: ['overdrive-factor', 'forced-beta'],
  },
  {
    ...NOTHING,
    id: 'separate-returns',
    symptom: 'The load stays on although the output is low.',
    cause: 'Logic and load do not share their return, or a current lifts one against the other.',
    criteria: ['off-base-voltage'],
    outside:
      'Whether the returns are joined is a matter of the wiring. The voltage left between them belongs into the stage as ground shift.',
  },
  {
    ...NOTHING,
    id: 'floating-base',
    symptom: 'The load glows, or reacts to a hand near the base.',
    cause: 'While the pin is an input nothing holds the base down.',
    criteria: ['reset-off'],
    findings: ['no-base-emitter-resistor'],
  },
  {
    ...NOTHING,
    id: 'on-at-power-up',
    symptom: 'The relay pulls in while the controller starts.',
    cause: 'In reset the pin is pulled up, or it drives the level that turns the transistor on.',
    criteria: ['reset-off'],
    findings: ['on-in-reset'],
    outside:
      'Pulses a pin gives while firmware starts are not part of a stage. Choose a pin whose manual promises a level, and state it as the reset of the drive.',
  },
  {
    ...NOTHING,
    id: 'expander-before-first-write',
    symptom: 'Outputs of a shift register or port expander act before they are first written.',
    cause: 'The outputs float until then, and their leakage lifts a base with a large RBE.',
    criteria: ['reset-off'],
  },
  {
    ...NOTHING,
    id: 'controller-restarts',
    symptom: 'The controller restarts when the relay switches.',
    cause: 'The coil has no clamp, or the shared supply dips.',
    criteria: ['holding-voltage'],
    findings: ['no-clamp'],
    outside:
      'Decoupling, the path of the return current and the supply’s own regulation belong to layout and supply. What a dip does to a coil that is on is judged.',
  },
  {
    ...NOTHING,
    id: 'dies-after-some-cycles',
    symptom: 'The transistor dies after some operations.',
    cause: 'The clamp is missing, too small, or lets the collector rise too far.',
    criteria: ['peak-collector-voltage', 'clamp-current'],
    findings: ['no-clamp', 'diode-reverse-voltage'],
    outside: 'A clamp fitted the wrong way round is seen on the board only.',
  },
  {
    ...NOTHING,
    id: 'slow-release',
    symptom: 'The relay releases late and its contacts weld.',
    cause: 'A plain diode lets the coil’s current fall slowly.',
    criteria: ['release-time'],
  },
  {
    ...NOTHING,
    id: 'capacitor-across-coil',
    symptom: 'The transistor suffers at turn-on although something is fitted across the coil.',
    cause:
      'It is a capacitor: it draws a peak when the transistor turns on and rings with the coil after.',
    outside: 'A stage cannot describe a capacitor across a coil. Take it out and fit a diode.',
  },
  {
    ...NOTHING,
    id: 'high-side-stays-on',
    symptom: 'A PNP on a higher supply never turns off.',
    cause:
      'The high level of the output, or its pull-up, stays below the supply by more than a junction.',
    criteria: ['off-base-voltage'],
    findings: ['rail-below-supply', 'pull-up-below-supply'],
  },
  {
    ...NOTHING,
    id: 'active-low-module',
    symptom: 'An active-low input on 5\u00a0V does not turn off from a 3.3\u00a0V output.',
    cause: 'The same: 1.7\u00a0V are left across the input while the output is high.',
    criteria: ['off-base-voltage'],
    findings: ['rail-below-supply'],
    outside:
      'The light-emitting diode of an opto-coupler is no transistor stage: the voltage left must stay below its forward voltage, or an open output rated for 5\u00a0V has to drive it.',
  },
  {
    ...NOTHING,
    id: 'load-in-the-emitter',
    symptom: 'A relay between emitter and ground does not pull in.',
    cause: 'A follower gives its load the output’s level less VBE, whatever the supply.',
    outside: 'Every topology here has its load at the collector. Move the load there.',
  },
  {
    ...NOTHING,
    id: 'darlington-drop',
    symptom: 'A Darlington leaves the coil too little voltage.',
    cause: 'It drops about a volt while on and asks for two junctions at its base.',
    criteria: ['load-voltage', 'overdrive-factor'],
  },
  {
    ...NOTHING,
    id: 'fails-when-hot',
    symptom: 'The relay works cold and fails hot.',
    cause: 'The copper’s resistance and with it the operate voltage rise with temperature.',
    criteria: ['load-voltage'],
  },
  {
    ...NOTHING,
    id: 'does-not-release-when-hot',
    symptom: 'After an hour the relay no longer releases; touching the base frees it.',
    cause: 'Hot leakage into an open base comes out multiplied by the gain.',
    criteria: ['off-collector-current'],
    findings: ['no-base-emitter-resistor'],
  },
  {
    ...NOTHING,
    id: 'half-on',
    symptom: 'With the input low the collector stands at half the supply.',
    cause: 'The low level and the ground shift come near VBE, which falls when hot.',
    criteria: ['off-base-voltage'],
    outside: 'A damaged transistor looks the same: measure the base before changing the stage.',
  },
  {
    ...NOTHING,
    id: 'pin-overloaded',
    symptom: 'The level of the pin sags and other pins misbehave.',
    cause: 'The base resistor is too small for the pin, or the pins of a port add up.',
    criteria: ['drive-current', 'tested-range'],
    outside: 'The sum over a port stands on the page of the project, which knows all its stages.',
  },
  {
    ...NOTHING,
    id: 'pre-biased-too-weak',
    symptom: 'A pre-biased transistor does not switch from a low logic level.',
    cause: 'The output stays below VI(on), which the resistors inside set.',
    criteria: ['input-on'],
    findings: ['outer-resistor-not-counted'],
  },
  {
    ...NOTHING,
    id: 'slow-switching',
    symptom: 'A stage switched thousands of times a second is late and hot.',
    cause: 'Heavy overdrive stores charge, and nothing draws it out of the base.',
    criteria: ['storage-time'],
    findings: ['overdriven'],
  },
  {
    ...NOTHING,
    id: 'lamp-inrush',
    symptom: 'The transistor of a lamp fails at switch-on.',
    cause:
      'A cold filament draws ten times its current and pulls the transistor out of saturation.',
    criteria: ['inrush-saturation', 'peak-current'],
    findings: ['lamp-inrush'],
  },
  {
    ...NOTHING,
    id: 'other-maker',
    symptom: 'The same type from another maker fails.',
    cause: 'Makers print different currents, powers and gains under one type number.',
    outside:
      'The calculation takes the figures it is given. The library fills a stage with the safest figure of all makers it knows until a maker is fixed.',
  },
  {
    ...NOTHING,
    id: 'pin-order',
    symptom: 'Nothing works, or the gain is tiny.',
    cause: 'Base, emitter and collector come in another order than expected.',
    outside:
      'The order of the pins plays no part in the calculation. Compare the drawing of the package in the data sheet with the layout.',
  },
  {
    ...NOTHING,
    id: 'reverse-base',
    symptom: 'The gain of a transistor fades over months.',
    cause:
      'A rail above the supply, a ground shift or a speed-up capacitor drives the base beyond VEBO.',
    criteria: ['reverse-base-voltage'],
  },
  {
    ...NOTHING,
    id: 'translator-slow',
    symptom: 'Edges behind a level translator are slow, or its low level is too high.',
    cause: 'The collector resistor does not suit the capacitance or the current of the next input.',
    criteria: ['rise-time', 'output-low'],
  },
  {
    ...NOTHING,
    id: 'transistor-array',
    symptom: 'The supply collapses, or the array gets hot, when several outputs switch together.',
    cause: 'The transistors of an array share one package and one emitter pin.',
    outside:
      'A stage takes single transistors, and the library refuses an array there. Add up the currents and losses of its transistors against the array’s own limits.',
  },
  {
    ...NOTHING,
    id: 'hot-base-resistor',
    symptom: 'The base resistor runs hot or drifts.',
    cause: 'Driven from a high voltage it turns more into heat than its size stands.',
    criteria: ['rb-dissipation'],
  },
];
