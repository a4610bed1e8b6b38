import { formatQuantity } from '../../units/engineering-notation.ts';
import { plainText } from './drawing.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { designatorRuns, loadLines } from './part-words.ts';
import type { SchematicSubject } from './schematic-subject.ts';
import { SYMBOLS, type SymbolName } from './symbols.ts';

const LOAD_NAMES = {
  coil: 'coil',
  resistor: 'resistive load',
  'led-string': 'LED string',
  lamp: 'filament lamp',
  'logic-input': 'pull-up of the logic input',
} as const;

/** Symbols of the load, from top to bottom. */
function loadSymbols({ stage, resistor }: SchematicSubject): readonly SymbolName[] {
  switch (stage.load.kind) {
    case 'coil':
      return ['coil'];
    case 'lamp':
      return ['lamp'];
    case 'led-string':
      return ['led-string', resistor];
    case 'resistor':
    case 'logic-input':
      return [resistor];
  }
}

const heightOf = (symbol: SymbolName) => SYMBOLS[symbol].box.height;

/** Between the joints above and below the load, 16 of wire at each end included. */
export function loadHeight(subject: SchematicSubject): number {
  return 32 + loadSymbols(subject).reduce((sum, symbol) => sum + heightOf(symbol), 0);
}

/** The load between two joints of the column, `topY` and `topY + loadHeight`. */
export function drawLoad(drawing: DrawingBuilder, subject: SchematicSubject, topY: number): void {
  const { frame, stage } = subject;
  const x = frame.columnX;
  const symbols = loadSymbols(subject);
  let y = topY + 16;
  drawing.wire(x, topY, x, y);
  for (const symbol of symbols) {
    drawing.symbol(symbol, { x, y: y + heightOf(symbol) / 2 }, 'load');
    y += heightOf(symbol);
  }
  drawing.wire(x, y, x, y + 16);
  if (stage.load.kind === 'coil') {
    drawing.text(x + 7, topY + 33, 'terminal', [{ text: 'A1' }]);
    drawing.text(x + 7, topY + 76, 'terminal', [{ text: 'A2' }]);
  }
  nameLoad(drawing, subject, topY + loadHeight(subject) / 2);
}

function nameLoad(drawing: DrawingBuilder, subject: SchematicSubject, middleY: number): void {
  const { frame, stage } = subject;
  const widest = Math.max(...loadSymbols(subject).map((symbol) => -SYMBOLS[symbol].box.x));
  const lines = loadLines(subject);
  const designator = designatorRuns(subject, 'load');
  const x = frame.columnX - widest - 9;
  const firstY = middleY + 6 - 8 * lines.length;
  const name = `${plainText(designator)}, ${LOAD_NAMES[stage.load.kind]}`;
  drawing.text(x, firstY, 'designator', designator, { anchor: 'end', part: 'load' });
  lines.forEach((text, row) => {
    drawing.text(x, firstY + 16 * (row + 1), 'value', [{ text }], {
      anchor: 'end',
      part: 'load',
      figure: { ref: `load-${row}`, name },
    });
  });
  drawing.name('load', `${name}, ${lines.join(', ')}`);
}

/** Nearer to the load where a range of voltages has to fit at its right. */
const clampColumn = ({ frame, stage }: SchematicSubject) =>
  frame.clampX - (stage.clamp.kind === 'diode-zener' && !frame.compact ? 24 : 0);

/** The clamp across the load, between the same two joints. */
export function drawClampAcrossLoad(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  topY: number,
): void {
  const { frame, stage } = subject;
  const bottomY = topY + loadHeight(subject);
  const middleY = (topY + bottomY) / 2;
  const pair = stage.clamp.kind === 'diode-zener';
  const x = clampColumn(subject);
  const half = pair ? 32 : 16;
  drawing.dot(frame.columnX, topY);
  drawing.dot(frame.columnX, bottomY);
  drawing.wire(frame.columnX, topY, x, topY, x, middleY - half);
  drawing.wire(x, middleY + half, x, bottomY, frame.columnX, bottomY);
  if (pair) {
    drawing.symbol('diode', { x, y: middleY - 16 }, 'clamp');
    drawing.symbol('zener-down', { x, y: middleY + 16 }, 'clamp');
  } else {
    drawing.symbol('diode', { x, y: middleY }, 'clamp');
  }
  nameClamp(drawing, subject, middleY, pair);
}

function nameClamp(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  middleY: number,
  pair: boolean,
): void {
  const { frame, stage } = subject;
  const x = clampColumn(subject) + (frame.compact ? 13 : 18);
  const designator = designatorRuns(subject, 'clamp');
  const zener = designatorRuns(subject, 'clampZener');
  const rating = stage.clamp.currentRatingA;
  const words = pair
    ? [clampVoltageText(subject)]
    : rating === null
      ? []
      : [formatQuantity(rating, 'A')];
  const name = plainText(designator);
  drawing.text(x, pair ? middleY - 14 : middleY - 2, 'designator', designator, { part: 'clamp' });
  if (pair) drawing.text(x, middleY + 12, 'designator', zener, { part: 'clamp' });
  if (!frame.compact) {
    words.forEach((text) => {
      drawing.text(x, middleY + (pair ? 28 : 14), 'value', [{ text }], {
        part: 'clamp',
        figure: { ref: 'clamp', name: `${name}, clamp` },
      });
    });
  }
  const kind = pair ? 'diode and zener across the load' : 'diode across the load';
  drawing.name('clamp', [`${name}, ${kind}`, ...words].join(', '));
}

/** Zener voltage, or the clamping voltage of a TVS. */
function clampVoltageText({ stage }: SchematicSubject): string {
  const { zenerV, kind } = stage.clamp;
  if (zenerV === null) return 'no voltage';
  if (kind === 'tvs-across-transistor') return formatQuantity(zenerV.max, 'V');
  return zenerV.min === zenerV.max
    ? formatQuantity(zenerV.min, 'V')
    : `${formatQuantity(zenerV.min, 'V').split('\u00a0')[0] ?? ''}…${formatQuantity(zenerV.max, 'V')}`;
}

/** A zener or TVS from the joint at `topY` to the one at `bottomY` of the transistor's column. */
export function drawClampAcrossTransistor(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  topY: number,
  bottomY: number,
): void {
  const { frame, stage } = subject;
  const x = frame.outerClampX;
  const middleY = bottomY - 40;
  drawing.dot(frame.columnX, topY);
  drawing.dot(frame.columnX, bottomY);
  drawing.wire(frame.columnX, topY, x, topY, x, middleY - 16);
  drawing.symbol('zener', { x, y: middleY }, 'clamp');
  drawing.wire(x, middleY + 16, x, bottomY, frame.columnX, bottomY);
  const designator = designatorRuns(subject, 'clamp');
  const value = clampVoltageText(subject);
  const options = { anchor: 'end', part: 'clamp' } as const;
  drawing.text(x - 14, middleY + 10, 'designator', designator, options);
  if (!frame.compact) {
    drawing.text(x - 14, middleY + 26, 'value', [{ text: value }], {
      ...options,
      figure: { ref: 'clamp', name: `${plainText(designator)}, clamp` },
    });
  }
  const kind = stage.clamp.kind === 'tvs-across-transistor' ? 'TVS' : 'zener';
  drawing.name('clamp', `${plainText(designator)}, ${kind} across the transistor, ${value}`);
}
