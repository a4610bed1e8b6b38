import type { Endpoint } from './http/endpoint.ts';
import type { Services } from './services.ts';
import { sessionEndpoints } from './session/session-endpoints.ts';

/** Every route of the API, by resource. */
export function allEndpoints(services: Services): Endpoint[] {
  return [...sessionEndpoints(services)];
}
