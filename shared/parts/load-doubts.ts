import { outside, type Doubt } from './doubt.ts';
import type { Coil, LoadRecord } from './load-record.ts';

const AGREEMENT = 0.05;

/** What looks slipped in a load record. */
export function loadDoubts(record: LoadRecord): Doubt[] {
  return [
    ...record.coils.flatMap((coil, index) => coilDoubts(coil, `coils.${index}`)),
    ...record.levels.flatMap(({ operate, release, maximum }, index) => [
      ...outside(`levels.${index}.operate`, operate, [0.3, 1], '1'),
      ...outside(`levels.${index}.release`, release, [0.02, operate ?? 1], '1'),
      ...outside(`levels.${index}.maximum`, maximum, [1, 5], '1'),
    ]),
    ...record.leds.flatMap(({ typV, maxV }, index) => [
      ...outside(`leds.${index}.typV`, typV, [0.8, 5], 'V'),
      ...outside(`leds.${index}.maxV`, maxV, [0.8, 5], 'V'),
    ]),
  ];
}

function coilDoubts(coil: Coil, path: string): Doubt[] {
  const { nominalV, resistanceOhm, currentA, powerW, operateV, releaseV } = coil;
  return [
    ...disagreement(`${path}.currentA`, currentA, ratio(nominalV, resistanceOhm), 'V/R'),
    ...disagreement(`${path}.powerW`, powerW, product(nominalV, currentA), 'V·I'),
    ...outside(`${path}.operateV`, operateV, [0.3 * nominalV, nominalV], 'V'),
    ...outside(`${path}.releaseV`, releaseV, [0.02 * nominalV, operateV ?? nominalV], 'V'),
  ];
}

const ratio = (left: number, right: number | null) => (right === null ? null : left / right);
const product = (left: number, right: number | null) => (right === null ? null : left * right);

function disagreement(
  path: string,
  printed: number | null,
  follows: number | null,
  rule: string,
): Doubt[] {
  if (printed === null || follows === null) return [];
  if (Math.abs(printed - follows) <= AGREEMENT * follows) return [];
  return [{ path, message: `The figure differs from ${rule} by more than 5 %. Check the unit.` }];
}
