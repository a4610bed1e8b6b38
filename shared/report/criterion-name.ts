import { CRITERIA, type CriterionId } from '../checks/criteria.ts';

/** What a criterion is called; one that this version does not know keeps its id. */
export function criterionName(id: string): string {
  return Object.hasOwn(CRITERIA, id) ? CRITERIA[id as CriterionId].name : id;
}
