const PIECES = /\d+|\D+/g;

/**
 * Order of designators and part numbers as people count: R4, R9, R12, R30.
 *
 * @returns negative, zero or positive, for `sort`
 */
export function naturalOrder(left: string, right: string): number {
  const a = left.match(PIECES) ?? [];
  const b = right.match(PIECES) ?? [];
  for (const [index, piece] of a.entries()) {
    const other = b[index];
    if (other === undefined) return 1;
    const byNumber = Number(piece) - Number(other);
    if (byNumber !== 0 && !Number.isNaN(byNumber)) return byNumber;
    if (piece !== other) return piece < other ? -1 : 1;
  }
  return a.length - b.length;
}
