import type { Criterion } from '../../checks/evaluation.ts';
import type { SymbolId } from '../../method/symbols.ts';
import type { CornerSource } from './corner-source.ts';
import type { SheetLine, Worksheet } from './worksheet.ts';

/** What the lines of one criterion are written from. */
export interface CriterionSource extends CornerSource {
  readonly criterion: Criterion;
  /** Goes on from the corner’s sheet, or from supply and ambient alone. */
  readonly sheet: Worksheet;
  /** Lines of the corner; empty for a criterion that no corner moves. */
  readonly cornerLines: readonly SheetLine[];
  readonly beyondRows: readonly string[];
}

/** Repeats the line of the corner that gave the criterion’s figure. */
export function cite({ sheet, cornerLines }: CriterionSource, symbol: SymbolId): SymbolId {
  const line = cornerLines.findLast(({ result }) => result === symbol);
  if (line !== undefined) sheet.repeat(line);
  return symbol;
}

/** A limit that is set and not computed. */
export function givenLimit(
  { sheet, criterion }: CriterionSource,
  limit: number | null,
  source: string,
): void {
  if (limit !== null && criterion.limit !== null) sheet.give('L', criterion.limit, source);
}

/** A rating times its derating; nothing where none is printed. */
export function deratedLimit(
  { sheet, criterion }: CriterionSource,
  rating: number | null,
  derating: number,
  source: string,
): void {
  if (rating === null || criterion.limit === null) return;
  sheet.apply('derated', {
    stated: criterion.limit,
    put: { d: [derating, 'Policy, derating'], L_n: [rating, source] },
  });
}

/** A resistor’s rating at the ambient of the corner. */
export function resistorLimit(
  { sheet, criterion, input }: CriterionSource,
  ratingW: number | null,
  source: string,
): void {
  if (ratingW === null || criterion.limit === null) return;
  sheet.apply('resistor-limit', {
    stated: criterion.limit,
    put: { d: [input.policy.resistorDerating, 'Policy, derating'], L_n: [ratingW, source] },
  });
}
