import { formatQuantity } from '../../units/engineering-notation.ts';
import { plainText } from './drawing.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { designatorRuns, inputsText, loadLines, resistorText } from './part-words.ts';
import type { SchematicSubject } from './schematic-subject.ts';
import { SYMBOLS, type SymbolName } from './symbols.ts';

const LOAD_NAMES = {
  coil: 'coil',
  resistor: 'resistive load',
  'led-string': 'LED string',
  lamp: 'filament lamp',
  'logic-input': 'collector resistor',
} as const;

/** A part of the load: its symbol, and what stands beside it. */
interface LoadPiece {
  readonly key: 'load' | 'loadResistor';
  readonly symbol: SymbolName;
  readonly name: string;
  readonly lines: readonly string[];
}

/** The parts of the load, from top to bottom: LEDs have their resistor below them. */
function loadPieces(subject: SchematicSubject): readonly LoadPiece[] {
  const { stage, resistor } = subject;
  const { load } = stage;
  const symbol = { coil: 'coil', lamp: 'lamp', 'led-string': 'led-string' } as const;
  const kind = load.kind;
  const main: LoadPiece = {
    key: 'load',
    symbol: kind === 'resistor' || kind === 'logic-input' ? resistor : symbol[kind],
    name: LOAD_NAMES[kind],
    lines: loadLines(subject),
  };
  if (load.kind !== 'led-string') return [main];
  const lines = [resistorText(load.resistanceOhm, load.tolerance)];
  return [main, { key: 'loadResistor', symbol: resistor, name: 'series resistor', lines }];
}

const heightOf = (symbol: SymbolName) => SYMBOLS[symbol].box.height;
const END_Y = 16;

/** Between the joints above and below the load, 16 of wire at each end included. */
export function loadHeight(subject: SchematicSubject): number {
  return 2 * END_Y + loadPieces(subject).reduce((sum, { symbol }) => sum + heightOf(symbol), 0);
}

/** Middle of the load's last part below its upper joint: where its lowest name stands. */
export function lastLoadMiddle(subject: SchematicSubject): number {
  const last = loadPieces(subject).at(-1);
  return loadHeight(subject) - END_Y - (last === undefined ? 0 : heightOf(last.symbol) / 2);
}

/** The load between two joints of the column, `topY` and `topY + loadHeight`. */
export function drawLoad(drawing: DrawingBuilder, subject: SchematicSubject, topY: number): void {
  const { frame, stage } = subject;
  const x = frame.columnX;
  let y = topY + END_Y;
  drawing.wire(x, topY, x, y);
  for (const piece of loadPieces(subject)) {
    const middleY = y + heightOf(piece.symbol) / 2;
    drawing.symbol(piece.symbol, { x, y: middleY }, piece.key);
    namePiece(drawing, subject, piece, middleY);
    y += heightOf(piece.symbol);
  }
  drawing.wire(x, y, x, y + END_Y);
  if (stage.load.kind === 'coil') {
    drawing.text(x + 7, topY + 33, 'terminal', [{ text: 'A1' }]);
    drawing.text(x + 7, topY + 76, 'terminal', [{ text: 'A2' }]);
  }
}

function namePiece(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  { key, symbol, name: what, lines }: LoadPiece,
  middleY: number,
): void {
  const designator = designatorRuns(subject, key);
  const x = subject.frame.columnX + SYMBOLS[symbol].box.x - 9;
  const firstY = middleY + 6 - 8 * lines.length;
  const name = `${plainText(designator)}, ${what}`;
  drawing.text(x, firstY, 'designator', designator, { anchor: 'end', part: key });
  lines.forEach((text, row) => {
    drawing.text(x, firstY + 16 * (row + 1), 'value', [{ text }], {
      anchor: 'end',
      part: key,
      figure: { ref: `${key}-${row}`, name },
    });
  });
  drawing.name(key, `${name}, ${lines.join(', ')}`);
}

/** The logic that the collector drives, at an arm from the joint below its resistor. */
export function drawLogicInput(
  drawing: DrawingBuilder,
  { frame, stage }: SchematicSubject,
  collectorY: number,
): void {
  if (stage.load.kind !== 'logic-input') return;
  const text = inputsText(stage.load.count);
  drawing.dot(frame.columnX, collectorY);
  drawing.wire(frame.columnX, collectorY, frame.inputX, collectorY);
  drawing.symbol('logic-input', { x: frame.inputX, y: collectorY }, 'logicInput');
  const labelY = collectorY - (frame.compact ? 46 : 32);
  drawing.text(frame.inputX + 32, labelY, 'value', [{ text }], {
    anchor: 'middle',
    part: 'logicInput',
    figure: { ref: 'logicInput', name: 'Driven' },
  });
  drawing.name('logicInput', `Driven, ${text}`);
}

/**
 * The clamp where one is fitted: across the load between the joints at its ends, or across the transistor.
 *
 * @param loadY upper joint of the load
 * @param ends upper and lower joint around the transistor
 */
export function drawClamp(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  loadY: number,
  [topY, bottomY]: readonly [number, number],
): void {
  const { clamp, load } = subject.stage;
  // The collector of a logic input has its arm where a clamp would stand; there is no energy to take.
  if (clamp.kind === 'none' || load.kind === 'logic-input') return;
  if (clampsTransistor(subject)) {
    drawClampAcrossTransistor(drawing, subject, topY, bottomY);
  } else {
    drawClampAcrossLoad(drawing, subject, loadY);
  }
}

/** Whether a zener or TVS stands across the transistor. */
export const clampsTransistor = ({ stage }: SchematicSubject): boolean =>
  stage.clamp.kind.endsWith('across-transistor') && stage.load.kind !== 'logic-input';

/** Nearer to the load where a range of voltages has to fit at its right. */
const clampColumn = ({ frame, stage }: SchematicSubject) =>
  frame.clampX - (stage.clamp.kind === 'diode-zener' && !frame.compact ? 24 : 0);

/** The clamp across the load, between the same two joints. */
function drawClampAcrossLoad(
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
function drawClampAcrossTransistor(
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
