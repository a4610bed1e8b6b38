import { auditEndpoints } from './audit/audit-endpoints.ts';
import { bomNoteEndpoints } from './bom-notes/bom-note-endpoints.ts';
import { calculationEndpoints } from './calculations/calculation-endpoints.ts';
import { checkEndpoints } from './checks/check-endpoints.ts';
import { deskEndpoints } from './desk/desk-endpoints.ts';
import type { Endpoint } from './http/endpoint.ts';
import { partEndpoints } from './parts/part-endpoints.ts';
import { policyEndpoints } from './policies/policy-endpoints.ts';
import { projectEndpoints } from './projects/project-endpoints.ts';
import { revisionEndpoints } from './revisions/revision-endpoints.ts';
import { searchEndpoints } from './search/search-endpoints.ts';
import type { Services } from './services.ts';
import { sessionEndpoints } from './session/session-endpoints.ts';
import { accountEndpoints } from './users/account-endpoints.ts';
import { peopleEndpoints } from './users/people-endpoints.ts';
import { stageEndpoints } from './stages/stage-endpoints.ts';

/** Every route of the API, by resource. */
export function allEndpoints(services: Services): Endpoint[] {
  return [
    ...sessionEndpoints(services),
    ...accountEndpoints(services),
    ...peopleEndpoints(services),
    ...auditEndpoints(services),
    ...policyEndpoints(services),
    ...projectEndpoints(services),
    ...stageEndpoints(services),
    ...revisionEndpoints(services),
    ...checkEndpoints(services),
    ...bomNoteEndpoints(services),
    ...calculationEndpoints(services),
    ...partEndpoints(services),
    ...deskEndpoints(services),
    ...searchEndpoints(services),
  ];
}
