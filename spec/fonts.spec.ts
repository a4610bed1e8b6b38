import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import * as fontkit from 'fontkit';
import { describe, expect, it } from 'vitest';

/** Everything a person may read on a screen is written in these folders. */
const FOLDERS = ['src', 'shared', 'server'];
const FONTS = [
  '@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-wght-normal.woff2',
  '@fontsource-variable/noto-sans/files/noto-sans-latin-wght-normal.woff2',
  '@fontsource-variable/noto-sans/files/noto-sans-greek-wght-normal.woff2',
  '@fontsource/noto-sans-math/files/noto-sans-math-latin-400-normal.woff2',
];

function charactersWritten(): Map<string, string> {
  const found = new Map<string, string>();
  for (const folder of FOLDERS) {
    for (const entry of readdirSync(folder, { recursive: true, withFileTypes: true })) {
      if (!entry.isFile() || !/\.(ts|html|json)$/.test(entry.name)) continue;
      const file = join(entry.parentPath, entry.name);
      for (const character of readFileSync(file, 'utf8')) {
        if (character > '~') found.set(character, file);
      }
    }
  }
  return found;
}

describe('shipped fonts', () => {
  // Blank by nature, or read from what people type and never written (℃).
  const blank = /[\u00a0\u2007\u2009\u202f\ufeff\u200b\u2103]/u;

  it('hold a glyph for every character the product writes', () => {
    const sets = FONTS.map((file) => {
      const font = fontkit.openSync(join('node_modules', file)) as fontkit.Font;
      return new Set(font.characterSet);
    });
    const written = charactersWritten();
    const missing = [...written].filter(
      ([character]) =>
        !blank.test(character) && !sets.some((set) => set.has(character.codePointAt(0) ?? 0)),
    );
    expect(written.has('Ω')).toBe(true);
    expect(missing.map(([character, file]) => `${character} in ${file}`)).toEqual([]);
  });
});
