import type { Point } from './drawing.ts';
import { SOURCE_SYMBOLS } from './source-symbols.ts';
import type { SymbolShape } from './symbol.ts';
import { TRANSISTOR_SYMBOLS } from './transistor-symbols.ts';
import { TWO_TERMINAL_SYMBOLS } from './two-terminal-symbols.ts';

const TABLE = { ...TRANSISTOR_SYMBOLS, ...TWO_TERMINAL_SYMBOLS, ...SOURCE_SYMBOLS };
export type SymbolName = keyof typeof TABLE;

/** Every symbol the drawings use, by name. */
export const SYMBOLS: Readonly<Record<SymbolName, SymbolShape>> = TABLE;

/** A point of a symbol after turning it by 0 or 90 degrees and moving it to its place. */
export function placed(point: Point, turn: 0 | 90, to: Point): Point {
  return turn === 0
    ? { x: to.x + point.x, y: to.y + point.y }
    : { x: to.x - point.y, y: to.y + point.x };
}
