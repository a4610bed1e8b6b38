import type { NoteSource, PartPlace } from '../../../shared/report/bom-note-source.ts';
import type { NoteOccasion, NoteProject } from '../../../shared/report/bom-note-build.ts';
import { type StageFile, StageInput } from '../../../shared/stage/stage-input.ts';
import { RELAY_FILE, relayDriver, TYPE_2N3904 } from '../relay-stage.ts';

/** An invented project; the stages' figures are made up and no test vectors. */
export const PROJECT: NoteProject = {
  code: 'GH-12',
  title: 'Greenhouse vent controller',
  supplementaryTitle: 'Relay board, driver stages',
  legalOwner: 'Glasshouse Works (demo)',
  department: 'Driver stages',
};

export const AT_MS = Date.UTC(2026, 2, 10, 14, 52);

export const ISSUE: NoteOccasion = {
  atMs: AT_MS,
  issue: { number: 7, issuedBy: 'D. Exporter' },
  program: 'Sinkwell 1.0.0',
};
export const PREVIEW: NoteOccasion = { ...ISSUE, issue: null };

const BASE = relayDriver({
  title: 'Vent motor contactor pilot relay',
  clamp: RELAY_FILE.clamp,
});

export const PNP = { ...TYPE_2N3904, partNumber: '2N3906', polarity: 'pnp' } as const;

const UNNAMED: Record<PartPlace, string | null> = {
  baseResistor: null,
  shuntResistor: null,
  pullUp: null,
  speedUpCapacitor: null,
  load: null,
  loadResistor: null,
  clamp: null,
  clampZener: null,
  preDriver: null,
  preBaseResistor: null,
  preShuntResistor: null,
};

/** A locked revision A of a stage with verified parts, changed where told. */
export function source(
  stage: Partial<StageFile> & { reference: string },
  designators: Partial<Record<PartPlace, string>> = {},
  changes: Partial<NoteSource> = {},
): NoteSource {
  return {
    revisionId: `revision of ${stage.reference}`,
    stageId: `stage of ${stage.reference}`,
    letter: 'A',
    stateWord: 'Locked',
    definition: StageInput.parse({ ...BASE, ...stage }),
    designators: { ...UNNAMED, ...designators },
    evaluation: { verdict: 'pass', baseResistorOhm: null },
    parts: ['transistor', 'preDriver', 'load', 'clamp'].map((role) => ({
      role,
      partNumber: { load: 'RL-24-1440', clamp: '1N4148W type' }[role] ?? '2N3904',
      revision: 2,
      latestRevision: 2,
      verified: true,
    })),
    designer: 'A. Designer',
    checker: 'B. Checker',
    lock: {
      approver: 'C. Approver',
      signedAtMs: Date.UTC(2026, 1, 18, 9, 30),
      hash: '41d70b93c6f8'.padEnd(64, '0'),
    },
    successor: null,
    ...changes,
  };
}

export const Q1 = source(
  { reference: 'Q1' },
  { baseResistor: 'R4', shuntResistor: 'R5', load: 'K1', clamp: 'D1' },
);
export const Q2 = source(
  { reference: 'Q2', baseResistor: { valueOhm: 430, tolerance: 0.05, ratingW: 0.1 } },
  { baseResistor: 'R6', shuntResistor: 'R7', load: 'K2', clamp: 'D2' },
);
export const Q12 = source(
  { reference: 'Q12' },
  { baseResistor: 'R30', shuntResistor: 'R31', load: 'K5', clamp: 'D9' },
);
/** Q12 as revision B, not locked. */
export const Q12_IN_CHECK: NoteSource = {
  ...Q12,
  letter: 'B',
  stateWord: 'In check',
  evaluation: { verdict: 'marginal', baseResistorOhm: null },
  lock: null,
};
