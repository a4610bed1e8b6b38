import { isHighSide } from '../stage/drive-source.ts';
import type { StageInput } from '../stage/stage-input.ts';
import type { StageModel } from '../stage/stage-model.ts';
import { formatQuantity } from '../units/engineering-notation.ts';
import type { Criterion, Finding } from './evaluation.ts';
import { largestInrushA } from './load.ts';
import { clampFault, type ClampFault, REVERSE_FACTOR, takesSupply } from './own-faults.ts';
import type { CornerTraits } from './stage-judge.ts';

/** A finding, and whether the stage fails by it alone. */
export interface Remark {
  readonly finding: Finding;
  readonly fails: boolean;
}

const note = (id: string, text: string): Remark => ({ finding: { id, text }, fails: false });
const defect = (id: string, text: string): Remark => ({ finding: { id, text }, fails: true });

/** Everything a designer should hear besides the criteria. */
export function remarksOn(
  model: StageModel,
  traits: CornerTraits,
  criteria: readonly Criterion[],
): Remark[] {
  return [
    ...onDrive(model, traits),
    ...onPartData(model, traits),
    ...onOffState(model, criteria),
    ...onClamp(model),
    ...onLoad(model, criteria),
  ];
}

function onDrive({ input }: StageModel, traits: CornerTraits): Remark[] {
  const remarks: Remark[] = [];
  const { policy } = input;
  if (traits.runaway) {
    remarks.push(
      defect(
        'thermal-runaway',
        'No junction temperature below 400 °C balances the dissipation at some corner: lower the thermal resistance or the loss.',
      ),
    );
  }
  const lavish = policy.overdrivenRatio * policy.overdriveFactor;
  if (traits.leastOverdrive > lavish) {
    remarks.push(
      note(
        'overdriven',
        `The least overdrive factor is above ${lavish}: a larger base resistor saves drive current and storage time.`,
      ),
    );
  }
  return remarks;
}

function onPartData({ input, part, inside }: StageModel, traits: CornerTraits): Remark[] {
  const remarks: Remark[] = [];
  if (traits.beyondRows.length > 0) {
    remarks.push(
      note(
        'outside-tested-range',
        `Used above the last row the data sheet tests: ${traits.beyondRows.join(', ')}. Those figures are extrapolated.`,
      ),
    );
  }
  if (traits.beyondTestBeta) {
    remarks.push(
      note(
        'forced-beta-beyond-the-data-sheet',
        'IC/IB is above that of the VCE(sat) rows at some corner: VCE(sat) is corrected by the Ebers–Moll difference and not guaranteed. A smaller base resistor brings it back.',
      ),
    );
  }
  if (part.hasVbe && !part.baseEmitter.guaranteed && inside?.byInput !== true) {
    remarks.push(
      note(
        'vbe-sat-not-guaranteed',
        `The data of ${input.transistor.partNumber} give no VBE(sat) maximum: VBE(on) or typical figures stand in, with an allowance.`,
      ),
    );
  }
  return remarks;
}

function onOffState(model: StageModel, criteria: readonly Criterion[]): Remark[] {
  const { input } = model;
  const remarks: Remark[] = [];
  const shunted = model.inside === null ? input.shuntResistor : model.inside.ratio;
  if (shunted === null) {
    remarks.push(
      note(
        'no-base-emitter-resistor',
        'No resistor from base to emitter: nothing holds the base off while the output floats, and leakage comes out amplified.',
      ),
    );
  }
  if (model.inside !== null && input.shuntResistor !== null) {
    remarks.push(
      note(
        'outer-resistor-not-counted',
        'The resistor from the input of the pre-biased part to ground is not counted: R2 inside it is what holds the base off. Leave it out, or take a plain transistor with RB and RBE.',
      ),
    );
  }
  const base = criteria.find(({ id }) => id === 'off-base-voltage');
  if (base?.status === 'fail' && railTooLow(model)) remarks.push(cannotTurnOff(model));
  return [...remarks, ...onPullUp(model), ...onReset(model)];
}

/** A pull-up to a rail below a PNP's supply draws base current through RB while the output is off. */
function onPullUp({ input, nominal }: StageModel): Remark[] {
  const { drive, supplyV, baseResistor, shuntResistor, policy } = input;
  if (!isHighSide(input) || drive.kind !== 'open-collector' || drive.railTracksSupply) return [];
  const leftV = supplyV.max - drive.railV.min;
  const seriesOhm = (baseResistor.valueOhm ?? Infinity) + drive.pullUp.valueOhm;
  const shuntOhm = shuntResistor?.valueOhm ?? Infinity;
  const share = shuntOhm === Infinity ? 1 : shuntOhm / (shuntOhm + seriesOhm);
  if (leftV * share <= policy.offBaseV) return [];
  const onV = Math.min(nominal.condition.vbeMaxV, leftV * share);
  return [
    note(
      'pull-up-below-supply',
      `The pull-up of the open output goes to a rail below the supply: while the output is off, up to ${formatQuantity((leftV - onV) / seriesOhm, 'A')} still flow out of the base and the PNP stays on. Take the pull-up to the load's own supply, or leave it out and let the base–emitter resistor hold the base.`,
    ),
  ];
}

