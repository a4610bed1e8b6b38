import {
  createPart,
  listParts,
  listRecords,
  readPart,
  readPartRevision,
  revisePart,
  verifyPart,
} from '../../shared/contract/part.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { Database } from '../persistence/database.ts';
import { PartService } from './part-service.ts';

/** The library is one for all: rights to change it come with a role in any project. */
export function partEndpoints({ database }: { readonly database: Database }): Endpoint[] {
  const parts = new PartService(database);
  return [
    endpoint(listParts, 'signed-in', async ({ query }) => ({ body: await parts.list(query) })),
    endpoint(listRecords, 'signed-in', async ({ query }) => ({ body: await parts.records(query) })),
    endpoint(readPart, 'signed-in', ({ actor, params }) => parts.read(actor, params.partId)),
    endpoint(readPartRevision, 'signed-in', ({ params }) =>
      parts.readRevision(params.partRevisionId),
    ),
    endpoint(createPart, { anyProject: ['designer'] }, (call) => parts.create(call, call.body)),
    endpoint(revisePart, { anyProject: ['designer'] }, (call) =>
      parts.revise(call, call.params.partId, call.ifMatch, call.body),
    ),
    endpoint(verifyPart, { anyProject: ['checker'] }, (call) =>
      parts.verify(call, call.params.partRevisionId, call.body),
    ),
  ];
}
