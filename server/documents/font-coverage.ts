import { readFileSync } from 'node:fs';

/**
 * The code points a TrueType font has glyphs for, from its character map.
 *
 * @throws {Error} if the font has no segmented map (format 4)
 * @see OpenType specification, table cmap, format 4
 */
export function fontCoverage(file: string): ReadonlySet<number> {
  const font = readFileSync(file);
  const map = tableOffset(font, 'cmap');
  for (let index = 0; index < font.readUInt16BE(map + 2); index += 1) {
    const subtable = map + font.readUInt32BE(map + 8 + 8 * index);
    if (font.readUInt16BE(subtable) === 4) return segments(font, subtable);
  }
  throw new Error(`${file} has no character map of format 4`);
}

function tableOffset(font: Buffer, tag: string): number {
  for (let index = 0; index < font.readUInt16BE(4); index += 1) {
    const record = 12 + 16 * index;
    if (font.toString('latin1', record, record + 4) === tag) return font.readUInt32BE(record + 8);
  }
  throw new Error(`the font has no table ${tag}`);
}

function segments(font: Buffer, subtable: number): Set<number> {
  const twice = font.readUInt16BE(subtable + 6);
  const covered = new Set<number>();
  for (let offset = 0; offset < twice; offset += 2) {
    const last = font.readUInt16BE(subtable + 14 + offset);
    const first = font.readUInt16BE(subtable + 16 + twice + offset);
    for (let code = first; code <= last && code !== 0xffff; code += 1) covered.add(code);
  }
  return covered;
}
