import { SHEET_DEG_C } from './constants.ts';

/**
 * Thermal resistance junction to ambient in use: the larger of the printed one and the one the power
 * rating implies, (TJmax − 25)/Ptot (JESD51 terms). Data sheets are known to contradict themselves here.
 *
 * @returns K/W; null where the sheet prints neither
 */
export function thermalResistanceInUse(
  printedKPerW: number | null,
  ratedPowerW: number | null,
  tjMaxDegC: number,
): number | null {
  const impliedKPerW =
    ratedPowerW === null ? null : Math.max(0, tjMaxDegC - SHEET_DEG_C) / ratedPowerW;
  if (printedKPerW === null || impliedKPerW === null) return printedKPerW ?? impliedKPerW;
  return Math.max(printedKPerW, impliedKPerW);
}

/** Share of the rated power left at an ambient temperature: 1 up to 25 °C, straight to 0 at TJmax. */
export function powerShare(ambientDegC: number, tjMaxDegC: number): number {
  if (ambientDegC >= tjMaxDegC) return 0;
  if (tjMaxDegC <= SHEET_DEG_C) return 1;
  return Math.min(1, (tjMaxDegC - ambientDegC) / (tjMaxDegC - SHEET_DEG_C));
}

const RESISTOR_FULL_DEG_C = 70;
const RESISTOR_ZERO_DEG_C = 155;

/** Share of a film resistor's rating left: 1 up to 70 °C, straight to 0 at 155 °C (chip resistor data sheets). */
export function resistorShare(ambientDegC: number): number {
  const share = (RESISTOR_ZERO_DEG_C - ambientDegC) / (RESISTOR_ZERO_DEG_C - RESISTOR_FULL_DEG_C);
  return Math.min(1, Math.max(0, share));
}
