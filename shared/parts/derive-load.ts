import { CoilLoad, LampLoad } from '../stage/load.ts';
import { clean, refused, type Derived } from './derived.ts';
import type { Coil, CoilLevels, LoadRecord } from './load-record.ts';

/** Which coil of a series, by its place in `coils`, and which contacts where levels differ by them. */
export interface LoadChoice {
  readonly coil?: number;
  /** Open takes the hardest figure of any contacts. */
  readonly contacts?: string | null;
}

const USUAL_TOLERANCE = 0.1;
const USUAL_REFERENCE_DEG_C = 20;

/**
 * The stage file's `load` from a record: a coil of a relay, contactor or solenoid series, or a lamp.
 * Absolute voltages go before fractions of nominal; the operative range stands in where neither is
 * printed; resistance is nominal V/I, else V²/P, where not printed itself. A coil without printed
 * tolerance or reference takes ±10 % and 20 °C (common practice), and says so.
 *
 * @returns the load, or why the record gives none
 */
export function deriveLoad(
  record: LoadRecord,
  choice: LoadChoice = {},
): Derived<CoilLoad | LampLoad> {
  if (record.family === 'lamp') return deriveLamp(record);
  if (record.family === 'led') {
    return refused(`${record.partNumber} prints typical forward voltages only: enter the string.`);
  }
  const coil = record.coils[choice.coil ?? 0];
  if (coil === undefined) return refused(`${record.partNumber} has no such coil.`);
  const resistanceOhm = coilResistanceOhm(coil);
  if (resistanceOhm === null) {
    return refused(
      `${record.partNumber} prints neither resistance, current nor power of the coil.`,
    );
  }
  const data = CoilLoad.safeParse({
    kind: 'coil',
    resistanceOhm,
    tolerance: record.tolerance ?? USUAL_TOLERANCE,
    referenceDegC: record.referenceDegC ?? USUAL_REFERENCE_DEG_C,
    inductanceH: coil.inductanceH,
    maximumReferenceDegC: record.maximumReferenceDegC,
    ...coilLevels(record, coil, choice.contacts ?? null),
  });
  if (!data.success) return refused(`${record.partNumber} has no figures a stage can take.`);
  return { ok: true, data: data.data, remarks: assumptions(record, coil) };
}

/** Contacts whose operate, release or overload figures differ. */
export function contactNames(record: LoadRecord): string[] {
  return [...new Set(record.levels.flatMap(({ contacts }) => contacts ?? []))];
}

function coilResistanceOhm({ resistanceOhm, nominalV, currentA, powerW }: Coil): number | null {
  if (resistanceOhm !== null) return resistanceOhm;
  if (currentA !== null) return clean(nominalV / currentA);
  return powerW === null ? null : clean(nominalV ** 2 / powerW);
}

function coilLevels(record: LoadRecord, coil: Coil, contacts: string | null) {
  const rows = record.levels.filter(
    (row) => row.contacts === null || contacts === null || row.contacts === contacts,
  );
  const inVolts = (share: number | null) => (share === null ? null : clean(share * coil.nominalV));
  const { range, rangeV } = coil;
  return {
    operateV:
      coil.operateV ??
      inVolts(extreme(rows, 'operate', Math.max)) ??
      rangeV?.min ??
      inVolts(range === null ? null : range.min),
    releaseV: coil.releaseV ?? inVolts(extreme(rows, 'release', Math.min)),
    maximumV:
      inVolts(extreme(rows, 'maximum', Math.min)) ??
      rangeV?.max ??
      inVolts(range === null ? null : range.max),
  };
}

function extreme(
  rows: readonly CoilLevels[],
  key: 'operate' | 'release' | 'maximum',
  pick: (...values: number[]) => number,
): number | null {
  const printed = rows.map((row) => row[key]).filter((value) => value !== null);
  return printed.length === 0 ? null : pick(...printed);
}

function assumptions(record: LoadRecord, coil: Coil): string[] {
  return [
    record.tolerance === null ? 'No coil tolerance is printed: ±10 % assumed.' : [],
    record.referenceDegC === null ? 'No reference temperature is printed: 20 °C assumed.' : [],
    coil.resistanceOhm === null ? 'The coil resistance follows from its current or power.' : [],
    coil.inductanceH === null ? 'No inductance is printed: measure it for the release time.' : [],
  ].flat();
}

/** The hot to cold ratio of a lamp is the worst its record names. */
function deriveLamp({ partNumber, filament }: LoadRecord): Derived<LampLoad> {
  if (filament === null) return refused(`${partNumber} prints no filament figures.`);
  const { nominalV, currentA, coldRatio } = filament;
  if (nominalV === null || currentA === null) {
    return refused(`${partNumber} prints no nominal voltage and current: enter them.`);
  }
  const data = LampLoad.parse({
    kind: 'lamp',
    nominalV,
    currentA,
    coldRatio: clean(1 / coldRatio.min),
  });
  return { ok: true, data, remarks: [] };
}
