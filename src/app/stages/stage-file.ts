import { saveAs } from 'file-saver';
import type { Revision } from '../../../shared/contract/revision.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';

/** A stage file read: the stage, or what is wrong with it, each sentence naming the field. */
export type StageFileReading =
  | { readonly ok: true; readonly stage: StageInput }
  | { readonly ok: false; readonly faults: readonly string[] };

/** Offers the definition as a stage file named after project, stage, revision and day. */
export function downloadStageFile(revision: Revision, definition: StageInput, day: Date): void {
  const date = day.toISOString().slice(0, 10).replaceAll('-', '');
  const name = `${revision.projectCode}_${definition.reference}_rev${revision.letter}_${date}.json`;
  const text = `${JSON.stringify(definition, null, 2)}\n`;
  saveAs(new Blob([text], { type: 'application/json' }), name.replaceAll('/', '-'));
}

/** Reads a stage file through the stage file's own schema. */
export function readStageText(text: string): StageFileReading {
  let content: unknown;
  try {
    content = JSON.parse(text);
  } catch {
    return { ok: false, faults: ['The file is not JSON.'] };
  }
  const parsed = StageInput.safeParse(content);
  if (parsed.success) return { ok: true, stage: parsed.data };
  const faults = parsed.error.issues.map(({ path, message }) => `${path.join('.')}: ${message}`);
  return { ok: false, faults };
}
