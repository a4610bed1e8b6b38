import { SHEET_DEG_C, SHEET_K, thermalVoltageV, ZERO_CELSIUS_K } from './constants.ts';

/**
 * A transistor at one junction temperature and one gain: the Ebers–Moll equations in transport form with Early effect
 * and a resistance in the collector (Sze, Ng, Physics of Semiconductor Devices; Sedra, Smith, Microelectronic
 * Circuits). A Darlington is taken as one transistor behind the drop its output stage adds. Magnitudes for a PNP.
 *
 *   IT = IS·(e^(VBE/VT) − e^(VBC/VT))·(1 + VCE/VA)    IC = IT − IR/βR    IB = IF/βF + IR/βR
 */
export interface Device {
  readonly isA: number;
  readonly gain: number;
  readonly reverseGain: number;
  readonly earlyV: number;
  readonly collectorOhm: number;
  /** What lies in series with the collector whatever the current, V. */
  readonly dropV: number;
  /** kT/q, times the junctions in series for what drives the base, V. */
  readonly thermalV: number;
  readonly junctions: number;
}

/** Band gap of silicon in the temperature law of IS, V (Gummel–Poon; common practice). */
const BAND_GAP_V = 1.11;
const SATURATION_CURRENT_EXPONENT = 3;

/** IS(T)/IS(25 °C): (T/T0)³·exp[(Eg/q)(1/VT0 − 1/VT)]; doubles every 4.5 to 5 K near 25 °C. */
export function saturationCurrentRatio(degC: number): number {
  const ratio = (degC + ZERO_CELSIUS_K) / SHEET_K;
  const exponent = BAND_GAP_V * (1 / thermalVoltageV(SHEET_DEG_C) - 1 / thermalVoltageV(degC));
  return Math.pow(ratio, SATURATION_CURRENT_EXPONENT) * Math.exp(exponent);
}

/** What drives the base: a current in A or a voltage in V, held over the curve. */
export type BaseDrive =
  | { readonly kind: 'current'; readonly ibA: number }
  | { readonly kind: 'voltage'; readonly vbeV: number };

/** e^(VBE/VT) at an inner collector–emitter voltage. */
function forwardFactor(device: Device, drive: BaseDrive, backFactor: number): number {
  const { isA, gain, reverseGain, thermalV, junctions } = device;
  if (drive.kind === 'voltage') return Math.exp(drive.vbeV / (junctions * thermalV));
  return (drive.ibA / isA + 1 / gain + 1 / reverseGain) / (1 / gain + backFactor / reverseGain);
}

/** Collector current at a voltage across the inner transistor, before drop and collector resistance, A. */
function innerCurrentA(device: Device, drive: BaseDrive, innerV: number): number {
  const { isA, reverseGain, earlyV, thermalV } = device;
  const back = Math.exp(-innerV / thermalV);
  const forward = forwardFactor(device, drive, back);
  const early = 1 + Math.max(0, innerV) / earlyV;
  return isA * (forward * (1 - back) * early - (forward * back - 1) / reverseGain);
}

/** Steps that halve any span met here to below rounding. */
const BISECTIONS = 80;

/** Where a rising function of the inner voltage meets zero, V. */
function innerVoltage(highV: number, excess: (innerV: number) => number): number {
  let low = 0;
  let high = highV;
  for (let step = 0; step < BISECTIONS && high - low > 1e-12; step++) {
    const middle = (low + high) / 2;
    if (excess(middle) < 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Collector current at a base drive and a voltage between the terminals, A; below 0 under the offset voltage. */
export function collectorCurrentA(device: Device, drive: BaseDrive, vceV: number): number {
  const { dropV, collectorOhm } = device;
  const availableV = vceV - dropV;
  if (availableV < 0) return 0;
  const innerV = innerVoltage(
    availableV,
    (each) => each + collectorOhm * innerCurrentA(device, drive, each) - availableV,
  );
  return innerCurrentA(device, drive, innerV);
}

/** Where a curve meets a load line. */
export interface CurvePoint {
  readonly vceV: number;
  readonly icA: number;
  /** Reciprocal slope of the curve there: RCE(sat) in saturation, ro in the active region. Ω */
  readonly slopeOhm: number;
}

/** Meeting of the curve of a base drive with the load line from `availableV` along `loadOhm`. */
export function meetLoadLine(
  device: Device,
  drive: BaseDrive,
  availableV: number,
  loadOhm: number,
): CurvePoint {
  const { dropV, collectorOhm } = device;
  const restV = availableV - dropV;
  if (restV <= 0) return { vceV: availableV, icA: 0, slopeOhm: Infinity };
  const innerV = innerVoltage(
    restV,
    (each) => each + (collectorOhm + loadOhm) * innerCurrentA(device, drive, each) - restV,
  );
  const icA = Math.max(0, innerCurrentA(device, drive, innerV));
  return { vceV: availableV - icA * loadOhm, icA, slopeOhm: slopeOhm(device, drive, innerV) };
}

/** VCE at which a base drive lets a collector current through, V; Infinity where it never does. */
export function voltageAtCurrentV(device: Device, drive: BaseDrive, icA: number): number {
  const { dropV, collectorOhm, earlyV } = device;
  // Ten Early voltages on, no sheet is read any more.
  const highV = 10 * earlyV;
  if (innerCurrentA(device, drive, highV) < icA) return Infinity;
  const innerV = innerVoltage(highV, (each) => innerCurrentA(device, drive, each) - icA);
  return innerV + dropV + collectorOhm * icA;
}

/** Reciprocal slope of a curve at an inner voltage, Ω. */
function slopeOhm(device: Device, drive: BaseDrive, innerV: number): number {
  const stepV = Math.min(device.thermalV * 1e-3, Math.max(innerV, 1e-6) / 2);
  const changeA =
    innerCurrentA(device, drive, innerV + stepV) - innerCurrentA(device, drive, innerV - stepV);
  return device.collectorOhm + (2 * stepV) / changeA;
}

/** Base–emitter voltage at given collector and base currents, V (Jaeger, Blalock, Microelectronic Circuit Design). */
export function baseVoltageV(device: Device, icA: number, ibA: number): number {
  const { isA, thermalV, junctions } = device;
  return junctions * thermalV * Math.log1p(baseCharge(device, icA, ibA) / isA);
}

/** IS with which a device shows a base–emitter voltage at given currents, A. */
export function saturationCurrentA(
  device: Omit<Device, 'isA'>,
  icA: number,
  ibA: number,
  vbeV: number,
): number {
  return baseCharge(device, icA, ibA) / Math.expm1(vbeV / (device.junctions * device.thermalV));
}

/** Current through the base–emitter junction that a pair of terminal currents asks for, A. */
function baseCharge({ gain, reverseGain }: Omit<Device, 'isA'>, icA: number, ibA: number): number {
  const share = 1 / (1 + reverseGain);
  return (ibA + share * icA) / (1 / gain + share);
}

/** Output resistance in the active region, Ω: VA/IC. */
export const outputResistanceOhm = (earlyV: number, icA: number): number =>
  icA > 0 ? earlyV / icA : Infinity;
