import type { StageFile } from '../../shared/stage/stage-input.ts';

/**
 * Stages of the demo: an invented maker of cold-room and irrigation controllers. Relay, coil and output
 * figures are invented; transistors come from the shipped library with their printed rows.
 */

/** A stage but for its transistor, which is taken from the library by number. */
export interface DemoStage {
  readonly transistor: string;
  /** Of the invented relay part, where the coil is one of the library. */
  readonly load?: string;
  readonly file: Omit<StageFile, 'transistor'>;
}

/** Part number of the invented relay that is revised after a lock. */
export const DEMO_RELAY = 'DEMO-RY24';

type Changes = Partial<Omit<StageFile, 'transistor'>>;

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
} as const;
