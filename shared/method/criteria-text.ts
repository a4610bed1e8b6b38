/** What a criterion asks and what it is held against, in plain sentences. */
export interface CriterionText {
  readonly asks: string;
  /** Where its limit comes from; the relation stands with the criterion itself. */
  readonly limit: string;
  /** What helps where it is missed. */
  readonly cure: string;
}

/** By criterion id. */
export const CRITERIA_TEXT: Readonly<Record<string, CriterionText>> = {
  'overdrive-factor': {
    asks: 'Is the base current large enough that the guaranteed gain saturates the transistor with reserve?',
    limit: 'At least the policy’s overdrive factor.',
    cure: 'A smaller base resistor, a transistor with more guaranteed gain at this current, or an output that delivers more.',
  },
  'forced-beta': {
    asks: 'Is the ratio of collector to base current one at which the data sheet promises a saturation voltage?',
    limit:
      'At most the policy’s forced β; with guaranteed figures only, at most the ratio of the rows in use where that is smaller.',
    cure: 'A smaller base resistor, or a transistor whose VCE(sat) is guaranteed at a higher IC/IB.',
  },
  'input-on': {
    asks: 'Does the output lift the input of a pre-biased part high enough to turn it on?',
    limit: 'At least the printed VI(on), raised when cold and above its test current.',
    cure: 'An output with a higher level, a smaller outer resistor, or a type with a lower VI(on).',
  },
  'input-off': {
    asks: 'Does the low output keep the input of a pre-biased part below what may turn it on?',
    limit: 'At most the printed VI(off).',
    cure: 'An output with a lower low level or less ground shift, or a type with a higher VI(off).',
  },
  'input-voltage': {
    asks: 'Does the input of a pre-biased part stay within its rating?',
    limit: 'At most the printed highest input voltage.',
    cure: 'A larger outer resistor, or a type that bears more at its input.',
  },
  'load-voltage': {
    asks: 'Does the coil get enough voltage to pull in when it is hot and the supply is low?',
    limit: 'At least the must-operate voltage, raised by the copper’s resistance when hot.',
    cure: 'A transistor with less VCE(sat) at this current (not a Darlington), a higher lowest supply, or a coil with a lower operate voltage; less self-heating of the coil helps as well.',
  },
  'saturation-voltage': {
    asks: 'How much voltage stays across the transistor when it is on?',
    limit: 'At most the stage’s own budget; stated only where none is set.',
    cure: 'More base current, or a transistor with less VCE(sat) at this current.',
  },
  'drive-current': {
    asks: 'Does the logic pin carry the base current without being overloaded?',
    limit: 'At most the pin’s limit times the policy’s derating.',
    cure: 'A larger base resistor, a larger base–emitter resistor, an output that delivers more, or a second transistor in front.',
  },
  'port-current': {
    asks: 'Do all pins of a port together stay within what the controller can carry?',
    limit:
      'At most the tightest port limit of the stages on it, times the policy’s derating; the strong drive currents of all current revisions of the project count, each as often as it is built.',
    cure: 'Larger base resistors or transistors with more gain on this port, stages moved to another port, or a driver between port and stages.',
  },
  'collector-current': {
    asks: 'Does the collector current stay within its rating?',
    limit: 'At most the rated IC times the policy’s derating.',
    cure: 'A transistor rated for more current, or a load that draws less.',
  },
  'junction-temperature': {
    asks: 'Does the junction stay cool enough in the hottest corner?',
    limit: 'At most the rated TJ in °C times the policy’s derating.',
    cure: 'Less VCE(sat), a package with less thermal resistance, more copper, or a cooler place.',
  },
  dissipation: {
    asks: 'Does the transistor turn less power into heat than it may at this ambient temperature?',
    limit:
      'At most the rated Ptot times the derating, falling above 25 °C to nothing at the highest TJ.',
    cure: 'Less VCE(sat), a package rated for more power, or a cooler place.',
  },
  'base-current': {
    asks: 'Does the base current stay within its rating?',
    limit: 'At most the rated IB times the derating; stated only where the sheet prints none.',
    cure: 'A larger base resistor, or a transistor that bears more base current.',
  },
  'peak-current': {
    asks: 'Does the highest collector current at turn-on stay within the peak rating?',
    limit: 'At most the rated peak current times the derating; IC where the sheet prints no peak.',
    cure: 'A transistor with a higher peak rating, or a load with less inrush: preheat a lamp or limit its current.',
  },
  'load-current': {
    asks: 'Does the load current stay within what the LEDs bear?',
    limit: 'At most their highest current times the policy’s derating.',
    cure: 'A larger series resistor, or LEDs that bear more.',
  },
  'load-current-low': {
    asks: 'Do the LEDs still get enough current at the lowest supply?',
    limit: 'At least their lowest current, where one is set.',
    cure: 'A smaller series resistor, or fewer LEDs in a string.',
  },
  'inrush-saturation': {
    asks: 'Does the transistor stay saturated while a cold filament draws its inrush?',
    limit: 'At least 1; below it is open, and a safe-operating-area curve decides.',
    cure: 'More base current, a keep-warm resistor across the transistor or a current limit; else read the safe-operating-area curve of the data sheet.',
  },
  'output-low': {
    asks: 'Is the low level of the translator low enough for the input it drives?',
    limit: 'At most the input’s VIL.',
    cure: 'A larger collector resistor, less ground shift, or more base current.',
  },
  'output-high': {
    asks: 'Is the high level of the translator high enough for the input it drives?',
    limit: 'At least the input’s VIH.',
    cure: 'A smaller collector resistor, or a transistor with less leakage.',
  },
  'rise-time': {
    asks: 'Does the output rise fast enough through the collector resistor?',
    limit: 'At most the stage’s own limit; stated only where none is set.',
    cure: 'A smaller collector resistor, or less capacitance at the output.',
  },
  'rc-dissipation': {
    asks: 'Does the collector resistor stay within its rating while the output is low?',
    limit: 'At most its rating times the derating, falling from 70 °C to nothing at 155 °C.',
    cure: 'A larger collector resistor, or one rated for more power.',
  },
  'load-overvoltage': {
    asks: 'Is the coil safe at the highest supply?',
    limit:
      'At most the coil’s highest voltage, lowered where the ambient exceeds the one it holds at.',
    cure: 'A lower highest supply, a resistor in series with the coil, or a coil for a higher voltage.',
  },
  'holding-voltage': {
    asks: 'Does the coil stay pulled in while the supply dips?',
    limit: 'At least the holding voltage.',
    cure: 'A supply that dips less, or a coil with a lower holding voltage.',
  },
  'rb-dissipation': {
    asks: 'Does the base resistor stay within its rating?',
    limit: 'At most its rating times the derating, falling from 70 °C to nothing at 155 °C.',
    cure: 'A resistor rated for more power: the next size, or two in series; a lower drive voltage helps as well.',
  },
  'rbe-dissipation': {
    asks: 'Does the base-emitter resistor stay within its rating?',
    limit: 'At most its rating times the derating, falling from 70 °C to nothing at 155 °C.',
    cure: 'A larger base–emitter resistor, or one rated for more power.',
  },
  'pull-up-dissipation': {
    asks: 'Does the pull-up resistor stay within its rating while the output is low?',
    limit: 'At most its rating times the derating, falling from 70 °C to nothing at 155 °C.',
    cure: 'A larger pull-up, or one rated for more power.',
  },
  'off-base-voltage': {
    asks: 'Is the base held low enough that a hot transistor stays off?',
    limit: 'At most the policy’s VBE when off, 2 mV less for every kelvin above 25 °C.',
    cure: 'A lower base–emitter resistor, an output with a lower low level, less ground shift, or less heat. A PNP needs a high level close to its own supply: put an NPN in front.',
  },
  'off-collector-current': {
    asks: 'Is the current left in the load small enough when the stage is off?',
    limit:
      'Coil: 10 % of its release current. LED or logic input: the policy’s current when off. Resistor or lamp: that, or 0.1 % of the collector current.',
    cure: 'A base–emitter resistor, or a lower one; a transistor with less hot leakage.',
  },
  'off-collector-voltage': {
    asks: 'Does the transistor stand the supply when it is off?',
    limit: 'At most the rated VCEO times the policy’s derating.',
    cure: 'A transistor with a higher VCEO.',
  },
  'reset-off': {
    asks: 'Is the base held low enough while the controller is in reset?',
    limit: 'The same as for the off state.',
    cure: 'A base–emitter resistor, low enough against the pin’s leakage or its pull-up; or a pin that starts up low.',
  },
  'reset-off-current': {
    asks: 'Is the current left in the load small enough while the controller is in reset?',
    limit: 'The same as for the off state.',
    cure: 'A lower base–emitter resistor, or a pin that starts up low.',
  },
  'reverse-base-voltage': {
    asks: 'Is the base-emitter junction safe against reverse voltage?',
    limit: 'At most the rated VEBO, not derated.',
    cure: 'A diode in series with the base or across base and emitter, less ground shift, or no speed-up capacitor.',
  },
  'drive-maximum': {
    asks: 'Does the open output stand the supply it is pulled up to?',
    limit: 'At least the highest supply.',
    cure: 'An open output rated for the supply, or an NPN in front.',
  },
  'peak-collector-voltage': {
    asks: 'Does the transistor stand the voltage at which the clamp holds the coil at turn-off?',
    limit: 'At most the rated VCEO times the policy’s derating.',
    cure: 'A clamp with a lower voltage, or a transistor with a higher VCEO.',
  },
  'surge-voltage': {
    asks: 'Does the transistor stand a surge of the supply with the clamp conducting?',
    limit: 'At most the rated VCEO, not derated.',
    cure: 'A transistor with a higher VCEO, a clamp with a lower voltage, or a suppressor on the supply.',
  },
  'release-time': {
    asks: 'How long does the relay stay on after turn-off?',
    limit: 'At most the stage’s own limit; stated only where none is set.',
    cure: 'A clamp with a higher voltage: a diode with a zener in series, as far as VCEO allows.',
  },
  'clamp-current': {
    asks: 'Does the clamp carry the coil’s current at turn-off?',
    limit: 'At most its current rating times the derating.',
    cure: 'A diode rated for the coil’s whole current.',
  },
  'clamp-power': {
    asks: 'Does the clamp stand the coil’s energy at this switching rate?',
    limit: 'At most its power rating times the derating.',
    cure: 'A clamp rated for more power, or fewer operations per second.',
  },
  'storage-time': {
    asks: 'Does the transistor leave saturation soon enough for the switching frequency?',
    limit: 'At most the stage’s own limit, else a tenth of the shorter of on and off time.',
    cure: 'Less overdrive, a lower base–emitter resistor or a speed-up capacitor to draw the charge out; a faster transistor, or a lower frequency.',
  },
  'low-to-high-delay': {
    asks: 'How long after turn-off does the input behind the translator see a high level?',
    limit: 'Stated only: the stage sets no limit for it.',
    cure: 'A smaller collector resistor, less capacitance at the output, or less overdrive.',
  },
  'tested-range': {
    asks: 'How many of gain, VCE(sat), VBE and pin current were used above their last tested row?',
    limit: 'None; any is open, since the sheet promises nothing there.',
    cure: 'A transistor, or an output, whose rows reach the current in use.',
  },
};
