import { type StageFile, StageInput } from '../../shared/stage/stage-input.ts';
import type { TransistorData } from '../../shared/stage/transistor-data.ts';

/**
 * Stages of the demo: an invented maker of cold-room and irrigation controllers. Relay, coil and output
 * figures are invented; transistors come from the shipped library with their printed rows.
 */

/** A stage but for its transistor, which is taken from the library by number. */
export interface DemoStage {
  readonly transistor: string;
  /** Of the invented relay part, where the coil is one of the library. */
  readonly load?: string;
  /** Of the library too: the transistor in front, with its base network. */
  readonly preDriver?: Front;
  readonly file: Omit<StageFile, 'transistor' | 'preDriver'>;
}

interface Front extends Omit<NonNullable<StageFile['preDriver']>, 'transistor'> {
  readonly designator: string;
  readonly transistor: string;
}

/** The whole definition, its transistors taken from the library by number. */
export function demoDefinition(
  { transistor, preDriver, file }: DemoStage,
  dataOf: (partNumber: string) => TransistorData,
): StageInput {
  const { baseResistor, shuntResistor } = preDriver ?? {};
  return StageInput.parse({
    ...file,
    transistor: dataOf(transistor),
    preDriver: preDriver && {
      ...{ baseResistor, shuntResistor },
      transistor: dataOf(preDriver.transistor),
    },
  });
}

/** Part number of the invented relay that is revised after a lock. */
export const DEMO_RELAY = 'DEMO-RY24';

type Changes = Partial<DemoStage['file']>;

const PIN = {
  kind: 'push-pull',
  railV: { min: 3, max: 3.6 },
  high: { dropV: 0.6, currentA: 0.008 },
  low: { levelV: 0.4, currentA: 0.008, unloadedV: 0.1 },
  sourceLimitA: 0.02,
  sinkLimitA: 0.02,
} as const;

/** An open collector with its pull-up to the load's own supply. */
const OPEN_COLLECTOR = {
  kind: 'open-collector',
  railV: { min: 21.6, max: 26.4 },
  railTracksSupply: true,
  low: { levelV: 0.4, currentA: 0.02 },
  sourceLimitA: null,
  sinkLimitA: 0.03,
  maximumV: 30,
  leakageA: 1e-6,
  pullUp: { valueOhm: 10_000, tolerance: 0.05, ratingW: 0.25 },
} as const;

/** The same output at a 5 V rail. */
const PIN_5V = { ...PIN, railV: { min: 4.75, max: 5.25 } } as const;

const resistor = (valueOhm: number, ratingW = 0.1) => ({ valueOhm, tolerance: 0.05, ratingW });

const NO_CLAMP = { clamp: null } as const;

const leds = (count: number, resistanceOhm: number) => ({
  ...{ kind: 'led-string' as const, count, resistanceOhm, tolerance: 0.05 },
  ...{ forwardV: { min: 1.8, max: 2.2 }, maximumA: 0.02, minimumA: 0.002 },
});

/** A PNP behind an NPN, on a 3.3 V output. */
function behind(front: Front, made: DemoStage): DemoStage {
  return {
    ...made,
    preDriver: front,
    file: {
      ...made.file,
      topology: 'two-transistor-high-side',
      drive: PIN,
      shuntResistor: resistor(10_000),
    },
  };
}

const coil = (resistanceOhm: number, operateV: number) => ({
  kind: 'coil' as const,
  resistanceOhm,
  tolerance: 0.1,
  referenceDegC: 20,
  temperatureRiseK: 20,
  inductanceH: 4,
  operateV,
  releaseV: 2.4,
  maximumV: 31,
  maximumReferenceDegC: 60,
  coilMaxDegC: 130,
});

function stage(
  reference: string,
  title: string,
  transistor: string,
  baseResistorOhm: number,
  changes: Changes = {},
): DemoStage {
  return {
    transistor,
    file: {
      format: 'sinkwell-stage/1',
      ...{ reference, title, topology: 'low-side-npn' },
      supplyV: { min: 21.6, max: 26.4 },
      ambientDegC: { min: -20, max: 50 },
      drive: { ...PIN, port: 'PB', portTotalA: 0.1 },
      load: coil(1600, 14.4),
      baseResistor: { valueOhm: baseResistorOhm, tolerance: 0.05, ratingW: 0.1 },
      shuntResistor: { valueOhm: 22_000, tolerance: 0.05, ratingW: 0.1 },
      clamp: { kind: 'diode', forwardV: 1, reverseV: 100, currentRatingA: 0.2 },
      policy: { name: 'General practice' },
      ...changes,
    },
  };
}

const highSide = (baseResistorOhm: number): Changes => ({
  topology: 'high-side-pnp',
  drive: OPEN_COLLECTOR,
  baseResistor: { valueOhm: baseResistorOhm, tolerance: 0.05, ratingW: 0.5 },
  shuntResistor: { valueOhm: 4700, tolerance: 0.05, ratingW: 0.25 },
});

