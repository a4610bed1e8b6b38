import type { CriterionId } from '../../checks/criteria.ts';
import { isHighSide } from '../../stage/drive-source.ts';
import { minimumGain } from '../../physics/gain.ts';
import type { SymbolId } from '../../method/symbols.ts';
import { toleranceLine } from './corner-source.ts';
import { type CriterionSource, givenLimit } from './criterion-source.ts';
import { largestGainLines } from './off-lines.ts';
import type { CriterionLines } from './on-state-criteria.ts';
import { minimumGainLines, vbeLines } from './row-lines.ts';

/** Storage time of the corner; false where the part does not print what it is worked from. */
function storageLines(source: CriterionSource): boolean {
  const { sheet, input, point } = source;
  const row = input.transistor.switching;
  const { gain } = point.model.part;
  if (gain === null || row?.tsSec == null || row.icA === null) return false;
  if (row.ib1A === null || row.ib2A === null) return false;
  const printed = 'Part, switching row';
  sheet.give('I_Cr', row.icA, printed);
  sheet.give('I_B1', row.ib1A, printed);
  sheet.give('I_B2', row.ib2A, printed);
  const at = { symbol: 'I_Cr', icA: row.icA } as const;
  minimumGainLines(sheet, gain, at, 'h_r', minimumGain(gain, row.icA));
  const constantSec = sheet.apply('storage-constant', { put: { t_s0: [row.tsSec, printed] } });
  if (!(constantSec > 0)) return false;
  outLines(source);
  largestGainLines(sheet, source, { symbol: 'I_C', icA: point.icA });
  sheet.apply('storage-warm');
  if (!(point.ibA > point.icA / sheet.value('h_max'))) {
    sheet.give('t_s', 0, 'Not saturated: nothing stored');
    return true;
  }
  sheet.apply('storage-time', { put: sheet.has('I_B') ? {} : { I_B: 'I_I' } });
  return true;
}

/** Current that leaves the base at turn-off. */
function outLines(source: CriterionSource): void {
  const { sheet, input, point } = source;
  const { condition, model } = point;
  const { drive } = input;
  const at = { symbol: 'I_full', icA: condition.fullA } as const;
  vbeLines(sheet, model.part, false, at, 'V_BEm25', condition.vbeMinV);
  sheet.give('a_BE', model.part.vbeTempcoVPerK, 'Policy, VBE over temperature');
  sheet.apply('vbe-least');
  if (input.shuntResistor === null) sheet.give('R_BEx', Infinity, 'No RBE');
  else toleranceLine(sheet, 'R_BEx', input.shuntResistor, 1, 'RBE');
  if (isHighSide(input) && drive.kind === 'open-collector') {
    sheet.apply('turn-off-shunt');
    return;
  }
  const rb = { valueOhm: point.chosenRbOhm, tolerance: input.baseResistor.tolerance };
  toleranceLine(sheet, 'R_Bx', rb, 1, 'RB');
  if (isHighSide(input) && drive.high !== null) pnpLeft(source, drive.high);
  else {
    const { levelV, unloadedV, currentA } = drive.low;
    sheet.apply('low-resistance', {
      put: { V_d: [levelV, 'Low output, level'], I_OH: [currentA, 'Low output, tested current'] },
    });
    sheet.apply('left-npn', {
      put: {
        V_OL: [unloadedV ?? levelV, 'Low output'],
        V_gs: [drive.groundShiftV, 'Drive, ground shift'],
      },
    });
  }
  sheet.apply('turn-off-current');
}

function pnpLeft(
  { sheet, input, point }: CriterionSource,
  high: NonNullable<CriterionSource['input']['drive']['high']>,
): void {
  const { drive } = input;
  const put = {
    V_d: [high.dropV, 'High output, drop'],
    V_unl: [high.unloadedDropV, 'High output, at no load'],
    I_OH: [high.currentA, 'High output, tested current'],
  } as const;
  sheet.apply('source-resistance', { as: 'R_O', put });
  const tracks = drive.railTracksSupply;
  const railV = tracks ? point.condition.supplyV : drive.railV.min;
  sheet.apply('left-pnp', {
    put: {
      V_r: [railV, tracks ? 'Supply of the corner' : 'Rail, min'],
      V_unl: put.V_unl,
    },
  });
}

function storage(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input } = source;
  const fallSec = input.transistor.switching?.tfSec;
  if (fallSec == null || !storageLines(source)) return null;
  sheet.apply('storage-and-fall', {
    stated: criterion.value ?? NaN,
    put: { t_f: [fallSec, 'Part, fall time'] },
  });
  if (input.storageTimeLimitSec !== null) {
    givenLimit(source, input.storageTimeLimitSec, 'Stage, own limit');
  } else if (criterion.limit !== null) {
    sheet.apply('period-share', {
      stated: criterion.limit,
      put: { D: [input.duty, 'Stage, duty'], f: [input.frequencyHz, 'Stage, frequency'] },
    });
  }
  return 't_sf';
}

/** Time constant at a logic input; false where its capacitance is not stated. */
function constantLines({ sheet, input }: CriterionSource): boolean {
  const { load, transistor } = input;
  if (load.kind !== 'logic-input' || load.capacitanceF === null) return false;
  const rc = { valueOhm: load.pullUpOhm, tolerance: load.tolerance };
  toleranceLine(sheet, 'R_C', rc, 1, 'RC');
  sheet.apply('rise-constant', {
    put: {
      C_in: [load.capacitanceF, 'Load, inputs together'],
      C_w: [load.wiringF ?? 0, 'Load, wiring'],
      C_ob: [transistor.capacitanceF ?? 0, 'Part, output capacitance'],
    },
  });
  return true;
}

function rise(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input } = source;
  if (!constantLines(source) || input.load.kind !== 'logic-input') return null;
  sheet.apply('rise-time', { stated: criterion.value ?? NaN });
  givenLimit(source, input.load.riseTimeLimitSec, 'Load, own limit');
  return 't_rise';
}

function lowToHigh(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input } = source;
  const { load } = input;
  if (load.kind !== 'logic-input' || !constantLines(source) || !storageLines(source)) return null;
  sheet.apply('low-level', { put: { V_gs: [input.drive.groundShiftV, 'Drive, ground shift'] } });
  sheet.apply('low-to-high', {
    stated: criterion.value ?? NaN,
    put: { V_IH: [load.vihV, 'Load, VIH'] },
  });
  return 't_LH';
}

function testedRange(source: CriterionSource): SymbolId {
  const { sheet, criterion, beyondRows } = source;
  const count = (name: string): readonly [number, string] => {
    const used = beyondRows.includes(name);
    return [
      used ? 1 : 0,
      `${name}: ${used ? 'used above its last tested row' : 'within its rows'}`,
    ];
  };
  sheet.apply('tested-sum', {
    stated: criterion.value ?? NaN,
    put: {
      n_h: count('hFE'),
      n_V: count('VCE(sat)'),
      n_B: count('VBE(sat)'),
      n_O: count('output current'),
    },
  });
  givenLimit(source, 0, 'None may be');
  return 'n_x';
}

/** Criteria of switching, logic inputs and the tested range. */
export const SWITCHING_LINES: Partial<Record<CriterionId, CriterionLines>> = {
  'storage-time': storage,
  'rise-time': rise,
  'low-to-high-delay': lowToHigh,
  'tested-range': testedRange,
};
