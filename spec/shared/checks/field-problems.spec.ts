/**
 * Every fault practitioners report of saturated stages: a stage that has it, what of the engine catches it, and that the
 * cure stands there in words; or, where no calculation can see it, the sentence that says so. The faults are those of public
 * question and issue threads and of common practice, in words of our own.
 */
import { describe, expect, it } from 'vitest';
import { criterionIds } from '../../../shared/checks/criteria.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { CRITERIA_TEXT } from '../../../shared/method/criteria-text.ts';
import { FIELD_PROBLEMS } from '../../../shared/method/field-problems.ts';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import type { TransistorData } from '../../../shared/stage/transistor-data.ts';
import { find, transistors } from '../parts/library-file.ts';
import { HIGH_SIDE_FILE, highSideStage, RELAY_FILE, relayStage } from '../relay-stage.ts';

const { drive, load, clamp, baseResistor } = RELAY_FILE;
const withRb = (valueOhm: number) => ({ baseResistor: { ...baseResistor, valueOhm } });
const resistor = (resistanceOhm: number) => ({
  load: { kind: 'resistor', resistanceOhm, tolerance: 0.05 },
  clamp: null,
});
const lowRail = {
  ...drive,
  kind: 'push-pull',
  railV: { min: 3, max: 3.6 },
};

function fromLibrary(partNumber: string): TransistorData {
  const derived = deriveTransistor(find(transistors, partNumber));
  if (!derived.ok) throw new Error(derived.reason);
  return derived.data;
}

const fiveVoltCoil = {
  ...load,
  resistanceOhm: 125,
  operateV: 3.75,
  releaseV: 0.5,
  inductanceH: 0.1,
};
const fiveVolt = { supplyV: { min: 4.75, max: 5.25 } };

const translator = (more: object) =>
  relayStage({
    topology: 'level-translator',
    ...fiveVolt,
    clamp: null,
    load: {
      kind: 'logic-input',
      pullUpOhm: 4700,
      tolerance: 0.05,
      ratingW: 0.1,
      count: 1,
      vilV: 0.8,
      vihV: 2,
      leakageA: 1e-6,
      lowCurrentA: 1e-6,
      capacitanceF: 1e-11,
      wiringF: 2e-11,
      riseTimeLimitSec: 1e-6,
      ...more,
    },
  });

