import { describe, expect, it } from 'vitest';
import type { Criterion, Evaluation } from '../../../shared/checks/evaluation.ts';
import { definitionLeaves } from '../../../shared/report/definition-leaves.ts';
import { revisionDiff, type ComparedRevision } from '../../../shared/report/revision-diff.ts';
import { StageInput, type StageFile } from '../../../shared/stage/stage-input.ts';
import { relayDriver, TYPE_2N3904 } from '../relay-stage.ts';

const FILE = relayDriver({
  reference: 'Q7',
  title: 'Louvre motor pilot relay',
  ambientDegC: { min: -20, max: 50 },
  baseResistor: { valueOhm: 680, tolerance: 0.05, ratingW: 0.1 },
  shuntResistor: { valueOhm: 22000, tolerance: 0.05 },
  clamp: { kind: 'diode', forwardV: 1 },
  transistor: {
    ...TYPE_2N3904,
    gain: TYPE_2N3904.gain.slice(1, 3),
    saturation: TYPE_2N3904.saturation.slice(0, 1),
    baseEmitter: TYPE_2N3904.baseEmitter.slice(0, 1),
  },
});

const criterion = (id: string, changes: Partial<Criterion>): Criterion => ({
  id,
  value: 1,
  limit: 2,
  relation: '<=',
  unit: 'V',
  margin: 0.5,
  status: 'pass',
  corner: null,
  ...changes,
});

const evaluation = (changes: Partial<Evaluation> = {}): Evaluation => ({
  reference: 'Q7',
  verdict: 'marginal',
  engine: '1.0.0',
  corners: 1024,
  baseResistorOhm: null,
  criteria: [],
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
  ...changes,
});

function revision(file: Partial<StageFile>, changes: Partial<ComparedRevision> = {}) {
  return {
    definition: StageInput.parse({ ...FILE, ...file }),
    evaluation: evaluation(),
    parts: [],
    ...changes,
  } satisfies ComparedRevision;
}

const A = revision({});
const texts = (lines: readonly { quantity: string; change: string }[]) =>
  lines.map(({ quantity, change }) => `${quantity}: ${change}`);

describe('comparison of two revisions', () => {
  it('names nothing but the verdict when nothing changed', () => {
    const diff = revisionDiff(A, A);
    expect(diff.definition).toEqual([]);
    expect(diff.partData).toEqual([]);
    expect(texts(diff.results)).toEqual(['Verdict: none']);
  });

  it('lists nine known changes with units and how far each moved', () => {
    const later = revision({
      ambientDegC: { min: -20, max: 60 },
      supplyV: { min: 21.6, max: 26.4, surge: 33 },
      baseResistor: { valueOhm: 620, tolerance: 0.01, ratingW: 0.1 },
      shuntResistor: null,
      clamp: { kind: 'diode-zener', forwardV: 1, zenerV: { min: 12, max: 14 } },
    });
    const { definition } = revisionDiff(A, later);
    expect(
      definition.map(({ quantity, before, after, change }) => [quantity, before, after, change]),
    ).toEqual([
      ['Supply surge', null, '33\u00a0V', 'added'],
      ['Ambient, max', '50\u00a0°C', '60\u00a0°C', '+10\u00a0K'],
      ['RB', '680\u00a0Ω', '620\u00a0Ω', '\u22128.8\u00a0%'],
      ['RB tolerance', '5\u00a0%', '1\u00a0%', '\u22124\u00a0points'],
      ['Clamp', 'Diode', 'Diode and zener', 'changed'],
      ['Clamp voltage, min', null, '12\u00a0V', 'added'],
      ['Clamp voltage, max', null, '14\u00a0V', 'added'],
      ['RBE', '22\u00a0kΩ', null, 'removed'],
      ['RBE tolerance', '5\u00a0%', null, 'removed'],
    ]);
  });

  it('turns round when the revisions are swapped', () => {
    const later = revision({ shuntResistor: null, title: 'Louvre relay' });
    const forward = revisionDiff(A, later).definition;
    const backward = revisionDiff(later, A).definition;
    expect(new Set(backward.map((line) => [line.id, line.after, line.before].join()))).toEqual(
      new Set(forward.map((line) => [line.id, line.before, line.after].join())),
    );
  });

  it('names a row of part data by its condition, so that a row put in front changes nothing else', () => {
    const transistor = FILE.transistor;
    const gain = [{ icA: 0.0001, vceV: 1, min: 40 }, ...transistor.gain];
    const { partData, definition } = revisionDiff(
      A,
      revision({ transistor: { ...transistor, gain } }),
    );
    expect(texts(partData)).toEqual([`hFE min at 100\u00a0µA, 1\u00a0V, 25\u00a0°C: added`]);
    expect(definition).toEqual([]);
  });

  it('says when the part snapshot is the same and when its standing moved', () => {
    const part = { role: 'transistor', partNumber: '2N3904', revision: 3, verified: true };
    const same = revisionDiff({ ...A, parts: [part] }, { ...A, parts: [part] });
    expect(same.partData[0]).toMatchObject({
      quantity: '2N3904',
      change: 'same snapshot, verified',
      kind: 'same',
    });
    const moved = revisionDiff(
      { ...A, parts: [{ ...part, revision: 2, verified: false }] },
      { ...A, parts: [part] },
    );
    expect(moved.partData[0]).toMatchObject({
      before: 'library revision 2, unverified',
      after: 'library revision 3, verified',
      kind: 'changed',
    });
  });

  it('follows value, limit and status of each criterion and the verdict', () => {
    const before = evaluation({
      criteria: [
        criterion('load-voltage', { value: 21.37, limit: 20.1, relation: '>=' }),
        criterion('forced-beta', { value: 9.69, limit: 10, unit: '1' }),
        criterion('dissipation', { value: 0.01, unit: 'W' }),
        criterion('surge-voltage', { value: 34 }),
      ],
    });
    const after = evaluation({
      verdict: 'fail',
      engine: '1.1.0',
      criteria: [
        criterion('load-voltage', { value: 21.37, limit: 20.76, relation: '>=' }),
        criterion('forced-beta', { value: 13.9, limit: 10, unit: '1', status: 'fail' }),
        criterion('dissipation', { value: 0.010001, unit: 'W' }),
        criterion('storage-time', { value: 1e-6, unit: 's' }),
      ],
    });
    const { results } = revisionDiff({ ...A, evaluation: before }, { ...A, evaluation: after });
    expect(texts(results)).toEqual([
      'Coil voltage: none',
      'limit of it: +3.3\u00a0%',
      'Forced β: +43\u00a0%',
      'verdict of it: changed',
      'Storage and fall time: added',
      'VCE in a surge: removed',
      'Engine: changed',
      'Verdict: changed',
    ]);
  });
});

