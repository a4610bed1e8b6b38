import { TransistorData } from '../stage/transistor-data.ts';
import { chosenLimits, rthJaOf } from './chosen-limits.ts';
import { gainGroups, gainPoint, rowsOfGroup, rowsOfMaker } from './chosen-rows.ts';
import { refused, type Derived } from './derived.ts';
import { internalResistors } from './internal-resistors.ts';
import { documentTitles, sourceOf, type Provenance } from './provenance.ts';
import type { LimitSet } from './transistor-limits.ts';
import type { TransistorRecord } from './transistor-record.ts';
import type { LeakageFigure, SwitchingFigure } from './transistor-rows.ts';

/** What a designer fixes about a part; null leaves it open. */
export interface TransistorChoice {
  readonly group?: string | null;
  readonly package?: string | null;
  /** One of `makerNames`; open takes the safest figure any maker prints. */
  readonly maker?: string | null;
}

/**
 * The stage file's `transistor` from a full part record: printed rows only, nothing computed but R1 and
 * R2 from their ratio. IBL and IEBO stay behind (they are no collector currents), IO(off) counts as ICES,
 * rows of one temperature grade stay behind, and turn-on and turn-off totals stay behind, since they
 * cannot be split into the four times. A pre-biased part's VO(on) is a VCE(sat) row, its IO rating IC.
 *
 * @returns the data, or why the record cannot stand in a stage
 */
export function deriveTransistor(
  record: TransistorRecord,
  choice: TransistorChoice = {},
): Derived<TransistorData> {
  const chosen: Chosen = { group: null, package: null, maker: null, ...choice };
  if (record.family === 'darlington-array') {
    return refused(`${record.partNumber} is an array: a stage takes single transistors.`);
  }
  if (chosen.group !== null && !gainGroups(record).includes(chosen.group)) {
    return refused(`${record.partNumber} has no gain group ${chosen.group}.`);
  }
  const limits = chosenLimits(record, chosen.maker);
  if (limits === null) {
    return refused(`${record.partNumber} has no figures of ${chosen.maker ?? ''}.`);
  }
  return parsed(record, {
    partNumber: record.partNumber,
    polarity: record.polarity,
    darlington: record.family === 'darlington',
    package: (chosen.package ?? record.package)?.slice(0, PACKAGE_LENGTH),
    source: sourceText(record, chosen),
    limits: ratings(limits),
    thermal: { rthJaKPerW: rthJaOf(limits, chosen.package), rthJcKPerW: limits.rthJcKPerW },
    ...electrical(record, chosen),
    capacitanceF: capacitance(record),
    internal: record.family === 'pre-biased' ? internalResistors(record.input, limits) : null,
  });
}

type Chosen = Required<TransistorChoice>;

const PACKAGE_LENGTH = 40;

function parsed(record: TransistorRecord, candidate: unknown): Derived<TransistorData> {
  const result = TransistorData.safeParse(candidate);
  if (result.success)
    return { ok: true, data: result.data, remarks: leftBehind(record, result.data) };
  const issue = result.error.issues[0];
  const where = issue === undefined ? '' : `${issue.path.join('.')}: ${issue.message}`;
  return refused(`${record.partNumber} does not fit a stage: ${where}.`);
}

function leftBehind(record: TransistorRecord, data: TransistorData): string[] {
  const totals = record.switching.some(
    (row) => row.toffSec !== null || row.highToLowMaxSec !== null,
  );
  const graded = record.saturation.some(({ variant }) => variant !== null);
  return [
    data.switching === null && totals
      ? 'Only turn-on and turn-off totals are printed: no switching row.'
      : [],
    graded ? 'VCE(sat) rows of one temperature grade are left out.' : [],
  ].flat();
}

function capacitance({ outputCapacitance }: TransistorRecord): number | null {
  return outputCapacitance === null ? null : (outputCapacitance.maxF ?? outputCapacitance.typF);
}

/** Pre-biased parts print VCC and IO instead of VCEO and IC. */
function ratings(limits: LimitSet) {
  const currents = [limits.icA, limits.ioA].filter((value) => value !== null);
  return {
    vceoV: limits.vceoV ?? limits.vccV,
    vcboV: limits.vcboV,
    veboV: limits.veboV,
    icA: currents.length === 0 ? null : Math.min(...currents),
    icPeakA: limits.icPeakA,
    ibA: limits.ibA,
    powerW: limits.powerW,
    tjMaxDegC: limits.tjMaxDegC,
  };
}

