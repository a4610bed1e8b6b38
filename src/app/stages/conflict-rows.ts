import type { Designators } from '../../../shared/contract/revision.ts';
import type { Draft } from './draft.ts';
import { GROUP_TITLES } from './field-spec.ts';
import { valueText } from './field-words.ts';
import { formToStage } from './form-to-stage.ts';
import { FIELD_PATHS, fieldSpec } from './stage-fields.ts';
import { stageToForm } from './stage-to-form.ts';

export type Side = 'yours' | 'theirs';

/** One thing that differs between the two drafts. */
export interface ConflictRow {
  readonly key: string;
  readonly label: string;
  readonly yours: string;
  readonly theirs: string;
  /** Changed by both since the last common state: somebody has to choose. */
  readonly clash: boolean;
  /** Where it was changed by one only, that one; else yours, until somebody chooses. */
  readonly proposed: Side;
}

interface Item {
  readonly key: string;
  readonly label: string;
  readonly value: (draft: Draft) => unknown;
  readonly text: (draft: Draft) => string;
}

/** Everything on the sheet that can differ, field by field. */
function items(): readonly Item[] {
  const fields = FIELD_PATHS.map((path): Item => {
    const spec = fieldSpec(path);
    const value = ({ definition }: Draft) => stageToForm(definition)[path];
    const label = `${GROUP_TITLES[spec.group]}: ${spec.label}`;
    return { key: path, label, value, text: (draft) => valueText(path, value(draft)) };
  });
  const transistor: Item = {
    key: 'transistor',
    label: 'Transistor: part and data',
    value: ({ definition, parts }) => [definition.transistor, parts.transistor],
    text: ({ definition }) => definition.transistor.partNumber,
  };
  const preDriver: Item = {
    key: 'preDriver',
    label: 'Pre-driver: part and data',
    value: ({ definition, parts }) => [definition.preDriver?.transistor ?? null, parts.preDriver],
    text: ({ definition }) => definition.preDriver?.transistor.partNumber ?? '–',
  };
  return [...fields, transistor, preDriver, ...designatorItems(), ...linkItems()];
}

function designatorItems(): readonly Item[] {
  const keys = [
    'baseResistor',
    'shuntResistor',
    'pullUp',
    'speedUpCapacitor',
    'load',
    'loadResistor',
    'preDriver',
    'preBaseResistor',
    'preShuntResistor',
    'clamp',
    'clampZener',
    'drive',
  ] as const satisfies (keyof Designators)[];
  return keys.map((key) => ({
    key: `designators.${key}`,
    label: `Designator: ${key}`,
    value: ({ designators }) => designators[key],
    text: ({ designators }) => designators[key] ?? '–',
  }));
}

function linkItems(): readonly Item[] {
  const keys = ['load', 'drive', 'clamp'] as const;
  return keys.map((key) => ({
    key: `parts.${key}`,
    label: `Library part: ${key}`,
    value: ({ parts }) => parts[key],
    text: ({ parts }) => (parts[key] === null ? 'typed by hand' : 'from the library'),
  }));
}

const differ = (a: unknown, b: unknown) => JSON.stringify(a) !== JSON.stringify(b);

/** What differs between both drafts, against the state both started from. */
export function conflictRows(base: Draft, yours: Draft, theirs: Draft): readonly ConflictRow[] {
  return items()
    .filter(({ value }) => differ(value(yours), value(theirs)))
    .map(({ key, label, value, text }) => {
      const mine = differ(value(base), value(yours));
      const other = differ(value(base), value(theirs));
      return {
        key,
        label,
        yours: text(yours),
        theirs: text(theirs),
        clash: mine && other,
        proposed: mine ? 'yours' : 'theirs',
      };
    });
}

/**
 * The draft that takes each row from the side chosen for it.
 *
 * @returns the draft, or null where the mix is no stage
 */
export function merged(
  yours: Draft,
  theirs: Draft,
  sides: ReadonlyMap<string, Side>,
): Draft | null {
  const from = (key: string) => (sides.get(key) === 'theirs' ? theirs : yours);
  const value = stageToForm(yours.definition);
  const other = stageToForm(theirs.definition);
  const mixed = Object.fromEntries(
    FIELD_PATHS.map((path) => [path, sides.get(path) === 'theirs' ? other[path] : value[path]]),
  ) as unknown as typeof value;
  const base = {
    ...yours.definition,
    transistor: from('transistor').definition.transistor,
    preDriver: from('preDriver').definition.preDriver,
  };
  const reading = formToStage(mixed, base);
  if (!reading.ok) return null;
  const designators = Object.fromEntries(
    Object.keys(yours.designators).map((key) => [
      key,
      from(`designators.${key}`).designators[key as keyof Designators],
    ]),
  ) as Designators;
  return {
    definition: reading.stage,
    designators,
    parts: {
      ...yours.parts,
      transistor: from('transistor').parts.transistor,
      preDriver: from('preDriver').parts.preDriver,
      load: from('parts.load').parts.load,
      drive: from('parts.drive').parts.drive,
      clamp: from('parts.clamp').parts.clamp,
    },
  };
}
