import { type FormulaNode, parseFormula, type Operator } from './formula.ts';
import { lawSymbol } from './symbols.ts';

/** A piece of a formula as it is set: on the line, below or above it. */
export interface FormulaRun {
  readonly text: string;
  readonly level: 'line' | 'sub' | 'sup';
}

const run = (text: string, level: FormulaRun['level'] = 'line'): FormulaRun => ({ text, level });

/** A letter symbol with its subscript. */
export function symbolRuns(id: string): readonly FormulaRun[] {
  const { main, sub } = lawSymbol(id);
  return sub === '' ? [run(main)] : [run(main), run(sub, 'sub')];
}

/** `IB = IR − VBE / RBE`, set with subscripts. */
export function lawRuns(result: string, formula: string): readonly FormulaRun[] {
  return merged([...symbolRuns(result), run(' = '), ...formulaRuns(formula, symbolRuns)]);
}

/**
 * A formula on one line.
 *
 * @param leaf how a symbol is written: by its letters, or by the number put in
 */
export function formulaRuns(
  formula: string,
  leaf: (symbol: string) => readonly FormulaRun[],
): readonly FormulaRun[] {
  return merged(write(parseFormula(formula), leaf));
}

type Leaf = (symbol: string) => readonly FormulaRun[];

const SIGNS: Record<Operator, string> = { '+': ' + ', '-': ' − ', '*': '·', '/': ' / ', '^': '' };
const BINDING: Record<Operator, number> = { '+': 1, '-': 1, '*': 2, '/': 2, '^': 3 };
const NAMES = { abs: 'abs', exp: 'exp', log: 'ln', max: 'max', min: 'min', sqrt: 'sqrt' } as const;

const bindingOf = (node: FormulaNode): number => {
  if (node.kind === 'operation') return BINDING[node.operator];
  return node.kind === 'negative' ? 1 : 4;
};

function write(node: FormulaNode, leaf: Leaf): readonly FormulaRun[] {
  switch (node.kind) {
    case 'number':
      return [run(node.text)];
    case 'symbol':
      return leaf(node.id);
    case 'negative':
      return [run('−'), ...bracketed(node.of, 2, leaf)];
    case 'call':
      return [
        run(`${NAMES[node.name]}(`),
        ...node.of.flatMap((each, k) => [...(k === 0 ? [] : [run(', ')]), ...write(each, leaf)]),
        run(')'),
      ];
    case 'operation':
      return operation(node, leaf);
  }
}

function operation(
  { operator, left, right }: Extract<FormulaNode, { kind: 'operation' }>,
  leaf: Leaf,
): readonly FormulaRun[] {
  const binding = BINDING[operator];
  if (operator === '^') {
    const power = write(right, leaf).map(({ text }) => text.replace(/^ | $/g, ''));
    return [...bracketed(left, 4, leaf), run(power.join(' '), 'sup')];
  }
  // a − (b + c) and a / (b·c) keep their brackets, a + (b − c) does not need them.
  const strict = operator === '-' || operator === '/' ? binding + 1 : binding;
  return [
    ...bracketed(left, binding, leaf),
    run(SIGNS[operator]),
    ...bracketed(right, strict, leaf),
  ];
}

function bracketed(node: FormulaNode, least: number, leaf: Leaf): readonly FormulaRun[] {
  const inner = write(node, leaf);
  return bindingOf(node) >= least ? inner : [run('('), ...inner, run(')')];
}

/** Neighbours of one level become one piece. */
function merged(runs: readonly FormulaRun[]): readonly FormulaRun[] {
  const joined: FormulaRun[] = [];
  for (const each of runs) {
    const last = joined.at(-1);
    if (last?.level === each.level)
      joined[joined.length - 1] = run(last.text + each.text, last.level);
    else joined.push(each);
  }
  return joined;
}
