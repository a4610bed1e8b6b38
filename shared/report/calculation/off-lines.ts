import { SHEET_DEG_C } from '../../physics/constants.ts';
import { isHighSide } from '../../stage/drive-source.ts';
import { type CornerSource, thermalVoltageLine } from './corner-source.ts';
import { exponentLine } from './operating-lines.ts';
import { leakageLines, maximumGainLines } from './row-lines.ts';
import type { SymbolId } from '../../method/symbols.ts';
import type { Worksheet } from './worksheet.ts';

/** Leakage of a settled corner: into the base, and what only the collector sees. */
function leakage(sheet: Worksheet, { point, input }: CornerSource): void {
  if (sheet.has('I_leak')) return;
  const { part } = point.model;
  if (part.leakage === null) sheet.give('I_leak', 0, 'No leakage row: open');
  else leakageLines(sheet, part.leakage, point.tjDegC, input.policy.leakageDoublingK);
  if (part.junctions > 1) sheet.give('I_CBO', 0, 'Darlington: its rows are collector figures');
  else sheet.give('I_CBO', sheet.value('I_leak'), 'The leakage above');
}

/** Base–emitter voltage with the output or RBE alone holding the base off. */
export function heldVoltageLines(sheet: Worksheet, source: CornerSource): void {
  leakage(sheet, source);
  const { input, off } = source;
  const { drive } = input;
  const stated = off.vbeV;
  if (isHighSide(input) && drive.kind === 'open-collector') {
    sheet.give('I_lk', drive.leakageA, outputLeak(source));
    sheet.apply('off-shunt', { stated });
    return;
  }
  if (sheet.has('R_BE')) sheet.apply('parallel');
  else sheet.give('R_p', source.point.rbOhm, 'RB alone');
  if (isHighSide(input)) {
    highLevel(sheet, source);
    sheet.apply('off-pnp', { stated });
  } else {
    lowLevel(sheet, source);
    sheet.apply('off-npn', { stated });
  }
}

const outputLeak = ({ side }: CornerSource) =>
  side === 'behind' ? 'Transistor in front, off' : 'Output, off-state leakage';

export function lowLevel(sheet: Worksheet, { input }: CornerSource): void {
  const { low, groundShiftV } = input.drive;
  const where = low.unloadedV === null ? 'Low output' : 'Low output, at no load';
  sheet.give('V_OL', low.unloadedV ?? low.levelV, where);
  sheet.give('V_gs', groundShiftV, 'Drive, ground shift');
}

function highLevel(sheet: Worksheet, { input, point }: CornerSource): void {
  const { drive } = input;
  const tracks = drive.railTracksSupply;
  sheet.apply('high-level', {
    put: {
      V_r: [
        tracks ? point.condition.supplyV : drive.railV.min,
        tracks ? 'Supply of the corner' : 'Rail, min',
      ],
      V_unl: [drive.high?.unloadedDropV ?? 0, 'High output, at no load'],
    },
  });
}

/** Collector current for a base–emitter voltage that stands on the sheet. */
function anchoredLine(
  sheet: Worksheet,
  { point }: CornerSource,
  voltage: SymbolId,
  as: SymbolId,
  stated: number,
): void {
  const { anchor, junctions, vbeTempcoVPerK } = point.model.part;
  if (anchor === null) {
    sheet.give(as, stated, 'No IC rating: no anchor row');
    return;
  }
  thermalVoltageLine(sheet, 'V_T');
  sheet.give('a_BE', vbeTempcoVPerK, 'Policy, VBE over temperature');
  const row = 'Lowest VBE row up to IC(max)/10, else usual minimum at IC(max)/100';
  sheet.apply('anchor-temperature', { put: { V_a25: [anchor.vbeV, row] } });
  sheet.apply('off-current', {
    as,
    stated,
    put: {
      V_off: voltage,
      I_an: [anchor.icA, row],
      n_j: [junctions, 'Junctions in series'],
    },
  });
}

/** Collector current with nothing but leakage at the base. */
function openLine(sheet: Worksheet, source: CornerSource, as: SymbolId, stated: number): void {
  const { point } = source;
  const { gain } = point.model.part;
  if (gain === null) {
    sheet.give(as, stated, 'No hFE row: the whole load current');
    return;
  }
  const baseA = sheet.value('I_CBO') + sheet.value('I_pin');
  sheet.give('I', baseA, 'Leakage and pin current together');
  largestGainLines(sheet, source, { symbol: 'I', icA: baseA });
  const besides = point.model.part.junctions > 1 ? sheet.value('I_leak') : 0;
  sheet.apply('off-current-open', {
    as,
    stated,
    put: { I_bes: [besides, 'Collector leakage of a Darlington, else 0'] },
  });
}

