import { leakageA, type LeakageTable } from '../../physics/leakage.ts';
import {
  leakageBasis,
  maximumGainBasis,
  maximumVbeBasis,
  minimumGainBasis,
  minimumVbeBasis,
  type RowBasis,
  type RowPoint,
  type SingleGainBasis,
} from '../../physics/row-basis.ts';
import type { GainTable } from '../../physics/gain.ts';
import type { SymbolId } from '../../method/symbols.ts';
import type { PartModel } from '../../stage/part-model.ts';
import { formatQuantity } from '../../units/engineering-notation.ts';
import type { ApplyOptions, Put, Worksheet } from './worksheet.ts';

const amps = (icA: number) => formatQuantity(icA, 'A', { digits: 6 });
const rowAt = (what: string, { at }: RowPoint) => `${what}, row of ${amps(at)}`;

/** A current that stands on the sheet, with the symbol it stands under. */
export interface ReadAt {
  readonly symbol: SymbolId;
  readonly icA: number;
}

const pair = (what: string, from: RowPoint, to: RowPoint, y: readonly [SymbolId, SymbolId]) =>
  ({
    I_1: [from.at, rowAt(what, from)],
    I_2: [to.at, rowAt(what, to)],
    [y[0]]: [from.value, rowAt(what, from)],
    [y[1]]: [to.value, rowAt(what, to)],
  }) as Partial<Record<SymbolId, Put>>;

/** Smallest hFE at 25 °C for a current: a given row or a worked line. */
export function minimumGainLines(
  sheet: Worksheet,
  table: GainTable,
  at: ReadAt,
  as: SymbolId,
  stated: number,
): void {
  const basis = minimumGainBasis(table, at.icA);
  if (basis.kind === 'single') singleGainLines(sheet, basis, at, as, stated);
  else gainLine(sheet, basis, 'hFE min', at, as, stated);
}

/** Largest hFE at 25 °C for a current. */
export function maximumGainLines(
  sheet: Worksheet,
  table: GainTable,
  at: ReadAt,
  as: SymbolId,
  stated: number,
): void {
  gainLine(sheet, maximumGainBasis(table, at.icA), 'hFE max', at, as, stated);
}

function gainLine(
  sheet: Worksheet,
  basis: RowBasis,
  what: string,
  at: ReadAt,
  as: SymbolId,
  stated: number,
): void {
  if (basis.kind === 'between') {
    const put = { I: at.symbol, ...pair(what, basis.from, basis.to, ['h_1', 'h_2']) };
    sheet.apply('gain-between', { as, stated, put });
  } else sheet.give(as, stated, rowAt(what, basis.from));
}

function singleGainLines(
  sheet: Worksheet,
  { from, typical, floor }: SingleGainBasis,
  at: ReadAt,
  as: SymbolId,
  stated: number,
): void {
  const row: Put = [from.value, rowAt('hFE min', from)];
  const options: ApplyOptions = floor === null ? { as, stated } : { as: 'h_c' };
  if (typical === null) {
    const put = { h_1: row, I_1: [from.at, rowAt('hFE min', from)], I: at.symbol } as const;
    sheet.apply('gain-inverse', { ...options, put });
  } else {
    typicalLine(sheet, typical.atCurrent, at.symbol, 'h_a');
    typicalLine(sheet, typical.atRow, [from.at, rowAt('hFE min', from)], 'h_b');
    sheet.apply('gain-typical', { ...options, put: { h_1: row } });
  }
  if (floor === null) return;
  const proof = `VCE(sat) row of ${amps(floor.at)}`;
  const put = { I_1: [floor.at, proof], I_2: [floor.at / floor.value, proof] } as const;
  sheet.apply('gain-floor', { as, stated, put });
}

function typicalLine(sheet: Worksheet, basis: RowBasis, current: Put, as: SymbolId): void {
  if (basis.kind !== 'between') {
    sheet.give(as, basis.from.value, rowAt('hFE typ', basis.from));
    return;
  }
  const put = { I: current, ...pair('hFE typ', basis.from, basis.to, ['h_1', 'h_2']) };
  sheet.apply('gain-between', { as, put });
}

/** Largest or smallest VBE at 25 °C for a current. */
export function vbeLines(
  sheet: Worksheet,
  { baseEmitter }: PartModel,
  largest: boolean,
  at: ReadAt,
  as: SymbolId,
  stated: number,
): void {
  const basis = (largest ? maximumVbeBasis : minimumVbeBasis)(baseEmitter, at.icA);
  const substitute = largest && !baseEmitter.guaranteed ? ' (substitute)' : '';
  const what = `VBE ${largest ? 'max' : 'min'}${substitute}`;
  if (basis === null) {
    sheet.give(as, stated, 'No VBE figure: usual minimum of the policy');
    return;
  }
  const { from } = basis;
  if (basis.kind === 'between') {
    const put = { I: at.symbol, ...pair(what, from, basis.to, ['V_1', 'V_2']) };
    sheet.apply('vbe-between', { as, stated, put });
    return;
  }
  if (basis.kind === 'row') {
    sheet.give(as, stated, rowAt(what, from));
    return;
  }
  const source = rowAt(what, from);
  const put = {
    I: at.symbol,
    I_1: [from.at, source],
    V_1: [from.value, source],
  } satisfies ApplyOptions['put'];
  if (basis.kind === 'below') sheet.apply('vbe-below', { as, stated, put });
  else if (basis.before === null) sheet.apply('vbe-above-one', { as, stated, put });
  else {
    const before = rowAt(what, basis.before);
    const more = {
      I_0: [basis.before.at, before],
      V_0r: [basis.before.value, before],
    } satisfies ApplyOptions['put'];
    sheet.apply('vbe-above', { as, stated, put: { ...put, ...more } });
  }
}

/** Leakage at the junction temperature on the sheet. */
export function leakageLines(
  sheet: Worksheet,
  table: LeakageTable,
  tjDegC: number,
  policyK: number,
): void {
  const basis = leakageBasis(table, tjDegC);
  const stated = leakageA(table, tjDegC);
  const row = ({ at }: RowPoint) => `Leakage row at ${formatQuantity(at, '°C')}`;
  const first = {
    T_1: [basis.from.at, row(basis.from)],
    I_1: [basis.from.value, row(basis.from)],
  } satisfies ApplyOptions['put'];
  if (basis.kind === 'between' && basis.from.value > 0 && basis.to.value > 0) {
    const second = {
      T_2: [basis.to.at, row(basis.to)],
      I_2: [basis.to.value, row(basis.to)],
    } satisfies ApplyOptions['put'];
    sheet.apply('leakage-between', { stated, put: { ...first, ...second } });
  } else if (basis.kind === 'above' && tjDegC > basis.from.at) {
    intervalLine(sheet, table, basis.from, basis.before, policyK);
    sheet.apply('leakage-doubling', { stated, put: first });
  } else sheet.give('I_leak', stated, row(basis.from));
}

function intervalLine(
  sheet: Worksheet,
  table: LeakageTable,
  from: RowPoint,
  before: RowPoint | null,
  policyK: number,
): void {
  if (before === null || before.value <= 0 || from.value <= before.value) {
    sheet.give('K_2', table.doublingK, 'Policy');
    return;
  }
  const row = ({ at }: RowPoint) => `Leakage row at ${formatQuantity(at, '°C')}`;
  sheet.apply('leakage-interval', {
    stated: table.doublingK,
    put: {
      K_p: [policyK, 'Policy'],
      T_1: [before.at, row(before)],
      I_1: [before.value, row(before)],
      T_2: [from.at, row(from)],
      I_2: [from.value, row(from)],
    },
  });
}