/** Cold-room controller, relay board. */
export const COLD_ROOM = {
  compressor: stage('Q1', 'Compressor contactor pilot relay', '2N3904', 560, {
    load: coil(1440, 16.8),
    ambientDegC: { min: -20, max: 60 },
  }),
  fan: stage('Q2', 'Evaporator fan relay, stage 1', '2N4401', 430, { load: coil(1100, 14.4) }),
  defrost: stage('Q3', 'Defrost heater relay', '2N4401', 430, { load: coil(1100, 14.4) }),
  drain: stage('Q4', 'Drain heater relay', '2N3904', 680),
  doorFrame: stage('Q5', 'Door frame heater relay', '2N3904', 680),
  liquidLine: stage('Q6', 'Liquid line valve, high side', '2N4403', 3300, {
    ...highSide(3300),
    load: coil(560, 14.4),
  }),
  sounder: stage('Q8', 'Alarm sounder', '2N4401', 390, {
    load: { kind: 'resistor', resistanceOhm: 820, tolerance: 0.05 },
    clamp: null,
  }),
  roomLight: stage('Q9', 'Room light relay', '2N3904', 1200, { load: coil(1440, 14.4) }),
  status: stage('Q10', 'Status output to the panel', '2N3904', 1000, {
    load: { kind: 'resistor', resistanceOhm: 2200, tolerance: 0.05 },
    clamp: null,
  }),
  supervisory: stage('Q11', 'Supervisory alarm relay', '2N3904', 680, { load: coil(1600, 14.4) }),
  agitator: stage('Q12', 'Brine agitator contactor pilot relay', '2N3904', 620, {
    load: coil(1440, 16.8),
    ambientDegC: { min: -20, max: 60 },
    drive: PIN,
    clamp: { kind: 'diode', forwardV: 1, currentRatingA: 0.2 },
  }),
  humidifier: stage('Q13', 'Humidifier valve', '2N4401', 430, {
    load: { ...coil(1100, 14.4), operateV: null },
  }),
  condenser: {
    ...stage('Q14', 'Condenser fan relay, high side', '2N3906', 8200, highSide(8200)),
    load: DEMO_RELAY,
  },
  spare: stage('Q15', 'Spare output', '2N3904', 680),
  suction: behind(
    {
      ...{ designator: 'Q17', transistor: '2N3904' },
      baseResistor: resistor(2200),
      shuntResistor: resistor(22_000),
    },
    stage('Q16', 'Suction line valve, high side', '2N3906', 6200, {
      load: coil(1100, 14.4),
      baseResistor: resistor(6200, 0.5),
    }),
  ),
  doorOpen: stage('Q18', 'Door open, LED string', 'DTC114E', 0, {
    topology: 'low-side-pre-biased',
    ambientDegC: { min: -10, max: 50 },
    drive: PIN_5V,
    load: leds(3, 2400),
    shuntResistor: null,
    ...NO_CLAMP,
  }),
  fanSpeed: stage('Q19', 'Speed signal to the 5 V fan drive', '2N3904', 5600, {
    topology: 'level-translator',
    supplyV: { min: 4.75, max: 5.25 },
    drive: PIN,
    ...{ frequencyHz: 10_000, duty: 0.5 },
    load: {
      ...{ kind: 'logic-input', pullUpOhm: 2200, tolerance: 0.05, ratingW: 0.1, count: 1 },
      ...{ vilV: 1.5, vihV: 3.5, leakageA: 1e-6, lowCurrentA: 1e-6 },
      ...{ capacitanceF: 1e-11, wiringF: 3e-11, riseTimeLimitSec: 1e-6 },
    },
    ...NO_CLAMP,
  }),
  water: stage('Q20', 'Defrost water valve, 12 V', 'MPSA14', 560, {
    topology: 'low-side-darlington',
    supplyV: { min: 10.8, max: 13.2 },
    drive: PIN_5V,
    load: { ...coil(270, 7.2), releaseV: 1.2, maximumV: 15.6, inductanceH: 0.8 },
    baseResistor: resistor(560, 0.25),
    shuntResistor: resistor(47_000),
  }),
  pilotLamp: stage('Q21', 'Pilot lamp, panel', '2N4401', 470, {
    drive: PIN_5V,
    load: { kind: 'lamp', nominalV: 24, currentA: 0.02, coldRatio: 10 },
    baseResistor: resistor(470, 0.25),
    ...NO_CLAMP,
  }),
  frame: stage('Q22', 'Window frame heater, pulsed', '2N3904', 820, {
    ...{ frequencyHz: 1000, duty: 0.5 },
    load: { kind: 'resistor', resistanceOhm: 1500, tolerance: 0.05 },
    ...NO_CLAMP,
  }),
} as const;

const STRICT: Changes = { policy: { name: 'High reliability' } };

/** Irrigation controller, valve board: stricter policy. */
export const IRRIGATION = {
  zone1: stage('Q1', 'Zone 1 valve pilot', '2N3904', 560, STRICT),
  zone2: stage('Q2', 'Zone 2 valve pilot', '2N3904', 560, {
    ...STRICT,
    load: { ...coil(1600, 14.4), releaseV: null },
  }),
  pump: stage('Q3', 'Pump contactor pilot relay', 'PN2222A', 1500, {
    ...STRICT,
    load: coil(1100, 14.4),
  }),
  master: stage('Q4', 'Master valve pilot', '2N3904', 560, STRICT),
  panel: stage('Q5', 'Panel signal, resistor load', '2N4401', 560, {
    ...STRICT,
    load: { kind: 'resistor', resistanceOhm: 1500, tolerance: 0.05 },
    clamp: null,
  }),
  zone3: behind(
    {
      ...{ designator: 'Q8', transistor: '2N3904' },
      baseResistor: resistor(3300),
      shuntResistor: resistor(22_000),
    },
    stage('Q6', 'Zone 3 valve, high side', '2N3906', 9100, {
      ...STRICT,
      baseResistor: resistor(9100, 0.5),
    }),
  ),
  running: stage('Q7', 'Pump running, LED string', '2N3904', 1200, {
    ...STRICT,
    load: leds(5, 1500),
    ...NO_CLAMP,
  }),
} as const;
