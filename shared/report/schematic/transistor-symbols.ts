import { at, circle, filled, line, rectangle, type Stroke, type SymbolShape } from './symbol.ts';

/** Collector and emitter leave the base bar under the same angle; the arrow tells the polarity. */
const legs = [line('M0 0H24'), { path: 'M24 -14V14', weight: 'bar' }] as const satisfies Stroke[];

export const TRANSISTOR_SYMBOLS = {
  npn: {
    strokes: [
      line(circle(32, 0, 22)),
      ...legs,
      line('M24 -7L40 -17V-32M24 7L40 17V32'),
      filled('M40 17L34.5 8.4L30 15.5Z'),
    ],
    terminals: { base: at(0, 0), collector: at(40, -32), emitter: at(40, 32) },
    box: { x: 0, y: -32, width: 54, height: 64 },
  },
  pnp: {
    strokes: [
      line(circle(32, 0, 22)),
      ...legs,
      line('M24 -7L40 -17V-32M24 7L40 17V32'),
      filled('M25.4 -7.9L35 -9L30.5 -16.1Z'),
    ],
    terminals: { base: at(0, 0), emitter: at(40, -32), collector: at(40, 32) },
    box: { x: 0, y: -32, width: 54, height: 64 },
  },
  'darlington-npn': {
    strokes: [
      line(circle(48, 8, 36)),
      line('M0 0H32M32 -6L46 -14V-20H64M32 6L48 16M48 15L64 4V-40M48 22L64 33V56'),
      { path: 'M32 -12V12', weight: 'bar' },
      { path: 'M48 6V28', weight: 'bar' },
      filled('M46 14.8L40.5 7L36.3 13.6Z'),
      filled('M64 33L58.4 24.4L54 31.2Z'),
      filled(circle(64, -20, 2.2)),
    ],
    terminals: { base: at(0, 0), collector: at(64, -40), emitter: at(64, 56) },
    box: { x: 0, y: -40, width: 84, height: 96 },
  },
  'pre-biased-npn': {
    strokes: [
      line('M14 -32h70a4 4 0 0 1 4 4v56a4 4 0 0 1 -4 4h-70a4 4 0 0 1 -4 -4v-56a4 4 0 0 1 4 -4Z'),
      line('M0 0H16M38 0H56M48 0V7M48 23V26H72'),
      line(rectangle(16, -4, 22, 8)),
      line(rectangle(44, 7, 8, 16)),
      { path: 'M56 -12V12', weight: 'bar' },
      line('M56 -7L72 -17V-40M56 7L72 17V40'),
      filled('M72 17L66.5 8.4L62 15.5Z'),
      filled(circle(48, 0, 2)),
      filled(circle(72, 26, 2)),
    ],
    letterings: [
      { text: 'R1', at: at(20, -8) },
      { text: 'R2', at: at(27, 20) },
    ],
    terminals: { base: at(0, 0), collector: at(72, -40), emitter: at(72, 40) },
    box: { x: 0, y: -40, width: 88, height: 80 },
  },
} as const satisfies Record<string, SymbolShape>;
