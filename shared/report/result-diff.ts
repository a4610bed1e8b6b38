import type { Criterion, Evaluation } from '../checks/evaluation.ts';
import { criterionName } from './criterion-name.ts';
import { formatQuantity } from '../units/engineering-notation.ts';
import { changeText } from './change-text.ts';
import type { DiffLine } from './diff-line.ts';

/**
 * Results that moved: value, limit and status of every criterion, engine version and verdict. The verdict's
 * line is always there, so that a reader need not look for what did not change.
 */
export function resultLines(before: Evaluation, after: Evaluation): DiffLine[] {
  const ids = new Set([...after.criteria, ...before.criteria].map(({ id }) => id));
  const find = (list: readonly Criterion[], id: string) => list.find((each) => each.id === id);
  return [
    ...[...ids].flatMap((id) =>
      criterionLines(find(before.criteria, id), find(after.criteria, id)),
    ),
    ...wordLine('engine', 'Engine', before.engine, after.engine).filter(moved),
    ...wordLine('verdict', 'Verdict', before.verdict, after.verdict),
  ];
}

const moved = ({ kind }: DiffLine) => kind !== 'same';

function criterionLines(before?: Criterion, after?: Criterion): DiffLine[] {
  const named = after ?? before;
  if (named === undefined) return [];
  const quantity = criterionName(named.id);
  const id = `criterion.${named.id}`;
  if (before === undefined || after === undefined) {
    const kind = before === undefined ? 'added' : 'removed';
    const text = (side?: Criterion) => (side === undefined ? null : figure(side.value, side.unit));
    return [{ id, quantity, before: text(before), after: text(after), change: kind, kind }];
  }
  const value = figureLine(id, quantity, [before.value, after.value], after.unit);
  const limit = figureLine(`${id}.limit`, 'limit of it', [before.limit, after.limit], after.unit);
  const status = wordLine(`${id}.status`, 'verdict of it', before.status, after.status);
  const rest = [limit, ...status].filter(moved);
  return moved(value) || rest.length > 0 ? [value, ...rest] : [];
}

type Sides = readonly [before: number | null, after: number | null];

const figure = (value: number | null, unit: string) =>
  formatQuantity(value, unit, { pad: true, digits: 3 });

/** Figures that read the same have not changed: what differs is below the digits anybody compares. */
function figureLine(id: string, quantity: string, [was, is]: Sides, unit: string): DiffLine {
  const before = figure(was, unit);
  const after = figure(is, unit);
  const line = { id, quantity, before, after };
  if (before === after) return { ...line, change: 'none', kind: 'same' };
  if (was === null || is === null) return { ...line, change: 'changed', kind: 'changed' };
  return { ...line, change: changeText(was, is, unit), kind: 'changed' };
}

const capital = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);

function wordLine(id: string, quantity: string, was: string, is: string): DiffLine[] {
  const same = was === is;
  const texts = { before: capital(was), after: capital(is) };
  return [
    { id, quantity, ...texts, change: same ? 'none' : 'changed', kind: same ? 'same' : 'changed' },
  ];
}
