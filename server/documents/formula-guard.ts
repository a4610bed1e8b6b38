/**
 * What a spreadsheet would take for a formula: a sign or a full-width sign in front, also behind spaces and
 * quotation marks, and control characters in front.
 *
 * @see OWASP, CSV Injection
 */
// eslint-disable-next-line no-control-regex -- control characters are what is looked for
const LOOKS_LIKE_FORMULA = /^(?:[\t\r\n\u0000]|[\s"'‘’“”`]*[=+\-@\uff1d\uff0b\uff0d\uff20])/;

/** Text for a cell, with an apostrophe in front where a spreadsheet would run it. Numbers need no guard. */
export function guarded(text: string): string {
  return LOOKS_LIKE_FORMULA.test(text) ? `'${text}` : text;
}
