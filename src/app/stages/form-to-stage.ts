import { NO_CLAMP } from '../../../shared/stage/clamp.ts';
import { STAGE_FORMAT, StageInput } from '../../../shared/stage/stage-input.ts';
import {
  applies,
  FIELD_PATHS,
  fieldSpec,
  shapeOf,
  type FieldPath,
  type StageFormValue,
} from './stage-fields.ts';

/** A field at fault, and what was expected there. */
export interface FieldFault {
  readonly path: FieldPath | null;
  readonly message: string;
}

export type FormReading =
  | { readonly ok: true; readonly stage: StageInput }
  | { readonly ok: false; readonly faults: readonly FieldFault[] };

/**
 * Reads the form through the stage file's own schema, so that form, file and server agree on every rule.
 *
 * @param base where everything without a field comes from: transistor, policy, what other kinds of stage hold
 */
export function formToStage(value: StageFormValue, base: StageInput): FormReading {
  const parsed = StageInput.safeParse(candidateOf(value, base));
  if (parsed.success) return { ok: true, stage: parsed.data };
  const faults = parsed.error.issues.map(({ path, message }) => ({
    path: fieldOf(path.map(String)),
    message,
  }));
  return { ok: false, faults };
}

function candidateOf(value: StageFormValue, base: StageInput): unknown {
  const shape = shapeOf(value);
  const candidate: Record<string, unknown> = {
    format: STAGE_FORMAT,
    drive: driveRest(value, base),
    clamp: { ...NO_CLAMP },
    shuntResistor: null,
    preDriver: frontRest(value, base),
    transistor: base.transistor,
    policy: base.policy,
  };
  for (const path of FIELD_PATHS) {
    if (FLAGS.includes(path) || !applies(path, shape)) continue;
    const entry = emptied(path, value[path]);
    if (path === 'drive/reset/kind' && entry === null) continue;
    put(candidate, path.split('/'), entry);
  }
  return candidate;
}

/** Fields that stand for whether a part is there, and have no key of their own. */
const FLAGS: readonly FieldPath[] = ['shuntFitted', 'preShuntFitted'];

/** The transistor in front; its base network has fields. */
function frontRest(value: StageFormValue, { preDriver }: StageInput) {
  return value.topology === 'two-transistor-high-side' && preDriver !== null
    ? { transistor: preDriver.transistor, shuntResistor: null }
    : preDriver;
}

/** What a drive may carry without its kind having a field for it. */
function driveRest(value: StageFormValue, { drive }: StageInput) {
  const pushPull = value['drive/kind'] === 'push-pull';
  return {
    reset: null,
    pullUp: pushPull ? drive.pullUp : null,
    high: pushPull ? null : drive.high,
  };
}

/** Empty text and an empty choice stand for null where the field may be empty. */
function emptied(path: FieldPath, entry: unknown): unknown {
  const spec = fieldSpec(path);
  const blank = entry === '' && (spec.kind === 'choice' || (spec.kind === 'text' && spec.optional));
  return blank ? null : entry;
}

function put(
  target: Record<string, unknown>,
  [key = '', ...below]: string[],
  entry: unknown,
): void {
  if (below.length === 0) {
    const span = typeof entry === 'object' && entry !== null;
    target[key] = span ? { ...(target[key] as object | undefined), ...entry } : entry;
    return;
  }
  target[key] ??= {};
  put(target[key] as Record<string, unknown>, below, entry);
}

/** The field an issue's path belongs to: the longest one that starts it. */
export function fieldOf(path: readonly string[]): FieldPath | null {
  for (let length = path.length; length > 0; length -= 1) {
    const candidate = path.slice(0, length).join('/');
    const found = FIELD_PATHS.find((known) => known === candidate);
    if (found !== undefined) return found;
  }
  return null;
}
