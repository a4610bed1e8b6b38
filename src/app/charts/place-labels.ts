import { SUBSCRIPT_SCALE } from '../../../shared/report/schematic/text-box.ts';
import { symbolParts } from '../ui/symbol-parts.ts';

export interface PixelPoint {
  readonly x: number;
  readonly y: number;
}

export interface PixelBox {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

export type Anchor = 'start' | 'middle' | 'end';

/** A place a label could take: baseline point and the side it grows from. */
export interface Spot extends PixelPoint {
  readonly anchor: Anchor;
}

/** A label that looks for a place; its spots in order of preference. */
export interface LabelWish {
  readonly text: string;
  readonly className: string;
  readonly mono: boolean;
  readonly spots: readonly Spot[];
}

export interface PlacedLabel extends Spot {
  readonly text: string;
  readonly className: string;
}

export const TEXT_PX = 12;
const ASCENT_PX = 9.5;
const DESCENT_PX = 3.5;
/** About how far the shipped fonts advance, in em, on the safe side. */
const ADVANCE = { mono: 0.62, sans: 0.56, space: 0.3 } as const;

/** About how wide a text of 12 px is. */
export function textWidthPx(text: string, mono: boolean): number {
  const advance = mono ? ADVANCE.mono : ADVANCE.sans;
  return symbolParts(text).reduce((sum, part) => {
    const spaces = part.text.split(/[ \u00a0]/).length - 1;
    const em = (part.text.length - spaces) * advance + spaces * ADVANCE.space;
    return sum + em * TEXT_PX * (part.sub ? SUBSCRIPT_SCALE : 1);
  }, 0);
}

const COST = { outside: 10_000, label: 400, line: 30, order: 0.5 } as const;

/**
 * Puts every label at the spot where it hides least: inside the frame first, then clear of other labels,
 * then clear of lines. The first wish has the first choice.
 *
 * @param frame what no label may leave
 * @param lines everything drawn, as open lines of pixels
 */
export function placeLabels(
  wishes: readonly LabelWish[],
  frame: PixelBox,
  lines: readonly (readonly PixelPoint[])[],
): PlacedLabel[] {
  const taken: PixelBox[] = [];
  return wishes.flatMap((wish) => {
    const width = textWidthPx(wish.text, wish.mono);
    let best: { spot: Spot; box: PixelBox; cost: number } | null = null;
    for (const [order, spot] of wish.spots.entries()) {
      const box = boxOf(spot, width);
      let cost = order * COST.order;
      if (!inside(box, frame)) cost += COST.outside;
      for (const other of taken) if (overlap(box, other)) cost += COST.label;
      const bound = best?.cost ?? Infinity;
      for (const line of lines) {
        if (cost >= bound) break;
        if (crosses(line, box)) cost += COST.line;
      }
      if (cost < bound) best = { spot, box, cost };
    }
    if (best === null) return [];
    taken.push(best.box);
    return [{ ...kept(best.spot, best.box, frame), text: wish.text, className: wish.className }];
  });
}

/** Where no spot was inside, the label is pushed in. */
function kept(spot: Spot, box: PixelBox, frame: PixelBox): Spot {
  const across = Math.max(0, frame.left - box.left) - Math.max(0, box.right - frame.right);
  const down = Math.max(0, frame.top - box.top) - Math.max(0, box.bottom - frame.bottom);
  return { ...spot, x: spot.x + across, y: spot.y + down };
}

function boxOf({ x, y, anchor }: Spot, width: number): PixelBox {
  const left = x - { start: 0, middle: width / 2, end: width }[anchor];
  return { left, right: left + width, top: y - ASCENT_PX, bottom: y + DESCENT_PX };
}

const inside = (box: PixelBox, frame: PixelBox) =>
  box.left >= frame.left &&
  box.right <= frame.right &&
  box.top >= frame.top &&
  box.bottom <= frame.bottom;

const overlap = (a: PixelBox, b: PixelBox) =>
  a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

/** Most pieces lie on one side of the box, which four comparisons tell. */
function crosses(line: readonly PixelPoint[], box: PixelBox): boolean {
  for (let k = 1; k < line.length; k++) {
    const [from, to] = [line[k - 1], line[k]];
    if (from === undefined || to === undefined) continue;
    if (Math.max(from.x, to.x) < box.left || Math.min(from.x, to.x) > box.right) continue;
    if (Math.max(from.y, to.y) < box.top || Math.min(from.y, to.y) > box.bottom) continue;
    if (clipSegment(from, to, box) !== null) return true;
  }
  return false;
}

/** The piece of a straight line that lies in a box (Liang and Barsky's parametric test); null where none does. */
export function clipSegment(
  from: PixelPoint,
  to: PixelPoint,
  box: PixelBox,
): readonly [PixelPoint, PixelPoint] | null {
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  let [enter, leave] = [0, 1];
  for (const [along, room] of [
    [-dx, from.x - box.left],
    [dx, box.right - from.x],
    [-dy, from.y - box.top],
    [dy, box.bottom - from.y],
  ] as const) {
    if (along === 0) {
      if (room < 0) return null;
    } else if (along < 0) enter = Math.max(enter, room / along);
    else leave = Math.min(leave, room / along);
  }
  if (!(enter <= leave)) return null;
  const at = (share: number) => ({ x: from.x + share * dx, y: from.y + share * dy });
  return [enter === 0 ? from : at(enter), leave === 1 ? to : at(leave)];
}
