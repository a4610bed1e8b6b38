import { StageInput } from '../../../shared/stage/stage-input.ts';
import { TOPOLOGIES } from '../../../shared/stage/stage-input.ts';
import { needsOf, transistorSuits } from '../../../shared/stage/topology-needs.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { TransistorData } from '../../../shared/stage/transistor-data.ts';
import { withLoad, withTopology } from './change-kind.ts';
import { conflictRows, merged, type Side } from './conflict-rows.ts';
import type { Draft } from './draft.ts';
import { fieldOf, formToStage } from './form-to-stage.ts';
import { startingStage } from './sample-stage.ts';
import { stageForm } from './stage-form.ts';
import { stageToForm } from './stage-to-form.ts';
import { NO_DESIGNATORS, NO_PARTS } from './testing/stage-samples.ts';

const asked = { reference: 'Q12', title: 'Agitator relay', loadKind: 'coil' } as const;
const relay = startingStage({ ...asked, topology: 'low-side-npn' });
const highSide = startingStage({ ...asked, topology: 'high-side-pnp', loadKind: 'resistor' });

const variants: Record<string, StageInput> = {
  'a coil behind a push-pull output': relay,
  'a resistor behind a PNP': highSide,
  'a stage with every optional figure': StageInput.parse({
    ...relay,
    quantity: 4,
    supplyV: { min: 21.6, max: 26.4, surge: 40, dip: 18 },
    frequencyHz: 200,
    duty: 0.5,
    storageTimeLimitSec: 1e-5,
    saturationLimitV: 0.3,
    speedUpCapacitorF: 1e-10,
    drive: {
      ...relay.drive,
      groundShiftV: -0.1,
      port: 'PA',
      portTotalA: 0.1,
      reset: { kind: 'pull-up', leakageA: 2e-6, pullUpOhm: 40000 },
    },
    clamp: {
      kind: 'diode-zener',
      forwardV: 1,
      zenerV: { min: 22.8, max: 25.6 },
      powerRatingW: 0.5,
    },
    shuntResistor: null,
  }),
  ...Object.fromEntries(
    TOPOLOGIES.flatMap((topology) =>
      needsOf(topology).loads.map((loadKind) => [
        `${topology} with ${loadKind}`,
        startingStage({ ...asked, topology, loadKind }),
      ]),
    ),
  ),
  'a TVS across the transistor': StageInput.parse({
    ...relay,
    clamp: { kind: 'tvs-across-transistor', zenerV: { min: 33, max: 53 }, standOffV: 30 },
  }),
};

describe('the form of a stage', () => {
  it.each(Object.entries(variants))('gives back %s unchanged', (_, stage) => {
    const form = stageForm(stageToForm(stage));
    expect(formToStage(form.getRawValue(), stage)).toEqual({ ok: true, stage });
  });

  it('drops what a new kind of load has no use for', () => {
    const form = stageForm(stageToForm(relay));
    form.controls['load/kind'].setValue('resistor');
    const reading = formToStage(form.getRawValue(), relay);
    expect(reading.ok && reading.stage.load).toEqual({
      kind: 'resistor',
      resistanceOhm: 1440,
      tolerance: 0.1,
    });
  });

  it('fills what a new kind of drive needs', () => {
    const form = stageForm(stageToForm(relay));
    form.controls['drive/kind'].setValue('open-collector');
    const reading = formToStage(form.getRawValue(), relay);
    expect(reading.ok && reading.stage.drive).toMatchObject({
      kind: 'open-collector',
      pullUp: { valueOhm: 4700, tolerance: 0.05 },
    });
  });

  it('names the field that a rule of the stage file refuses', () => {
    const form = stageForm(stageToForm(relay));
    form.controls['load/resistanceOhm'].setValue(-5);
    form.controls.supplyV.setValue({ min: 30, max: 20 });
    const reading = formToStage(form.getRawValue(), relay);
    const paths = reading.ok ? [] : reading.faults.map(({ path }) => path);
    expect(paths).toEqual(expect.arrayContaining(['load/resistanceOhm', 'supplyV']));
  });

  it('finds the field of a path below it', () => {
    expect(fieldOf(['supplyV', 'min'])).toBe('supplyV');
    expect(fieldOf(['transistor', 'gain', '0'])).toBeNull();
  });
});

/** Rows of onsemi 2N3903/D, Rev. 9, enough for a verdict. */
const NPN = TransistorData.parse({
  partNumber: '2N3904',
  polarity: 'npn',
  limits: { vceoV: 40, veboV: 6, icA: 0.2, powerW: 0.625, tjMaxDegC: 150 },
  thermal: { rthJaKPerW: 200 },
  gain: [{ icA: 0.01, vceV: 1, min: 100, max: 300 }],
  saturation: [{ icA: 0.01, ibA: 0.001, maxV: 0.2 }],
  baseEmitter: [{ icA: 0.01, ibA: 0.001, minV: 0.65, maxV: 0.85 }],
  leakage: [{ kind: 'icex', currentA: 5e-8, voltageV: 30 }],
});
const link = { partRevisionId: '00000000-0000-4000-8000-000000000001', choice: {} };
const draftOfRelay: Draft = {
  definition: {
    ...relay,
    transistor: NPN,
    baseResistor: { valueOhm: 1000, tolerance: 0.05, ratingW: 0.1 },
  },
  designators: { ...NO_DESIGNATORS, baseResistor: 'R30', shuntResistor: 'R31', clamp: 'D7' },
  parts: { ...NO_PARTS, transistor: link, load: link },
};

