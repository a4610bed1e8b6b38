import {
  lockRevision,
  passRevision,
  previewLock,
  readRevision,
  returnRevision,
  saveRevision,
  submitRevision,
  verifyRevision,
  withdrawRevision,
} from '../../shared/contract/revision.ts';
import { startRevision } from '../../shared/contract/stage.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { Database } from '../persistence/database.ts';
import type { SignInService } from '../session/sign-in-service.ts';
import { DraftService } from './draft-service.ts';
import { LockService } from './lock-service.ts';
import { startNextRevision } from './next-revision.ts';
import { WorkflowService } from './workflow-service.ts';

export function revisionEndpoints(services: {
  readonly database: Database;
  readonly signIns: SignInService;
}): Endpoint[] {
  const { database } = services;
  const drafts = new DraftService(database);
  const workflow = new WorkflowService(database);
  const locks = new LockService(database, services.signIns);
  return [
    endpoint(readRevision, { project: 'member' }, ({ actor, params }) =>
      drafts.read(actor, params.revisionId),
    ),
    endpoint(saveRevision, { project: ['designer'] }, (call) =>
      drafts.save(call, call.params.revisionId, call.ifMatch, call.body),
    ),
    endpoint(startRevision, { project: ['designer'] }, (call) =>
      startNextRevision(database, call, call.params.stageId),
    ),
    endpoint(submitRevision, { project: ['designer'] }, (call) =>
      workflow.submit(call, call.params.revisionId, call.ifMatch),
    ),
    endpoint(passRevision, { project: ['checker'] }, (call) =>
      workflow.pass(call, call.params.revisionId, call.ifMatch),
    ),
    endpoint(returnRevision, { project: ['checker', 'approver'] }, (call) =>
      workflow.giveBack(call, call.params.revisionId, call.ifMatch, call.body.reason),
    ),
    endpoint(withdrawRevision, { project: ['designer'] }, (call) =>
      workflow.withdraw(call, call.params.revisionId, call.ifMatch, call.body.reason),
    ),
    endpoint(previewLock, { project: 'member' }, async ({ actor, params }) => ({
      body: await locks.preview(actor, params.revisionId),
    })),
    endpoint(lockRevision, { project: ['approver'] }, (call) =>
      locks.lock(call, call.params.revisionId, call.ifMatch, call.body, call.http.request.ip ?? ''),
    ),
    endpoint(verifyRevision, { project: 'member' }, async ({ actor, params }) => ({
      body: await locks.verify(actor, params.revisionId),
    })),
  ];
}
