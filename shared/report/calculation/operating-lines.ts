import { SHEET_DEG_C } from '../../physics/constants.ts';
import {
  atEnd,
  type CornerSource,
  signOf,
  thermalVoltageLine,
  toleranceLine,
} from './corner-source.ts';
import { insideGain } from '../../stage/internal-resistors.ts';
import { maximumGainLines, minimumGainLines, vbeLines } from './row-lines.ts';
import { saturationLines } from './saturation-lines.ts';
import { powerLines } from './power-lines.ts';
import type { Worksheet } from './worksheet.ts';

/** Base resistor, gain, VBE, base current, saturation and dissipation of a corner. */
export function operatingLines(sheet: Worksheet, source: CornerSource): void {
  resistorLines(sheet, source);
  const byInput = source.point.model.inside?.byInput === true;
  if (byInput) inputLines(sheet, source);
  else baseLines(sheet, source);
  saturationLines(sheet, source);
  powerLines(sheet, source);
}

function resistorLines(sheet: Worksheet, source: CornerSource): void {
  const { point, input } = source;
  const { inside } = point.model;
  const { internal } = input.transistor;
  const { tolerance } = input.baseResistor;
  const outer = { valueOhm: point.chosenRbOhm, tolerance };
  toleranceLine(sheet, 'R_Bo', outer, signOf(source, 'rb'), 'RB', point.outerRbOhm);
  if (inside === null || internal === null) {
    sheet.give('R_B', point.rbOhm, 'RB');
    if (input.shuntResistor !== null) {
      toleranceLine(sheet, 'R_BE', input.shuntResistor, signOf(source, 'rbe'), 'RBE', point.rbeOhm);
    }
    return;
  }
  const r1 = { valueOhm: internal.r1Ohm, tolerance: internal.r1Tolerance };
  const end = inside.r1Ohm[atEnd(source, 'r1', '+') ? 1 : 0];
  toleranceLine(sheet, 'R_1', r1, signOf(source, 'r1'), 'R1', end);
  sheet.apply('base-series', { stated: point.rbOhm });
  if (inside.ratio === null) return;
  ratioLines(sheet, internal, signOf(source, 'ratio'));
  sheet.apply('shunt-inside', { stated: point.rbeOhm });
}

type Internal = NonNullable<CornerSource['input']['transistor']['internal']>;

/** R2/R1 at an end of its tolerance. */
export function ratioLines(sheet: Worksheet, internal: Internal, sign: number): void {
  sheet.apply('ratio-nominal', {
    put: {
      R_1n: [internal.r1Ohm, 'R1, nominal'],
      R_2n: [internal.r2Ohm ?? 0, 'R2, nominal'],
    },
  });
  sheet.apply('ratio-tolerance', {
    put: { t: [sign * internal.ratioTolerance, 'R2/R1, tolerance'] },
  });
}

/** X of hFE over temperature: the part’s own or the policy’s. */
export function exponentLine(sheet: Worksheet, { point }: CornerSource): void {
  const { gain, junctions } = point.model.part;
  if (gain === null || sheet.has('X')) return;
  const own = coldPair(point.model);
  if (own === null) {
    const twice = junctions > 1 ? ', twice for a Darlington' : '';
    sheet.give('X', gain.exponent, `Policy${twice}`);
    return;
  }
  sheet.apply('gain-exponent', {
    stated: gain.exponent,
    put: {
      h_w: [own.warm, 'hFE min at 25 °C of the cold pair'],
      h_k: [own.cold, 'hFE min of the cold row'],
      T_c: [own.degC, 'Cold row, temperature'],
    },
  });
}

/** The pair of rows that gives the largest exponent. */
function coldPair({ input, inside }: CornerSource['point']['model']) {
  const printed = input.transistor.gain;
  const rows = inside === null ? printed : insideGain(printed, inside);
  let best: { warm: number; cold: number; degC: number; steep: number } | null = null;
  for (const { tempDegC, min, icA } of rows) {
    if (tempDegC >= SHEET_DEG_C || min === null) continue;
    for (const row of rows) {
      const fits = row.tempDegC === SHEET_DEG_C && row.icA === icA && row.min !== null;
      if (!fits) continue;
      const steep = Math.log(row.min / min) / Math.log(298.15 / (tempDegC + 273.15));
      if (best === null || steep > best.steep) {
        best = { warm: row.min, cold: min, degC: tempDegC, steep };
      }
    }
  }
  return best;
}