function electrical(record: TransistorRecord, { group, maker }: Chosen) {
  const own = <T extends Provenance>(rows: readonly T[], point: (row: T) => string) =>
    rowsOfMaker(rows, record, maker, point);
  const gain = own(rowsOfGroup(record.gain, group), gainPoint);
  const saturation = own(record.saturation, ({ icA }) => `${icA}`);
  const baseEmitter = own(record.baseEmitter, ({ kind, icA }) => `${kind} ${icA}`);
  const leakage = own(record.leakage, ({ symbol, tempDegC }) => `${symbol} ${tempDegC}`);
  return {
    gain: gain.map((row) => picked(row, GAIN_KEYS)),
    saturation: [
      ...saturation
        .filter(({ variant }) => variant === null)
        .map((row) => picked(row, SATURATION_KEYS)),
      ...outputOnRows(record),
    ],
    baseEmitter: baseEmitter.map((row) => picked(row, BASE_EMITTER_KEYS)),
    leakage: leakage.flatMap(collectorLeakage),
    switching: slowest(own(record.switching, switchingPoint)),
  };
}

const GAIN_KEYS = ['icA', 'vceV', 'min', 'typ', 'max', 'tempDegC'] as const;
const SATURATION_KEYS = ['icA', 'ibA', 'typV', 'maxV'] as const;
const BASE_EMITTER_KEYS = ['kind', 'icA', 'ibA', 'minV', 'typV', 'maxV'] as const;

function picked<T extends object>(row: T, keys: readonly (keyof T)[]): Partial<T> {
  return Object.fromEntries(keys.map((key) => [key, row[key]])) as Partial<T>;
}

function outputOnRows({ family, input }: TransistorRecord) {
  if (family !== 'pre-biased' || input === null) return [];
  return input.outputOn.map(({ outputA, inputA, typV, maxV }) => {
    return { icA: outputA, ibA: inputA, typV, maxV };
  });
}

const LEAKAGE_KINDS = {
  ICBO: 'icbo',
  ICES: 'ices',
  ICEX: 'icex',
  ICEO: 'iceo',
  'IO(off)': 'ices',
  IBL: null,
  IEBO: null,
} as const satisfies Record<LeakageFigure['symbol'], string | null>;

function collectorLeakage({ symbol, maxA, vcbV, vceV, vccV, tempDegC }: LeakageFigure) {
  const kind = LEAKAGE_KINDS[symbol];
  const voltageV = vcbV ?? vceV ?? vccV;
  return kind === null ? [] : [{ kind, currentA: maxA, voltageV, tempDegC }];
}

const switchingPoint = ({ icA, ib1A, ib2A }: SwitchingFigure) => [icA, ib1A, ib2A].join();

/** The first test that prints a storage time; of several makers' rows at its point the longest times. */
function slowest(rows: readonly SwitchingFigure[]) {
  const first = rows.find(({ tsSec }) => tsSec !== null);
  if (first === undefined) return null;
  const same = rows.filter((row) => switchingPoint(row) === switchingPoint(first));
  const longest = (key: 'tdSec' | 'trSec' | 'tsSec' | 'tfSec') => {
    const printed = same.map((row) => row[key]).filter((value) => value !== null);
    return printed.length === 0 ? null : Math.max(...printed);
  };
  return {
    tdSec: longest('tdSec'),
    trSec: longest('trSec'),
    tsSec: longest('tsSec'),
    tfSec: longest('tfSec'),
    icA: first.icA,
    ib1A: first.ib1A,
    ib2A: first.ib2A,
  };
}

const SOURCE_LENGTH = 400;

/** Documents with their pages, then what was fixed; ids alone where the titles run too long. */
function sourceText(record: TransistorRecord, { group, maker }: Chosen): string {
  const used = [sourceOf(record.sources, 'limits'), sourceOf(record.sources, 'electrical')];
  const ids = [...new Set(used.filter((text) => text !== null))];
  const titles = [...new Set(ids.flatMap((text) => documentTitles(text, record.documents)))];
  const fixed = [
    group === null ? [] : `gain group ${group}`,
    maker === null ? [] : `limits of ${maker}`,
  ].flat();
  const long = [...titles, ...fixed].join('; ');
  return long.length <= SOURCE_LENGTH
    ? long
    : [...ids, ...fixed].join('; ').slice(0, SOURCE_LENGTH);
}
