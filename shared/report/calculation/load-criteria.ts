import { SHEET_DEG_C } from '../../physics/constants.ts';
import type { SymbolId } from '../../method/symbols.ts';
import { toleranceLine } from './corner-source.ts';
import { cite, type CriterionSource, givenLimit } from './criterion-source.ts';
import { largestGainLines } from './off-lines.ts';
import { exponentLine, ratioLines } from './operating-lines.ts';
import { minimumGainLines } from './row-lines.ts';

/** The inrush of a lamp; its current for reading rows at. */
function inrush({ sheet, input }: CriterionSource): number {
  const { load } = input;
  if (load.kind !== 'lamp') return NaN;
  sheet.apply('lamp-cold', { put: { c: [load.coldRatio, 'Load, cold inrush over rated'] } });
  return sheet.apply('lamp-inrush');
}

/** Peak collector current of a lamp: the filament’s inrush, or what the transistor passes. */
export function lampPeakLines(source: CriterionSource): SymbolId {
  const { sheet, criterion, point } = source;
  const inrushA = inrush(source);
  const stated = criterion.value ?? NaN;
  if (point.model.part.gain === null) {
    sheet.give('I_pk', stated, 'No hFE row: the inrush');
    return 'I_pk';
  }
  largestGainLines(sheet, source, { symbol: 'I_in', icA: inrushA });
  sheet.apply('lamp-peak', { stated, put: baseCurrentOf(source) });
  return 'I_pk';
}

/** Whether the transistor stays saturated while the cold filament draws its inrush. */
export function lampLines(source: CriterionSource): SymbolId | null {
  const { sheet, criterion, point } = source;
  const { gain } = point.model.part;
  if (gain === null) return null;
  const inrushA = inrush(source);
  const cold = point.tjDegC < SHEET_DEG_C;
  if (cold) exponentLine(sheet, source);
  const stated = point.leastGainAt(inrushA);
  const ratio = Math.pow((point.tjDegC + 273.15) / 298.15, gain.exponent);
  const at = { symbol: 'I_in', icA: inrushA } as const;
  minimumGainLines(sheet, gain, at, 'h_in25', cold ? stated / ratio : stated);
  sheet.apply(cold ? 'gain-temperature' : 'gain-plain', {
    as: 'h_in',
    stated,
    put: { h_FE25: 'h_in25' },
  });
  sheet.apply('lamp-saturation', { stated: criterion.value ?? NaN, put: baseCurrentOf(source) });
  givenLimit(source, 1, 'Saturated');
  return 'O_in';
}

/** A part judged by its input voltage has an input current in place of a base current. */
const baseCurrentOf = ({ sheet }: CriterionSource): Partial<Record<'I_B', SymbolId>> =>
  sheet.has('I_B') ? {} : { I_B: 'I_I' };

/** Input voltage of a pre-biased part, against VI(on) or its rating. */
export function inputOnLines(source: CriterionSource, maximum: boolean): SymbolId | null {
  const { point } = source;
  const input = point.model.inside?.input;
  if (input == null) return null;
  cite(source, 'V_I');
  if (maximum) givenLimit(source, input.maximumV, 'Part, highest input voltage');
  else if (input.onV !== null) onLimit(source, input.onV);
  return 'V_I';
}

function onLimit(source: CriterionSource, onV: number): void {
  const { sheet, criterion, input, point } = source;
  const { internal } = input.transistor;
  const { inside } = point.model;
  if (criterion.limit === null || internal === null || inside === null) return;
  sheet.give('V_Ion', onV, 'Part, VI(on)');
  extraLine(source);
  if (point.tjDegC >= SHEET_DEG_C) {
    sheet.apply('input-on-limit-warm', { stated: criterion.limit });
    return;
  }
  if (inside.ratio === null) sheet.give('k_s', 1, 'No R2');
  else {
    ratioLines(sheet, internal, -1);
    sheet.apply('input-divider');
  }
  sheet.apply('input-junction');
  sheet.give('X', input.policy.gainExponent, 'Policy');
  sheet.apply('input-on-limit', { stated: criterion.limit });
}

/** What a load current above the tested one asks for. */
function extraLine({ sheet, input, point }: CriterionSource): void {
  const { internal } = input.transistor;
  const rows = internal?.input;
  if (internal === null || rows?.gi == null || rows.onOutputA === null) {
    sheet.give('V_ext', 0, 'The sheet prints no GI or no test current');
    return;
  }
  if (point.condition.fullA <= rows.onOutputA) {
    sheet.give('V_ext', 0, 'Load current within that of the test');
    return;
  }
  const r1 = { valueOhm: internal.r1Ohm, tolerance: internal.r1Tolerance };
  toleranceLine(sheet, 'R_1x', r1, 1, 'R1, largest');
  sheet.apply('input-extra', {
    put: { I_Ot: [rows.onOutputA, 'Part, output current of the test'], G_I: [rows.gi, 'Part, GI'] },
  });
}
