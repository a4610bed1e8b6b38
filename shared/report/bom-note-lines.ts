import type { BomLine } from './bom-note.ts';
import { isFlagged } from './bom-note-source.ts';
import { type FittedPart, PART_FAMILIES, type Purchase } from './fitted-part.ts';
import { naturalOrder } from './natural-order.ts';

/** A line with the parts merged into it; the first stands for all. */
export interface MergedLine {
  readonly line: BomLine;
  readonly parts: readonly [FittedPart, ...FittedPart[]];
}

/**
 * Equal parts of all stages on one line each, in the order transistors, resistors, capacitors, clamps, loads;
 * within a family by description, value and part number. Quantities count every copy of a stage.
 */
export function mergeLines(parts: readonly FittedPart[]): MergedLine[] {
  const groups = new Map<string, [FittedPart, ...FittedPart[]]>();
  for (const part of parts) {
    const key = JSON.stringify([part.family, part.purchase]);
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [part]);
    else group.push(part);
  }
  return [...groups.values()]
    .sort(([a], [b]) => byFamily(a, b) || byPurchase(a.purchase, b.purchase))
    .map((group, index) => ({ line: line(group, index + 1), parts: group }));
}

function line(parts: MergedLine['parts'], number: number): BomLine {
  return {
    line: number,
    quantity: parts.reduce((sum, part) => sum + part.source.definition.quantity, 0),
    designators: parts
      .map((part) => ({ text: designatorText(part), flagged: isFlagged(part.source) }))
      .sort((a, b) => naturalOrder(a.text, b.text)),
    ...parts[0].purchase,
  };
}

/** `R30`, `R30 ×2` in a stage the board has twice, `RB of Q12` where nobody named it. */
function designatorText(part: FittedPart): string {
  const { reference, quantity } = part.source.definition;
  const name = part.designator ?? `${part.place} of ${reference}`;
  return quantity === 1 ? name : `${name} ×${quantity}`;
}

const byFamily = (a: FittedPart, b: FittedPart) =>
  PART_FAMILIES.indexOf(a.family) - PART_FAMILIES.indexOf(b.family);

function byPurchase(a: Purchase, b: Purchase): number {
  return (
    naturalOrder(a.description, b.description) ||
    byNumbers(sortNumbers(a), sortNumbers(b)) ||
    naturalOrder(a.partNumber ?? '', b.partNumber ?? '')
  );
}

const sortNumbers = ({ value, tolerance, ratings, partRevision }: Purchase) => [
  value?.min ?? Number.MAX_VALUE,
  tolerance ?? 0,
  ratings[0]?.value ?? 0,
  partRevision ?? 0,
];

function byNumbers(a: readonly number[], b: readonly number[]): number {
  const at = a.findIndex((number, index) => number !== b[index]);
  return at === -1 ? 0 : (a[at] ?? 0) - (b[at] ?? 0);
}
