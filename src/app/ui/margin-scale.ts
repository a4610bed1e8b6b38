/** The shared scale of all margin bars: square root, 100 % at `fullPx` from the limit tick. */
export interface MarginBarShape {
  readonly fromPx: number;
  readonly widthPx: number;
  /** Which end carries an arrow head: the margin runs off the scale there. */
  readonly arrow: 'left' | 'right' | null;
}

/**
 * Distance of a margin from the limit tick, in px, not negative.
 *
 * @param margin fraction of the limit; its sign is left to the caller
 */
export function marginOffsetPx(margin: number, fullPx: number): number {
  return Math.sqrt(Math.min(1, Math.abs(margin))) * fullPx;
}

/**
 * The bar of one margin: right of the tick when the limit is met, left when not, cut with an arrow where the
 * scale or the room ends.
 *
 * @param roomPx px left of the tick
 */
export function marginBarShape(margin: number, fullPx: number, roomPx: number): MarginBarShape {
  const length = Math.max(2, marginOffsetPx(margin, fullPx));
  if (margin >= 0) return { fromPx: 0, widthPx: length, arrow: margin > 1 ? 'right' : null };
  const shown = Math.min(length, roomPx);
  return { fromPx: -shown, widthPx: shown, arrow: length > roomPx ? 'left' : null };
}
