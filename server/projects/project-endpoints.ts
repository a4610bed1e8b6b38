import { projectActivity } from '../../shared/contract/audit.ts';
import {
  createProject,
  listProjects,
  readProject,
  saveMembers,
  saveProject,
} from '../../shared/contract/project.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { Database } from '../persistence/database.ts';
import { accessProject } from './project-access.ts';
import { recentActivity } from './project-activity.ts';
import { ProjectService } from './project-service.ts';

export function projectEndpoints({ database }: { readonly database: Database }): Endpoint[] {
  const projects = new ProjectService(database);
  return [
    endpoint(listProjects, 'signed-in', async ({ actor }) => ({
      body: { projects: await projects.list(actor) },
    })),
    endpoint(createProject, 'signed-in', (call) => projects.create(call, call.body)),
    endpoint(readProject, { project: 'member' }, ({ actor, params }) =>
      projects.read(actor, params.projectId),
    ),
    endpoint(saveProject, { project: 'manager' }, (call) =>
      projects.save(call, call.params.projectId, call.ifMatch, call.body),
    ),
    endpoint(saveMembers, { project: 'manager' }, (call) =>
      projects.saveMembers(call, call.params.projectId, call.ifMatch, call.body.members),
    ),
    endpoint(projectActivity, { project: 'member' }, ({ actor, params, query }) =>
      database.read(async (manager) => {
        const { project } = await accessProject(manager, actor, params.projectId);
        return { body: { lines: await recentActivity(manager, [project.id], query.limit) } };
      }),
    ),
  ];
}
