import { formulaRuns, type FormulaRun, lawRuns, symbolRuns } from '../method/formula-text.ts';
import { LAWS } from '../method/laws.ts';
import { lawSymbol } from '../method/symbols.ts';
import { formatQuantity } from '../units/engineering-notation.ts';
import type { CalculationSheet, CornerBlock, CriterionBlock } from './calculation-sheet.ts';
import type { SheetInput, SheetLine } from './calculation/worksheet.ts';
import { cornerWords } from './corner-words.ts';
import { criterionName } from './criterion-name.ts';

/** Digits a figure is printed with: enough to follow by hand to five. */
const DIGITS = 6;

/** A figure as the sheet prints it. */
export const sheetFigure = (value: number, unit: string): string =>
  formatQuantity(value, unit, { digits: DIGITS });

/** A line as it is read: on screen, in print and in the PDF alike. */
export interface LineText {
  readonly number: number;
  readonly symbol: readonly FormulaRun[];
  readonly name: string;
  readonly formula: readonly FormulaRun[];
  readonly numbers: readonly FormulaRun[];
  readonly value: string;
  /** Where each number comes from. */
  readonly from: readonly FormulaRun[];
  /** Where the law comes from, and where it holds. */
  readonly source: string;
  readonly judgement: boolean;
  readonly agrees: boolean;
}

const plain = (text: string): FormulaRun => ({ text, level: 'line' });

export function lineText(line: SheetLine): LineText {
  const law = LAWS[line.law];
  const put = (symbol: string): readonly FormulaRun[] => {
    const input = line.inputs.find((each) => each.symbol === symbol);
    const text = input === undefined ? symbol : sheetFigure(input.value, input.unit);
    return [plain(text.startsWith('\u2212') ? `(${text})` : text)];
  };
  const { meaning } = lawSymbol(line.result);
  return {
    number: line.number,
    symbol: symbolRuns(line.result),
    name: line.result === law.result ? law.name : sentence(meaning),
    formula: lawRuns(line.result, law.formula),
    numbers: [plain('= '), ...formulaRuns(law.formula, put)],
    value: sheetFigure(line.value, line.unit),
    from: fromRuns(line.inputs),
    source: law.source,
    judgement: law.judgement,
    agrees: line.agrees,
  };
}

const sentence = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** `RB: line 7; VF: Clamp, forward drop` */
function fromRuns(inputs: readonly SheetInput[]): readonly FormulaRun[] {
  const groups = new Map<string, SheetInput[]>();
  for (const input of inputs) {
    const where = input.line === null ? (input.source ?? '') : `line ${input.line}`;
    groups.set(where, [...(groups.get(where) ?? []), input]);
  }
  return [...groups].flatMap(([where, group], k) => [
    ...(k === 0 ? [] : [plain('; ')]),
    ...group.flatMap(({ symbol }, index) => [
      ...(index === 0 ? [] : [plain(', ')]),
      ...symbolRuns(symbol),
    ]),
    plain(`: ${where}`),
  ]);
}

const SIDES = {
  only: '',
  behind: ', output transistor',
  front: ', transistor in front',
} as const;

/** `Corner A, transistor in front` */
export const cornerHeading = ({ letter, side }: CornerBlock): string =>
  `Corner ${letter}${SIDES[side]}`;

/** The whole corner in words. */
export const cornerSentence = ({ corner }: CornerBlock): string => cornerWords(corner, '');

export const criterionHeading = ({ criterion }: CriterionBlock): string =>
  criterionName(criterion.id);

/** What a criterion comes to: figure, limit and margin, or why there is none. */
export function criterionSentence({ criterion, figure }: CriterionBlock): string {
  const { value, limit, relation, unit, margin, status } = criterion;
  if (value === null || figure === null) {
    return `No figure: it is infinite, or the data it needs are not printed. Status ${status}.`;
  }
  const sign = relation === '>=' ? '≥' : '≤';
  const held = limit === null ? 'no limit is set' : `${sign} ${sheetFigure(limit, unit)}`;
  const left =
    margin === null ? '' : `, margin ${formatQuantity(margin * 100, '%', { digits: 4 })}`;
  return `${sheetFigure(value, unit)}, ${held}${left}. Status ${status}.`;
}

/** Where a criterion’s figures go on from: `Figures of corner A`; '' where no corner moves it. */
export const cornerReference = ({ corner }: CriterionBlock): string =>
  corner === null ? '' : `Figures of corner ${corner}`;

/** How the second computation came out. */
export function recomputedText({ lineCount, differing }: CalculationSheet): string {
  return differing === 0
    ? `${lineCount} lines, each within 1e\u22129 of the engine`
    : `${differing} of ${lineCount} lines differ from the engine`;
}
