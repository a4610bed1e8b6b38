import type { SymbolId } from './symbols.ts';

/** One law of the calculation: what both the method page and the calculation sheet say of it. */
export interface Law {
  /** What it gives; a sheet may name it more closely, such as RB for any resistance. */
  readonly result: SymbolId;
  /** In the grammar of `parseFormula`, which mathjs reads as well; `log` is the natural logarithm. */
  readonly formula: string;
  readonly name: string;
  /** Where it holds, in a sentence; '' where it always does. */
  readonly validity: string;
  readonly source: string;
  /** Judgement, not measurement. */
  readonly judgement: boolean;
}

interface LawText {
  readonly result: SymbolId;
  readonly formula: string;
  readonly name: string;
  readonly validity?: string;
  readonly source: string;
  readonly judgement?: boolean;
}

export const law = (text: LawText): Law => ({ validity: '', judgement: false, ...text });
