import type { Evaluation } from '../checks/evaluation.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { changeText } from './change-text.ts';
import { leafText, type DefinitionLeaf } from './definition-leaf.ts';
import { definitionLeaves } from './definition-leaves.ts';
import type { DiffLine } from './diff-line.ts';
import { resultLines } from './result-diff.ts';

/** A library part a revision was filled from. */
export interface ComparedPart {
  readonly role: string;
  readonly partNumber: string;
  readonly revision: number;
  readonly verified: boolean;
}

/** What of a revision is compared. */
export interface ComparedRevision {
  readonly definition: StageInput;
  readonly evaluation: Evaluation;
  readonly parts: readonly ComparedPart[];
}

/** The three groups of a comparison; a group without a line has not changed. */
export interface RevisionDiff {
  readonly definition: readonly DiffLine[];
  readonly partData: readonly DiffLine[];
  readonly results: readonly DiffLine[];
}

/**
 * What changed between two revisions of a stage, in words with units: values of the definition, the part
 * data it was judged with, and the results. Pure: the same two revisions give the same lines.
 *
 * @param before the earlier revision
 * @param after the later one
 */
export function revisionDiff(before: ComparedRevision, after: ComparedRevision): RevisionDiff {
  const lines = leafLines(definitionLeaves(before.definition), definitionLeaves(after.definition));
  const isPartData = ({ id }: DiffLine) => /^(preDriver\.)?transistor\./.test(id);
  return {
    definition: lines.filter((line) => !isPartData(line)),
    partData: [...partLines(before.parts, after.parts), ...lines.filter(isPartData)],
    results: resultLines(before.evaluation, after.evaluation),
  };
}

function leafLines(before: readonly DefinitionLeaf[], after: readonly DefinitionLeaf[]) {
  const earlier = new Map(before.map((leaf) => [leaf.path, leaf]));
  const later = new Map(after.map((leaf) => [leaf.path, leaf]));
  const paths = new Set([...later.keys(), ...earlier.keys()]);
  return [...paths].flatMap((path) => leafLine(earlier.get(path), later.get(path)) ?? []);
}

function leafLine(before?: DefinitionLeaf, after?: DefinitionLeaf): DiffLine | null {
  const named = after ?? before;
  if (named === undefined || before?.value === after?.value) return null;
  const line = { id: named.path, quantity: named.label };
  if (after === undefined || before === undefined) {
    return {
      ...line,
      before: before === undefined ? null : leafText(before),
      after: after === undefined ? null : leafText(after),
      change: before === undefined ? 'added' : 'removed',
      kind: before === undefined ? 'added' : 'removed',
    };
  }
  const change =
    typeof before.value === 'number' && typeof after.value === 'number'
      ? changeText(before.value, after.value, after.unit ?? '1')
      : 'changed';
  return { ...line, before: leafText(before), after: leafText(after), change, kind: 'changed' };
}

const standing = ({ revision, verified }: ComparedPart) =>
  `library revision ${revision}, ${verified ? 'verified' : 'unverified'}`;

function partLines(before: readonly ComparedPart[], after: readonly ComparedPart[]): DiffLine[] {
  const roles = new Set([...after, ...before].map(({ role }) => role));
  return [...roles].flatMap((role) => {
    const was = before.find((part) => part.role === role);
    const is = after.find((part) => part.role === role);
    return partLine(role, was, is) ?? [];
  });
}

function partLine(role: string, was?: ComparedPart, is?: ComparedPart): DiffLine | null {
  const named = is ?? was;
  if (named === undefined) return null;
  const line = { id: `parts.${role}`, quantity: named.partNumber };
  if (was === undefined || is === undefined) {
    return {
      ...line,
      before: was === undefined ? null : standing(was),
      after: is === undefined ? null : standing(is),
      change: was === undefined ? 'added' : 'removed',
      kind: was === undefined ? 'added' : 'removed',
    };
  }
  if (was.partNumber !== is.partNumber) {
    const texts = [was, is].map((part) => `${part.partNumber}, ${standing(part)}`);
    return {
      ...line,
      before: texts[0] ?? null,
      after: texts[1] ?? null,
      change: 'changed',
      kind: 'changed',
    };
  }
  if (was.revision === is.revision && was.verified === is.verified) {
    const change = `same snapshot, ${is.verified ? 'verified' : 'unverified'}`;
    return { ...line, before: standing(was), after: standing(is), change, kind: 'same' };
  }
  return {
    ...line,
    before: standing(was),
    after: standing(is),
    change: 'changed',
    kind: 'changed',
  };
}
