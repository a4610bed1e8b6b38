import { fontCoverage } from './font-coverage.ts';
import { FONTS } from './pdf-fonts.ts';

const COVERAGE = [FONTS.Roboto.normal, FONTS.Roboto.bold].map(fontCoverage);

/** How the trade writes them without the sign. */
const SPELLED: Readonly<Record<string, string>> = { '→': '->', '∥': '||', '\u207b': '-' };

/**
 * Text that the PDF's fonts can show. A glyph that is missing would vanish without a word (85 µA became
 * 85 A): such characters are spelled out, or named by their code point.
 */
export function printable(text: string): string {
  return Array.from(text.normalize('NFC'), (character) => {
    const code = character.codePointAt(0) ?? 0;
    if (character === '\n' || COVERAGE.every((covered) => covered.has(code))) return character;
    return SPELLED[character] ?? `[U+${code.toString(16).toUpperCase().padStart(4, '0')}]`;
  }).join('');
}
