import type { CriterionId } from '../../checks/criteria.ts';
import type { SymbolId } from '../../method/symbols.ts';
import { toleranceLine } from './corner-source.ts';
import { clampLines } from './clamp-lines.ts';
import { type CriterionSource, deratedLimit, givenLimit } from './criterion-source.ts';
import {
  heldVoltageLines,
  lowLevel,
  offCurrentLines,
  resetLines,
  reverseLines,
} from './off-lines.ts';
import type { CriterionLines } from './on-state-criteria.ts';

function voltageLimit({ sheet, criterion, input, point }: CriterionSource): void {
  if (criterion.limit === null) return;
  const { junctions, vbeTempcoVPerK } = point.model.part;
  sheet.apply('policy-off-voltage', {
    stated: criterion.limit,
    put: {
      n_j: [junctions, 'Junctions in series'],
      V_offB: [input.policy.offBaseV, 'Policy, VBE while off'],
      a_BE: [vbeTempcoVPerK, 'Policy, VBE over temperature'],
    },
  });
}

function currentLimit(source: CriterionSource): void {
  const { sheet, criterion, input, point } = source;
  const { load, policy } = input;
  if (criterion.limit === null) return;
  const stated = criterion.limit;
  if (load.kind === 'coil' && load.releaseV !== null) {
    sheet.apply('release-share', {
      stated,
      put: {
        V_rel: [load.releaseV, 'Load, release voltage'],
        R_n: [load.resistanceOhm, 'Load, resistance'],
      },
    });
  } else if (load.kind === 'resistor' || load.kind === 'lamp') {
    sheet.apply('load-share', {
      stated,
      put: {
        I_offp: [policy.offCurrentA, 'Policy, current while off'],
        I_C: [point.icA, 'Collector current of the corner while on'],
      },
    });
  } else sheet.give('L', stated, 'Policy, current while off');
}

function offBase(source: CriterionSource): SymbolId {
  heldVoltageLines(source.sheet, source);
  voltageLimit(source);
  return 'V_off';
}

function offCurrent(source: CriterionSource): SymbolId {
  offCurrentLines(source.sheet, source);
  currentLimit(source);
  return 'I_off';
}

function outputHigh(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input } = source;
  const { load } = input;
  if (load.kind !== 'logic-input') return null;
  offCurrentLines(sheet, source);
  const rc = { valueOhm: load.pullUpOhm, tolerance: load.tolerance };
  toleranceLine(sheet, 'R_C', rc, 1, 'RC');
  sheet.apply('output-high', {
    stated: criterion.value ?? NaN,
    put: {
      n: [load.count, 'Load, inputs'],
      I_IH: [load.leakageA, 'Load, high-level current'],
    },
  });
  givenLimit(source, load.vihV, 'Load, VIH');
  return 'V_OH';
}

function offVoltage(source: CriterionSource): SymbolId {
  const { input } = source;
  deratedLimit(source, input.transistor.limits.vceoV, input.policy.voltageDerating, 'Part, VCEO');
  return 'V_S';
}

function reset(source: CriterionSource): SymbolId {
  resetLines(source.sheet, source, false);
  if (source.off.resetOpen) {
    currentLimit(source);
    return 'I_rst';
  }
  voltageLimit(source);
  return 'V_rst';
}

function resetCurrent(source: CriterionSource): SymbolId {
  resetLines(source.sheet, source, true);
  currentLimit(source);
  return 'I_rst';
}

function reverse(source: CriterionSource): SymbolId {
  reverseLines(source.sheet, source);
  givenLimit(source, source.input.transistor.limits.veboV, 'Part, VEBO');
  return 'V_EBr';
}

function inputOff(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input } = source;
  lowLevel(sheet, source);
  sheet.apply('input-low', { stated: criterion.value ?? NaN });
  givenLimit(source, input.transistor.internal?.input?.offV ?? null, 'Part, VI(off)');
  return 'V_offI';
}

function driveMaximum(source: CriterionSource): SymbolId {
  const { sheet, criterion } = source;
  sheet.give('V_Omax', criterion.value ?? NaN, 'Output, highest voltage');
  givenLimit(source, criterion.limit, 'Supply, max');
  return 'V_Omax';
}

