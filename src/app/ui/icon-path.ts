/** An icon of lucide: SVG elements by tag and attributes, on a 24 grid. */
export type IconNodes = readonly (readonly [
  string,
  Readonly<Record<string, string | number | undefined>>,
])[];

type Attributes = IconNodes[number][1];

/**
 * The outline of an icon as one path, so that a single `<path>` draws it.
 *
 * @throws {RangeError} for an element that has no outline here
 */
export function iconPath(nodes: IconNodes): string {
  return nodes.map(([tag, attributes]) => outline(tag, attributes)).join('');
}

function outline(tag: string, a: Attributes): string {
  const n = (name: string) => Number(a[name] ?? 0);
  switch (tag) {
    case 'path':
      return `M0 0${a['d']}`; // a leading `m` is relative to where the element before it ended
    case 'line':
      return `M${n('x1')} ${n('y1')}L${n('x2')} ${n('y2')}`;
    case 'polyline':
      return `M${a['points']}`;
    case 'polygon':
      return `M${a['points']}Z`;
    case 'circle':
      return ellipse(n('cx'), n('cy'), n('r'), n('r'));
    case 'ellipse':
      return ellipse(n('cx'), n('cy'), n('rx'), n('ry'));
    case 'rect':
      return rectangle(n('x'), n('y'), n('width'), n('height'), n('rx') || n('ry'));
    default:
      throw new RangeError(`no outline for <${tag}>`);
  }
}

function ellipse(cx: number, cy: number, rx: number, ry: number): string {
  return `M${cx - rx} ${cy}a${rx} ${ry} 0 1 0 ${2 * rx} 0a${rx} ${ry} 0 1 0 ${-2 * rx} 0Z`;
}

function rectangle(x: number, y: number, width: number, height: number, r: number): string {
  const corner = (dx: number, dy: number) => (r ? `a${r} ${r} 0 0 1 ${dx} ${dy}` : '');
  return (
    `M${x + r} ${y}h${width - 2 * r}${corner(r, r)}v${height - 2 * r}${corner(-r, r)}` +
    `h${2 * r - width}${corner(-r, -r)}v${2 * r - height}${corner(r, -r)}Z`
  );
}
