import { formatQuantity } from '../units/engineering-notation.ts';
import type { TransistorData } from '../stage/transistor-data.ts';
import type { DefinitionLeaf } from './definition-leaf.ts';

/** A figure of a row: what it is called, its unit, its value where printed. */
type Figure = readonly [label: string, unit: string, value: number | null];
interface Row {
  readonly list: string;
  /** The condition the figures were measured at: the row's name. */
  readonly condition: string;
  readonly figures: readonly Figure[];
}

const at = (...conditions: (readonly [value: number | null, unit: string])[]) =>
  conditions
    .filter(([value]) => value !== null)
    .map(([value, unit]) => formatQuantity(value, unit))
    .join(', ');

function rowsOf(part: TransistorData): Row[] {
  return [
    ...part.gain.map((row) => ({
      list: 'gain',
      condition: at([row.icA, 'A'], [row.vceV, 'V'], [row.tempDegC, '°C']),
      figures: [
        ['hFE min', '1', row.min],
        ['hFE typ', '1', row.typ],
        ['hFE max', '1', row.max],
      ] as const,
    })),
    ...part.saturation.map((row) => ({
      list: 'saturation',
      condition: at([row.icA, 'A'], [row.ibA, 'A']),
      figures: [
        ['VCE(sat) typ', 'V', row.typV],
        ['VCE(sat) max', 'V', row.maxV],
      ] as const,
    })),
    ...part.baseEmitter.map((row) => ({
      list: 'baseEmitter',
      condition: at([row.icA, 'A'], [row.ibA, 'A']),
      figures: [
        [`VBE(${row.kind}) min`, 'V', row.minV],
        [`VBE(${row.kind}) typ`, 'V', row.typV],
        [`VBE(${row.kind}) max`, 'V', row.maxV],
      ] as const,
    })),
    ...part.leakage.map((row) => ({
      list: 'leakage',
      condition: at([row.voltageV, 'V'], [row.tempDegC, '°C']),
      figures: [[`${row.kind.toUpperCase()} max`, 'A', row.currentA]] as const,
    })),
  ];
}

/**
 * The figures of a transistor's rows, each named by its condition, so that a row inserted in front of
 * others does not make all of them look changed. Equal conditions are told apart by their order.
 *
 * @param path where the transistor stands in the definition
 * @param prefix goes before each label
 */
export function transistorRowLeaves(
  part: TransistorData,
  path: string,
  prefix: string,
): DefinitionLeaf[] {
  const seen = new Map<string, number>();
  return rowsOf(part).flatMap(({ list, condition, figures }) =>
    figures.flatMap(([label, unit, value]) => {
      if (value === null) return [];
      const name = `${path}.${list}[${condition}] ${label}`;
      const count = (seen.get(name) ?? 0) + 1;
      seen.set(name, count);
      const again = count === 1 ? '' : ` (${count})`;
      const words = `${prefix}${label} at ${condition}${again}`;
      return [{ path: name + again, label: words, unit, value }];
    }),
  );
}
