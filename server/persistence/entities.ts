import { AuditHeadEntity } from '../audit/audit-head-entity.ts';
import { AuditLineEntity } from '../audit/audit-line-entity.ts';
import { OutgoingMailEntity } from '../mail/outgoing-mail-entity.ts';
import { SessionEntity } from '../session/session-entity.ts';
import { OneTimeTokenEntity } from '../users/one-time-token-entity.ts';
import { PersonEntity } from '../users/person-entity.ts';
import { WorkspaceEntity } from '../users/workspace-entity.ts';
import { BomNoteEntity } from '../bom-notes/bom-note-entity.ts';
import { CheckRecordEntity } from '../checks/check-record-entity.ts';
import { FindingEntity } from '../checks/finding-entity.ts';
import { FindingEventEntity } from '../checks/finding-event-entity.ts';
import { PartEntity } from '../parts/part-entity.ts';
import { PartRevisionEntity } from '../parts/part-revision-entity.ts';
import { PartVerificationEntity } from '../parts/part-verification-entity.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { MembershipEntity } from '../projects/membership-entity.ts';
import { ProjectEntity } from '../projects/project-entity.ts';
import { RevisionEntity } from '../revisions/revision-entity.ts';
import { RevisionMoveEntity } from '../revisions/revision-move-entity.ts';
import { RevisionPartEntity } from '../revisions/revision-part-entity.ts';
import { RevisionPersonEntity } from '../revisions/revision-person-entity.ts';
import { SignatureEntity } from '../revisions/signature-entity.ts';
import { StageEntity } from '../stages/stage-entity.ts';

/** A list of classes, never a glob: the same under tsc, tsx and vitest. */
export const entities = [
  AuditHeadEntity,
  AuditLineEntity,
  OneTimeTokenEntity,
  OutgoingMailEntity,
  PersonEntity,
  SessionEntity,
  WorkspaceEntity,
  BomNoteEntity,
  CheckRecordEntity,
  FindingEntity,
  FindingEventEntity,
  MembershipEntity,
  PartEntity,
  PartRevisionEntity,
  PartVerificationEntity,
  PolicyEntity,
  ProjectEntity,
  RevisionEntity,
  RevisionMoveEntity,
  RevisionPartEntity,
  RevisionPersonEntity,
  SignatureEntity,
  StageEntity,
] as const;
