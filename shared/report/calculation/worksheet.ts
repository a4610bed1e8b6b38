import {
  evaluateFormula,
  type FormulaNode,
  parseFormula,
  symbolsOf,
} from '../../method/formula.ts';
import { type LawId, LAWS } from '../../method/laws.ts';
import { lawSymbol, type SymbolId } from '../../method/symbols.ts';

/** A figure put into a formula: from outside (with its source) or from a line above. */
export interface SheetInput {
  readonly symbol: SymbolId;
  /** SI, in full precision. */
  readonly value: number;
  readonly unit: string;
  /** Where it comes from; null where a line gave it. */
  readonly source: string | null;
  /** Number of the line that gave it; null where it comes from outside. */
  readonly line: number | null;
}

/** One worked line: a law, the numbers put in and what it comes to. */
export interface SheetLine {
  readonly number: number;
  readonly law: LawId;
  readonly result: SymbolId;
  readonly unit: string;
  /** The engine’s figure where it states one, else what the formula comes to. SI. */
  readonly value: number;
  readonly inputs: readonly SheetInput[];
  /** Whether the engine states this figure. */
  readonly stated: boolean;
  /** Whether the formula comes to the same within 1e-9. */
  readonly agrees: boolean;
}

const NEAR = 1e-9;
/** What is left of a difference of two equal figures is rounding: no figure of a stage is this small, in any SI unit. */
const ROUNDING = 1e-13;
const ZERO_CELSIUS_K = 273.15;

/** Whether two figures are the same within 1e-9 of the larger; temperatures are compared in kelvin. */
export function sameFigure(a: number, b: number, unit: string): boolean {
  if (a === b || (Number.isNaN(a) && Number.isNaN(b))) return true;
  const zero = unit === '°C' ? ZERO_CELSIUS_K : 0;
  const largest = Math.max(Math.abs(a + zero), Math.abs(b + zero));
  return Math.abs(a - b) <= Math.max(NEAR * largest, ROUNDING);
}

/** A value with its source, or the symbol of one that stands on the sheet already. */
export type Put = readonly [value: number, source: string] | SymbolId;

export interface ApplyOptions {
  /** What the result is called here. */
  readonly as?: SymbolId;
  /** What the engine states for it. */
  readonly stated?: number;
  /** Figures of this line alone. */
  readonly put?: Partial<Record<SymbolId, Put>>;
}

/** Counts the lines of a whole sheet. */
export class LineCounter {
  private count = 0;

  next(): number {
    this.count += 1;
    return this.count;
  }
}

interface Known {
  readonly value: number;
  readonly source: string | null;
  readonly line: number | null;
}

/**
 * Lines of a calculation in their order. What a line gives can be put into later ones; a sheet that goes on from
 * another knows the other’s figures too.
 */
export class Worksheet {
  readonly lines: SheetLine[] = [];
  private readonly known: Map<SymbolId, Known>;
  private readonly counter: LineCounter;
  /** Unit of limits and figures that have none of their own. */
  private readonly ownUnit: string;

  constructor(counter: LineCounter, from: Worksheet | null = null, ownUnit = '1') {
    this.counter = counter;
    this.known = new Map(from?.known);
    this.ownUnit = ownUnit;
  }

  /** A figure from outside. */
  give(symbol: SymbolId, value: number, source: string): void {
    this.known.set(symbol, { value, source, line: null });
  }

  has(symbol: SymbolId): boolean {
    return this.known.has(symbol);
  }

  /** @throws {RangeError} where no line and nothing given stands for it */
  value(symbol: SymbolId): number {
    return this.knownOf(symbol).value;
  }

  /** Works a line; gives the figure later lines go on with. */
  apply(law: LawId, { as, stated, put = {} }: ApplyOptions = {}): number {
    const { formula, result } = LAWS[law];
    const node = formulaOf(formula);
    const inputs = symbolsOf(node).map((id) => this.input(id as SymbolId, put));
    const reached = evaluateFormula(
      node,
      (id) => inputs.find(({ symbol }) => symbol === id)?.value ?? NaN,
    );
    const symbol = as ?? result;
    const unit = this.unitOf(symbol);
    const value = stated ?? reached;
    const number = this.counter.next();
    this.lines.push({
      number,
      law,
      result: symbol,
      unit,
      value,
      inputs,
      stated: stated !== undefined,
      agrees: sameFigure(value, reached, unit),
    });
    this.known.set(symbol, { value, source: null, line: number });
    return value;
  }

  /** The line that gave a figure, worked once more here: with its numbers, under a number of its own. */
  repeat(line: SheetLine): void {
    const number = this.counter.next();
    this.lines.push({ ...line, number });
    this.known.set(line.result, { value: line.value, source: null, line: number });
  }

  private input(symbol: SymbolId, put: ApplyOptions['put'] & object): SheetInput {
    const given = put[symbol];
    const { value, source, line } =
      typeof given === 'object'
        ? { value: given[0], source: given[1], line: null }
        : this.knownOf(given ?? symbol);
    return { symbol, value, unit: this.unitOf(symbol), source, line };
  }

  private knownOf(symbol: SymbolId): Known {
    const known = this.known.get(symbol);
    if (known === undefined) throw new RangeError(`nothing stands for ${symbol}`);
    return known;
  }

  private unitOf(symbol: SymbolId): string {
    return lawSymbol(symbol).unit || this.ownUnit;
  }
}

const PARSED = new Map<string, FormulaNode>();

function formulaOf(text: string): FormulaNode {
  const found = PARSED.get(text) ?? parseFormula(text);
  PARSED.set(text, found);
  return found;
}
