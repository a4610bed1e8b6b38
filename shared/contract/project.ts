import * as z from 'zod';
import { Criterion } from '../checks/evaluation.ts';
import { PROJECT_ROLES, REVISION_STATES } from '../review/revision-state.ts';
import { PolicyLimits } from '../stage/policy.ts';
import { Id, PersonName, PersonRef } from './common-fields.ts';
import type { Route } from './route.ts';

export const ProjectRole = z.enum(PROJECT_ROLES);

/** A released version of a set of limits; never changed, only followed by a newer version. */
export const PolicyVersion = z
  .object({ id: Id, name: z.string(), version: z.int(), limits: PolicyLimits })
  .meta({ id: 'PolicyVersion' });
export type PolicyVersion = z.infer<typeof PolicyVersion>;

export const listPolicies = {
  method: 'GET',
  path: '/api/policies',
  summary: 'Policies a project can adopt',
  reply: z.object({ policies: z.array(PolicyVersion) }),
} as const satisfies Route;

export const Member = z.object({ person: PersonRef, roles: z.array(ProjectRole) });
export type Member = z.infer<typeof Member>;

/** A port of the project's controller, the pins in use taken together. */
export const PortVerdict = z
  .object({ port: z.string(), pins: z.int(), criterion: Criterion })
  .meta({ id: 'PortVerdict' });
export type PortVerdict = z.infer<typeof PortVerdict>;

const stateCounts = z.object(
  Object.fromEntries(REVISION_STATES.map((state) => [state, z.int()])) as Record<
    (typeof REVISION_STATES)[number],
    z.ZodInt
  >,
);

export const Project = z
  .object({
    id: Id,
    /** Short code such as `CR-40`, unique. */
    code: z.string(),
    title: z.string(),
    supplementaryTitle: z.string().nullable(),
    legalOwner: z.string(),
    department: z.string().nullable(),
    policy: PolicyVersion,
    /** Whether a stage with unverified part data may be locked. */
    unverifiedBlocksLock: z.boolean(),
    members: z.array(Member),
    /** Current revisions by state. */
    counts: stateCounts,
    /** The criterion `port-current` of each port that a current revision stands on. */
    ports: z.array(PortVerdict),
    /** The roles of the person asking. */
    ownRoles: z.array(ProjectRole),
    /** Whether the person asking may change title, policy and members. */
    mayManage: z.boolean(),
  })
  .meta({ id: 'Project' });
export type Project = z.infer<typeof Project>;

export const ProjectSummary = Project.pick({
  id: true,
  code: true,
  title: true,
  counts: true,
  ownRoles: true,
}).extend({ policyName: z.string(), stages: z.int() });
export type ProjectSummary = z.infer<typeof ProjectSummary>;

const ProjectFields = {
  code: z
    .string({ error: 'expected a short code such as CR-40' })
    .trim()
    .regex(
      /^[A-Z0-9][A-Z0-9-]{0,11}$/,
      'expected up to 12 capitals, digits or hyphens, such as CR-40',
    ),
  title: PersonName,
  supplementaryTitle: PersonName.nullable(),
  legalOwner: PersonName,
  department: PersonName.nullable(),
  policyId: Id,
  unverifiedBlocksLock: z.boolean(),
};

export const listProjects = {
  method: 'GET',
  path: '/api/projects',
  summary: 'The projects one is a member of (administrators: all)',
  reply: z.object({ projects: z.array(ProjectSummary) }),
} as const satisfies Route;

/** Whoever creates a project becomes its designer and manages it, as does every administrator. */
export const createProject = {
  method: 'POST',
  path: '/api/projects',
  summary: 'Create a project',
  body: z.strictObject(ProjectFields),
  reply: Project,
  status: 201,
} as const satisfies Route;

const params = z.strictObject({ projectId: Id });

export const readProject = {
  method: 'GET',
  path: '/api/projects/:projectId',
  summary: 'One project',
  params,
  reply: Project,
} as const satisfies Route;

/** A changed policy re-evaluates every draft; submitted and locked revisions keep theirs. */
export const saveProject = {
  method: 'PUT',
  path: '/api/projects/:projectId',
  summary: 'Change title, owner or policy',
  params,
  body: z.strictObject(ProjectFields),
  reply: Project,
  guarded: true,
} as const satisfies Route;

export const saveMembers = {
  method: 'PUT',
  path: '/api/projects/:projectId/members',
  summary: 'Replace the member list',
  params,
  body: z.strictObject({
    members: z
      .array(z.strictObject({ personId: Id, roles: z.array(ProjectRole).min(1).max(4) }))
      .max(200),
  }),
  reply: Project,
  guarded: true,
} as const satisfies Route;
