import { createStage, listStages, readStage } from '../../shared/contract/stage.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { Database } from '../persistence/database.ts';
import { accessProject } from '../projects/project-access.ts';
import { stageList } from './stage-list.ts';
import { StageService } from './stage-service.ts';

export function stageEndpoints({ database }: { readonly database: Database }): Endpoint[] {
  const stages = new StageService(database);
  return [
    endpoint(listStages, { project: 'member' }, ({ actor, params, query }) =>
      database.read(async (manager) => {
        const { project } = await accessProject(manager, actor, params.projectId);
        return { body: await stageList(manager, project.id, query) };
      }),
    ),
    endpoint(createStage, { project: ['designer'] }, (call) =>
      stages.create(call, call.params.projectId, call.body),
    ),
    endpoint(readStage, { project: 'member' }, ({ actor, params }) =>
      stages.read(actor, params.stageId),
    ),
  ];
}
