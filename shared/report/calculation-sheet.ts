import { CornerStudy } from '../checks/corner-study.ts';
import { type CriterionId, PRE } from '../checks/criteria.ts';
import type { Corner, Criterion } from '../checks/evaluation.ts';
import { leastLimit } from '../checks/margin.ts';
import type { SymbolId } from '../method/symbols.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { conditionLines, driveLines } from './calculation/condition-lines.ts';
import type { CornerSource, Side } from './calculation/corner-source.ts';
import type { CriterionSource } from './calculation/criterion-source.ts';
import { OFF_STATE_LINES } from './calculation/off-criteria.ts';
import { ON_STATE_LINES } from './calculation/on-state-criteria.ts';
import { operatingLines } from './calculation/operating-lines.ts';
import { SWITCHING_LINES } from './calculation/switching-criteria.ts';
import { LineCounter, type SheetLine, Worksheet } from './calculation/worksheet.ts';

/** The operating point of one transistor at one corner, worked from the stage file’s figures. */
export interface CornerBlock {
  /** `A`, `B` … `Z`, `AA` */
  readonly letter: string;
  readonly side: Side;
  readonly corner: Corner;
  readonly lines: readonly SheetLine[];
}

/** One criterion at its worst corner: figure, limit and margin. */
export interface CriterionBlock {
  readonly criterion: Criterion;
  /** Letter of the corner whose figures it goes on with; null where no corner moves it. */
  readonly corner: string | null;
  readonly lines: readonly SheetLine[];
  /** What the figure is called; null where it cannot be worked. */
  readonly figure: SymbolId | null;
}

/** A stage worked out by hand, line by line. */
export interface CalculationSheet {
  readonly corners: readonly CornerBlock[];
  readonly criteria: readonly CriterionBlock[];
  /** How many lines there are, and how many do not come to the engine’s figure. */
  readonly lineCount: number;
  readonly differing: number;
}

const LINES = { ...ON_STATE_LINES, ...OFF_STATE_LINES, ...SWITCHING_LINES };

/** Criteria that need no operating point: supply and ratings are enough. */
const WITHOUT_CORNER: readonly CriterionId[] = [
  'holding-voltage',
  'off-collector-voltage',
  'drive-maximum',
  'input-off',
  'peak-collector-voltage',
  'surge-voltage',
  'rise-time',
  'tested-range',
];

const ownId = (id: string) => (id.startsWith(PRE) ? id.slice(PRE.length) : id) as CriterionId;

/**
 * The calculation of a stage as a worked document: for each criterion at its worst corner the laws used, the numbers
 * put in, what they come to and where they come from. Every figure is computed a second time, from the laws of the
 * method page, and compared with the engine’s.
 *
 * @param rbOhm the base resistor the stage was judged at
 * @returns null where the stage cannot be judged at all
 */
export function calculationSheet(input: StageInput, rbOhm: number): CalculationSheet | null {
  const study = CornerStudy.of(input, rbOhm);
  if (study === null) return null;
  const writer = new SheetWriter(input, study);
  const criteria = study.criteria.map((criterion) => writer.criterion(criterion));
  const corners = writer.corners();
  const lines = [...corners, ...criteria].flatMap((block) => block.lines);
  return {
    corners,
    criteria,
    lineCount: lines.length,
    differing: lines.filter(({ agrees }) => !agrees).length,
  };
}

interface WorkedCorner extends CornerBlock {
  readonly sheet: Worksheet;
}

class SheetWriter {
  private readonly input: StageInput;
  private readonly study: CornerStudy;
  private readonly counter = new LineCounter();
  private readonly worked = new Map<string, WorkedCorner>();

  constructor(input: StageInput, study: CornerStudy) {
    this.input = input;
    this.study = study;
  }

  corners(): readonly CornerBlock[] {
    return [...this.worked.values()].map(({ letter, side, corner, lines }) => ({
      letter,
      side,
      corner,
      lines,
    }));
  }

  criterion(criterion: Criterion): CriterionBlock {
    const id = ownId(criterion.id);
    const write = LINES[id];
    if (criterion.value === null || write === undefined) return unworked(criterion);
    const source = this.source(criterion.id, criterion.corner);
    const worked =
      criterion.corner === null || WITHOUT_CORNER.includes(id) ? null : this.corner(source);
    const sheet = new Worksheet(this.counter, worked?.sheet ?? null, criterion.unit);
    if (worked === null) giveSupply(sheet, source, criterion);
    const figure = write({
      ...source,
      criterion,
      sheet,
      cornerLines: worked?.lines ?? [],
      beyondRows: id === 'tested-range' ? this.study.beyondRows(criterion.id) : [],
    } satisfies CriterionSource);
    if (figure !== null) marginLine(sheet, criterion, figure);
    return { criterion, corner: worked?.letter ?? null, lines: sheet.lines, figure };
  }

  private source(criterionId: string, corner: Corner | null): CornerSource {
    const { point, off } = this.study.at(criterionId, corner);
    return {
      point,
      off,
      corner: corner ?? {},
      side: this.sideOf(criterionId),
      input: point.model.input,
    };
  }

  private sideOf(criterionId: string): Side {
    if (this.input.topology !== 'two-transistor-high-side') return 'only';
    return criterionId.startsWith(PRE) ? 'front' : 'behind';
  }

  private corner(source: CornerSource): WorkedCorner {
    const key = JSON.stringify([source.side, source.corner]);
    const found = this.worked.get(key);
    if (found !== undefined) return found;
    const sheet = new Worksheet(this.counter);
    conditionLines(sheet, source);
    driveLines(sheet, source);
    operatingLines(sheet, source);
    const { side, corner } = source;
    const letter = letterOf(this.worked.size);
    const block = { letter, side, corner, lines: sheet.lines, sheet };
    this.worked.set(key, block);
    return block;
  }
}

const unworked = (criterion: Criterion): CriterionBlock => ({
  criterion,
  corner: null,
  lines: [],
  figure: null,
});

function giveSupply(sheet: Worksheet, { input }: CornerSource, { value, id }: Criterion): void {
  sheet.give('V_Smax', input.supplyV.max, 'Supply, max');
  sheet.give('V_Smin', input.supplyV.min, 'Supply, min');
  const shown = ownId(id) === 'off-collector-voltage' ? value : null;
  sheet.give('V_S', shown ?? input.supplyV.max, 'Supply, max');
}

function marginLine(sheet: Worksheet, criterion: Criterion, figure: SymbolId): void {
  const { margin, relation, limit, unit } = criterion;
  if (margin === null || limit === null || !sheet.has('L')) return;
  if (relation === '<=' && limit <= 0) return;
  sheet.apply(relation === '<=' ? 'margin-at-most' : 'margin-at-least', {
    stated: margin,
    put: { x: figure, L_0: [leastLimit(unit), 'Least limit of this unit'] },
  });
}

/** 0 is A, 26 is AA. */
function letterOf(index: number): string {
  const letter = String.fromCharCode(65 + (index % 26));
  return index < 26 ? letter : letterOf(Math.floor(index / 26) - 1) + letter;
}
