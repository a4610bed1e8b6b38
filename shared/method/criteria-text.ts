/** What a criterion asks and what it is held against, in plain sentences. */
export interface CriterionText {
  readonly asks: string;
  /** Where its limit comes from; the relation stands with the criterion itself. */
  readonly limit: string;
}

/** By criterion id. */
export const CRITERIA_TEXT: Readonly<Record<string, CriterionText>> = {
  'overdrive-factor': {
    asks: 'Is the base current large enough that the guaranteed gain saturates the transistor with reserve?',
    limit: 'At least the policy’s overdrive factor.',
  },
  'forced-beta': {
    asks: 'Is the ratio of collector to base current one at which the data sheet promises a saturation voltage?',
    limit:
      'At most the policy’s forced β; with guaranteed figures only, at most the ratio of the rows in use where that is smaller.',
  },
  'input-on': {
    asks: 'Does the output lift the input of a pre-biased part high enough to turn it on?',
    limit: 'At least the printed VI(on), raised when cold and above its test current.',
  },
  'input-off': {
    asks: 'Does the low output keep the input of a pre-biased part below what may turn it on?',
    limit: 'At most the printed VI(off).',
  },
  'input-voltage': {
    asks: 'Does the input of a pre-biased part stay within its rating?',
    limit: 'At most the printed highest input voltage.',
  },
  'load-voltage': {
    asks: 'Does the coil get enough voltage to pull in when it is hot and the supply is low?',
    limit: 'At least the must-operate voltage, raised by the copper’s resistance when hot.',
  },
  'saturation-voltage': {
    asks: 'How much voltage stays across the transistor when it is on?',
    limit: 'At most the stage’s own budget; stated only where none is set.',
  },
  'drive-current': {
    asks: 'Does the logic pin carry the base current without being overloaded?',
    limit: 'At most the pin’s limit times the policy’s derating.',
  },
  'collector-current': {
    asks: 'Does the collector current stay within its rating?',
    limit: 'At most the rated IC times the policy’s derating.',
  },
  'junction-temperature': {
    asks: 'Does the junction stay cool enough in the hottest corner?',
    limit: 'At most the rated TJ in °C times the policy’s derating.',
  },
  dissipation: {
    asks: 'Does the transistor turn less power into heat than it may at this ambient temperature?',
    limit:
      'At most the rated Ptot times the derating, falling above 25 °C to nothing at the highest TJ.',
  },
  'base-current': {
    asks: 'Does the base current stay within its rating?',
    limit: 'At most the rated IB times the derating; stated only where the sheet prints none.',
  },
  'peak-current': {
    asks: 'Does the highest collector current at turn-on stay within the peak rating?',
    limit: 'At most the rated peak current times the derating; IC where the sheet prints no peak.',
  },
  'load-current': {
    asks: 'Does the load current stay within what the LEDs bear?',
    limit: 'At most their highest current times the policy’s derating.',
  },
  'load-current-low': {
    asks: 'Do the LEDs still get enough current at the lowest supply?',
    limit: 'At least their lowest current, where one is set.',
  },
  'inrush-saturation': {
    asks: 'Does the transistor stay saturated while a cold filament draws its inrush?',
    limit: 'At least 1; below it is open, and a safe-operating-area curve decides.',
  },
  'output-low': {
    asks: 'Is the low level of the translator low enough for the input it drives?',
    limit: 'At most the input’s VIL.',
  },
  'output-high': {
    asks: 'Is the high level of the translator high enough for the input it drives?',
    limit: 'At least the input’s VIH.',
  },
  'rise-time': {
    asks: 'Does the output rise fast enough through the collector resistor?',
    limit: 'At most the stage’s own limit; stated only where none is set.',
  },
  'rc-dissipation': {
    asks: 'Does the collector resistor stay within its rating while the output is low?',
    limit: 'At most its rating times the derating, falling from 70 °C to nothing at 155 °C.',
  },
  'load-overvoltage': {
    asks: 'Is the coil safe at the highest supply?',
    limit:
      'At most the coil’s highest voltage, lowered where the ambient exceeds the one it holds at.',
  },
  'holding-voltage': {
    asks: 'Does the coil stay pulled in while the supply dips?',
    limit: 'At least the holding voltage.',
  },
  'rb-dissipation': {
    asks: 'Does the base resistor stay within its rating?',
    limit: 'At most its rating times the derating, falling from 70 °C to nothing at 155 °C.',
  },
  'rbe-dissipation': {
    asks: 'Does the base-emitter resistor stay within its rating?',
    limit: 'At most its rating times the derating, falling from 70 °C to nothing at 155 °C.',
  },
  'pull-up-dissipation': {
    asks: 'Does the pull-up resistor stay within its rating while the output is low?',
    limit: 'At most its rating times the derating, falling from 70 °C to nothing at 155 °C.',
  },
  'off-base-voltage': {
    asks: 'Is the base held low enough that a hot transistor stays off?',
    limit: 'At most the policy’s VBE when off, 2 mV less for every kelvin above 25 °C.',
  },
  'off-collector-current': {
    asks: 'Is the current left in the load small enough when the stage is off?',
    limit:
      'Coil: 10 % of its release current. LED or logic input: the policy’s current when off. Resistor or lamp: that, or 0.1 % of the collector current.',
  },
  'off-collector-voltage': {
    asks: 'Does the transistor stand the supply when it is off?',
    limit: 'At most the rated VCEO times the policy’s derating.',
  },
  'reset-off': {
    asks: 'Is the base held low enough while the controller is in reset?',
    limit: 'The same as for the off state.',
  },
  'reset-off-current': {
    asks: 'Is the current left in the load small enough while the controller is in reset?',
    limit: 'The same as for the off state.',
  },
  'reverse-base-voltage': {
    asks: 'Is the base-emitter junction safe against reverse voltage?',
    limit: 'At most the rated VEBO, not derated.',
  },
  'drive-maximum': {
    asks: 'Does the open output stand the supply it is pulled up to?',
    limit: 'At least the highest supply.',
  },
  'peak-collector-voltage': {
    asks: 'Does the transistor stand the voltage at which the clamp holds the coil at turn-off?',
    limit: 'At most the rated VCEO times the policy’s derating.',
  },
  'surge-voltage': {
    asks: 'Does the transistor stand a surge of the supply with the clamp conducting?',
    limit: 'At most the rated VCEO, not derated.',
  },
  'release-time': {
    asks: 'How long does the relay stay on after turn-off?',
    limit: 'At most the stage’s own limit; stated only where none is set.',
  },
  'clamp-current': {
    asks: 'Does the clamp carry the coil’s current at turn-off?',
    limit: 'At most its current rating times the derating.',
  },
  'clamp-power': {
    asks: 'Does the clamp stand the coil’s energy at this switching rate?',
    limit: 'At most its power rating times the derating.',
  },
  'storage-time': {
    asks: 'Does the transistor leave saturation soon enough for the switching frequency?',
    limit: 'At most the stage’s own limit, else a tenth of the shorter of on and off time.',
  },
  'tested-range': {
    asks: 'How many of gain, VCE(sat), VBE and pin current were used above their last tested row?',
    limit: 'None; any is open, since the sheet promises nothing there.',
  },
};
