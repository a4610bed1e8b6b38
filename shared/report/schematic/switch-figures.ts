import type { CornerFigures } from '../../checks/evaluation.ts';
import { insideModel } from '../../stage/internal-resistors.ts';
import { formatQuantity } from '../../units/engineering-notation.ts';
import type { Run } from './drawing.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { symbolRuns, voltText } from './part-words.ts';
import { ownFigures, type SchematicSubject } from './schematic-subject.ts';

/** What the figures of a transistor are placed by: its base line and its collector's joint. */
interface Places {
  readonly baseY: number;
  readonly collectorY: number;
}

const amps = (valueA: number) => formatQuantity(valueA, 'A', { pad: true });

/** A figure behind its symbol where there is room for one. */
function lead({ frame }: SchematicSubject, letter: string, sub: string, text: string): Run[] {
  return frame.compact ? [{ text }] : [...symbolRuns(letter, sub), { text: ` ${text}` }];
}

/** An NPN: its base current from the left, its collector current from above. */
export function drawLowSideFigures(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  { baseY, collectorY }: Places,
): void {
  const { stage, frame } = subject;
  const figures = ownFigures(subject);
  if (figures === null) return;
  drawCollectorCurrent(drawing, subject, collectorY);
  drawing.text(
    frame.columnX + 12,
    collectorY + frame.collectorTextY[stage.load.kind === 'logic-input' ? 1 : 0],
    'voltage',
    [{ text: voltText(figures.vceV) }],
    { figure: { ref: 'vce', name: 'Collector–emitter voltage' } },
  );
  const inside = insideModel(stage);
  if (inside?.byInput === false) {
    drawAtEmitter(drawing, subject, baseY, 'left');
    return;
  }
  drawBaseFigures(drawing, subject, baseY, figures, inside === null ? BASE : INPUT);
  if (inside === null) drawShuntCurrent(drawing, subject, baseY + 100, 4);
}

/** What is shown at the base line: of the base, or of the input of a pre-biased part. */
const BASE = {
  ...{ voltageSub: 'BE', voltageName: 'Base–emitter voltage' },
  ...{ currentSub: 'B', currentName: 'Base current', compactY: 29 },
};
const INPUT: typeof BASE = {
  ...{ voltageSub: 'I', voltageName: 'Input voltage' },
  ...{ currentSub: 'I', currentName: 'Input current', compactY: 44 },
};

function drawBaseFigures(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  baseY: number,
  { vbeV, ibA }: CornerFigures,
  shown: typeof BASE,
): void {
  const { compact, nodeX, nodeTextX } = subject.frame;
  const voltage = lead(subject, 'V', shown.voltageSub, voltText(vbeV));
  drawing.text(nodeTextX, baseY - 9, 'voltage', voltage, {
    figure: { ref: 'vbe', name: shown.voltageName },
  });
  drawing.arrow(nodeX + (compact ? 20 : 42), baseY, 'right');
  const current = lead(subject, 'I', shown.currentSub, amps(ibA));
  const x = nodeX + (compact ? 10 : 40);
  drawing.text(x, baseY + (compact ? shown.compactY : 20), 'current', current, {
    anchor: compact ? 'start' : 'middle',
    figure: { ref: 'ib', name: shown.currentName },
  });
}

/** A PNP: its base current to the left, its collector current below. */
export function drawHighSideFigures(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  { baseY, collectorY }: Places,
): void {
  const { frame, stage } = subject;
  const figures = ownFigures(subject);
  if (figures === null) return;
  const { columnX: x, compact, nodeX } = frame;
  drawCollectorCurrent(drawing, subject, collectorY);
  drawing.text(
    x + 12,
    collectorY - 6,
    'voltage',
    [{ text: voltText(figures.supplyV - figures.vceV) }],
    { figure: { ref: 'vc', name: 'Voltage at the load' } },
  );
  const crowded = compact && stage.topology === 'two-transistor-high-side';
  drawing.text(
    crowded ? x + 12 : frame.nodeTextX,
    crowded ? baseY - 40 : baseY + 20,
    'voltage',
    lead(subject, 'V', 'EB', voltText(figures.vbeV)),
    { figure: { ref: 'vbe', name: 'Emitter–base voltage' } },
  );
  if (crowded) return;
  drawing.arrow(nodeX + (compact ? 20 : 42), baseY, 'left');
  drawing.text(
    nodeX + (compact ? 4 : 10),
    baseY - 9,
    'current',
    lead(subject, 'I', 'B', amps(figures.ibA)),
    { figure: { ref: 'ib', name: 'Base current' } },
  );
  drawShuntCurrent(drawing, subject, baseY - 30, 3);
}

/** What the transistor in front draws through the base resistor of the one behind, and drops. */
export function drawFrontFigures(
  drawing: DrawingBuilder,
  front: SchematicSubject,
  behind: SchematicSubject,
  baseY: number,
): void {
  const { columnX: x, compact } = front.frame;
  const own = ownFigures(front);
  const other = ownFigures(behind);
  const [currentA, dropV] = own === null ? [other?.driveA, other?.outputV] : [own.icA, own.vceV];
  if (currentA === undefined || dropV === undefined) return;
  drawing.arrow(x, baseY - 48, 'down');
  drawing.text(x - 10, baseY - 43, 'current', [{ text: amps(currentA) }], {
    anchor: 'end',
    figure: { ref: 'ir-output', name: 'Current of the base resistor' },
  });
  drawing.text(x + (compact ? 12 : -10), baseY - 26, 'voltage', [{ text: voltText(dropV) }], {
    anchor: compact ? 'start' : 'end',
    figure: { ref: 'vce-front', name: 'Collector–emitter voltage of the pre-driver' },
  });
  drawAtEmitter(drawing, front, baseY, 'right');
}

/** Base–emitter voltage and base current beside the emitter, where the base has no lead long enough. */
function drawAtEmitter(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  baseY: number,
  side: 'left' | 'right',
): void {
  const { frame } = subject;
  const figures = ownFigures(subject);
  if (figures === null) return;
  const x = frame.columnX + (side === 'left' ? -10 : 12);
  const anchor = side === 'left' ? 'end' : 'start';
  drawing.text(x, baseY + 52, 'voltage', lead(subject, 'V', 'BE', voltText(figures.vbeV)), {
    anchor,
    figure: { ref: 'vbe', name: 'Base–emitter voltage' },
  });
  drawing.text(x, baseY + 68, 'current', lead(subject, 'I', 'B', amps(figures.ibA)), {
    anchor,
    figure: { ref: 'ib', name: 'Base current' },
  });
}

function drawCollectorCurrent(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  collectorY: number,
): void {
  const { figures, frame } = subject;
  if (figures === null) return;
  drawing.arrow(frame.columnX, collectorY - 8, 'down');
  drawing.text(
    frame.columnX - 10,
    collectorY - 4,
    'current',
    lead(subject, 'I', 'C', amps(figures.icA)),
    { anchor: 'end', figure: { ref: 'ic', name: 'Collector current' } },
  );
}

function drawShuntCurrent(
  drawing: DrawingBuilder,
  { figures, frame, stage }: SchematicSubject,
  y: number,
  textDown: number,
): void {
  if (figures === null || stage.shuntResistor === null || frame.compact) return;
  drawing.arrow(frame.nodeX, y, 'down');
  drawing.text(frame.nodeX + 12, y + textDown, 'current', [{ text: amps(figures.shuntA) }], {
    figure: { ref: 'ishunt', name: 'Current of the base–emitter resistor' },
  });
}
