import type { EntityManager } from 'typeorm';
import type { Lock } from '../../shared/contract/revision.ts';
import { lockContent } from './lock-document.ts';
import type { RevisionContext } from './revision-context.ts';
import { SignatureEntity } from './signature-entity.ts';

/** The signature block of a locked revision, its hash made again for this reply. */
export async function lockReply(
  manager: EntityManager,
  context: RevisionContext,
): Promise<Lock | null> {
  const signature = await manager.findOneBy(SignatureEntity, { revisionId: context.revision.id });
  if (signature === null) return null;
  const { approverId, approverName, hash, meaning, signedAtMs } = signature;
  const now = await lockContent(manager, context, meaning);
  return {
    approver: { id: approverId, name: approverName },
    ...{ signedAtMs, meaning, hash },
    intact: now.hash === hash,
  };
}
