import { formatQuantity } from '../../units/engineering-notation.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { symbolRuns, wrapped } from './part-words.ts';
import type { SchematicSubject } from './schematic-subject.ts';

/** The transistor with its base at the end of the base wire, named at its right. */
export function drawTransistor(
  drawing: DrawingBuilder,
  { stage, frame }: SchematicSubject,
  baseY: number,
): void {
  const across = stage.clamp.kind.endsWith('across-transistor');
  const { polarity, partNumber } = stage.transistor;
  drawing.symbol(polarity, { x: frame.columnX - 40, y: baseY }, 'transistor');
  const room = (across ? frame.outerClampX - 16 : frame.width - 4) - (frame.columnX + 24);
  const x = frame.columnX + 24;
  drawing.text(x, baseY - 4, 'designator', [{ text: stage.reference }], { part: 'transistor' });
  wrapped(partNumber, Math.floor(room / (12 * 0.62))).forEach((text, row) => {
    drawing.text(x, baseY + 12 + 14 * row, 'value', [{ text }], {
      part: 'transistor',
      figure: { ref: `transistor-${row}`, name: `${stage.reference}, transistor` },
    });
  });
  drawing.name('transistor', `${stage.reference}, transistor, ${partNumber}`);
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
  drawing.text(
    frame.columnX + 20,
    frame.top - 7,
    'voltage',
    [...symbolRuns('V', 'S'), { text: ` ${text}` }],
    {
      part: 'supply',
      figure: { ref: 'vs', name: 'Supply' },
    },
  );
  drawing.name('supply', `Supply, ${text}`);
}

/** The return at the foot of the column. */
export function drawReturn(
  drawing: DrawingBuilder,
  { frame }: SchematicSubject,
  railY: number,
): void {
  drawing.dot(frame.columnX, railY);
  drawing.symbol('ground', { x: frame.columnX, y: railY }, null);
  drawing.text(frame.columnX + 20, railY + 14, 'voltage', [{ text: '0\u00a0V' }], {
    figure: { ref: 'return', name: 'Return' },
  });
}
