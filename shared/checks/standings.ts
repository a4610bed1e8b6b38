import type { CoilLoad } from '../stage/load.ts';
import type { PartModel } from '../stage/part-model.ts';
import type { StageInput } from '../stage/stage-input.ts';
import type { StageModel } from '../stage/stage-model.ts';
import type { WorstCases } from './worst-cases.ts';

/** Says of each criterion what missing or substituted data leaves of its status. */
export function standOnData(model: StageModel, worst: WorstCases, switchingKnown: boolean): void {
  standOnPart(model, worst);
  standOnRatings(model.input, worst);
  if (model.input.load.kind === 'coil') standOnCoil(model.input, worst);
  standOnOtherLoads(model, worst);
  if (model.input.frequencyHz > 0) standOnSwitching(model.input, worst, switchingKnown);
}

function standOnDrive(part: PartModel, worst: WorstCases): void {
  if (!part.baseEmitter.guaranteed) {
    worst.stand('overdrive-factor', 'at-best-marginal');
    worst.stand('forced-beta', 'at-best-marginal');
  }
  if (part.saturation === null) worst.stand('forced-beta', 'at-best-open');
  if (!part.hasVbe || part.gain === null) worst.stand('overdrive-factor', 'unknown');
  if (!part.hasVbe) worst.stand('forced-beta', 'unknown');
}

function standOnPart({ part, input, inside }: StageModel, worst: WorstCases): void {
  if (inside?.byInput !== true) standOnDrive(part, worst);
  if (part.saturation === null) {
    worst.stand('saturation-voltage', 'unknown');
    worst.stand('dissipation', 'unknown');
    worst.stand('junction-temperature', 'unknown');
    if (input.load.kind === 'coil') worst.stand('load-voltage', 'unknown');
  }
  if (part.rthJaKPerW === null) worst.stand('junction-temperature', 'unknown');
}

function standOnRatings(input: StageInput, worst: WorstCases): void {
  const { limits } = input.transistor;
  const { baseResistor, shuntResistor, drive } = input;
  if (limits.icA === null) {
    worst.stand('collector-current', 'at-best-open');
    if (limits.icPeakA === null) worst.stand('peak-current', 'at-best-open');
  }
  if (limits.vceoV === null) {
    worst.stand('off-collector-voltage', 'at-best-open');
    if (input.supplyV.surge !== null) worst.stand('surge-voltage', 'at-best-open');
  }
  if (limits.powerW === null) worst.stand('dissipation', 'at-best-open');
  if (baseResistor.ratingW === null && worst.takesPart('rb-dissipation')) {
    worst.stand('rb-dissipation', 'at-best-open');
  }
  if (shuntResistor?.ratingW === null && worst.takesPart('rbe-dissipation')) {
    worst.stand('rbe-dissipation', 'at-best-open');
  }
  if (drive.kind === 'open-collector' && drive.pullUp.ratingW === null) {
    worst.stand('pull-up-dissipation', 'at-best-open');
  }
}

/** What the off state needs to know of part, coil and reset. */
export function standOffState(model: StageModel, worst: WorstCases, baseOpen: boolean): void {
  const { part, input } = model;
  const { load } = input;
  const currentUnknown =
    part.leakage === null || (baseOpen ? part.gain === null : part.anchor === null);
  // A Darlington's leakage rows are collector figures: its base voltage does without them.
  const baseUnknown = part.leakage === null && part.junctions === 1 && model.inside === null;
  if (baseUnknown && !baseOpen) worst.stand('off-base-voltage', 'unknown');
  if (currentUnknown) worst.stand('off-collector-current', 'unknown');
  else if (load.kind === 'coil' && load.releaseV === null) {
    worst.stand('off-collector-current', 'at-best-open');
  }
  standReset(model, worst, currentUnknown);
}

function standReset({ part, input }: StageModel, worst: WorstCases, currentUnknown: boolean): void {
  const { reset } = input.drive;
  const pinUnknown = reset?.kind === 'pull-up' && reset.pullUpOhm === null;
  const baseOpen = !worst.takesPart('reset-off-current');
  const leakUnknown = part.leakage === null && (part.junctions === 1 || baseOpen);
  if (worst.takesPart('reset-off') && (leakUnknown || pinUnknown)) {
    worst.stand('reset-off', 'unknown');
  }
  if (worst.takesPart('reset-off-current') && (currentUnknown || pinUnknown)) {
    worst.stand('reset-off-current', 'unknown');
  }
}

function standOnOtherLoads({ input, part }: StageModel, worst: WorstCases): void {
  const { load } = input;
  if (load.kind === 'lamp') {
    worst.stand(
      'inrush-saturation',
      part.gain === null || !part.hasVbe ? 'unknown' : 'open-if-missed',
    );
  }
  if (load.kind === 'logic-input') {
    if (part.saturation === null) worst.stand('output-low', 'unknown');
    if (part.leakage === null) worst.stand('output-high', 'unknown');
    if (load.ratingW === null) worst.stand('rc-dissipation', 'at-best-open');
    worst.stand('low-to-high-delay', 'stated');
    if (load.capacitanceF === null) {
      worst.stand('rise-time', load.riseTimeLimitSec === null ? 'stated' : 'unknown');
    }
  }
}

function standOnCoil(input: StageInput, worst: WorstCases): void {
  const { load, frequencyHz, ambientDegC, transistor } = input;
  if (load.kind !== 'coil') return;
  if (frequencyHz === 0 && load.operateV === null && worst.standing('load-voltage') === 'judged') {
    worst.stand('load-voltage', 'at-best-open');
  }
  if (transistor.limits.vceoV === null) worst.stand('peak-collector-voltage', 'at-best-open');
  const ratedDegC = load.maximumReferenceDegC ?? load.referenceDegC;
  if (load.maximumV !== null && load.coilMaxDegC === null && ambientDegC.max > ratedDegC) {
    worst.stand('load-overvoltage', 'at-best-marginal');
  }
  standOnRelease(input, load, worst);
}

function standOnRelease({ clamp }: StageInput, load: CoilLoad, worst: WorstCases): void {
  const timed = clamp.kind !== 'none' && load.inductanceH !== null && load.releaseV !== null;
  if (clamp.kind !== 'none' && clamp.currentRatingA === null) {
    worst.stand('clamp-current', 'at-best-open');
  }
  if (!timed) worst.stand('release-time', load.releaseTimeLimitSec === null ? 'stated' : 'unknown');
}

function standOnSwitching(input: StageInput, worst: WorstCases, known: boolean): void {
  const { transistor, load, clamp } = input;
  if (!known) worst.stand('storage-time', 'unknown');
  if (transistor.switching?.trSec == null || transistor.switching.tfSec === null) {
    for (const id of ['dissipation', 'junction-temperature'] as const) {
      if (worst.standing(id) === 'judged') worst.stand(id, 'at-best-open');
    }
  }
  if (load.kind === 'coil' && clamp.kind !== 'none') {
    if (load.inductanceH === null) worst.stand('clamp-power', 'unknown');
    else if (clamp.powerRatingW === null) worst.stand('clamp-power', 'at-best-open');
  }
}