/** Largest hFE of a corner at another current, at its junction temperature. */
export function largestGainLines(
  sheet: Worksheet,
  source: CornerSource,
  at: { readonly symbol: SymbolId; readonly icA: number },
): void {
  const { point } = source;
  const { gain } = point.model.part;
  if (gain === null) return;
  const stated = point.mostGainAt(at.icA);
  const hot = point.tjDegC > SHEET_DEG_C;
  if (hot) exponentLine(sheet, source);
  maximumGainLines(
    sheet,
    gain,
    at,
    'h_max25',
    hot ? stated / factor(point.tjDegC, gain.exponent) : stated,
  );
  sheet.apply(hot ? 'gain-temperature' : 'gain-plain', {
    as: 'h_max',
    stated,
    put: { h_FE25: 'h_max25' },
  });
}

const factor = (degC: number, exponent: number) => Math.pow((degC + 273.15) / 298.15, exponent);

/** Collector current while off. */
export function offCurrentLines(sheet: Worksheet, source: CornerSource): void {
  const { off } = source;
  if (off.baseOpen) {
    leakage(sheet, source);
    sheet.give('I_pin', source.input.drive.leakageA, outputLeak(source));
    openLine(sheet, source, 'I_off', off.collectorA);
    return;
  }
  heldVoltageLines(sheet, source);
  anchoredLine(sheet, source, 'V_off', 'I_off', off.collectorA);
}

/** Base–emitter voltage in reset, or with the base open the collector current. */
export function resetLines(sheet: Worksheet, source: CornerSource, current: boolean): void {
  const { off, input } = source;
  const { reset } = input.drive;
  if (reset === null) return;
  if (reset.kind === 'driven-low') {
    heldVoltageLines(sheet, source);
    sheet.give('V_rst', off.resetVbeV, 'Held as in the off state');
    if (current) anchoredLine(sheet, source, 'V_off', 'I_rst', off.resetCollectorA);
    return;
  }
  leakage(sheet, source);
  pinLines(sheet, source);
  if (off.resetOpen) {
    openLine(sheet, source, 'I_rst', off.resetCollectorA);
    return;
  }
  sheet.apply('reset-voltage', { stated: off.resetVbeV });
  if (current) anchoredLine(sheet, source, 'V_rst', 'I_rst', off.resetCollectorA);
}

function pinLines(sheet: Worksheet, { input, point }: CornerSource): void {
  const { drive } = input;
  const { reset } = drive;
  if (reset?.kind !== 'pull-up') {
    sheet.give('I_pin', reset?.leakageA ?? 0, 'Pin in reset, leakage');
    return;
  }
  const tracks = drive.railTracksSupply;
  const railV = tracks ? point.condition.supplyV : drive.railV.max;
  sheet.apply('pin-pull-up', {
    put: {
      V_r: [railV, tracks ? 'Supply of the corner' : 'Rail, max'],
      R_pu: [reset.pullUpOhm ?? 0, 'Pull-up in reset'],
      R_BE: sheet.has('R_BE') ? 'R_BE' : [0, 'No RBE'],
    },
  });
}

/** What pulls the base beyond its emitter. */
export function reverseLines(sheet: Worksheet, source: CornerSource): void {
  const { input, off, point } = source;
  const { drive, speedUpCapacitorF } = input;
  if (isHighSide(input)) {
    if (drive.railTracksSupply) sheet.give('V_bk', 0, 'The output runs from the load’s supply');
    else sheet.apply('back-pnp', { put: { V_r: [drive.railV.max, 'Rail, max'] } });
  } else sheet.apply('back-npn', { put: { V_gs: [drive.groundShiftV, 'Drive, ground shift'] } });
  const driven = !(isHighSide(input) && drive.kind === 'open-collector');
  if ((speedUpCapacitorF ?? 0) > 0 && driven) {
    sheet.apply('swing-capacitor', {
      put: { I_R: [point.driveA, 'Drive current of the corner'] },
    });
  } else sheet.give('V_sw', 0, 'No speed-up capacitor');
  const stated = off.reverseV;
  sheet.apply(sheet.has('R_BE') ? 'reverse-shunted' : 'reverse-plain', { stated });
}
