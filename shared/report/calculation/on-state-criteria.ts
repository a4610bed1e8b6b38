import type { CriterionId } from '../../checks/criteria.ts';
import { isHighSide } from '../../stage/drive-source.ts';
import type { SymbolId } from '../../method/symbols.ts';
import { toleranceLine } from './corner-source.ts';
import {
  cite,
  type CriterionSource,
  deratedLimit,
  givenLimit,
  resistorLimit,
} from './criterion-source.ts';
import { inputOnLines, lampLines, lampPeakLines } from './load-criteria.ts';

/** Writes a criterion’s figure and limit; gives the symbol of the figure, null where there is none to work. */
export type CriterionLines = (source: CriterionSource) => SymbolId | null;

function forcedBeta(source: CriterionSource): SymbolId {
  const { sheet, input, point, criterion } = source;
  const { policy } = input;
  const { saturation, junctions } = point.model.part;
  cite(source, 'b_f');
  if (junctions > 1 && saturation !== null) {
    givenLimit(source, saturation.testBeta[point.piece] ?? 0, 'VCE(sat) rows in use: IC/IB');
  } else if (!policy.guaranteedOnly || saturation === null) {
    givenLimit(source, policy.forcedBeta, 'Policy, forced β');
  } else if (criterion.limit !== null) {
    sheet.apply('forced-beta-limit', {
      stated: criterion.limit,
      put: {
        b_pol: [policy.forcedBeta, 'Policy, forced β'],
        b_t: [saturation.testBeta[point.piece] ?? 0, 'VCE(sat) rows in use: IC/IB'],
      },
    });
  }
  return 'b_f';
}

function driveCurrent(source: CriterionSource): SymbolId {
  const { sheet, input, criterion } = source;
  const { drive, policy } = input;
  const open = drive.kind === 'open-collector';
  const sinks = isHighSide(input) || open;
  let figure: SymbolId = 'I_R';
  if (open && !isHighSide(input)) {
    figure = 'I_pu';
    pullUpAtLeast(source);
    sheet.apply('pull-up-current', { stated: criterion.value ?? NaN });
  } else if (source.point.model.inside?.byInput === true) figure = cite(source, 'I_I');
  else cite(source, 'I_R');
  const rating = sinks ? drive.sinkLimitA : drive.sourceLimitA;
  deratedLimit(source, rating, policy.driveDerating, `Output, ${sinks ? 'sink' : 'source'} limit`);
  return figure;
}

/** The rail at its highest and the pull-up at its least. */
function pullUpAtLeast({ sheet, input, point }: CriterionSource): void {
  const { drive } = input;
  const tracks = drive.railTracksSupply;
  const railV = tracks ? point.condition.supplyV : drive.railV.max;
  sheet.give('V_r', railV, tracks ? 'Supply of the corner' : 'Rail, max');
  if (drive.pullUp !== null) toleranceLine(sheet, 'R_pu', drive.pullUp, -1, 'Pull-up');
}

function dissipation(source: CriterionSource): SymbolId {
  const { sheet, input, criterion } = source;
  const { limits } = input.transistor;
  cite(source, 'P');
  if (limits.powerW === null || criterion.limit === null) return 'P';
  if (limits.tjMaxDegC <= 25) sheet.give('L', criterion.limit, 'Part, rated power');
  else {
    sheet.apply('power-limit', {
      stated: criterion.limit,
      put: {
        d: [input.policy.powerDerating, 'Policy, derating'],
        P_tot: [limits.powerW, 'Part, rated power'],
        T_Jmax: [limits.tjMaxDegC, 'Part, highest junction temperature'],
      },
    });
  }
  return 'P';
}

function baseResistor(source: CriterionSource): SymbolId {
  const { sheet, criterion, input, point } = source;
  sheet.apply('rb-power', {
    stated: criterion.value ?? NaN,
    put: { I_R: [point.driveA, 'Drive current of the corner'] },
  });
  resistorLimit(source, input.baseResistor.ratingW, 'RB, rating');
  return 'P_RB';
}

function shuntResistor(source: CriterionSource): SymbolId {
  const { sheet, criterion, input } = source;
  sheet.apply('rbe-power', { stated: criterion.value ?? NaN });
  resistorLimit(source, input.shuntResistor?.ratingW ?? null, 'RBE, rating');
  return 'P_RBE';
}

function pullUp(source: CriterionSource): SymbolId {
  const { sheet, criterion, input } = source;
  pullUpAtLeast(source);
  sheet.apply('pull-up-power', { stated: criterion.value ?? NaN });
  resistorLimit(source, input.drive.pullUp?.ratingW ?? null, 'Pull-up, rating');
  return 'P_pu';
}

function coilVoltage(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input } = source;
  const { load, frequencyHz, duty } = input;
  if (load.kind !== 'coil') return null;
  const stated = criterion.value ?? NaN;
  if (frequencyHz > 0) {
    sheet.apply('mean-voltage', { stated, put: { D: [duty, 'Stage, duty'] } });
    givenLimit(source, load.holdV, 'Load, holding voltage');
    return 'V_m';
  }
  sheet.apply('coil-voltage', { stated });
  if (load.operateV !== null && criterion.limit !== null) {
    sheet.apply('operate-limit', {
      stated: criterion.limit,
      put: {
        V_op: [load.operateV, 'Load, must-operate voltage'],
        T_op: [
          load.operateReferenceDegC ?? load.referenceDegC,
          'Load, temperature of that voltage',
        ],
      },
    });
  }
  return 'V_coil';
}

