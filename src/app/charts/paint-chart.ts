import { SVG, type G, type Svg } from '@svgdotjs/svg.js';
import { SUBSCRIPT_DROP } from '../../../shared/report/schematic/text-box.ts';
import { symbolParts } from '../ui/symbol-parts.ts';
import type { ChartScene, SceneText } from './chart-scene.ts';
import { TEXT_PX } from './place-labels.ts';

/** Draws a chart into an element, in place of what was drawn there; its look comes from style sheets. */
export function paintChart(host: HTMLElement, scene: ChartScene): Svg {
  const { width, height } = scene;
  host.querySelector('svg')?.remove();
  const svg: Svg = SVG().addTo(host).size(width, height).viewbox(0, 0, width, height);
  svg.attr({ 'aria-hidden': 'true', focusable: 'false' });
  for (const { path, className } of scene.shapes) {
    if (path !== '') svg.path(path).attr('class', className);
  }
  for (const text of scene.texts) paintText(svg, text);
  return svg;
}

/** Moves the cursor of a drawn chart to a row of its table; null takes it away. */
export function paintCursor(svg: Svg, scene: ChartScene, at: number | null): void {
  svg.find('.cursor').forEach((old) => old.remove());
  if (at === null) return;
  const group: G = svg.group().addClass('cursor');
  const { line, dots } = scene.cursorAt(at);
  group.path(line.path).attr('class', line.className);
  for (const { x, y } of dots) group.circle(6).center(x, y).addClass('cursor-dot');
  if (scene.upright) group.back();
}

function paintText(svg: Svg, { x, y, text, anchor, className }: SceneText): void {
  const element = svg.element('text').attr({ x, y, 'text-anchor': anchor, class: className });
  let lowered = false;
  for (const part of symbolParts(text)) {
    const span = document.createElementNS('http://www.w3.org/2000/svg', 'tspan');
    if (part.sub !== lowered) {
      span.setAttribute('dy', String((part.sub ? 1 : -1) * TEXT_PX * SUBSCRIPT_DROP));
    }
    if (part.sub) span.setAttribute('class', 'sub');
    lowered = part.sub;
    span.textContent = part.text;
    element.node.append(span);
  }
}
