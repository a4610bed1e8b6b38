import type { Designators, PartLinks, Revision } from '../../../shared/contract/revision.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';

/** What a designer changes on the sheet and what is saved together. */
export interface Draft {
  readonly definition: StageInput;
  readonly designators: Designators;
  readonly parts: PartLinks;
}

/** The part of a revision that a draft is. */
export const draftOf = ({ definition, designators, parts }: Revision): Draft => ({
  definition,
  designators,
  parts,
});

/** Whether two drafts say the same. Keys come in the schema's order, so text decides. */
export const sameDraft = (a: Draft, b: Draft): boolean => JSON.stringify(a) === JSON.stringify(b);
