import { CRITERIA, type CriterionId } from './criteria.ts';

/** The name of a criterion inside a sentence; one that this version does not know keeps its id. */
export const criterionInSentence = (id: string): string =>
  Object.hasOwn(CRITERIA, id) ? inSentence(CRITERIA[id as CriterionId].name) : id;

/** Text that begins a sentence, put inside one: small first letter, unless it begins with a symbol. */
export function inSentence(text: string): string {
  return /^([A-Z][a-z]|A )/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text;
}
