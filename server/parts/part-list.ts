import { type EntityManager, In, type SelectQueryBuilder } from 'typeorm';
import type * as z from 'zod';
import type { listParts, listRecords, PartRow } from '../../shared/contract/part.ts';
import type { PartKind } from '../../shared/parts/part-record.ts';
import { naturalOrder } from '../../shared/report/natural-order.ts';
import { jsonText } from '../persistence/dialect.ts';
import { PartRevisionEntity } from './part-revision-entity.ts';
import { PartVerificationEntity } from './part-verification-entity.ts';

type Query = z.output<typeof listParts.query>;
type Row = PartRow & { readonly search: string };

/** The library by the latest revision of each part, filtered, sorted and paged. */
export async function partList(
  manager: EntityManager,
  query: Query,
): Promise<z.input<typeof listParts.reply>> {
  const rows = await latestRows(manager);
  const matching = rows.filter((row) => matches(row, query));
  const sign = query.direction === 'asc' ? 1 : -1;
  matching.sort(
    (a, b) => sign * ORDER[query.sort](a, b) || naturalOrder(a.partNumber, b.partNumber),
  );
  const from = (query.page - 1) * query.pageSize;
  return {
    parts: matching.slice(from, from + query.pageSize),
    matching: matching.length,
    total: rows.length,
  };
}

const ORDER: Record<Query['sort'], (a: Row, b: Row) => number> = {
  partNumber: (a, b) => naturalOrder(a.partNumber, b.partNumber),
  summary: (a, b) => naturalOrder(a.summary, b.summary),
  package: (a, b) => naturalOrder(a.package ?? '', b.package ?? ''),
  changed: (a, b) => a.changedAtMs - b.changedAtMs,
};

function matches(row: Row, { kind, search, verified }: Query): boolean {
  return (
    (kind === undefined || row.kind === kind) &&
    (search === undefined || row.search.includes(search.trim().toLowerCase())) &&
    (verified === undefined || row.verified === (verified === 'yes'))
  );
}

/** Records are not parsed for lists: the few members shown are taken out by the database. */
async function latestRows(manager: EntityManager): Promise<Row[]> {
  const rows = await manager
    .createQueryBuilder(PartRevisionEntity, 'revision')
    .innerJoin('revision.part', 'part')
    .leftJoin(PartVerificationEntity, 'check', 'check.partRevisionId = revision.id')
    .select('part.id', 'id')
    .addSelect('part.kind', 'kind')
    .addSelect('part.partNumber', 'partNumber')
    .addSelect('revision.summary', 'summary')
    .addSelect(jsonText('revision.record', 'package'), 'package')
    .addSelect(jsonText('revision.record', 'family'), 'family')
    .addSelect(jsonText('revision.record', 'polarity'), 'polarity')
    .addSelect(jsonText('revision.record', 'confidence'), 'confidence')
    .addSelect('revision.id', 'latestRevisionId')
    .addSelect('revision.number', 'revision')
    .addSelect('revision.createdAtMs', 'changedAtMs')
    .addSelect('revision.search', 'search')
    .addSelect('check.partRevisionId', 'verification')
    .where(isLatest)
    .getRawMany<Omit<Row, 'verified'> & { verification: string | null }>();
  return rows.map(({ verification, ...row }) => ({ ...row, verified: verification !== null }));
}

/** The latest data of every part of a kind, by part number. */
export async function latestRecords(
  manager: EntityManager,
  kind: PartKind,
): Promise<z.input<typeof listRecords.reply>> {
  const revisions = await manager
    .createQueryBuilder(PartRevisionEntity, 'revision')
    .innerJoin('revision.part', 'part')
    .where(isLatest)
    .andWhere('part.kind = :kind', { kind })
    .getMany();
  const ids = revisions.map(({ id }) => id);
  const checks = await manager.findBy(PartVerificationEntity, { partRevisionId: In(ids) });
  const verified = new Set(checks.map(({ partRevisionId }) => partRevisionId));
  const parts = revisions.map(({ id, partId, record }) => {
    return { partId, partRevisionId: id, verified: verified.has(id), record };
  });
  parts.sort((a, b) => naturalOrder(a.record.partNumber, b.record.partNumber));
  return { parts };
}

function isLatest(outer: SelectQueryBuilder<PartRevisionEntity>): string {
  const latest = outer
    .subQuery()
    .select('MAX(other.number)')
    .from(PartRevisionEntity, 'other')
    .where('other.partId = part.id')
    .getQuery();
  return `revision.number = ${latest}`;
}
