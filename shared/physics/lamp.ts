/** A filament lamp by its rating and its cold inrush. */
export interface Lamp {
  readonly nominalV: number;
  readonly currentA: number;
  /** Cold inrush over rated current. */
  readonly coldRatio: number;
}

/** Judgement, not measurement: how lamp current goes with voltage, and cold tungsten with temperature. */
const CURRENT_EXPONENT = 0.55;
const COLD_EXPONENT = 1.2;
const ROOM_K = 298;
const ZERO_CELSIUS_K = 273;

/** Steady current at a supply voltage, A: I·(V/V_nominal)^0.55. */
export function lampSteadyA(lamp: Lamp, supplyV: number): number {
  return lamp.currentA * Math.pow(supplyV / lamp.nominalV, CURRENT_EXPONENT);
}

/** Resistance of the cold filament, Ω: smaller below room temperature, no credit above. */
export function lampColdOhm(lamp: Lamp, ambientDegC: number): number {
  const absolute = Math.max(0, ambientDegC + ZERO_CELSIUS_K) / ROOM_K;
  const share = Math.min(1, Math.pow(absolute, COLD_EXPONENT));
  return (lamp.nominalV / (lamp.currentA * lamp.coldRatio)) * share;
}
