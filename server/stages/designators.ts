import type { Designators } from '../../shared/contract/revision.ts';
import type { StageInput } from '../../shared/stage/stage-input.ts';

/** Letters by the trade's lettering (IEEE 315; K for a relay coil also in IEC 81346-2). */
const LOAD_LETTERS = {
  coil: 'K',
  resistor: 'R',
  'led-string': 'D',
  lamp: 'DS',
  'logic-input': 'R',
} as const;

/** Designators as far as somebody named them. */
export type NamedDesignators = { readonly [K in keyof Designators]?: Designators[K] | undefined };

const NONE: Designators = {
  baseResistor: null,
  shuntResistor: null,
  pullUp: null,
  speedUpCapacitor: null,
  load: null,
  clamp: null,
  clampZener: null,
  drive: null,
  loadResistor: null,
  preDriver: null,
  preBaseResistor: null,
  preShuntResistor: null,
};

/**
 * Gives every part around the transistor a designator: the one named, else the next free number of its
 * letter in the project. Parts the stage does not have get none.
 *
 * @param used designators of all other stages of the project, their references included
 * @param sameOutput the designator other stages give the logic output of the same port, if any
 */
export function allocateDesignators(
  definition: StageInput,
  named: NamedDesignators,
  used: Iterable<string>,
  sameOutput: string | null,
): Designators {
  const wanted = lettersOf(definition);
  const taken = new Set(used);
  const kept = { ...NONE };
  for (const key of Object.keys(wanted) as (keyof Designators)[]) kept[key] = named[key] ?? null;
  kept.drive ??= sameOutput;
  for (const designator of Object.values(kept)) if (designator !== null) taken.add(designator);
  for (const [key, letter] of Object.entries(wanted) as [keyof Designators, string][]) {
    kept[key] ??= takeNext(letter, taken);
  }
  return kept;
}

/** The letter of each part the stage has. */
function lettersOf(stage: StageInput): Partial<Record<keyof Designators, string>> {
  const { clamp, drive, load, preDriver } = stage;
  const has: [keyof Designators, string, boolean][] = [
    ['baseResistor', 'R', stage.baseResistor.valueOhm !== 0],
    ['shuntResistor', 'R', stage.shuntResistor !== null],
    ['pullUp', 'R', drive.pullUp !== null],
    ['speedUpCapacitor', 'C', stage.speedUpCapacitorF !== null],
    ['loadResistor', 'R', load.kind === 'led-string'],
    ['load', LOAD_LETTERS[load.kind], true],
    ['clamp', 'D', clamp.kind !== 'none'],
    ['clampZener', 'D', clamp.kind === 'diode-zener'],
    ['drive', 'U', true],
    ['preDriver', 'Q', preDriver !== null],
    ['preBaseResistor', 'R', preDriver !== null],
    ['preShuntResistor', 'R', (preDriver?.shuntResistor ?? null) !== null],
  ];
  return Object.fromEntries(has.flatMap(([key, letter, there]) => (there ? [[key, letter]] : [])));
}

function takeNext(letter: string, taken: Set<string>): string {
  let number = 1;
  while (taken.has(`${letter}${number}`)) number += 1;
  taken.add(`${letter}${number}`);
  return `${letter}${number}`;
}
