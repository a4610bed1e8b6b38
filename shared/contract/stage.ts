import * as z from 'zod';
import { Verdict } from '../checks/evaluation.ts';
import { REVISION_STATES } from '../review/revision-state.ts';
import { StageInput } from '../stage/stage-input.ts';
import { Id, TimeMs } from './common-fields.ts';
import { Designators, PartLinks, Revision } from './revision.ts';
import type { Route } from './route.ts';

export const RevisionState = z.enum(REVISION_STATES);

/** One row of a project's stages table: the current revision of a stage. */
export const StageRow = z
  .object({
    stageId: Id,
    revisionId: Id,
    letter: z.string(),
    state: RevisionState,
    reference: z.string(),
    title: z.string(),
    quantity: z.int(),
    topology: z.string(),
    loadKind: z.string(),
    /** "Coil, 1.44 kΩ" */
    loadText: z.string(),
    /** Part numbers, separated by a comma where there are two. */
    transistor: z.string(),
    baseResistorOhm: z.number().nullable(),
    overdriveFactor: z.number().nullable(),
    vceSatV: z.number().nullable(),
    powerW: z.number().nullable(),
    verdict: Verdict,
    /** The criterion with the smallest margin; null when none has one. */
    least: z.object({ criterionId: z.string(), margin: z.number().nullable() }).nullable(),
    unverified: z.boolean(),
    partDataChanged: z.boolean(),
    savedAtMs: TimeMs,
  })
  .meta({ id: 'StageRow' });
export type StageRow = z.infer<typeof StageRow>;

export const STAGE_SORTS = [
  'reference',
  'title',
  'load',
  'transistor',
  'baseResistor',
  'overdriveFactor',
  'vceSat',
  'power',
  'verdict',
  'margin',
  'state',
  'letter',
] as const;

const projectParams = z.strictObject({ projectId: Id });
const stageParams = z.strictObject({ stageId: Id });

export const listStages = {
  method: 'GET',
  path: '/api/projects/:projectId/stages',
  summary: 'The stages table of a project',
  params: projectParams,
  query: z.strictObject({
    search: z.string().max(100).optional(),
    state: RevisionState.optional(),
    verdict: Verdict.optional(),
    load: z.string().max(40).optional(),
    transistor: z.string().max(60).optional(),
    sort: z.enum(STAGE_SORTS).default('reference'),
    direction: z.enum(['asc', 'desc']).default('asc'),
    page: z.coerce.number().int().min(1).max(100000).default(1),
    pageSize: z.coerce.number().int().min(1).max(500).default(100),
  }),
  reply: z.object({
    stages: z.array(StageRow),
    /** Rows that match, and rows there are. */
    matching: z.int(),
    total: z.int(),
    superseded: z.int(),
    /** What the filters can be set to. */
    transistors: z.array(z.string()),
    loads: z.array(z.string()),
  }),
} as const satisfies Route;

/** The definition's own policy is put aside for the project's; `policyDifference` names what that changed. */
const PolicyDifference = z.object({
  key: z.string(),
  given: z.union([z.number(), z.string(), z.boolean()]),
  adopted: z.union([z.number(), z.string(), z.boolean()]),
});

export const createStage = {
  method: 'POST',
  path: '/api/projects/:projectId/stages',
  summary: 'Create a stage with its first revision, or import a stage file',
  params: projectParams,
  body: z.strictObject({
    definition: StageInput,
    designators: Designators.partial().optional(),
    parts: PartLinks.partial().optional(),
  }),
  reply: z.object({ revision: Revision, policyDifference: z.array(PolicyDifference) }),
  status: 201,
} as const satisfies Route;

export const RevisionSummary = z.object({
  id: Id,
  letter: z.string(),
  state: RevisionState,
  verdict: Verdict,
  savedAtMs: TimeMs,
});
export type RevisionSummary = z.infer<typeof RevisionSummary>;

export const readStage = {
  method: 'GET',
  path: '/api/stages/:stageId',
  summary: 'A stage and all its revisions, oldest first',
  params: stageParams,
  reply: z
    .object({
      id: Id,
      projectId: Id,
      reference: z.string(),
      currentRevisionId: Id,
      revisions: z.array(RevisionSummary),
    })
    .meta({ id: 'Stage' }),
} as const satisfies Route;

/** A copy of the latest revision as the next draft; refused while one is under way. */
export const startRevision = {
  method: 'POST',
  path: '/api/stages/:stageId/revisions',
  summary: 'Start the next revision from a locked or withdrawn one',
  params: stageParams,
  reply: Revision,
  status: 201,
} as const satisfies Route;
