import { formatQuantity } from '../../units/engineering-notation.ts';
import { plainText } from './drawing.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { designatorRuns, resistorText, symbolRuns, voltText } from './part-words.ts';
import { ownFigures, type SchematicSubject } from './schematic-subject.ts';

/** How far the circuit moves down to make room for what stands above the drive. */
export function driveHeadroom({ stage, frame }: SchematicSubject): number {
  if (!pullUpDrawn(stage)) return 0;
  const capacitor = stage.speedUpCapacitorF === null ? 0 : 32;
  return capacitor + (frame.compact ? 48 : 88);
}

const pullUpDrawn = (stage: SchematicSubject['stage']) =>
  stage.drive.kind === 'open-collector' && stage.topology !== 'high-side-pnp';

/**
 * The logic output with its rail, its pull-up where one drives the stage, and the way back to the return
 * rail at `railY`.
 */
export function drawDrive(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  baseY: number,
  railY: number,
): void {
  const { stage, frame } = subject;
  const { driveX } = frame;
  drawing.symbol(stage.drive.kind, { x: driveX, y: baseY }, 'drive');
  drawing.wire(driveX, baseY + 32, driveX, railY, frame.columnX, railY);
  if (pullUpDrawn(stage)) drawPullUp(drawing, subject, baseY);
  else drawRail(drawing, subject, driveX, baseY - 32);

  const kind = stage.drive.kind === 'push-pull' ? ['push-pull'] : ['open', 'collector'];
  const designator = designatorRuns(subject, 'drive');
  drawing.text(driveX + (frame.compact ? 14 : 16), baseY + 50, 'designator', designator, {
    part: 'drive',
  });
  if (!frame.compact) {
    kind.forEach((text, row) => {
      drawing.text(driveX + 16, baseY + 66 + 16 * row, 'value', [{ text }], { part: 'drive' });
    });
    drawOutputFigures(drawing, subject, baseY);
  }
  drawing.name('drive', `${plainText(designator)}, ${kind.join(' ')} output`);
}

function drawRail(drawing: DrawingBuilder, subject: SchematicSubject, x: number, y: number): void {
  drawing.symbol('supply', { x, y }, null);
  const text = railText(subject);
  const runs =
    subject.stage.topology === 'level-translator'
      ? [...symbolRuns('V', '1'), { text: ` ${text}` }]
      : [{ text }];
  drawing.text(x + 20, y - 7, 'voltage', runs, {
    figure: { ref: 'rail', name: 'Logic rail' },
  });
}

/** The rail at the corner: high with a strong output; with the supply where it tracks it. */
function railText({ stage, figures }: SchematicSubject): string {
  const { railV, railTracksSupply } = stage.drive;
  const text = (valueV: number) => formatQuantity(valueV, 'V');
  if (figures === null) {
    return railV.min === railV.max ? text(railV.min) : `${text(railV.min)} … ${text(railV.max)}`;
  }
  if (railTracksSupply) return text(figures.supplyV);
  return text(figures.corner['drive'] === 'strong' ? railV.max : railV.min);
}

function drawPullUp(drawing: DrawingBuilder, subject: SchematicSubject, baseY: number): void {
  const { stage, frame } = subject;
  const { pullUpX, driveX } = frame;
  const lift = stage.speedUpCapacitorF === null ? 0 : 32;
  const top = baseY - 96 - lift;
  drawRail(drawing, subject, pullUpX, top - 16);
  drawing.dot(pullUpX, top - 8);
  drawing.wire(pullUpX, top - 16, pullUpX, top);
  drawing.wire(pullUpX, top - 8, driveX, top - 8, driveX, baseY - 32);
  drawing.symbol(subject.resistor, { x: pullUpX, y: top + 32 }, 'pullUp');
  drawing.wire(pullUpX, top + 64, pullUpX, baseY);
  drawing.dot(pullUpX, baseY);
  if (stage.drive.pullUp === null) return;
  const designator = designatorRuns(subject, 'pullUp');
  const value = resistorText(stage.drive.pullUp.valueOhm, stage.drive.pullUp.tolerance);
  drawing.text(pullUpX + 14, top + 12, 'designator', designator, { part: 'pullUp' });
  drawing.text(pullUpX + 14, top + 28, 'value', [{ text: value }], {
    part: 'pullUp',
    figure: { ref: 'pullUp', name: `${plainText(designator)}, pull-up` },
  });
  drawing.name('pullUp', `${plainText(designator)}, pull-up, ${value}`);
}

function drawOutputFigures(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  baseY: number,
): void {
  const { frame, parts, stage } = subject;
  const figures = ownFigures(subject);
  if (figures === null) return;
  const middle = frame.outputX;
  const fromPullUp = pullUpDrawn(stage);
  // In front of another transistor the pull-up leaves no room for the voltage beside it.
  if (!fromPullUp || parts.transistor === 'transistor') {
    const x = fromPullUp ? frame.pullUpX + 8 : middle;
    drawing.text(x, baseY - 9, 'voltage', [{ text: voltText(figures.outputV) }], {
      anchor: fromPullUp ? 'start' : 'middle',
      figure: { ref: 'vo', name: 'Output voltage' },
    });
  }
  const into = stage.topology === 'high-side-pnp' ? 'left' : 'right';
  drawing.arrow(fromPullUp ? middle + 8 : middle, baseY, into);
  drawing.text(
    middle,
    baseY + 20,
    'current',
    [{ text: formatQuantity(figures.driveA, 'A', { pad: true }) }],
    {
      anchor: 'middle',
      figure: { ref: 'ir', name: `Drive current ${plainText(symbolRuns('I', 'R'))}` },
    },
  );
}
