import type { EntityManager } from 'typeorm';
import type { PartLinks, PartStanding } from '../../shared/contract/revision.ts';
import type { PartKind } from '../../shared/parts/part-record.ts';
import type { StageInput } from '../../shared/stage/stage-input.ts';
import { invalidField } from '../http/invalid-field.ts';
import { PartRevisionEntity } from '../parts/part-revision-entity.ts';
import { isFromLibrary } from './library-figures.ts';
import { RevisionPartEntity } from './revision-part-entity.ts';

type Role = PartStanding['role'];

const KINDS: Record<Role, PartKind> = {
  transistor: 'transistor',
  preDriver: 'transistor',
  load: 'load',
  drive: 'logic-output',
  clamp: 'diode',
};
const ROLES = Object.keys(KINDS) as Role[];

/**
 * Replaces the part links of a draft. A transistor whose figures are no longer those of the linked record loses its
 * link: they count as typed by hand then.
 *
 * @throws {ApiError} invalid-input naming a link to nothing, or to a part of the wrong kind
 */
export async function storePartLinks(
  manager: EntityManager,
  revisionId: string,
  links: { readonly [K in Role]?: PartLinks[K] | undefined },
  definition: StageInput,
): Promise<void> {
  const transistors: Partial<Record<Role, StageInput['transistor'] | undefined>> = {
    transistor: definition.transistor,
    preDriver: definition.preDriver?.transistor,
  };
  await manager.delete(RevisionPartEntity, { revisionId });
  for (const role of ROLES) {
    const link = links[role] ?? null;
    if (link === null) continue;
    const found = await manager.findOne(PartRevisionEntity, {
      select: { id: true, record: true, part: { kind: true } },
      relations: { part: true },
      where: { id: link.partRevisionId },
    });
    if (found?.part?.kind !== KINDS[role]) {
      throw invalidField(
        `/parts/${role}/partRevisionId`,
        `expected a library revision of a part of kind ${KINDS[role]}`,
      );
    }
    const figures = transistors[role];
    if (figures !== undefined && !isFromLibrary(found.record, link.choice, figures)) continue;
    await manager.insert(RevisionPartEntity, {
      revisionId,
      role,
      partRevisionId: link.partRevisionId,
      choice: link.choice,
    });
  }
}

/** The links as the contract has them: every role, null where the figures were typed by hand. */
export function asPartLinks(rows: readonly RevisionPartEntity[]): PartLinks {
  const link = (role: Role) => {
    const row = rows.find((candidate) => candidate.role === role);
    return row === undefined ? null : { partRevisionId: row.partRevisionId, choice: row.choice };
  };
  return {
    transistor: link('transistor'),
    preDriver: link('preDriver'),
    load: link('load'),
    drive: link('drive'),
    clamp: link('clamp'),
  };
}
