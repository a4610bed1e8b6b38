import { evaluateStage } from '../../shared/checks/evaluate-stage.ts';
import type { LockPreview } from '../../shared/contract/revision.ts';
import type * as z from 'zod';
import type { Act, Actor } from '../audit/act.ts';
import { ApiError } from '../http/api-error.ts';
import type { Versioned } from '../http/versioned.ts';
import type { Database } from '../persistence/database.ts';
import type { SignInService } from '../session/sign-in-service.ts';
import { differences } from './differences.ts';
import { lockContent, meaningOf, sha256 } from './lock-document.ts';
import { permit } from './permit.ts';
import { auditRevision } from './revision-audit.ts';
import { openRevision, type RevisionContext } from './revision-context.ts';
import { answerRevision, type RevisionAnswer } from './revision-reply.ts';
import { makeMove } from './revision-write.ts';
import { SignatureEntity } from './signature-entity.ts';

export interface Verification {
  readonly whole: boolean;
  readonly storedHash: string;
  readonly recomputedHash: string;
  readonly differences: string[];
}

/** The signature under a revision: shown beforehand, given with the password, verified ever after. */
export class LockService {
  constructor(
    private readonly database: Database,
    private readonly signIns: Pick<SignInService, 'verifyPassword'>,
  ) {}

  /** What would be signed, and whether the stored result is what the engine computes today. */
  async preview(actor: Actor, revisionId: string): Promise<z.input<typeof LockPreview>> {
    const { context, meaning, hash } = await this.database.read(async (manager) => {
      const context = await openRevision(manager, actor, revisionId);
      const meaning = meaningOf(context);
      return { context, meaning, hash: (await lockContent(manager, context, meaning)).hash };
    });
    return { meaning, hash, recomputed: resultDifferences(context).length === 0 };
  }

  /**
   * Signs and locks. The password is asked at the act itself, outside of the transaction.
   *
   * @param shown the hash the approver was shown
   * @param address of the caller, for throttling
   */
  async lock(
    act: Act<Actor>,
    revisionId: string,
    ifMatch: Versioned,
    { password, hash: shown }: { readonly password: string; readonly hash: string },
    address: string,
  ): Promise<RevisionAnswer> {
    const seen = await this.database.read(async (manager) => {
      const context = await openRevision(manager, act.actor, revisionId);
      permit(context, 'lock', ifMatch);
      return context;
    });
    await this.signIns.verifyPassword(act.actor.id, password, address);
    if (resultDifferences(seen).length > 0) {
      throw new ApiError(
        'conflict',
        'The stored result is not what the engine computes today: return the revision to draft.',
      );
    }
    return this.database.transaction(async (manager) => {
      const context = await openRevision(manager, act.actor, revisionId);
      permit(context, 'lock', ifMatch);
      const meaning = meaningOf(context);
      const { hash, text } = await lockContent(manager, context, meaning);
      if (hash !== shown) {
        throw new ApiError('version-conflict', 'What you were shown is not what would be locked.');
      }
      const signature = { revisionId, approverId: act.actor.id, approverName: act.actor.name };
      await manager.insert(SignatureEntity, {
        ...{ ...signature, signedAtMs: act.atMs, meaning, hash, document: text },
      });
      await makeMove(manager, act, context, 'lock');
      await auditRevision(manager, act, context, 'revision.locked', (name) => `locked ${name}`, {
        ...{ hash, meaning, port: context.port },
      });
      return answerRevision(manager, act.actor, revisionId);
    });
  }

  /** Makes hash and result of a locked revision again and says what differs. */
  async verify(actor: Actor, revisionId: string): Promise<Verification> {
    const { context, signature, now } = await this.database.read(async (manager) => {
      const context = await openRevision(manager, actor, revisionId);
      const signature = await manager.findOneBy(SignatureEntity, { revisionId });
      if (signature === null) throw new ApiError('conflict', 'The revision is not locked.');
      return { context, signature, now: await lockContent(manager, context, signature.meaning) };
    });
    const found = [
      ...(sha256(signature.document) === signature.hash
        ? []
        : ['The signed document does not fit its own hash.']),
      ...differences(JSON.parse(signature.document), JSON.parse(now.text)),
      ...resultDifferences(context).map((line) => `Computed again: ${line}`),
    ];
    return {
      whole: found.length === 0 && now.hash === signature.hash,
      storedHash: signature.hash,
      recomputedHash: now.hash,
      differences: found,
    };
  }
}

/** Where the engine as it is today departs from the stored result. */
function resultDifferences({ revision }: RevisionContext): string[] {
  return differences(revision.evaluation, evaluateStage(revision.definition));
}
