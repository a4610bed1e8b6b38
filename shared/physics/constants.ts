/** Boltzmann constant, J/K (SI 2019, exact). */
export const BOLTZMANN_J_PER_K = 1.380649e-23;

/** Elementary charge, C (SI 2019, exact). */
export const ELEMENTARY_CHARGE_C = 1.602176634e-19;

/** 0 °C in kelvin. */
export const ZERO_CELSIUS_K = 273.15;

/** Temperature data sheets print their rows at, °C and K. */
export const SHEET_DEG_C = 25;
export const SHEET_K = SHEET_DEG_C + ZERO_CELSIUS_K;

/** kT/q per kelvin, V/K. */
const VOLT_PER_K = BOLTZMANN_J_PER_K / ELEMENTARY_CHARGE_C;

/** Thermal voltage kT/q, V, at a temperature in °C: 25.693 mV at 25 °C. */
export function thermalVoltageV(degC: number): number {
  return VOLT_PER_K * (degC + ZERO_CELSIUS_K);
}
