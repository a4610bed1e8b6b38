import { thermalResistanceInUse } from '../../physics/thermal.ts';
import { switchingLossW } from '../../stage/switching-loss.ts';
import { atEnd, type CornerSource } from './corner-source.ts';
import { clampLines } from './clamp-lines.ts';
import type { Worksheet } from './worksheet.ts';

/** How near the engine brings a junction to its balance; where the balance jumps it cannot be met. */
const BALANCED_K = 1e-7;

/** Dissipation with its switching loss, and the balance of the junction. */
export function powerLines(sheet: Worksheet, source: CornerSource): void {
  const { point } = source;
  const { inside } = point.model;
  const lossW = switchingLossW(point);
  const byBase = inside !== null && !inside.byInput;
  if (byBase) sheet.apply('input-before-base', { stated: point.inputV });
  sheet.give('s', point.model.conductionShare, 'Duty where it counts, else 1');
  if (lossW > 0) lossLines(sheet, source, lossW);
  const law = inside === null ? ('dissipation' as const) : ('dissipation-input' as const);
  sheet.apply(lossW > 0 ? `${law}-switched` : law, {
    stated: point.powerW,
    put: byBase ? { I_I: 'I_R' } : {},
  });
  thermalLine(sheet, source);
  const { rthJaKPerW } = point.model.part;
  const settled = atEnd(source, 'instant', 'settled');
  if (!settled || rthJaKPerW === null || point.runaway) return;
  const gapK = point.condition.ambientDegC + rthJaKPerW * point.powerW - point.tjDegC;
  if (Math.abs(gapK) < BALANCED_K) {
    sheet.apply('junction-balance', { stated: point.tjDegC });
  }
}

function thermalLine(sheet: Worksheet, { point, input }: CornerSource): void {
  const { limits, thermal } = input.transistor;
  const stated = point.model.part.rthJaKPerW;
  if (stated === null) return;
  if (thermal.rthJaKPerW === null || limits.powerW === null) {
    const printed = thermal.rthJaKPerW !== null;
    sheet.give('R_th', stated, printed ? 'Part, printed' : 'Part, implied by its power rating');
    return;
  }
  sheet.apply('thermal-resistance', {
    stated: thermalResistanceInUse(thermal.rthJaKPerW, limits.powerW, limits.tjMaxDegC) ?? stated,
    put: {
      R_thp: [thermal.rthJaKPerW, 'Part, printed'],
      T_Jmax: [limits.tjMaxDegC, 'Part, highest junction temperature'],
      P_tot: [limits.powerW, 'Part, rated power'],
    },
  });
}

function lossLines(sheet: Worksheet, source: CornerSource, stated: number): void {
  const { input } = source;
  sheet.give('f', input.frequencyHz, 'Stage, frequency');
  sheet.give('D', input.duty, 'Stage, duty');
  edgeLines(sheet, source);
  if (input.load.kind === 'coil') coilLossLines(sheet, source, input.load.inductanceH, stated);
  else sheet.apply('loss-resistive', { stated });
}

/** Fall time as printed, and the rise time at the drive of the circuit. */
function edgeLines(sheet: Worksheet, { point, input }: CornerSource): void {
  const row = input.transistor.switching;
  const rowBeta = row?.icA != null && row.ib1A !== null ? row.icA / row.ib1A : Infinity;
  const rise = [row?.trSec ?? 0, 'Part, rise time'] as const;
  sheet.give('t_f', row?.tfSec ?? 0, 'Part, fall time');
  if (Number.isFinite(point.forcedBeta)) {
    const put = { t_r: rise, b_row: [rowBeta, 'Switching row, IC/IB1'] } as const;
    sheet.apply('rise-in-circuit', { put });
  } else sheet.give('t_rc', ...rise);
}

function coilLossLines(
  sheet: Worksheet,
  source: CornerSource,
  inductanceH: number | null,
  stated: number,
): void {
  const { condition, model } = source.point;
  if (model.clamp === null) sheet.give('V_pk', condition.supplyV, 'No clamp: the supply');
  else clampLines(sheet, source);
  let stillOn = true;
  if (model.clamp !== null && model.clamp.smallestV > 0 && inductanceH !== null) {
    sheet.give('L_c', inductanceH, 'Load, inductance');
    stillOn = sheet.apply('dead-time') > sheet.apply('off-time');
  }
  const why = stillOn ? 'Supply: current still flows at turn-on' : 'No current left at turn-on';
  sheet.give('V_on', stillOn ? condition.supplyV : 0, why);
  sheet.apply('loss-coil', { stated });
}
