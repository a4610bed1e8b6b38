import type * as z from 'zod';

/** One thing wrong with a document: where, and what was expected there. */
export interface StageIssue {
  /** JSON path such as `$.transistor.gain[0].icA`. */
  readonly path: string;
  readonly expected: string;
}

/**
 * What a failed parse of a stage file has to say, one line per field. Unknown keys, which the schema reports on
 * the object that holds them, are named with their own path.
 */
export function stageIssues(error: z.ZodError): StageIssue[] {
  return error.issues.flatMap((issue) =>
    issue.code === 'unrecognized_keys'
      ? issue.keys.map((key) => ({
          path: jsonPath([...issue.path, key]),
          expected: 'no such key in a stage file',
        }))
      : [{ path: jsonPath(issue.path), expected: issue.message.replace(/^Invalid input: /, '') }],
  );
}

function jsonPath(path: readonly PropertyKey[]): string {
  return path.reduce<string>((text, step) => {
    if (typeof step === 'number') return `${text}[${step}]`;
    const name = String(step);
    return /^[A-Za-z_]\w*$/.test(name) ? `${text}.${name}` : `${text}[${JSON.stringify(name)}]`;
  }, '$');
}
