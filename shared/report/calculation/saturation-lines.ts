import { SHEET_DEG_C } from '../../physics/constants.ts';
import { DARLINGTON_DROP_V, type SaturationLine } from '../../physics/saturation.ts';
import type { OperatingPoint } from '../../stage/operating-point.ts';
import { formatQuantity } from '../../units/engineering-notation.ts';
import { type CornerSource, thermalVoltageLine } from './corner-source.ts';
import type { ApplyOptions, Put, Worksheet } from './worksheet.ts';

/** Collector current and VCE of a corner: from gain, from the VCE(sat) line, or without any drop. */
export function saturationLines(sheet: Worksheet, { point }: CornerSource): void {
  const { saturation } = point.model.part;
  if (!(point.ibA > 0) && point.model.inside?.byInput !== true) {
    sheet.give('I_C', point.icA, 'No base current: the transistor stays off');
    sheet.give('V_CE', point.vceV, 'The whole supply');
    return;
  }
  if (!point.saturated) {
    sheet.apply('active-current', { stated: point.icA });
    sheet.apply('load-line', { stated: point.vceV });
    return;
  }
  if (!point.fullDrop || saturation === null) {
    sheet.apply('current-without-drop', { stated: point.icA });
    const why = saturation === null ? 'No VCE(sat) row' : 'Corner with VCE = 0';
    sheet.give('V_CE', 0, why);
    return;
  }
  pieceLines(sheet, saturation, point.piece);
  hotLines(sheet, saturation, point);
  stepLine(sheet, saturation, point);
  currentLine(sheet, saturation, point);
  sheet.apply('load-line', { stated: point.vceV });
}

function row(line: SaturationLine, k: number): { current: Put; voltage: Put } {
  const icA = line.rowA[k] ?? 0;
  const what = `VCE(sat) max, row of ${formatQuantity(icA, 'A', { digits: 6 })}`;
  // The line runs through non-decreasing maxima: the row as the line takes it.
  let highest = 0;
  for (let j = 0; j <= k; j++) highest = Math.max(highest, line.maxV[j] ?? 0);
  return { current: [icA, what], voltage: [highest, what] };
}

function segment(line: SaturationLine, k: number): ApplyOptions['put'] & object {
  const [first, second] = [row(line, k - 1), row(line, k)];
  return { I_1: first.current, V_1: first.voltage, I_2: second.current, V_2: second.voltage };
}

function pieceLines(sheet: Worksheet, line: SaturationLine, k: number): void {
  if (k > 0) {
    sheet.apply('line-slope', { stated: line.slopeOhm[k] ?? 0, put: segment(line, k) });
    sheet.apply('line-offset', { stated: line.interceptV[k] ?? 0, put: segment(line, k) });
    return;
  }
  thermalVoltageLine(sheet, 'V_T25');
  const first = row(line, 0);
  sheet.apply('intrinsic-drop', {
    stated: line.intrinsicV,
    put: {
      b_t1: [line.testBeta[0] ?? 0, 'VCE(sat), first row: IC/IB'],
      b_R: [line.reverseGain, 'Part, else 0.5'],
      V_D: [
        line.darlington ? DARLINGTON_DROP_V : 0,
        line.darlington ? 'Darlington' : 'No Darlington',
      ],
    },
  });
  const stated = line.interceptV[0] ?? 0;
  if (line.rowA.length > 1) {
    const put = segment(line, 1);
    sheet.apply('line-slope', { as: 'R_CEs', stated: line.slopeOhm[1] ?? 0, put });
    const offset = { ...put, R_CE25: 'R_CEs' } satisfies ApplyOptions['put'];
    sheet.apply('line-offset', { as: 'V_0s', stated: line.interceptV[1] ?? 0, put: offset });
    sheet.apply('line-start', { stated, put: { V_1: first.voltage } });
  } else sheet.apply('line-start-one', { stated, put: { V_1: first.voltage } });
  sheet.apply('line-first-slope', {
    stated: line.slopeOhm[0] ?? 0,
    put: { V_1: first.voltage, I_1: first.current },
  });
}

function hotLines(sheet: Worksheet, line: SaturationLine, point: OperatingPoint): void {
  const { tjDegC, piece } = point;
  const hot = tjDegC > SHEET_DEG_C;
  const { rceTempcoPerK } = point.model.input.policy;
  sheet.apply(hot ? 'slope-hot' : 'slope-plain', {
    stated: point.rceSatOhm,
    put: { a_R: [rceTempcoPerK, 'Policy'] },
  });
  if (line.darlington) {
    sheet.apply(tjDegC < SHEET_DEG_C ? 'offset-darlington' : 'offset-plain');
  } else {
    const positive = (line.interceptV[piece] ?? 0) > 0;
    sheet.apply(hot && positive ? 'offset-hot' : 'offset-plain');
  }
}

function stepLine(sheet: Worksheet, line: SaturationLine, point: OperatingPoint): void {
  const testBeta = line.testBeta[point.piece] ?? 0;
  const source = 'VCE(sat) rows in use: IC/IB';
  sheet.give('b_t', testBeta, source);
  const byInput = point.model.inside?.byInput === true;
  if (byInput || point.forcedBeta <= testBeta || point.forcedBeta >= point.gain) {
    const why = byInput ? 'VO(on) is taken as it stands' : 'Driven at least as hard as the rows';
    sheet.give('dV', 0, why);
    return;
  }
  thermalVoltageLine(sheet, 'V_T');
  sheet.apply(Number.isFinite(point.gain) ? 'forced-step' : 'forced-step-open', {
    put: { b_R: [line.reverseGain, 'Part, else 0.5'] },
  });
}

function currentLine(sheet: Worksheet, line: SaturationLine, point: OperatingPoint): void {
  const endA = line.upToA[point.piece] ?? Infinity;
  const stated = point.icA;
  if (!Number.isFinite(endA)) {
    sheet.apply('saturated-current', { stated });
    return;
  }
  const put = { I_k: [endA, 'VCE(sat), row the piece ends at'] } satisfies ApplyOptions['put'];
  sheet.apply('saturated-current-row', { stated, put });
}
