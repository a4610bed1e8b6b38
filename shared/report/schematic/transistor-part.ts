import { formatQuantity } from '../../units/engineering-notation.ts';
import { plainText, type Run } from './drawing.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { clampsTransistor } from './load-column.ts';
import { designatorRuns, symbolRuns, wrapped } from './part-words.ts';
import type { SchematicSubject } from './schematic-subject.ts';
import { SYMBOLS, type SymbolName } from './symbols.ts';
import { transistorSymbol } from './transistor-choice.ts';

/** How the transistor's symbol lies to its column and to its base line. */
export interface TransistorPlace {
  readonly symbol: SymbolName;
  readonly baseX: number;
  /** Terminals above and below the base line. */
  readonly up: number;
  readonly down: number;
}

/** Where the terminals of the subject's transistor come to lie. */
export function transistorPlace({ stage, frame, parts }: SchematicSubject): TransistorPlace {
  const inFront = parts.transistor === 'preDriver';
  const symbol = inFront ? stage.transistor.polarity : transistorSymbol(stage);
  const { collector, emitter } = SYMBOLS[symbol].terminals as Record<
    'collector' | 'emitter',
    { readonly x: number; readonly y: number }
  >;
  return {
    symbol,
    baseX: frame.columnX - collector.x,
    up: Math.max(-collector.y, -emitter.y),
    down: Math.max(collector.y, emitter.y),
  };
}

/** The transistor with its base at the end of the base wire, named at its right. */
export function drawTransistor(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  baseY: number,
): void {
  const { frame, parts, stage } = subject;
  const { partNumber } = stage.transistor;
  const { symbol, baseX } = transistorPlace(subject);
  const part = parts.transistor;
  const designator: readonly Run[] =
    part === 'preDriver' ? designatorRuns(subject, 'preDriver') : [{ text: stage.reference }];
  const name = `${plainText(designator)}, transistor${parts.ofWhat}`;
  drawing.symbol(symbol, { x: baseX, y: baseY }, part);
  const x = frame.columnX + 24;
  drawing.text(x, baseY - 4, 'designator', designator, { part });
  const perLine = Math.floor((rightOf(subject) - x) / (12 * 0.62));
  wrapped(partNumber, perLine).forEach((text, row) => {
    drawing.text(x, baseY + 12 + 14 * row, 'value', [{ text }], {
      part,
      figure: { ref: `${part}-${row}`, name },
    });
  });
  drawing.name(part, `${name}, ${partNumber}`);
}

/** How far the transistor's name may reach to the right. */
function rightOf(subject: SchematicSubject): number {
  const { frame, parts } = subject;
  if (parts.transistor === 'preDriver') return frame.nextColumnX - 8;
  return clampsTransistor(subject) ? frame.outerClampX - 16 : frame.width - 4;
}

/** The supply at the head of the column. */
export function drawSupply(drawing: DrawingBuilder, subject: SchematicSubject): void {
  const { stage, frame, figures } = subject;
  drawing.symbol('supply', { x: frame.columnX, y: frame.top }, 'supply');
  const { min, max } = stage.supplyV;
  const span =
    min === max
      ? formatQuantity(min, 'V')
      : `${formatQuantity(min, 'V')} … ${formatQuantity(max, 'V')}`;
  const text = figures === null ? span : formatQuantity(figures.supplyV, 'V');
  const symbol = symbolRuns('V', stage.topology === 'level-translator' ? '2' : 'S');
  drawing.text(frame.columnX + 20, frame.top - 7, 'voltage', [...symbol, { text: ` ${text}` }], {
    part: 'supply',
    figure: { ref: 'vs', name: 'Supply' },
  });
  drawing.name('supply', `Supply, ${text}`);
}

/** The return at the foot of a column; `joined` where a rail from the drive ends there too. */
export function drawReturn(
  drawing: DrawingBuilder,
  { frame, parts }: SchematicSubject,
  railY: number,
  joined = true,
): void {
  if (joined) drawing.dot(frame.columnX, railY);
  drawing.symbol('ground', { x: frame.columnX, y: railY }, null);
  const front = parts.transistor === 'preDriver';
  drawing.text(frame.columnX + 20, railY + 14, 'voltage', [{ text: '0\u00a0V' }], {
    figure: front
      ? { ref: 'logic-return', name: 'Return of the logic' }
      : { ref: 'return', name: 'Return' },
  });
}
