import type { Criterion } from '../../../shared/checks/evaluation.ts';
import { ACTIONS, type Action, type Revision } from '../../../shared/contract/revision.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';

/** An invented revision for the specs of the review pages; its figures are made up and no test vectors. */

const id = (last: number) => `00000000-0000-4000-8000-0000000000${last}`;

export const DESIGNER = { id: id(11), name: 'A. Designer' };
export const CHECKER = { id: id(12), name: 'B. Checker' };
export const APPROVER = { id: id(13), name: 'C. Approver' };
export const REVISION_ID = id(20);
export const HASH = '0123456789abcdef'.repeat(4);

const criterion = (name: string, changes: Partial<Criterion>): Criterion => ({
  id: name,
  value: 5.73,
  limit: 2,
  relation: '>=',
  unit: '1',
  margin: 1.87,
  status: 'pass',
  corner: { supply: 'max', ambient: 'min', drive: 'weak', rb: '+' },
  ...changes,
});

/** Allowed actions; every other one carries the reason. */
export function permissions(allowed: readonly Action[], reason = 'The revision is in check.') {
  return Object.fromEntries(
    ACTIONS.map((action) => {
      const yes = allowed.includes(action);
      return [action, { allowed: yes, reason: yes ? null : reason }];
    }),
  ) as Revision['may'];
}

const definition = StageInput.parse({
  format: 'sinkwell-stage/1',
  reference: 'Q7',
  title: 'Louvre motor pilot relay',
  topology: 'low-side-npn',
  supplyV: { min: 21.6, max: 26.4 },
  ambientDegC: { min: -20, max: 60 },
  drive: {
    kind: 'push-pull',
    railV: { min: 3, max: 3.6 },
    high: { dropV: 0.6, currentA: 0.008 },
    low: { levelV: 0.4, currentA: 0.008 },
    sourceLimitA: 0.02,
    sinkLimitA: 0.02,
  },
  load: { kind: 'resistor', resistanceOhm: 1440, tolerance: 0.1 },
  baseResistor: { valueOhm: 620, tolerance: 0.05 },
  transistor: {
    partNumber: '2N3904',
    polarity: 'npn',
    limits: { vceoV: 40, icA: 0.2, powerW: 0.625, tjMaxDegC: 150 },
    thermal: { rthJaKPerW: 200 },
    gain: [],
    saturation: [],
    baseEmitter: [],
  },
  policy: { name: 'General practice' },
});

export const IN_CHECK: Revision = {
  id: REVISION_ID,
  stageId: id(21),
  projectId: id(22),
  projectCode: 'GH-12',
  projectTitle: 'Greenhouse vent controller',
  letter: 'B',
  state: 'in-check',
  definition,
  evaluation: {
    reference: 'Q7',
    verdict: 'marginal',
    engine: '1.0.0',
    corners: 1024,
    baseResistorOhm: null,
    criteria: [
      criterion('overdrive-factor', {}),
      criterion('load-voltage', {
        value: 21.37,
        limit: 20.76,
        unit: 'V',
        margin: 0.0294,
        status: 'marginal',
      }),
    ],
    nominal: {
      icA: null,
      ibA: null,
      driveA: null,
      vceV: null,
      vbeV: null,
      rceSatOhm: null,
      forcedBeta: null,
      overdriveFactor: null,
      powerW: null,
      tjDegC: null,
    },
    findings: [],
  },
  designators: {
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
  },
  parts: { transistor: null, preDriver: null, load: null, drive: null, clamp: null },
  partStanding: [],
  port: null,
  policyVersion: 3,
  designer: DESIGNER,
  authors: [DESIGNER],
  createdAtMs: 1_773_000_000_000,
  savedAtMs: 1_773_000_000_000,
  submittedAtMs: 1_773_000_000_000,
  submittedBy: DESIGNER,
  checkedAtMs: null,
  checkedBy: null,
  returned: null,
  withdrawn: null,
  check: null,
  findings: [],
  lock: null,
  previous: null,
  may: permissions(['check', 'close', 'return']),
};

export const CHECKED: Revision = {
  ...IN_CHECK,
  state: 'checked',
  checkedAtMs: 1_773_100_000_000,
  checkedBy: CHECKER,
  may: permissions(['lock', 'send-back'], 'The revision is checked.'),
};

export const LOCKED: Revision = {
  ...CHECKED,
  state: 'locked',
  lock: {
    approver: APPROVER,
    signedAtMs: 1_773_200_000_000,
    meaning: 'I release it.',
    hash: HASH,
    intact: true,
  },
  may: permissions([], 'The revision is locked.'),
};
