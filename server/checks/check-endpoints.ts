import { checkRoutes } from '../../shared/contract/revision.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { Database } from '../persistence/database.ts';
import { CheckService } from './check-service.ts';
import { FindingService } from './finding-service.ts';

export function checkEndpoints({ database }: { readonly database: Database }): Endpoint[] {
  const checks = new CheckService(database);
  const findings = new FindingService(database);
  return [
    endpoint(checkRoutes.save, { project: ['checker'] }, (call) =>
      checks.save(call, call.params.revisionId, call.ifMatch, call.body),
    ),
    endpoint(checkRoutes.raise, { project: ['checker'] }, (call) =>
      findings.raise(call, call.params.revisionId, call.ifMatch, call.body),
    ),
    endpoint(checkRoutes.answer, { project: ['designer'] }, (call) =>
      findings.say(call, call.params, call.ifMatch, 'answered', call.body.text),
    ),
    endpoint(checkRoutes.close, { project: ['checker'] }, (call) =>
      findings.say(call, call.params, call.ifMatch, 'closed', call.body.text),
    ),
    endpoint(checkRoutes.reopen, { project: ['checker'] }, (call) =>
      findings.say(call, call.params, call.ifMatch, 'reopened', call.body.text),
    ),
  ];
}
