import { StageInput } from '../../../shared/stage/stage-input.ts';
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