describe('another topology or load', () => {
  it.each(TOPOLOGIES)('gives %s a stage that can be judged', (topology) => {
    const { definition } = withTopology(draftOfRelay, topology);
    expect(StageInput.parse(definition)).toEqual(definition);
    expect(definition.topology).toBe(topology);
    expect(transistorSuits(definition.transistor, needsOf(topology))).toBe(true);
    const { criteria, corners } = evaluateStage(definition);
    expect(corners).toBeGreaterThan(0);
    expect(criteria.length).toBeGreaterThan(10);
    expect(definition.supplyV).toEqual(relay.supplyV);
  });

  it('moves an NPN with its whole network to the front of a PNP, and back', () => {
    const two = withTopology(draftOfRelay, 'two-transistor-high-side');
    expect(two.definition.preDriver).toEqual({
      transistor: NPN,
      baseResistor: draftOfRelay.definition.baseResistor,
      shuntResistor: relay.shuntResistor,
    });
    expect(two.definition.transistor).toMatchObject({ partNumber: 'not chosen', polarity: 'pnp' });
    expect(two.parts).toMatchObject({ transistor: null, preDriver: link, load: link });
    expect(two.designators).toMatchObject({ preBaseResistor: 'R30', baseResistor: null });
    const back = withTopology(two, 'low-side-npn');
    expect(back).toEqual(draftOfRelay);
  });

  it('keeps a transistor that suits, and lets go of one that does not', () => {
    const translator = withTopology(draftOfRelay, 'level-translator');
    expect(translator.definition.transistor).toEqual(NPN);
    expect(translator.definition.load.kind).toBe('logic-input');
    expect(translator.definition.clamp.kind).toBe('none');
    expect(translator.parts).toMatchObject({ transistor: link, load: null });
    const darlington = withTopology(draftOfRelay, 'low-side-darlington');
    expect(darlington.definition.transistor).toMatchObject({ darlington: true });
    expect(darlington.parts.transistor).toBeNull();
  });

  it.each([
    ['low-side-npn', 820],
    ['high-side-pnp', 11_000],
    ['low-side-darlington', 430],
  ] as const)('starts RB of %s at forced β 10', (topology, valueOhm) => {
    expect(startingStage({ ...asked, topology }).baseResistor.valueOhm).toBe(valueOhm);
  });

  it('starts RB1 from what RB behind it draws', () => {
    const { preDriver } = startingStage({ ...asked, topology: 'two-transistor-high-side' });
    expect(preDriver?.baseResistor.valueOhm).toBe(6200);
  });

  it('has no resistor outside a pre-biased part', () => {
    const { definition } = withTopology(draftOfRelay, 'low-side-pre-biased');
    expect(definition).toMatchObject({ baseResistor: { valueOhm: 0 }, shuntResistor: null });
    expect(definition.transistor.internal).toMatchObject({ r1Ohm: 10_000, r2Ohm: 10_000 });
  });

  it('gives a PNP an output that can turn it off, and an NPN one that can turn it on', () => {
    const high = withTopology(draftOfRelay, 'high-side-pnp');
    expect(high.definition.drive.kind).toBe('open-collector');
    expect(withTopology(high, 'low-side-npn').definition.drive).toEqual(relay.drive);
  });

  it('starts LEDs at about 10 mA and takes the clamp away; a coil gets its diode', () => {
    const leds = withLoad(draftOfRelay, 'led-string');
    expect(leds.definition.load).toMatchObject({ count: 4, forwardV: { min: 1.8, max: 2.4 } });
    const ohm = leds.definition.load.kind === 'led-string' && leds.definition.load.resistanceOhm;
    expect((24 - 4 * 2.1) / Number(ohm)).toBeCloseTo(0.01, 3);
    expect(leds.definition.clamp.kind).toBe('none');
    expect(leds.designators.clamp).toBeNull();
    expect(withLoad(leds, 'coil').definition.clamp).toMatchObject({ kind: 'diode', forwardV: 1 });
  });
});

describe('a conflict', () => {
  const draft = (change: object): Draft => ({
    definition: StageInput.parse({ ...relay, ...change }),
    designators: NO_DESIGNATORS,
    parts: NO_PARTS,
  });
  const base = draft({});
  const yours = draft({ title: 'Yours', baseResistor: { ...relay.baseResistor, valueOhm: 620 } });
  const theirs = draft({
    quantity: 3,
    baseResistor: { ...relay.baseResistor, valueOhm: 680 },
  });

  it('lists what differs, and asks only where both changed the same', () => {
    const rows = conflictRows(base, yours, theirs);
    expect(rows.map(({ key, clash, proposed }) => [key, clash, proposed])).toEqual(
      expect.arrayContaining([
        ['title', false, 'yours'],
        ['quantity', false, 'theirs'],
        ['baseResistor/valueOhm', true, 'yours'],
      ]),
    );
    expect(rows).toHaveLength(3);
  });

  it('takes each field from the side that was chosen for it', () => {
    const sides = new Map<string, Side>([
      ['title', 'yours'],
      ['quantity', 'theirs'],
      ['baseResistor/valueOhm', 'theirs'],
    ]);
    const result = merged(yours, theirs, sides);
    expect(result?.definition).toMatchObject({
      title: 'Yours',
      quantity: 3,
      baseResistor: { valueOhm: 680 },
    });
  });
});