function baseLines(sheet: Worksheet, source: CornerSource): void {
  const { point } = source;
  const { condition, model, tjDegC } = point;
  const { gain, vbeTempcoVPerK } = model.part;
  const at = { symbol: 'I_full', icA: condition.fullA } as const;
  if (gain !== null) {
    const high = atEnd(source, 'gain', 'max');
    const stated = high ? condition.gainMax : condition.gainMin;
    (high ? maximumGainLines : minimumGainLines)(sheet, gain, at, 'h_FE25', stated);
    const penalty = high ? tjDegC > SHEET_DEG_C : tjDegC < SHEET_DEG_C;
    if (penalty) exponentLine(sheet, source);
    sheet.apply(penalty ? 'gain-temperature' : 'gain-plain', { stated: point.gain });
  }
  const largest = atEnd(source, 'vbe', 'max');
  const vbeV = largest ? condition.vbeMaxV : condition.vbeMinV;
  thermalVoltageLine(sheet, 'V_T25');
  vbeLines(sheet, model.part, largest, at, 'V_BE25', vbeV);
  sheet.give('a_BE', vbeTempcoVPerK, 'Policy, VBE over temperature');
  sheet.apply('vbe-temperature', { stated: point.vbeV });
  if (point.beyondPin) {
    beyondLines(sheet, source);
    sheet.apply('drive-beyond', { stated: point.driveA });
  } else sheet.apply('drive-current', { stated: point.driveA });
  sheet.apply(sheet.has('R_BE') ? 'base-current' : 'base-current-alone', { stated: point.ibA });
  ratioFigures(sheet, source);
}

function beyondLines(sheet: Worksheet, { point }: CornerSource): void {
  sheet.apply('source-beyond', { stated: point.drive.beyondOhm });
  sheet.apply('open-beyond');
}

function ratioFigures(sheet: Worksheet, { point }: CornerSource): void {
  if (!(point.ibA > 0)) {
    sheet.give('b_f', Infinity, 'No base current');
    sheet.give('ODF', 0, 'No base current');
    return;
  }
  sheet.apply('forced-beta', { stated: point.forcedBeta });
  if (sheet.has('h_FE') && point.condition.fullA > 0) {
    sheet.apply('overdrive', { stated: point.overdrive });
  }
}

function inputLines(sheet: Worksheet, source: CornerSource): void {
  const { point } = source;
  const { inside } = point.model;
  const input = inside?.input;
  const { internal } = source.input.transistor;
  if (inside === null || internal === null) return;
  if (input?.currentA == null || input.testV === null) {
    sheet.give('g_I', 0, 'The sheet prints no tested input current');
  } else {
    sheet.apply('input-conductance', {
      put: {
        I_It: [input.currentA, 'Part, input current at its test'],
        V_It: [input.testV, 'Part, input voltage of that test'],
      },
    });
  }
  const r1 = { valueOhm: internal.r1Ohm, tolerance: internal.r1Tolerance };
  toleranceLine(sheet, 'R_1m', r1, -1, 'R1, smallest', inside.r1Ohm[0]);
  if (point.beyondPin) {
    beyondLines(sheet, source);
    sheet.apply('series-in-front', { put: { R_OH: 'R_b' } });
    sheet.apply('input-voltage', { stated: point.vbeV, put: { V_oc: 'V_ocb' } });
  } else {
    sheet.apply('series-in-front');
    sheet.apply('input-voltage', { stated: point.vbeV });
  }
  sheet.apply('input-current', { stated: point.driveA });
  sheet.apply('forced-beta', { stated: point.forcedBeta, put: { I_B: 'I_I' } });
}
