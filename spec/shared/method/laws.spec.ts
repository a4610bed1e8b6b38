import { describe, expect, it } from 'vitest';
import { all, create } from 'mathjs';
import { ownCriterionIds } from '../../../shared/checks/criteria.ts';
import { CRITERION_LAWS_OF, SHARED_LAWS } from '../../../shared/method/criterion-laws.ts';
import { evaluateFormula, parseFormula, symbolsOf } from '../../../shared/method/formula.ts';
import { lawRuns } from '../../../shared/method/formula-text.ts';
import { LAWS, type LawId } from '../../../shared/method/laws.ts';
import { lawSymbol } from '../../../shared/method/symbols.ts';

const math = create(all ?? {});
const entries = Object.entries(LAWS) as [LawId, (typeof LAWS)[LawId]][];

describe('laws of the method', () => {
  it.each(entries)('%s is read by mathjs as it is here', (_, { formula, result }) => {
    const node = parseFormula(formula);
    const scope = Object.fromEntries(
      symbolsOf(node).map((id, k) => [id, 1.37 + 0.61 * k - (k % 3) * 0.4]),
    );
    const ours = evaluateFormula(node, (id) => scope[id] ?? NaN);
    const theirs: unknown = math.evaluate(formula, { ...scope });
    // mathjs goes on with complex numbers where a real power or logarithm ends.
    if (!Number.isNaN(ours)) expect(theirs).toBeCloseTo(ours, 9);
    expect([result, ...symbolsOf(node)].map((id) => lawSymbol(id).meaning)).not.toContain('');
  });

  it.each(entries)('%s says what it is and where it comes from', (_, { name, source }) => {
    expect(name).toMatch(/^[A-Zh]/);
    expect(source.length).toBeGreaterThan(3);
  });

  it('stand on the method page, each with a criterion or with what all share', () => {
    const shown = [...Object.values(CRITERION_LAWS_OF), ...SHARED_LAWS.map(({ laws }) => laws)];
    expect(new Set(shown.flat())).toEqual(new Set(Object.keys(LAWS)));
    expect(Object.keys(CRITERION_LAWS_OF).sort()).toEqual([...ownCriterionIds()].sort());
  });

  it('are set with subscripts, powers and the brackets they need', () => {
    const { result, formula } = LAWS['gain-temperature'];
    expect(lawRuns(result, formula)).toEqual([
      { text: 'h', level: 'line' },
      { text: 'FE', level: 'sub' },
      { text: ' = h', level: 'line' },
      { text: 'FE(25)', level: 'sub' },
      { text: '·((T', level: 'line' },
      { text: 'J', level: 'sub' },
      { text: ' + 273.15) / 298.15)', level: 'line' },
      { text: 'X', level: 'sup' },
    ]);
    expect(
      lawRuns('m', '(L - x) - (x + L) / (2 * x)')
        .map(({ text }) => text)
        .join(''),
    ).toBe('m = L − x − (x + L) / (2·x)');
  });

  it.each(['1 +', '2 ** 3', 'sin(x)', '(a', 'a b', '€'])('refuses %s', (text) => {
    expect(() => parseFormula(text)).toThrow(RangeError);
  });
});
