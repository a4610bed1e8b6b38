import type * as z from 'zod';
import type { Project } from '../../../shared/contract/project.ts';
import type { Crumb } from '../ui/page-title.ts';

/** The way to a tab of a project; empty until the project is known. */
export function projectTrail(
  project: Pick<z.infer<typeof Project>, 'id' | 'code' | 'title'> | null,
  tab: string,
): readonly Crumb[] {
  if (!project) return [];
  const here = { text: `${project.code} ${project.title}` };
  return tab === 'Stages'
    ? [{ text: 'Projects', link: ['/projects'] }, here]
    : [
        { text: 'Projects', link: ['/projects'] },
        { ...here, link: ['/p', project.id] },
        { text: tab },
      ];
}
