import { CRITERIA, type CriterionId } from '../../../shared/checks/criteria.ts';

/** What a criterion is called; an id this version does not know is shown as its own words. */
export function criterionName(id: string): string {
  return id in CRITERIA ? CRITERIA[id as CriterionId].name : id.replaceAll('-', ' ');
}

/** The name inside a sentence: small first letter, unless it is a symbol. */
export function criterionInSentence(id: string): string {
  const name = criterionName(id);
  return /^[A-Z][a-z]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name;
}
