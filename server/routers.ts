import { auditEndpoints } from './audit/audit-endpoints.ts';
import type { Endpoint } from './http/endpoint.ts';
import type { Services } from './services.ts';
import { sessionEndpoints } from './session/session-endpoints.ts';
import { accountEndpoints } from './users/account-endpoints.ts';
import { peopleEndpoints } from './users/people-endpoints.ts';

/** Every route of the API, by resource. */
export function allEndpoints(services: Services): Endpoint[] {
  return [
    ...sessionEndpoints(services),
    ...accountEndpoints(services),
    ...peopleEndpoints(services),
    ...auditEndpoints(services),
  ];
}