function peakVoltage(source: CriterionSource): SymbolId {
  const { sheet, input } = source;
  clampLines(sheet, source);
  deratedLimit(source, input.transistor.limits.vceoV, input.policy.voltageDerating, 'Part, VCEO');
  return 'V_pk';
}

function surge(source: CriterionSource): SymbolId {
  const { sheet, criterion, input, point } = source;
  const { clamp } = point.model;
  clampLines(sheet, source);
  const across = clamp !== null && clamp.standOffV !== null;
  const surgeV = input.supplyV.surge ?? 0;
  const put = { V_sg: [surgeV, 'Supply, surge'] } as const;
  const none = across ? 'Clamp across the transistor: adds nothing' : 'No clamp across the coil';
  sheet.apply('surge-voltage', {
    stated: criterion.value ?? NaN,
    put: clamp === null || across ? { ...put, V_cl: [0, none] } : put,
  });
  const { vceoV } = input.transistor.limits;
  if (vceoV === null || criterion.limit === null) return 'V_CEs';
  const standOffV = clamp?.standOffV ?? Infinity;
  sheet.apply('surge-limit', {
    stated: criterion.limit,
    put: {
      V_CEO: [vceoV, 'Part, VCEO'],
      V_so: [standOffV, across ? 'Clamp, stand-off' : 'No clamp across the transistor'],
    },
  });
  return 'V_CEs';
}

function holding(source: CriterionSource): SymbolId | null {
  const { sheet, input } = source;
  if (input.load.kind !== 'coil') return null;
  sheet.give('V_dip', input.supplyV.dip ?? NaN, 'Supply, dip');
  givenLimit(source, input.load.holdV, 'Load, holding voltage');
  return 'V_dip';
}

function release(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input } = source;
  const { load } = input;
  if (load.kind !== 'coil' || load.inductanceH === null || load.releaseV === null) return null;
  clampLines(sheet, source);
  sheet.give('L_c', load.inductanceH, 'Load, inductance');
  const releaseA = sheet.apply('release-current', {
    put: {
      V_rel: [load.releaseV, 'Load, release voltage'],
      R_n: [load.resistanceOhm, 'Load, resistance'],
    },
  });
  const stated = criterion.value ?? NaN;
  if (source.point.icA <= releaseA) sheet.give('t_rel', stated, 'The current starts below release');
  else sheet.apply('release-time', { stated });
  givenLimit(source, load.releaseTimeLimitSec, 'Load, release time limit');
  return 't_rel';
}

function clampCurrent(source: CriterionSource): SymbolId {
  const { input } = source;
  deratedLimit(source, input.clamp.currentRatingA, input.policy.currentDerating, 'Clamp, current');
  return 'I_C';
}

function clampPower(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, input, point } = source;
  const { load } = input;
  const { clamp } = point.model;
  if (load.kind !== 'coil' || load.inductanceH === null || clamp === null) return null;
  clampLines(sheet, source);
  sheet.give('f', input.frequencyHz, 'Stage, frequency');
  sheet.give('D', input.duty, 'Stage, duty');
  const stated = criterion.value ?? NaN;
  if (clamp.largestV > 0) {
    sheet.give('L_c', load.inductanceH, 'Load, inductance');
    sheet.apply('clamp-charge');
    sheet.apply(clamp.standOffV === null ? 'clamp-energy' : 'clamp-energy-across');
    sheet.apply('clamp-power', { stated });
  } else sheet.apply('clamp-power-steady', { stated });
  deratedLimit(source, input.clamp.powerRatingW, input.policy.powerDerating, 'Clamp, power');
  return 'P_cl';
}

/** Criteria of the off state and of turn-off. */
export const OFF_STATE_LINES: Partial<Record<CriterionId, CriterionLines>> = {
  'off-base-voltage': offBase,
  'input-off': inputOff,
  'off-collector-current': offCurrent,
  'output-high': outputHigh,
  'off-collector-voltage': offVoltage,
  'reset-off': reset,
  'reset-off-current': resetCurrent,
  'reverse-base-voltage': reverse,
  'drive-maximum': driveMaximum,
  'peak-collector-voltage': peakVoltage,
  'surge-voltage': surge,
  'holding-voltage': holding,
  'release-time': release,
  'clamp-current': clampCurrent,
  'clamp-power': clampPower,
};
