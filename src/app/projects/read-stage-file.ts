import { StageInput } from '../../../shared/stage/stage-input.ts';

/** One stage out of a file: either its definition, or what is wrong with it. */
export interface FileStage {
  readonly file: string;
  /** What the list calls it: `Q12 Brine agitator relay`, or its place in the file. */
  readonly name: string;
  readonly definition: StageInput | null;
  /** Sentences that name the field by its path. */
  readonly faults: readonly string[];
}

/** Reads a stage file: one stage, or an array of them. */
export function readStageFile(file: string, text: string): readonly FileStage[] {
  let content: unknown;
  try {
    content = JSON.parse(text);
  } catch {
    return [{ file, name: file, definition: null, faults: ['The file is not JSON.'] }];
  }
  const stages: readonly unknown[] = Array.isArray(content) ? content : [content];
  if (stages.length === 0) {
    return [{ file, name: file, definition: null, faults: ['The file holds no stage.'] }];
  }
  return stages.map((stage, index) => readStage(file, stage, index));
}

function readStage(file: string, stage: unknown, index: number): FileStage {
  const parsed = StageInput.safeParse(stage);
  if (parsed.success) {
    const { reference, title } = parsed.data;
    return { file, name: `${reference} ${title}`, definition: parsed.data, faults: [] };
  }
  const faults = parsed.error.issues.map(({ path, message }) =>
    path.length > 0 ? `${path.join('.')}: ${message}` : message,
  );
  return { file, name: givenName(stage) ?? `Stage ${index + 1}`, definition: null, faults };
}

function givenName(stage: unknown): string | null {
  if (typeof stage !== 'object' || stage === null || !('reference' in stage)) return null;
  return typeof stage.reference === 'string' ? stage.reference : null;
}
