import { at, circle, filled, line, rectangle, type SymbolShape } from './symbol.ts';

/** Terminals one above the other, 64 apart, where the symbol says nothing else. */
const UPRIGHT = { top: at(0, -32), bottom: at(0, 32) };
/** Diodes and capacitors are short, so that two fit in series. */
const SHORT = { top: at(0, -16), bottom: at(0, 16) };

const box = (halfWidth: number, halfHeight: number) => ({
  x: -halfWidth,
  y: -halfHeight,
  width: 2 * halfWidth,
  height: 2 * halfHeight,
});

const emission = (y: number) => [
  line(`M12 ${y}l9 -6M12 ${y + 8}l9 -6`),
  filled(`M24 ${y - 8}l-3.6 5.4l-2.4 -3.8Z`),
  filled(`M24 ${y}l-3.6 5.4l-2.4 -3.8Z`),
];

export const TWO_TERMINAL_SYMBOLS = {
  'resistor-box': {
    strokes: [line(rectangle(-8, -24, 16, 48)), line('M0 -32V-24M0 24V32')],
    terminals: UPRIGHT,
    box: box(8, 32),
  },
  'resistor-zigzag': {
    strokes: [line('M0 -32V-24L8 -20L-8 -12L8 -4L-8 4L8 12L-8 20L0 24V32')],
    terminals: UPRIGHT,
    box: box(8, 32),
  },
  coil: {
    strokes: [line(rectangle(-24, -12, 48, 24)), line('M0 -32V-12M0 12V32')],
    terminals: UPRIGHT,
    box: box(24, 32),
  },
  winding: {
    strokes: [line('M0 -32V-24a6 6 0 0 1 0 12a6 6 0 0 1 0 12a6 6 0 0 1 0 12a6 6 0 0 1 0 12V32')],
    terminals: UPRIGHT,
    box: box(8, 32),
  },
  lamp: {
    strokes: [
      line(circle(0, 0, 16)),
      line('M-11.3 -11.3L11.3 11.3M11.3 -11.3L-11.3 11.3M0 -32V-16M0 16V32'),
    ],
    terminals: UPRIGHT,
    box: box(16, 32),
  },
  diode: {
    strokes: [line('M-10 -8H10M0 -8L9 8H-9Z'), line('M0 -16V16')],
    terminals: SHORT,
    box: box(10, 16),
  },
  zener: {
    strokes: [line('M-10 -2V-8H10M0 -8L9 8H-9Z'), line('M0 -16V16')],
    terminals: SHORT,
    box: box(10, 16),
  },
  'diode-down': {
    strokes: [line('M-10 8H10M0 8L9 -8H-9Z'), line('M0 -16V16')],
    terminals: SHORT,
    box: box(10, 16),
  },
  'zener-down': {
    strokes: [line('M10 2V8H-10M0 8L9 -8H-9Z'), line('M0 -16V16')],
    terminals: SHORT,
    box: box(10, 16),
  },
  'led-string': {
    strokes: [
      line('M0 -48V-9M-10 -16H10M0 -16L9 -32H-9ZM0 9V48M-10 32H10M0 32L9 16H-9Z'),
      { path: 'M0 -9V9', weight: 'line', dashed: true },
      ...emission(-26),
      ...emission(22),
    ],
    letterings: [{ text: 'n', at: at(-18, 4) }],
    terminals: { top: at(0, -48), bottom: at(0, 48) },
    box: { x: -20, y: -48, width: 44, height: 96 },
  },
  capacitor: {
    strokes: [line('M-10 -3H10M-10 3H10M0 -16V-3M0 3V16')],
    terminals: SHORT,
    box: box(10, 16),
  },
} as const satisfies Record<string, SymbolShape>;
