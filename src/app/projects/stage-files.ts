import { saveAs } from 'file-saver';
import type { StageInput } from '../../../shared/stage/stage-input.ts';

export interface StageToSave {
  readonly projectCode: string;
  readonly letter: string;
  readonly definition: StageInput;
}

/** One file per stage, such as `CR-40_Q12_revB_20260310.json`. */
export function saveStageFiles(stages: readonly StageToSave[], nowMs: number): void {
  for (const { projectCode, letter, definition } of stages) {
    save(`${projectCode}_${plain(definition.reference)}_rev${letter}_${stamp(nowMs)}`, definition);
  }
}

/** All stages as the array of one file, such as `CR-40_stages_20260310.json`. */
export function saveStageArray(stages: readonly StageToSave[], nowMs: number): void {
  save(
    `${stages[0]?.projectCode ?? 'project'}_stages_${stamp(nowMs)}`,
    stages.map((stage) => stage.definition),
  );
}

function save(name: string, content: unknown): void {
  const text = `${JSON.stringify(content, null, 2)}\n`;
  saveAs(new Blob([text], { type: 'application/json' }), `${name}.json`);
}

/** Day of the export, UTC, as the file names carry it. */
function stamp(nowMs: number): string {
  return new Date(nowMs).toISOString().slice(0, 10).replaceAll('-', '');
}

/** A designator may hold a slash; a file name may not. */
function plain(reference: string): string {
  return reference.replaceAll('/', '-');
}
