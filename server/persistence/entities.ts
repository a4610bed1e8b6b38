import { AuditHeadEntity } from '../audit/audit-head-entity.ts';
import { AuditLineEntity } from '../audit/audit-line-entity.ts';
import { OutgoingMailEntity } from '../mail/outgoing-mail-entity.ts';
import { SessionEntity } from '../session/session-entity.ts';
import { OneTimeTokenEntity } from '../users/one-time-token-entity.ts';
import { PersonEntity } from '../users/person-entity.ts';
import { WorkspaceEntity } from '../users/workspace-entity.ts';

/** A list of classes, never a glob: the same under tsc, tsx and vitest. */
export const entities = [
  AuditHeadEntity,
  AuditLineEntity,
  OneTimeTokenEntity,
  OutgoingMailEntity,
  PersonEntity,
  SessionEntity,
  WorkspaceEntity,
] as const;
