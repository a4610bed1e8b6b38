import { criterionName } from '../../../shared/report/criterion-name.ts';

/** The name inside a sentence: small first letter, unless it is a symbol. */
export function criterionInSentence(id: string): string {
  const name = criterionName(id);
  return /^[A-Z][a-z]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name;
}
