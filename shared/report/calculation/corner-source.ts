import { BOLTZMANN_J_PER_K, ELEMENTARY_CHARGE_C } from '../../physics/constants.ts';
import type { Corner } from '../../checks/evaluation.ts';
import type { StudiedCorner } from '../../checks/corner-study.ts';
import type { OperatingPoint } from '../../stage/operating-point.ts';
import type { StageInput } from '../../stage/stage-input.ts';
import type { SymbolId } from '../../method/symbols.ts';
import type { Worksheet } from './worksheet.ts';

/** Which transistor of its stage a corner belongs to. */
export type Side = 'only' | 'behind' | 'front';

/** What the lines of a corner are written from. */
export interface CornerSource {
  readonly point: OperatingPoint;
  readonly off: StudiedCorner['off'];
  readonly corner: Corner;
  readonly side: Side;
  /** The stage as this transistor sees it. */
  readonly input: StageInput;
}

export const atEnd = ({ corner }: CornerSource, variable: string, end: string): boolean =>
  corner[variable] === end;

/** Sign of a tolerance’s end; −1 where the corner does not name it. */
export const signOf = (source: CornerSource, variable: string): 1 | -1 =>
  atEnd(source, variable, '+') ? 1 : -1;

/** A resistance at an end of its tolerance. */
export function toleranceLine(
  sheet: Worksheet,
  as: SymbolId,
  { valueOhm, tolerance }: { readonly valueOhm: number; readonly tolerance: number },
  sign: number,
  what: string,
  stated?: number,
): void {
  sheet.apply('tolerance', {
    as,
    ...(stated === undefined ? {} : { stated }),
    put: {
      R_n: [valueOhm, `${what}, nominal`],
      t: [sign * tolerance, `${what}, tolerance`],
    },
  });
}

/** kT/q, of the junction or of the 25 °C the rows stand at. */
export function thermalVoltageLine(sheet: Worksheet, as: 'V_T' | 'V_T25'): void {
  if (sheet.has(as)) return;
  sheet.apply('thermal-voltage', {
    as,
    put: {
      k_B: [BOLTZMANN_J_PER_K, 'SI 2019, exact'],
      q_e: [ELEMENTARY_CHARGE_C, 'SI 2019, exact'],
      T: as === 'V_T' ? 'T_J' : [25, 'Data-sheet rows'],
    },
  });
}
