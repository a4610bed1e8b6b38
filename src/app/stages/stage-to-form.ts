import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { FIELD_PATHS, fieldSpec, type FieldPath, type StageFormValue } from './stage-fields.ts';

/** Stand-ins for fields a stage of this kind lacks, so that they are filled when the kind changes. */
const USUAL: Partial<Record<FieldPath, unknown>> = {
  quantity: 1,
  duty: 1,
  frequencyHz: 0,
  'drive/high/dropV': 0.6,
  'drive/high/currentA': 0.008,
  'drive/high/unloadedDropV': 0,
  'drive/pullUp/valueOhm': 4700,
  'drive/pullUp/tolerance': 0.05,
  'drive/leakageA': 0,
  'drive/groundShiftV': 0,
  'drive/reset/leakageA': 1e-6,
  'load/referenceDegC': 20,
  'load/temperatureRiseK': 0,
  'preDriver/shuntResistor/valueOhm': 22000,
  'preDriver/shuntResistor/tolerance': 0.05,
  'load/tolerance': 0.1,
  'shuntResistor/valueOhm': 22000,
  'shuntResistor/tolerance': 0.05,
  'clamp/forwardV': 1,
};

/** The value at a path with slashes; undefined where a step of it is missing. */
export function valueAt(source: unknown, path: string): unknown {
  return path
    .split('/')
    .reduce<unknown>(
      (value, key) =>
        value === null || value === undefined ? undefined : (value as Record<string, unknown>)[key],
      source,
    );
}

/** A stage as the form holds it: every field by its path, whatever the kinds of drive, load and clamp. */
export function stageToForm(stage: StageInput): StageFormValue {
  const entries = FIELD_PATHS.map((path) => [path, entryOf(stage, path)] as const);
  return Object.fromEntries(entries) as unknown as StageFormValue;
}

function entryOf(stage: StageInput, path: FieldPath): unknown {
  if (path === 'shuntFitted') return stage.shuntResistor !== null;
  if (path === 'preShuntFitted') return (stage.preDriver?.shuntResistor ?? null) !== null;
  const found = valueAt(stage, path) ?? USUAL[path];
  switch (fieldSpec(path).kind) {
    case 'quantity':
      return found ?? null;
    case 'span':
      return spanOf(found);
    case 'flag':
      return found ?? false;
    case 'text':
    case 'choice':
      return found ?? '';
  }
}

function spanOf(found: unknown) {
  const { min, max } = (found ?? { min: null, max: null }) as { min: number; max: number };
  return { min, max };
}
