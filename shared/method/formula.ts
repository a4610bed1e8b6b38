/** A formula taken apart; what it is made of decides how it is set and what it comes to. */
export type FormulaNode =
  | { readonly kind: 'number'; readonly text: string }
  | { readonly kind: 'symbol'; readonly id: string }
  | { readonly kind: 'negative'; readonly of: FormulaNode }
  | {
      readonly kind: 'operation';
      readonly operator: Operator;
      readonly left: FormulaNode;
      readonly right: FormulaNode;
    }
  | { readonly kind: 'call'; readonly name: FunctionName; readonly of: readonly FormulaNode[] };

export type Operator = '+' | '-' | '*' | '/' | '^';

/** Functions a law may use; `log` is the natural logarithm. */
const FUNCTIONS = {
  abs: Math.abs,
  exp: Math.exp,
  log: Math.log,
  max: Math.max,
  min: Math.min,
  sqrt: Math.sqrt,
} as const;
export type FunctionName = keyof typeof FUNCTIONS;

const TOKEN = /\s*(\d+(?:\.\d+)?(?:e[+-]?\d+)?|[A-Za-z]\w*|[-+*/^(),])/gy;

/**
 * Takes an expression apart: numbers, symbols, + − * / ^, brackets and the functions above, with the usual precedence.
 * The grammar is a part of what mathjs reads, so that a law is written once for both.
 *
 * @throws {RangeError} where the text is no such expression
 */
export function parseFormula(text: string): FormulaNode {
  return new FormulaParser(text).whole();
}

class FormulaParser {
  private readonly tokens: string[];
  private at = 0;
  private readonly text: string;

  constructor(text: string) {
    this.text = text;
    this.tokens = [...text.matchAll(TOKEN)].map(([, token = '']) => token);
    const read = this.tokens.join('');
    if (read !== text.replace(/\s/g, '')) this.refuse();
  }

  whole(): FormulaNode {
    const node = this.sum();
    if (this.at < this.tokens.length) this.refuse();
    return node;
  }

  private sum(): FormulaNode {
    let left = this.product();
    for (let operator = this.take('+', '-'); operator; operator = this.take('+', '-')) {
      left = { kind: 'operation', operator, left, right: this.product() };
    }
    return left;
  }

  private product(): FormulaNode {
    let left = this.signed();
    for (let operator = this.take('*', '/'); operator; operator = this.take('*', '/')) {
      left = { kind: 'operation', operator, left, right: this.signed() };
    }
    return left;
  }

  private signed(): FormulaNode {
    return this.take('-') ? { kind: 'negative', of: this.signed() } : this.power();
  }

  private power(): FormulaNode {
    const left = this.atom();
    const operator = this.take('^');
    return operator ? { kind: 'operation', operator, left, right: this.signed() } : left;
  }

  private atom(): FormulaNode {
    const token = this.tokens[this.at] ?? this.refuse();
    this.at += 1;
    if (/^\d/.test(token)) return { kind: 'number', text: token };
    if (token === '(') {
      const inside = this.sum();
      this.expect(')');
      return inside;
    }
    if (!/^[A-Za-z]/.test(token)) return this.refuse();
    return this.tokens[this.at] === '(' ? this.call(token) : { kind: 'symbol', id: token };
  }

  private call(name: string): FormulaNode {
    if (!Object.hasOwn(FUNCTIONS, name)) return this.refuse();
    this.expect('(');
    const of = [this.sum()];
    while (this.tokens[this.at] === ',') {
      this.at += 1;
      of.push(this.sum());
    }
    this.expect(')');
    return { kind: 'call', name: name as FunctionName, of };
  }

  private take<T extends Operator>(...wanted: readonly T[]): T | undefined {
    const found = wanted.find((operator) => operator === this.tokens[this.at]);
    if (found !== undefined) this.at += 1;
    return found;
  }

  private expect(token: string): void {
    if (this.tokens[this.at] !== token) this.refuse();
    this.at += 1;
  }

  private refuse(): never {
    throw new RangeError(`no formula: ${this.text}`);
  }
}

/** The symbols of a formula in the order they come, each once. */
export function symbolsOf(node: FormulaNode): readonly string[] {
  switch (node.kind) {
    case 'number':
      return [];
    case 'symbol':
      return [node.id];
    case 'negative':
      return symbolsOf(node.of);
    case 'operation':
      return [...new Set([...symbolsOf(node.left), ...symbolsOf(node.right)])];
    case 'call':
      return [...new Set(node.of.flatMap(symbolsOf))];
  }
}

/**
 * What a formula comes to.
 *
 * @param valueOf SI value of a symbol
 */
export function evaluateFormula(node: FormulaNode, valueOf: (symbol: string) => number): number {
  const below = (child: FormulaNode) => evaluateFormula(child, valueOf);
  switch (node.kind) {
    case 'number':
      return Number(node.text);
    case 'symbol':
      return valueOf(node.id);
    case 'negative':
      return -below(node.of);
    case 'operation':
      return operate(node.operator, below(node.left), below(node.right));
    case 'call':
      return FUNCTIONS[node.name](...(node.of.map(below) as [number]));
  }
}

function operate(operator: Operator, left: number, right: number): number {
  switch (operator) {
    case '+':
      return left + right;
    case '-':
      return left - right;
    case '*':
      return left * right;
    case '/':
      return left / right;
    case '^':
      return Math.pow(left, right);
  }
}
