import { criterionName } from '../../../shared/report/criterion-name.ts';

/** The name inside a sentence: small first letter, unless it is a symbol. */
export const criterionInSentence = (id: string): string => inSentence(criterionName(id));

/** Text that begins a sentence, put inside one: small first letter, unless it begins with a symbol. */
export function inSentence(text: string): string {
  return /^([A-Z][a-z]|A )/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text;
}
