import type { AuditEntry } from '../audit/record-audit.ts';
import type { PersonEntity } from './person-entity.ts';

/** An entry of the trail about a person's account. */
export function personAudit(
  { id, name }: Pick<PersonEntity, 'id' | 'name'>,
  action: string,
  summary: string,
  detail: Record<string, unknown> = {},
): AuditEntry {
  return {
    action,
    objectKind: 'person',
    objectId: id,
    objectName: name,
    projectId: null,
    summary,
    detail,
  };
}