/** What turns the load on while the controller is in reset, which no criterion of the base voltage shows. */
function onReset({ input }: StageModel): Remark[] {
  const { drive } = input;
  if (drive.reset === null) return [];
  const highSide = isHighSide(input);
  if (highSide && drive.reset.kind === 'driven-low') {
    return [
      note(
        'on-in-reset',
        'In reset the output is low, which turns this PNP on: the load runs until the controller has started. Put an NPN in front, or take an output that starts up high.',
      ),
    ];
  }
  if (!highSide && drive.kind === 'open-collector' && drive.reset.kind !== 'driven-low') {
    return [
      note(
        'on-in-reset',
        'In reset the open output lets its own pull-up turn the transistor on: the load runs until the controller has started. Take an output that starts up low, or one that drives both ways.',
      ),
    ];
  }
  return [];
}

/** Whether a push-pull output below the supply is what keeps a PNP on. */
function railTooLow({ input }: StageModel): boolean {
  const { drive, supplyV } = input;
  const lower = !drive.railTracksSupply && drive.railV.min < supplyV.max;
  return isHighSide(input) && drive.kind === 'push-pull' && lower;
}

function cannotTurnOff({ input, nominal }: StageModel): Remark {
  const { drive, supplyV, baseResistor } = input;
  const diodeV = 0.5;
  const throughV = supplyV.max - nominal.condition.vbeMaxV - drive.railV.min - diodeV;
  const clampA = Math.max(0, throughV) / (baseResistor.valueOhm ?? Infinity);
  return note(
    'rail-below-supply',
    `The output's high level stays below the supply, so the PNP does not turn off. Up to ${formatQuantity(clampA, 'A')} flow through the output's clamp diode, and the load switches on while the rail is down. Put an NPN in front, or an open-drain output rated for the supply.`,
  );
}

function onLoad(model: StageModel, criteria: readonly Criterion[]): Remark[] {
  const { input, conditions } = model;
  const { load, supplyV } = input;
  if (conditions.some(({ availableV }) => takesSupply(input, availableV))) {
    return [
      defect(
        'leds-take-the-supply',
        'The forward voltages of the string reach the supply at some corner: no current flows. Use fewer LEDs in series or a higher supply.',
      ),
    ];
  }
  const inrush = criteria.find(({ id }) => id === 'inrush-saturation');
  if (load.kind !== 'lamp' || inrush?.status !== 'open') return [];
  const worstW = (supplyV.max * largestInrushA(model)) / 4;
  return [
    note(
      'lamp-inrush',
      `The cold filament pulls the transistor out of saturation: up to ${worstW.toPrecision(3)} W for 10 to 50 ms. Only the safe-operating-area curve of the data sheet decides; preheat the lamp, limit its current or drive harder.`,
    ),
  ];
}

const CLAMP_DEFECTS: Record<ClampFault, (input: StageInput) => string> = {
  'no-clamp': () =>
    'The coil has no clamp: its stored energy breaks the transistor down at turn-off. Fit a diode across the coil.',
  'clamp-conducts-at-supply': () =>
    'The clamp across the transistor conducts at the highest supply: the load never switches off. Choose a higher voltage.',
  'diode-reverse-voltage': ({ clamp, supplyV }) =>
    `The clamp diode's reverse rating of ${clamp.reverseV ?? 0} V is below twice the highest supply, ${(REVERSE_FACTOR * supplyV.max).toPrecision(3)} V.`,
};

function onClamp(model: StageModel): Remark[] {
  const { input, clamp } = model;
  const fault = clampFault(model);
  if (fault !== null) return [defect(fault, CLAMP_DEFECTS[fault](input))];
  if (clamp?.standOffV !== null || input.clamp.reverseV !== null) return [];
  const neededV = REVERSE_FACTOR * input.supplyV.max;
  return [
    note(
      'diode-reverse-voltage-unknown',
      `The clamp diode's reverse rating is not stated: it should be at least twice the highest supply, ${neededV.toPrecision(3)} V.`,
    ),
  ];
}
