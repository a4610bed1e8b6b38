import { saveAs } from 'file-saver';

/** What the style sheets decide about a stroke or a text; a file of its own has to carry it along. */
const LOOK = [
  'fill',
  'stroke',
  'stroke-width',
  'stroke-dasharray',
  'stroke-linejoin',
  'paint-order',
  'font-family',
  'font-size',
  'font-weight',
  'word-spacing',
] as const;

const SVG_NAMES = 'http://www.w3.org/2000/svg';

/** Pixels of a picture per CSS pixel: sharp at 150 to 200 dpi on paper. */
const PICTURE_SCALE = 3;

/** The chart as a file of its own, in the light scheme whatever the screen shows. */
export function saveChartSvg(host: HTMLElement, name: string): void {
  saveAs(new Blob([chartXml(host, name)], { type: 'image/svg+xml' }), `${fileName(name)}.svg`);
}

/** @throws Error where the browser cannot turn the drawing into a picture */
export async function saveChartPng(host: HTMLElement, name: string): Promise<void> {
  const image = new Image();
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(chartXml(host, name))}`;
  await image.decode();
  const canvas = document.createElement('canvas');
  canvas.width = image.naturalWidth * PICTURE_SCALE;
  canvas.height = image.naturalHeight * PICTURE_SCALE;
  canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height);
  const blob = await new Promise<Blob | null>((done) => {
    canvas.toBlob(done, 'image/png');
  });
  if (blob === null) throw new Error('The browser made no picture of the chart.');
  saveAs(blob, `${fileName(name)}.png`);
}

/** The drawing as XML: in HTML's own spelling a no-break space is an entity that XML does not know. */
export function chartXml(host: HTMLElement, name: string): string {
  return new XMLSerializer().serializeToString(standalone(host, name));
}

/** "Output characteristics, load line" gives `output-characteristics-load-line`. */
export const fileName = (name: string): string =>
  name
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '') || 'chart';

/** A copy that needs no style sheet: computed on light paper, written out as attributes. */
function standalone(host: HTMLElement, name: string): SVGSVGElement {
  const shown = host.querySelector('svg');
  if (shown === null) throw new Error('The chart is not drawn.');
  const paper = document.createElement('div');
  paper.className = `${host.className} chart-paper`;
  const copy = document.createElementNS(SVG_NAMES, 'svg');
  for (const attribute of ['width', 'height', 'viewBox']) {
    copy.setAttribute(attribute, shown.getAttribute(attribute) ?? '');
  }
  copy.append(...[...shown.children].map((child) => child.cloneNode(true)));
  copy.querySelector('.cursor')?.remove();
  paper.append(copy);
  document.body.append(paper);
  try {
    for (const element of copy.querySelectorAll('path, text, tspan')) {
      const look = getComputedStyle(element);
      for (const property of LOOK) element.setAttribute(property, look.getPropertyValue(property));
    }
    copy.prepend(background(copy, getComputedStyle(paper).backgroundColor));
  } finally {
    paper.remove();
  }
  for (const element of copy.querySelectorAll('[class]')) element.removeAttribute('class');
  copy.setAttribute('role', 'img');
  copy.setAttribute('aria-label', name);
  return copy;
}

function background(svg: SVGSVGElement, colour: string): SVGRectElement {
  const rect = document.createElementNS(SVG_NAMES, 'rect');
  rect.setAttribute('width', svg.getAttribute('width') ?? '');
  rect.setAttribute('height', svg.getAttribute('height') ?? '');
  rect.setAttribute('fill', colour);
  return rect;
}
