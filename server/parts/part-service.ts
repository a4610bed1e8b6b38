import type { EntityManager } from 'typeorm';
import type * as z from 'zod';
import type { createPart, listParts, listRecords, verifyPart } from '../../shared/contract/part.ts';
import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import { ApiError, notFound } from '../http/api-error.ts';
import { invalidField } from '../http/invalid-field.ts';
import { expectVersion, type Versioned } from '../http/versioned.ts';
import type { Database } from '../persistence/database.ts';
import { PartEntity } from './part-entity.ts';
import { latestRecords, partList } from './part-list.ts';
import { answerPart, answerPartRevision, openPart, type PartAnswer } from './part-reply.ts';
import { PartRevisionEntity } from './part-revision-entity.ts';
import { mayKeepLibrary, mayVerify, requirePermission } from './part-rights.ts';
import { PartVerificationEntity } from './part-verification-entity.ts';
import { insertPart, insertPartRevision } from './part-write.ts';

type Fields = z.output<typeof createPart.body>;

/** The part library: parts, their immutable revisions, and who verified them. */
export class PartService {
  constructor(private readonly database: Database) {}

  list(query: z.output<typeof listParts.query>) {
    return this.database.read((manager) => partList(manager, query));
  }

  records({ kind }: z.output<typeof listRecords.query>) {
    return this.database.read((manager) => latestRecords(manager, kind));
  }

  read(actor: Actor, partId: string): Promise<PartAnswer> {
    return this.database.read((manager) => answerPart(manager, actor, partId));
  }

  readRevision(partRevisionId: string): ReturnType<typeof answerPartRevision> {
    return this.database.read((manager) => answerPartRevision(manager, partRevisionId));
  }

  create(act: Act<Actor>, { record, comment }: Fields): Promise<PartAnswer> {
    return this.database.transaction(async (manager) => {
      requirePermission(await mayKeepLibrary(manager, act.actor), 'part-keeper');
      const { kind, partNumber } = record;
      if (await manager.existsBy(PartEntity, { kind, partNumber })) {
        throw invalidField(
          '/record/partNumber',
          `expected a number that is new to the library; ${partNumber} is there: revise it`,
        );
      }
      const partId = await insertPart(manager, record);
      const origin = { authorId: act.actor.id, comment, atMs: act.atMs };
      await insertPartRevision(manager, partId, 1, record, origin);
      await audit(manager, act, { partId, partNumber }, 'part.created', `added ${partNumber}`, {
        ...{ comment, record },
      });
      return answerPart(manager, act.actor, partId);
    });
  }

  /** An edit is a new revision; what was filled from the older one stays as it is and is flagged. */
  revise(
    act: Act<Actor>,
    partId: string,
    ifMatch: Versioned,
    { record, comment }: Fields,
  ): Promise<PartAnswer> {
    return this.database.transaction(async (manager) => {
      const { part, latest, etag } = await openPart(manager, partId);
      requirePermission(await mayKeepLibrary(manager, act.actor), 'part-keeper');
      expectVersion(ifMatch, etag);
      if (record.kind !== part.kind || record.partNumber !== part.partNumber) {
        throw invalidField(
          '/record/partNumber',
          `expected ${part.partNumber} of kind ${part.kind}: another number is another part`,
        );
      }
      const number = latest.number + 1;
      const origin = { authorId: act.actor.id, comment, atMs: act.atMs };
      await insertPartRevision(manager, partId, number, record, origin);
      const { partNumber } = part;
      await audit(
        manager,
        act,
        { partId, partNumber },
        'part.revised',
        `changed ${partNumber}, library revision ${number}`,
        { comment, number, old: latest.record, new: record },
      );
      return answerPart(manager, act.actor, partId);
    });
  }

  verify(
    act: Act<Actor>,
    partRevisionId: string,
    { document, note }: z.output<typeof verifyPart.body>,
  ): Promise<PartAnswer> {
    return this.database.transaction(async (manager) => {
      const revision = await manager.findOneBy(PartRevisionEntity, { id: partRevisionId });
      if (revision === null) throw notFound();
      const { authorId, number, partId, record } = revision;
      requirePermission(
        await mayVerify(manager, act.actor, { authorId, verified: false }),
        'part-verifier',
      );
      if (await manager.existsBy(PartVerificationEntity, { partRevisionId })) {
        throw new ApiError('conflict', 'These data are verified already.');
      }
      await manager.insert(PartVerificationEntity, {
        ...{ partRevisionId, personId: act.actor.id, document, note, atMs: act.atMs },
      });
      const { partNumber } = record;
      await audit(
        manager,
        act,
        { partId, partNumber },
        'part.verified',
        `verified ${partNumber}, library revision ${number}`,
        { document, note, number },
      );
      return answerPart(manager, act.actor, partId);
    });
  }
}

function audit(
  manager: EntityManager,
  act: Act<Actor>,
  { partId, partNumber }: { readonly partId: string; readonly partNumber: string },
  action: string,
  summary: string,
  detail: Record<string, unknown>,
): Promise<void> {
  const object = { objectKind: 'part', objectId: partId, objectName: partNumber, projectId: null };
  return recordAudit(manager, act, { action, ...object, summary, detail });
}
