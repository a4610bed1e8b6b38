import { In, type EntityManager } from 'typeorm';
import type * as z from 'zod';
import type { Part, PartRevision, PartVerification } from '../../shared/contract/part.ts';
import type { PersonRef } from '../../shared/contract/common-fields.ts';
import type { Actor } from '../audit/act.ts';
import { notFound } from '../http/api-error.ts';
import type { Versioned } from '../http/versioned.ts';
import { namesOf } from '../projects/names-of.ts';
import { PartEntity } from './part-entity.ts';
import { PartRevisionEntity } from './part-revision-entity.ts';
import { mayKeepLibrary, mayVerify } from './part-rights.ts';
import { partUses } from './part-uses.ts';
import { PartVerificationEntity } from './part-verification-entity.ts';

export interface PartAnswer {
  readonly body: z.input<typeof Part>;
  readonly etag: Versioned;
}

/** A part with its revisions, newest first. */
export interface PartContext {
  readonly part: PartEntity;
  readonly revisions: readonly PartRevisionEntity[];
  readonly latest: PartRevisionEntity;
  readonly verifications: readonly PartVerificationEntity[];
  /** Moves with every new revision and every verification. */
  readonly etag: Versioned;
}

/** @throws {ApiError} not-found */
export async function openPart(manager: EntityManager, partId: string): Promise<PartContext> {
  const part = await manager.findOneBy(PartEntity, { id: partId });
  const revisions = await manager.find(PartRevisionEntity, {
    where: { partId },
    order: { number: 'DESC' },
  });
  const [latest] = revisions;
  if (part === null || latest === undefined) throw notFound();
  const verifications = await manager.findBy(PartVerificationEntity, {
    partRevisionId: In(revisions.map(({ id }) => id)),
  });
  const version = revisions.length + verifications.length;
  return { part, revisions, latest, verifications, etag: { id: partId, version } };
}

/** Reads a part for one person, as every route that touches it answers. */
export async function answerPart(
  manager: EntityManager,
  actor: Actor,
  partId: string,
): Promise<PartAnswer> {
  const { part, revisions, latest, verifications, etag } = await openPart(manager, partId);
  const named = await namesOf(manager, [
    ...revisions.map(({ authorId }) => authorId ?? ''),
    ...verifications.map(({ personId }) => personId),
  ]);
  const replies = revisions.map((revision) => revisionReply(revision, verifications, named));
  const [first] = replies;
  if (first === undefined) throw notFound();
  const verified = first.verification !== null;
  const { id, kind, partNumber } = part;
  return {
    body: {
      ...{ id, kind, partNumber },
      latest: first,
      revisions: replies,
      ...(await partUses(manager, actor, partId)),
      may: {
        revise: await mayKeepLibrary(manager, actor),
        verify: await mayVerify(manager, actor, { authorId: latest.authorId, verified }),
      },
    },
    etag,
  };
}

export async function answerPartRevision(
  manager: EntityManager,
  partRevisionId: string,
): Promise<{ body: PartRevision }> {
  const revision = await manager.findOneBy(PartRevisionEntity, { id: partRevisionId });
  if (revision === null) throw notFound();
  const verifications = await manager.findBy(PartVerificationEntity, { partRevisionId });
  const named = await namesOf(manager, [
    revision.authorId ?? '',
    ...verifications.map(({ personId }) => personId),
  ]);
  return { body: revisionReply(revision, verifications, named) };
}

function revisionReply(
  { authorId, comment, createdAtMs, id, number, partId, record, summary }: PartRevisionEntity,
  verifications: readonly PartVerificationEntity[],
  named: (id: string) => PersonRef,
): PartRevision {
  const found = verifications.find(({ partRevisionId }) => partRevisionId === id);
  const verification: PartVerification | null = found
    ? {
        by: named(found.personId),
        atMs: found.atMs,
        document: found.document,
        note: found.note,
      }
    : null;
  return {
    ...{ id, partId, number, record, summary, comment, createdAtMs, verification },
    author: authorId === null ? null : named(authorId),
  };
}
