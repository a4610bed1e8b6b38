import type { StageInput } from '../../stage/stage-input.ts';
import { isHighSide } from '../../stage/drive-source.ts';
import { atEnd, type CornerSource, signOf, toleranceLine } from './corner-source.ts';
import type { Worksheet } from './worksheet.ts';

const end = (low: boolean) => (low ? 'min' : 'max');

/** Supply, temperatures and the load line of a corner. */
export function conditionLines(sheet: Worksheet, source: CornerSource): void {
  const { point, input } = source;
  const { condition, tjDegC } = point;
  sheet.give('V_S', condition.supplyV, `Supply, ${end(!atEnd(source, 'supply', 'max'))}`);
  sheet.give('T_A', condition.ambientDegC, `Ambient, ${end(!atEnd(source, 'ambient', 'max'))}`);
  const settled = atEnd(source, 'instant', 'settled');
  sheet.give(
    'T_J',
    tjDegC,
    settled ? 'Balance of the junction temperature, found by iteration' : 'Ambient, at start',
  );
  sheet.give('V_Smax', input.supplyV.max, 'Supply, max');
  sheet.give('V_Smin', input.supplyV.min, 'Supply, min');
  loadLines(sheet, source, settled);
  sheet.apply('full-current', { stated: condition.fullA });
}

function loadLines(sheet: Worksheet, source: CornerSource, settled: boolean): void {
  const { point, input } = source;
  const { load } = input;
  const { availableV, loadOhm } = point.condition;
  switch (load.kind) {
    case 'coil':
      coilLine(sheet, source, load, settled);
      break;
    case 'lamp':
      lampLines(sheet, load, loadOhm);
      break;
    case 'logic-input':
      toleranceLine(
        sheet,
        'R_L',
        asResistor(load.pullUpOhm, load),
        signOf(source, 'load'),
        'RC',
        loadOhm,
      );
      sheet.give('n', load.count, 'Load, inputs');
      sheet.give('I_IL', load.lowCurrentA, 'Load, low-level current');
      sheet.apply('available-inputs', { stated: availableV });
      return;
    default:
      toleranceLine(
        sheet,
        'R_L',
        asResistor(load.resistanceOhm, load),
        signOf(source, 'load'),
        source.side === 'front' ? 'RB as load' : 'Load',
        loadOhm,
      );
  }
  if (load.kind === 'led-string') {
    ledLine(sheet, source, load);
    sheet.give('n', load.count, 'Load, LEDs');
    sheet.apply('available-leds', { stated: availableV });
  } else if (source.side === 'front') {
    const seriesV = point.condition.supplyV - availableV;
    sheet.give('V_EB', seriesV, 'Transistor behind, at the same supply and ambient');
    sheet.apply('available-behind', { stated: availableV });
  } else sheet.apply('available-plain', { stated: availableV });
}

const asResistor = (valueOhm: number, { tolerance }: { readonly tolerance: number }) => ({
  valueOhm,
  tolerance,
});

function coilLine(
  sheet: Worksheet,
  source: CornerSource,
  load: Extract<StageInput['load'], { kind: 'coil' }>,
  settled: boolean,
): void {
  const { coilDegC, loadOhm } = source.point.condition;
  if (settled) {
    sheet.apply('load-temperature', {
      stated: coilDegC,
      put: { dT_L: [load.temperatureRiseK, 'Load, rise'] },
    });
  } else sheet.give('T_L', coilDegC, 'Ambient, at start');
  sheet.apply('copper', {
    stated: loadOhm,
    put: {
      R_n: [load.resistanceOhm, 'Load, resistance'],
      t: [signOf(source, 'load') * load.tolerance, 'Load, tolerance'],
      T_r: [load.referenceDegC, 'Load, reference temperature'],
    },
  });
}

function lampLines(
  sheet: Worksheet,
  load: Extract<StageInput['load'], { kind: 'lamp' }>,
  loadOhm: number,
): void {
  sheet.give('I_n', load.currentA, 'Load, rated current');
  sheet.give('V_n', load.nominalV, 'Load, rated voltage');
  sheet.apply('lamp-current');
  sheet.apply('lamp-resistance', { stated: loadOhm });
}

function ledLine(
  sheet: Worksheet,
  source: CornerSource,
  load: Extract<StageInput['load'], { kind: 'led-string' }>,
): void {
  const high = atEnd(source, 'vf', 'max');
  const { min, max } = load.forwardV;
  sheet.apply(high ? 'led-forward-high' : 'led-forward-low', {
    put: { V_Fn: [high ? max : min, `LED, VF ${high ? 'max' : 'min'}`] },
  });
}

/** The output as the base resistor sees it. */
export function driveLines(sheet: Worksheet, source: CornerSource): void {
  const { point, input, side } = source;
  const { drive } = input;
  const strong = atEnd(source, 'drive', 'strong');
  const { openV: stated, sourceOhm } = point.drive;
  if (side === 'behind') {
    const dropV = point.condition.supplyV - stated;
    const front = strong ? 'Transistor in front, no drop' : 'Transistor in front, largest drop';
    sheet.give('V_CE1', dropV, `${front}, at the same supply and ambient`);
    sheet.give('R_OH', 0, 'Its slope is in that drop');
    sheet.apply('open-behind', { stated });
    return;
  }
  const { supplyV } = point.condition;
  const railV = drive.railTracksSupply ? supplyV : strong ? drive.railV.max : drive.railV.min;
  sheet.give(
    'V_r',
    railV,
    drive.railTracksSupply ? 'Supply of the corner' : `Rail, ${end(!strong)}`,
  );
  sheet.give('V_gs', drive.groundShiftV, 'Drive, ground shift');
  if (isHighSide(input)) {
    testedOutput(sheet, drive.low.levelV, 0, drive.low.currentA, 'Low output', strong, sourceOhm);
    sheet.apply('open-high-side', { stated });
  } else if (drive.kind === 'open-collector') {
    toleranceLine(sheet, 'R_pu', drive.pullUp, strong ? -1 : 1, 'Pull-up', sourceOhm);
    sheet.give('R_OH', sourceOhm, 'The pull-up');
    sheet.give('I_lk', drive.leakageA, 'Output, off-state leakage');
    sheet.apply(strong ? 'open-strong' : 'open-pull-up', { stated });
  } else {
    const { dropV, unloadedDropV, currentA } = drive.high;
    testedOutput(sheet, dropV, unloadedDropV, currentA, 'High output', strong, sourceOhm);
    sheet.apply(strong ? 'open-strong' : 'open-weak', { stated });
  }
}

function testedOutput(
  sheet: Worksheet,
  dropV: number,
  unloadedV: number,
  currentA: number,
  what: string,
  strong: boolean,
  stated: number,
): void {
  if (strong) {
    sheet.give('R_OH', 0, `${what}, strong`);
    return;
  }
  sheet.give('V_d', dropV, `${what}, at its tested current`);
  sheet.give('V_unl', unloadedV, `${what}, at no load`);
  sheet.give('I_OH', currentA, `${what}, tested current`);
  sheet.apply('source-resistance', { stated });
}
