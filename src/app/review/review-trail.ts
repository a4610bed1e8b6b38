import type { Revision } from '../../../shared/contract/revision.ts';
import type { Crumb } from '../ui/page-title.ts';

/** The way to a page of a revision. */
export function reviewTrail(revision: Revision | undefined, page: string): readonly Crumb[] {
  if (revision === undefined) return [];
  const { projectId, projectCode, projectTitle, stageId, id, definition, letter } = revision;
  return [
    { text: 'Projects', link: ['/projects'] },
    { text: `${projectCode} ${projectTitle}`, link: ['/p', projectId] },
    { text: `${definition.reference} ${letter}`, link: ['/p', projectId, 's', stageId, 'r', id] },
    { text: page },
  ];
}
