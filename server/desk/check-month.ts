import { In, type EntityManager } from 'typeorm';
import type { Desk } from '../../shared/contract/desk.ts';
import { figureDifference } from '../../shared/review/pass-conditions.ts';
import { CheckRecordEntity } from '../checks/check-record-entity.ts';
import { RevisionEntity } from '../revisions/revision-entity.ts';
import { RevisionMoveEntity } from '../revisions/revision-move-entity.ts';

const HOUR_MS = 3_600_000;

/** A person's checks of the calendar month (UTC) that `nowMs` lies in. */
export async function checkMonth(
  manager: EntityManager,
  personId: string,
  nowMs: number,
): Promise<Desk['month']> {
  const now = new Date(nowMs);
  const fromMs = Date.UTC(now.getUTCFullYear(), now.getUTCMonth(), 1);
  const own = await manager.findBy(RevisionMoveEntity, { personId, move: In(['pass', 'return']) });
  const decided = own.filter(({ atMs }) => atMs >= fromMs);
  const revisionIds = decided.map(({ revisionId }) => revisionId);
  const moves = await manager.find(RevisionMoveEntity, {
    where: { revisionId: In(revisionIds), move: 'submit' },
    order: { sequence: 'ASC' },
  });
  const hours = decided.flatMap(({ atMs, revisionId, sequence }) => {
    const submitted = moves.findLast(
      (move) => move.revisionId === revisionId && move.sequence < sequence,
    );
    return submitted === undefined ? [] : [(atMs - submitted.atMs) / HOUR_MS];
  });
  const differences = await figureDifferences(manager, personId, revisionIds);
  return {
    checksDone: decided.length,
    returned: decided.filter(({ move }) => move === 'return').length,
    largestDifference: differences.length === 0 ? null : Math.max(...differences),
    medianHoursToCheck: median(hours),
  };
}

/** How far the person's own figures lay from the tool's, as magnitudes. */
async function figureDifferences(
  manager: EntityManager,
  checkerId: string,
  revisionIds: readonly string[],
): Promise<number[]> {
  const revisionId = In([...revisionIds]);
  const checks = await manager.findBy(CheckRecordEntity, { checkerId, revisionId });
  const revisions = await manager.find(RevisionEntity, {
    select: { id: true, evaluation: true },
    where: { id: revisionId },
  });
  return checks.flatMap((check) => {
    const criteria = revisions.find(({ id }) => id === check.revisionId)?.evaluation.criteria ?? [];
    const difference = figureDifference(check, criteria);
    return difference === null ? [] : [Math.abs(difference)];
  });
}

function median(values: readonly number[]): number | null {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  const upper = sorted[middle];
  if (upper === undefined) return null;
  return sorted.length % 2 === 1 ? upper : ((sorted[middle - 1] ?? upper) + upper) / 2;
}