/** Stages that have the fault, and the words the cure must be found by. */
const PROVOKED: Record<string, { stages: StageInput[]; cure: RegExp[] }> = {
  'weak-base-current': {
    stages: [relayStage(withRb(22_000))],
    cure: [/smaller base resistor/, /guaranteed gain/],
  },
  'reused-resistor': {
    stages: [relayStage({ ...withRb(3300), ...resistor(1000) })],
    cure: [/smaller base resistor/],
  },
  'separate-returns': {
    stages: [relayStage({ drive: { ...drive, groundShiftV: 0.5 } })],
    cure: [/less ground shift/],
  },
  'floating-base': {
    stages: [relayStage({ drive: { ...drive, reset: { kind: 'high-z' } }, shuntResistor: null })],
    cure: [/base–emitter resistor/, /nothing holds the base off/],
  },
  'on-at-power-up': {
    stages: [
      relayStage({ drive: { ...drive, reset: { kind: 'pull-up', pullUpOhm: 10_000 } } }),
      highSideStage({ drive: { ...HIGH_SIDE_FILE.drive, reset: { kind: 'driven-low' } } }),
    ],
    cure: [/starts up low/, /starts up high/],
  },
  'expander-before-first-write': {
    stages: [
      relayStage({
        drive: { ...drive, reset: { kind: 'high-z', leakageA: 5e-6 } },
        shuntResistor: { valueOhm: 220_000, tolerance: 0.05 },
      }),
    ],
    cure: [/low enough against the pin’s leakage/],
  },
  'controller-restarts': {
    stages: [
      relayStage({ clamp: null }),
      relayStage({ supplyV: { min: 21.6, max: 26.4, dip: 12 }, load: { ...load, holdV: 14 } }),
    ],
    cure: [/Fit a diode across the coil/, /supply that dips less/],
  },
  'dies-after-some-cycles': {
    stages: [
      relayStage({ clamp: null }),
      relayStage({ clamp: { ...clamp, reverseV: 30, currentRatingA: 0.01 } }),
      relayStage({ clamp: { ...clamp, kind: 'diode-zener', zenerV: { min: 22, max: 26 } } }),
    ],
    cure: [/Fit a diode/, /rated for the coil’s whole current/, /clamp with a lower voltage/],
  },
  'slow-release': {
    stages: [relayStage({ load: { ...load, releaseTimeLimitSec: 0.007 } })],
    cure: [/diode with a zener in series/],
  },
  'high-side-stays-on': {
    stages: [
      highSideStage({ drive: lowRail }),
      highSideStage({
        drive: { ...HIGH_SIDE_FILE.drive, railV: { min: 3, max: 3.6 }, railTracksSupply: false },
      }),
    ],
    cure: [/NPN in front/, /open-drain output rated for the supply/, /pull-up to the load's own/],
  },
  'active-low-module': {
    stages: [highSideStage({ ...fiveVolt, drive: lowRail, ...resistor(1000), ...withRb(2200) })],
    cure: [/NPN in front/],
  },
  'darlington-drop': {
    stages: [
      relayStage({
        topology: 'low-side-darlington',
        ...fiveVolt,
        load: fiveVoltCoil,
        transistor: fromLibrary('TIP120'),
      }),
    ],
    cure: [/not a Darlington/, /delivers more/],
  },
  'fails-when-hot': {
    stages: [relayStage({ ...withRb(620), load: { ...load, temperatureRiseK: 60 } })],
    cure: [/less self-heating of the coil/],
  },
  'does-not-release-when-hot': {
    stages: [highSideStage({ shuntResistor: null })],
    cure: [/base–emitter resistor/],
  },
  'half-on': {
    stages: [
      relayStage({
        drive: { ...drive, low: { levelV: 0.5, currentA: 0.008 } },
        ambientDegC: { min: 0, max: 100 },
      }),
    ],
    cure: [/lower low level/, /less heat/],
  },
  'pin-overloaded': { stages: [relayStage(withRb(150))], cure: [/larger base resistor/] },
  'pre-biased-too-weak': {
    stages: [
      relayStage({
        topology: 'low-side-pre-biased',
        transistor: fromLibrary('DTC114E'),
        ...resistor(2400),
        ...withRb(10),
      }),
    ],
    cure: [/higher level/, /lower VI\(on\)/],
  },
  'slow-switching': {
    stages: [relayStage({ frequencyHz: 500_000, duty: 0.5, ...resistor(1440), ...withRb(270) })],
    cure: [/Less overdrive/, /speed-up capacitor/, /larger base resistor/],
  },
  'lamp-inrush': {
    stages: [
      relayStage({
        clamp: null,
        load: { kind: 'lamp', nominalV: 24, currentA: 0.03, coldRatio: 12 },
        ...withRb(240),
      }),
    ],
    cure: [/safe-operating-area curve/, /preheat/],
  },
  'reverse-base': {
    stages: [
      relayStage({
        drive: { ...drive, railV: { min: 10.8, max: 13.2 } },
        ...withRb(4700),
        speedUpCapacitorF: 1e-9,
      }),
    ],
    cure: [/diode in series with the base or across base and emitter/],
  },
  'translator-slow': {
    stages: [
      translator({ pullUpOhm: 47_000, capacitanceF: 2e-10 }),
      { ...translator({}), drive: { ...translator({}).drive, groundShiftV: 0.75 } },
    ],
    cure: [/smaller collector resistor/, /less ground shift/],
  },
  'hot-base-resistor': {
    stages: [relayStage({ drive: { ...drive, railV: { min: 22, max: 26 } }, ...withRb(1000) })],
    cure: [/rated for more power/],
  },
};

const idsOf = (of: readonly { id: string }[]) => of.map(({ id }) => id);

describe('faults met in the field', () => {
  it('are the 27 of the collection, each once', () => {
    expect(FIELD_PROBLEMS).toHaveLength(27);
    expect(new Set(idsOf(FIELD_PROBLEMS)).size).toBe(27);
  });

  it('are each provoked by a stage here, or said to lie outside the calculation', () => {
    const unprovoked = FIELD_PROBLEMS.filter(({ id }) => !(id in PROVOKED));
    for (const { id, criteria, findings, outside } of unprovoked) {
      expect([...criteria, ...findings], id).toEqual([]);
      expect(outside, id).toMatch(/^[A-Z].{30,}\.$/);
    }
    expect(idsOf(unprovoked)).toEqual([
      'capacitor-across-coil',
      'load-in-the-emitter',
      'other-maker',
      'pin-order',
      'transistor-array',
    ]);
  });

  it.each(Object.keys(PROVOKED))('%s: is caught, and the cure is said', (id) => {
    const problem = FIELD_PROBLEMS.find((each) => each.id === id);
    const provoked = PROVOKED[id];
    if (problem === undefined || provoked === undefined) throw new Error(`no problem ${id}`);
    const results = provoked.stages.map(evaluateStage);
    const missed = results.flatMap(({ criteria }) =>
      criteria.filter(({ status }) => status === 'fail' || status === 'open'),
    );
    const found = results.flatMap(({ findings }) => findings);
    expect(problem.criteria.length + problem.findings.length).toBeGreaterThan(0);
    expect(idsOf(missed)).toEqual(expect.arrayContaining([...problem.criteria]));
    expect(idsOf(found)).toEqual(expect.arrayContaining([...problem.findings]));
    const words = [
      ...problem.criteria.map((criterion) => CRITERIA_TEXT[criterion]?.cure ?? ''),
      ...found.filter((each) => problem.findings.includes(each.id)).map(({ text }) => text),
    ].join(' ');
    for (const cure of provoked.cure) expect(words).toMatch(cure);
  });

  it('name criteria that exist', () => {
    for (const { criteria } of FIELD_PROBLEMS) {
      for (const id of criteria) expect(criterionIds()).toContain(id);
    }
  });
});

describe('a fault goes away with its cure', () => {
  const status = (stage: StageInput, id: string) =>
    evaluateStage(stage).criteria.find((each) => each.id === id)?.status;

  it('a load of a tenth is no problem for the same base resistor', () => {
    const led = relayStage({ ...withRb(3300), ...resistor(10_000) });
    expect(status(led, 'overdrive-factor')).toBe('pass');
  });

  it('a cooler coil pulls in', () => {
    const cool = relayStage({ ...withRb(620), load: { ...load, temperatureRiseK: 0 } });
    expect(status(cool, 'load-voltage')).not.toBe('fail');
  });

  it('a zener in series with the diode releases in time', () => {
    const quick = relayStage({
      load: { ...load, releaseTimeLimitSec: 0.007 },
      clamp: { ...clamp, kind: 'diode-zener', zenerV: { min: 4.3, max: 4.5 } },
    });
    expect(status(quick, 'release-time')).toBe('pass');
    expect(status(quick, 'peak-collector-voltage')).not.toBe('fail');
  });

  it('a pull-up at the load’s own supply leaves the base alone', () => {
    expect(idsOf(evaluateStage(highSideStage()).findings)).not.toContain('pull-up-below-supply');
  });

  it('a finding about the base changes no verdict', () => {
    const own = highSideStage();
    const low = highSideStage({
      drive: { ...HIGH_SIDE_FILE.drive, railV: { min: 5, max: 26.4 }, railTracksSupply: false },
    });
    expect(idsOf(evaluateStage(low).findings)).toContain('pull-up-below-supply');
    expect(evaluateStage(low).verdict).toBe(evaluateStage(own).verdict);
  });
});

describe('what the library does about makers and arrays', () => {
  it('takes the safest current of all makers where none is fixed', () => {
    const record = find(transistors, 'BC337-40');
    const open = fromLibrary('BC337-40').limits.icA ?? NaN;
    const printed = [record.limits, ...record.alternatives]
      .map(({ icA }) => icA)
      .filter((value) => value !== null);
    expect(printed.length).toBeGreaterThan(1);
    expect(open).toBe(Math.min(...printed));
  });

  it('refuses an array as the transistor of a stage', () => {
    const array = transistors.find(({ family }) => family === 'darlington-array');
    const derived = array === undefined ? null : deriveTransistor(array);
    expect(derived).toMatchObject({ ok: false });
  });
});
