import { SVG, type Container, type Svg } from '@svgdotjs/svg.js';
import type {
  Drawing,
  DrawingArrow,
  DrawingElement,
  DrawingText,
  PartKey,
} from '../../../shared/report/schematic/drawing.ts';
import { ARROW_PATH, DOT_RADIUS } from '../../../shared/report/schematic/schematic-svg.ts';
import type { Stroke } from '../../../shared/report/schematic/symbol.ts';
import { SYMBOLS } from '../../../shared/report/schematic/symbols.ts';
import { SUBSCRIPT_DROP, TEXT_STYLE } from '../../../shared/report/schematic/text-box.ts';

const ARROW_TURN: Readonly<Record<DrawingArrow['points'], number>> = {
  right: 0,
  down: 90,
  left: 180,
  up: 270,
};

/** Draws the data into an element, in place of what was drawn there; colours come from style sheets. */
export function paintDrawing(host: HTMLElement, drawing: Drawing, selected: PartKey | null): void {
  const { width, height } = drawing;
  host.replaceChildren();
  const svg: Svg = SVG().addTo(host).viewbox(0, 0, width, height);
  svg.attr({ role: 'img', 'aria-label': drawing.name, focusable: 'false' });
  const marked = drawing.parts.find(({ key }) => key === selected);
  if (marked !== undefined) {
    const { x, y, width: across, height: down } = marked.box;
    svg.rect(across, down).move(x, y).radius(6).addClass('selection');
  }
  for (const element of drawing.elements) paint(svg, element, selected);
}

function paint(svg: Svg, element: DrawingElement, selected: PartKey | null): void {
  switch (element.kind) {
    case 'symbol': {
      const shape = SYMBOLS[element.symbol];
      const group = svg.group();
      group.attr('transform', placement(element.at, element.turn));
      if (element.part !== null && element.part === selected) group.addClass('selected');
      for (const stroke of shape.strokes) paintStroke(group, stroke);
      for (const { text, at } of shape.letterings ?? []) {
        const letters = group.element('text').attr({ x: at.x, y: at.y }).addClass('terminal');
        letters.node.textContent = text;
      }
      return;
    }
    case 'wire': {
      const points = element.points.map(({ x, y }) => `${x} ${y}`).join('L');
      svg.path(`M${points}`).addClass('line');
      return;
    }
    case 'dot':
      svg
        .circle(2 * DOT_RADIUS)
        .center(element.at.x, element.at.y)
        .addClass('dot');
      return;
    case 'arrow':
      svg
        .path(ARROW_PATH)
        .attr('transform', placement(element.at, ARROW_TURN[element.points]))
        .addClass('arrow');
      return;
    case 'text':
      paintText(svg, element);
  }
}

const placement = ({ x, y }: { x: number; y: number }, turn: number) =>
  `translate(${x} ${y})${turn === 0 ? '' : ` rotate(${turn})`}`;

function paintStroke(group: Container, stroke: Stroke): void {
  const path = group.path(stroke.path).addClass(stroke.weight);
  if (stroke.filled === true) path.addClass('filled');
  if (stroke.dashed === true) path.addClass('dashed');
}

function paintText(svg: Svg, text: DrawingText): void {
  const element = svg.element('text').addClass(text.role);
  element.attr({ x: text.at.x, y: text.at.y, 'text-anchor': text.anchor });
  if (text.figure !== null) element.attr('data-ref', text.figure.ref);
  const dropPx = TEXT_STYLE[text.role].size * SUBSCRIPT_DROP;
  let lowered = false;
  for (const run of text.runs) {
    const span = document.createElementNS('http://www.w3.org/2000/svg', 'tspan');
    const sub = run.sub === true;
    if (sub !== lowered) span.setAttribute('dy', String(sub ? dropPx : -dropPx));
    if (sub) span.setAttribute('class', 'sub');
    lowered = sub;
    span.textContent = run.text;
    element.node.append(span);
  }
}