describe('values of a definition', () => {
  it('have words for every field a stage can hold', () => {
    const loads: StageFile['load'][] = [
      {
        kind: 'coil',
        resistanceOhm: 1440,
        tolerance: 0.1,
        referenceDegC: 20,
        temperatureRiseK: 20,
        inductanceH: 4,
        operateV: 16.8,
        operateReferenceDegC: 20,
        releaseV: 2.4,
        holdV: 6,
        maximumV: 31,
        maximumReferenceDegC: 20,
        coilMaxDegC: 130,
        releaseTimeLimitSec: 0.02,
      },
      { kind: 'resistor', resistanceOhm: 100, tolerance: 0.05 },
      {
        kind: 'led-string',
        count: 3,
        forwardV: { min: 1.8, max: 2.4 },
        resistanceOhm: 470,
        tolerance: 0.05,
        maximumA: 0.03,
        minimumA: 0.005,
      },
      { kind: 'lamp', nominalV: 24, currentA: 0.08, coldRatio: 12 },
      {
        kind: 'logic-input',
        pullUpOhm: 4700,
        tolerance: 0.05,
        ratingW: 0.1,
        count: 2,
        vilV: 0.8,
        vihV: 2,
        leakageA: 1e-6,
        lowCurrentA: 4e-4,
        capacitanceF: 1e-11,
        wiringF: 2e-11,
        riseTimeLimitSec: 1e-6,
      },
    ];
    const resistor = { valueOhm: 4700, tolerance: 0.05, ratingW: 0.1 };
    const full: Partial<StageFile> = {
      supplyV: { min: 21.6, max: 26.4, surge: 33, dip: 9 },
      storageTimeLimitSec: 1e-6,
      saturationLimitV: 0.3,
      speedUpCapacitorF: 1e-10,
      drive: {
        kind: 'push-pull',
        railV: { min: 3, max: 3.6 },
        high: { dropV: 0.6, currentA: 0.008, unloadedDropV: 0.1 },
        low: { levelV: 0.4, currentA: 0.008, unloadedV: 0.1 },
        sourceLimitA: 0.02,
        sinkLimitA: 0.02,
        pullUp: resistor,
        reset: { kind: 'pull-up', leakageA: 1e-6, pullUpOhm: 1e5 },
        groundShiftV: 0.1,
        port: 'PB',
        portTotalA: 0.08,
        maximumV: 5.5,
      },
      clamp: {
        kind: 'diode-zener',
        forwardV: 1,
        zenerV: { min: 12, max: 14 },
        standOffV: 30,
        reverseV: 75,
        currentRatingA: 0.2,
        powerRatingW: 0.5,
      },
      preDriver: {
        transistor: FILE.transistor,
        baseResistor: resistor,
        shuntResistor: resistor,
      },
      transistor: {
        ...FILE.transistor,
        package: 'TO-92',
        source: 'data sheet',
        limits: {
          vceoV: 40,
          vcboV: 60,
          veboV: 6,
          icA: 0.2,
          icPeakA: 0.3,
          ibA: 0.05,
          powerW: 0.6,
          tjMaxDegC: 150,
        },
        thermal: { rthJaKPerW: 200, rthJcKPerW: 83.3 },
        switching: {
          tdSec: 1e-8,
          trSec: 1e-8,
          tsSec: 1e-7,
          tfSec: 1e-8,
          icA: 0.01,
          ib1A: 0.001,
          ib2A: 0.001,
        },
        capacitanceF: 4e-12,
        model: { earlyV: 90, betaR: 0.5, isA: 1e-14, rcOhm: 1 },
        internal: {
          r1Ohm: 10000,
          r2Ohm: 10000,
          input: {
            onV: 3,
            onOutputA: 0.01,
            offV: 0.5,
            currentA: 8e-4,
            testV: 5,
            gi: 30,
            maximumV: 40,
          },
        },
        leakage: [{ kind: 'icex', currentA: 5e-8, voltageV: 30 }],
      },
    };
    for (const load of loads) {
      const leaves = definitionLeaves(StageInput.parse({ ...FILE, ...full, load }));
      // A field without words of its own is called by its path, which has a dot or a lower-case start.
      expect(
        leaves.filter(({ path, label }) => path === label || path.endsWith(`.${label}`)),
      ).toEqual([]);
      expect(new Set(leaves.map(({ path }) => path)).size).toBe(leaves.length);
    }
  });
});
