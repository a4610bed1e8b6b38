import type { EntityManager } from 'typeorm';
import type * as z from 'zod';
import type { listStages, StageRow } from '../../shared/contract/stage.ts';
import { naturalOrder } from '../../shared/report/natural-order.ts';
import { REVISION_STATES, revisionLetter } from '../../shared/review/revision-state.ts';
import { VERDICTS } from '../../shared/checks/evaluation.ts';
import {
  isUnverified,
  partDataChanged,
  standingInProjects,
  type RevisionPartStanding,
} from '../revisions/part-standing.ts';
import { revisionLines, type RevisionLine } from '../revisions/revision-line.ts';

type Query = z.output<typeof listStages.query>;
type List = z.input<typeof listStages.reply>;

/** The stages table: current revisions, or the superseded ones when asked for by state. */
export async function stageList(
  manager: EntityManager,
  projectId: string,
  query: Query,
): Promise<List> {
  const lines = await revisionLines(manager, [projectId]);
  const current = lines.filter((line) => line.current);
  const superseded = lines.filter(({ state }) => state === 'superseded');
  const matching = (query.state === 'superseded' ? superseded : current).filter((line) =>
    matches(line, query),
  );
  const sign = query.direction === 'asc' ? 1 : -1;
  matching.sort((a, b) => sign * ORDER[query.sort](a, b) || naturalOrder(a.reference, b.reference));
  const from = (query.page - 1) * query.pageSize;
  const standing = await standingInProjects(manager, [projectId]);
  return {
    stages: matching.slice(from, from + query.pageSize).map((line) => stageRow(line, standing)),
    matching: matching.length,
    total: current.length,
    superseded: superseded.length,
    transistors: distinct(current.flatMap(({ transistor }) => transistor.split(', '))),
    loads: distinct(current.map(({ loadKind }) => loadKind)),
  };
}

type Order = (a: RevisionLine, b: RevisionLine) => number;

const byNumber =
  (figure: (line: RevisionLine) => number | null): Order =>
  (a, b) =>
    (figure(a) ?? Infinity) === (figure(b) ?? Infinity)
      ? 0
      : (figure(a) ?? Infinity) - (figure(b) ?? Infinity);
const byText =
  (text: (line: RevisionLine) => string): Order =>
  (a, b) =>
    naturalOrder(text(a).toLowerCase(), text(b).toLowerCase());

/** The columns one may sort by; figures that do not exist stand last. */
const ORDER: Record<Query['sort'], Order> = {
  reference: byText(({ reference }) => reference),
  title: byText(({ title }) => title),
  load: byText(({ loadText }) => loadText),
  transistor: byText(({ transistor }) => transistor),
  baseResistor: byNumber(({ baseResistorOhm }) => baseResistorOhm),
  overdriveFactor: byNumber(({ overdriveFactor }) => overdriveFactor),
  vceSat: byNumber(({ vceSatV }) => vceSatV),
  power: byNumber(({ powerW }) => powerW),
  verdict: byNumber(({ verdict }) => VERDICTS.indexOf(verdict)),
  margin: byNumber(({ leastMargin }) => leastMargin),
  state: byNumber(({ state }) => REVISION_STATES.indexOf(state)),
  letter: byNumber(({ number }) => number),
};

function matches(line: RevisionLine, { load, search, state, transistor, verdict }: Query): boolean {
  const text = `${line.reference} ${line.title} ${line.transistor} ${line.loadText}`.toLowerCase();
  return (
    (search === undefined || text.includes(search.trim().toLowerCase())) &&
    (state === undefined || line.state === state) &&
    (verdict === undefined || line.verdict === verdict) &&
    (load === undefined || line.loadKind === load) &&
    (transistor === undefined || line.transistor.split(', ').includes(transistor))
  );
}

function stageRow(
  line: RevisionLine,
  standing: readonly RevisionPartStanding[],
): z.input<typeof StageRow> {
  const own = standing.filter(({ revisionId }) => revisionId === line.id);
  const { baseResistorOhm, leastCriterion, leastMargin, overdriveFactor, powerW, vceSatV } = line;
  return {
    ...{ stageId: line.stageId, revisionId: line.id, letter: revisionLetter(line.number) },
    ...{ state: line.state, reference: line.reference, title: line.title },
    ...{ quantity: line.quantity, topology: line.topology, loadKind: line.loadKind },
    ...{ loadText: line.loadText, transistor: line.transistor, verdict: line.verdict },
    ...{ baseResistorOhm, overdriveFactor, vceSatV, powerW, savedAtMs: line.savedAtMs },
    least: leastOf(leastCriterion, leastMargin),
    unverified: isUnverified(line.topology, own),
    partDataChanged: partDataChanged(own),
  };
}

/** The least margin as the contract has it. */
export function leastOf(
  criterionId: string | null,
  margin: number | null,
): { criterionId: string; margin: number | null } | null {
  return criterionId === null ? null : { criterionId, margin };
}

function distinct(values: readonly string[]): string[] {
  return [...new Set(values)].sort(naturalOrder);
}
