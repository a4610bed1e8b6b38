import { at, line, rectangle, type SymbolShape } from './symbol.ts';

const output = {
  terminals: { out: at(32, 0), rail: at(0, -32), return: at(0, 32) },
  box: { x: -24, y: -32, width: 56, height: 64 },
};
const body = [line(rectangle(-24, -24, 48, 48)), line('M24 0H32M0 -32V-24M0 24V32')];

export const SOURCE_SYMBOLS = {
  'push-pull': { ...output, strokes: [...body, line('M-6 -6L6 0L-6 6Z')] },
  'open-collector': {
    ...output,
    strokes: [...body, line('M-12 -6L0 0L-12 6Z'), line('M14 -5L19 0L14 5L9 0ZM9 8H19')],
  },
  supply: {
    strokes: [{ path: 'M-12.5 -12H12.5', weight: 'rail' }, line('M0 -12V0')],
    terminals: { node: at(0, 0) },
    box: { x: -13, y: -14, width: 26, height: 14 },
  },
  ground: {
    strokes: [line('M0 0V8M-12 8H12M-8 13H8M-4 18H4')],
    terminals: { node: at(0, 0) },
    box: { x: -12, y: 0, width: 24, height: 19 },
  },
  'logic-input': {
    strokes: [line(rectangle(8, -24, 48, 48)), line('M0 0H8')],
    letterings: [{ text: '1', at: at(28, 5) }],
    terminals: { in: at(0, 0) },
    box: { x: 0, y: -24, width: 56, height: 48 },
  },
} as const satisfies Record<string, SymbolShape>;
