import type { BomNote } from '../../../shared/report/bom-note.ts';
import type { Crumb } from '../ui/page-title.ts';

/** The way to a note of a project; empty until the note is known. */
export function noteTrail(
  projectId: string,
  note: BomNote | null | undefined,
  here: string,
): readonly Crumb[] {
  if (!note) return [];
  const { projectCode, title } = note.titleBlock;
  const issued = note.issue !== null;
  return [
    { text: 'Projects', link: ['/projects'] },
    { text: `${projectCode} ${title}`, link: ['/p', projectId] },
    ...(issued ? [{ text: 'BOM note', link: ['/p', projectId, 'bom-note'] }] : []),
    { text: here },
  ];
}
