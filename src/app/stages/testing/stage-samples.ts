import type { Designators, PartLinks, Revision } from '../../../../shared/contract/revision.ts';
import { ACTIONS } from '../../../../shared/contract/revision.ts';
import { evaluateStage } from '../../../../shared/checks/evaluate-stage.ts';
import { startingStage } from '../sample-stage.ts';

export const NO_DESIGNATORS: Designators = {
  baseResistor: null,
  shuntResistor: null,
  pullUp: null,
  speedUpCapacitor: null,
  load: null,
  clamp: null,
  clampZener: null,
  drive: null,
  loadResistor: null,
  preDriver: null,
  preBaseResistor: null,
  preShuntResistor: null,
};

export const NO_PARTS: PartLinks = {
  transistor: null,
  preDriver: null,
  load: null,
  drive: null,
  clamp: null,
};

const ID = '00000000-0000-4000-8000-00000000000';

/** A draft as the server would send it. */
export function draftRevision(change: Partial<Revision> = {}): Revision {
  const definition = startingStage({
    reference: 'Q12',
    title: 'Agitator relay',
    topology: 'low-side-npn',
    loadKind: 'coil',
  });
  const person = { id: `${ID}1`, name: 'Dora Designer' };
  const allowed = { allowed: true, reason: null };
  const none = null;
  return {
    id: `${ID}2`,
    stageId: `${ID}3`,
    projectId: `${ID}4`,
    projectCode: 'CR-40',
    projectTitle: 'Cold-room controller',
    letter: 'A',
    state: 'draft',
    definition,
    evaluation: evaluateStage(definition),
    designators: NO_DESIGNATORS,
    parts: NO_PARTS,
    partStanding: [],
    port: none,
    policyVersion: 1,
    designer: person,
    authors: [person],
    createdAtMs: 1,
    savedAtMs: 1,
    ...{ submittedAtMs: none, submittedBy: none, checkedAtMs: none, checkedBy: none, check: none },
    ...{ lock: none, previous: none, returned: none, withdrawn: none },
    findings: [],
    may: Object.fromEntries(ACTIONS.map((action) => [action, allowed])) as Revision['may'],
    ...change,
  };
}
