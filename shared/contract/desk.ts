import * as z from 'zod';
import { Verdict } from '../checks/evaluation.ts';
import { Activity } from './audit.ts';
import { Id, TimeMs } from './common-fields.ts';
import type { Route } from './route.ts';
import { RevisionState } from './stage.ts';

export const DESK_GROUPS = [
  'to-check',
  'to-approve',
  'findings-to-answer',
  'findings-to-close',
  'part-data-changed',
  'own-drafts',
] as const;

/** One thing that waits for the signed-in person. */
export const DeskItem = z.object({
  revisionId: Id,
  stageId: Id,
  projectId: Id,
  projectCode: z.string(),
  projectTitle: z.string(),
  reference: z.string(),
  letter: z.string(),
  title: z.string(),
  state: RevisionState,
  verdict: Verdict,
  least: z.object({ criterionId: z.string(), margin: z.number().nullable() }).nullable(),
  /** Since when it waits, and from whom. */
  sinceMs: TimeMs,
  from: z.string().nullable(),
  /** Number, title and subject of a finding; the changed part; criteria read so far. */
  note: z.string().nullable(),
});
export type DeskItem = z.infer<typeof DeskItem>;

export const Desk = z
  .object({
    /** Waits for me. */
    groups: z.array(z.object({ kind: z.enum(DESK_GROUPS), items: z.array(DeskItem) })),
    /** My own work that waits for others. */
    waitingForOthers: z.array(DeskItem),
    activity: z.array(Activity),
    month: z.object({
      checksDone: z.int(),
      returned: z.int(),
      largestDifference: z.number().nullable(),
      medianHoursToCheck: z.number().nullable(),
    }),
  })
  .meta({ id: 'Desk' });
export type Desk = z.infer<typeof Desk>;

export const readDesk = {
  method: 'GET',
  path: '/api/desk',
  summary: 'What waits for the signed-in person',
  reply: Desk,
} as const satisfies Route;

/** Number of waiting things, for the badge of the rail. */
export const countDesk = {
  method: 'GET',
  path: '/api/desk/count',
  summary: 'How many things wait',
  reply: z.object({ waiting: z.int() }),
} as const satisfies Route;