function overvoltage(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input } = source;
  const { load } = input;
  if (load.kind !== 'coil') return null;
  sheet.apply('coil-voltage', { stated: criterion.value ?? NaN });
  if (load.maximumV === null || criterion.limit === null) return 'V_coil';
  const reference = load.maximumReferenceDegC ?? load.referenceDegC;
  if (load.coilMaxDegC === null || load.coilMaxDegC <= reference) {
    sheet.give('L', criterion.limit, 'Load, highest voltage');
    return 'V_coil';
  }
  sheet.apply('overvoltage-limit', {
    stated: criterion.limit,
    put: {
      V_max: [load.maximumV, 'Load, highest voltage'],
      T_cm: [load.coilMaxDegC, 'Load, highest coil temperature'],
      T_mr: [reference, 'Load, ambient that voltage holds at'],
    },
  });
  return 'V_coil';
}

function collectorCurrent(source: CriterionSource): SymbolId {
  const { input } = source;
  cite(source, 'I_C');
  deratedLimit(source, input.transistor.limits.icA, input.policy.currentDerating, 'Part, IC');
  return 'I_C';
}

function peakCurrent(source: CriterionSource): SymbolId {
  const { input } = source;
  const { icPeakA, icA } = input.transistor.limits;
  const figure = input.load.kind === 'lamp' ? lampPeakLines(source) : cite(source, 'I_C');
  const rating = icPeakA === null ? 'Part, IC: no ICM is printed' : 'Part, ICM';
  deratedLimit(source, icPeakA ?? icA, input.policy.currentDerating, rating);
  return figure;
}

function outputLow(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input } = source;
  if (input.load.kind !== 'logic-input') return null;
  sheet.apply('low-level', {
    stated: criterion.value ?? NaN,
    put: { V_gs: [input.drive.groundShiftV, 'Drive, ground shift'] },
  });
  givenLimit(source, input.load.vilV, 'Load, VIL');
  return 'V_low';
}

function collectorResistor(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input } = source;
  const { load } = input;
  if (load.kind !== 'logic-input') return null;
  const rc = { valueOhm: load.pullUpOhm, tolerance: load.tolerance };
  toleranceLine(sheet, 'R_C', rc, -1, 'RC');
  sheet.apply('rc-power', { stated: criterion.value ?? NaN });
  resistorLimit(source, load.ratingW, 'RC, rating');
  return 'P_RC';
}

function loadCurrent(source: CriterionSource): SymbolId | null {
  const { input } = source;
  if (input.load.kind !== 'led-string') return null;
  cite(source, 'I_C');
  deratedLimit(source, input.load.maximumA, input.policy.currentDerating, 'LED, highest current');
  return 'I_C';
}

function leastLoadCurrent(source: CriterionSource): SymbolId | null {
  const { input } = source;
  if (input.load.kind !== 'led-string') return null;
  cite(source, 'I_C');
  givenLimit(source, input.load.minimumA, 'LED, least current');
  return 'I_C';
}

function baseCurrent(source: CriterionSource): SymbolId {
  const { input, point } = source;
  const figure = cite(source, point.model.inside?.byInput === true ? 'I_I' : 'I_B');
  deratedLimit(source, input.transistor.limits.ibA, input.policy.currentDerating, 'Part, IB');
  return figure;
}

function junction(source: CriterionSource): SymbolId {
  const { input } = source;
  cite(source, 'T_J');
  const { tjMaxDegC } = input.transistor.limits;
  deratedLimit(
    source,
    tjMaxDegC,
    input.policy.junctionDerating,
    'Part, highest junction temperature',
  );
  return 'T_J';
}

function overdrive(source: CriterionSource): SymbolId {
  givenLimit(source, source.input.policy.overdriveFactor, 'Policy, overdrive factor');
  return cite(source, 'ODF');
}

function saturation(source: CriterionSource): SymbolId {
  givenLimit(source, source.input.saturationLimitV, 'Stage, own budget');
  return cite(source, 'V_CE');
}

/** Criteria of the on state. */
export const ON_STATE_LINES: Partial<Record<CriterionId, CriterionLines>> = {
  'overdrive-factor': overdrive,
  'input-on': (source) => inputOnLines(source, false),
  'input-voltage': (source) => inputOnLines(source, true),
  'forced-beta': forcedBeta,
  'load-voltage': coilVoltage,
  'saturation-voltage': saturation,
  'drive-current': driveCurrent,
  'collector-current': collectorCurrent,
  'junction-temperature': junction,
  dissipation,
  'base-current': baseCurrent,
  'peak-current': peakCurrent,
  'load-current': loadCurrent,
  'load-current-low': leastLoadCurrent,
  'inrush-saturation': lampLines,
  'output-low': outputLow,
  'rc-dissipation': collectorResistor,
  'load-overvoltage': overvoltage,
  'rb-dissipation': baseResistor,
  'rbe-dissipation': shuntResistor,
  'pull-up-dissipation': pullUp,
};
