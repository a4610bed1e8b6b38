import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { RELAY_FILE, relayStage, TYPE_2N3904 } from '../relay-stage.ts';

type Changes = Parameters<typeof relayStage>[0];

function statusOf(changes: Changes, id: string) {
  const evaluation = evaluateStage(
    relayStage({ baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: 620 }, ...changes }),
  );
  return evaluation.criteria.find((each) => each.id === id)?.status;
}

const part = (more: object) => ({ transistor: { ...TYPE_2N3904, ...more } });
const limits = (more: object) => part({ limits: { ...TYPE_2N3904.limits, ...more } });

describe('missing data is open, never hoped for', () => {
  it.each([
    ['gain rows', part({ gain: [] }), 'overdrive-factor'],
    ['saturation rows', part({ saturation: [] }), 'load-voltage'],
    ['saturation rows', part({ saturation: [] }), 'forced-beta'],
    ['saturation rows', part({ saturation: [] }), 'dissipation'],
    ['VBE rows', part({ baseEmitter: [] }), 'overdrive-factor'],
    ['leakage rows', part({ leakage: [] }), 'off-collector-current'],
    ['VCEO', limits({ vceoV: null }), 'off-collector-voltage'],
    ['VCEO', limits({ vceoV: null }), 'peak-collector-voltage'],
    ['IC', limits({ icA: null }), 'collector-current'],
    ['Ptot', limits({ powerW: null }), 'dissipation'],
    ['operateV', { load: { ...RELAY_FILE.load, operateV: null } }, 'load-voltage'],
    ['releaseV', { load: { ...RELAY_FILE.load, releaseV: null } }, 'off-collector-current'],
    [
      'rating of RB',
      { baseResistor: { valueOhm: 620, tolerance: 0.05, ratingW: null } },
      'rb-dissipation',
    ],
    [
      'rating of RBE',
      { shuntResistor: { valueOhm: 22000, tolerance: 0.05, ratingW: null } },
      'rbe-dissipation',
    ],
  ])('without %s', (_, changes, id) => {
    expect(statusOf(changes, id)).toBe('open');
  });

  it('counts the quantities used above their last row, and is open then', () => {
    const transistor = {
      ...TYPE_2N3904,
      gain: TYPE_2N3904.gain.slice(0, 3),
      saturation: TYPE_2N3904.saturation.slice(0, 1),
      baseEmitter: TYPE_2N3904.baseEmitter.slice(0, 1),
    };
    const evaluation = evaluateStage(
      relayStage({ transistor, baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: 220 } }),
    );
    expect(evaluation.criteria.at(-1)).toMatchObject({
      id: 'tested-range',
      value: 4,
      limit: 0,
      status: 'open',
    });
    const finding = evaluation.findings.find(({ id }) => id === 'outside-tested-range');
    expect(finding?.text).toContain('hFE, VCE(sat), VBE(sat), output current');
  });

  it('is at best marginal in drive where VBE(sat) is not guaranteed', () => {
    const changes = part({
      baseEmitter: [
        { icA: 0.01, typV: 0.7 },
        { icA: 0.05, typV: 0.8 },
      ],
    });
    expect(statusOf(changes, 'overdrive-factor')).toBe('marginal');
    const evaluation = evaluateStage(relayStage(changes));
    expect(evaluation.findings.map(({ id }) => id)).toContain('vbe-sat-not-guaranteed');
  });

  it('is at best marginal in overvoltage where the coil limit is unknown and the ambient above its reference', () => {
    const load = { ...RELAY_FILE.load, maximumV: 40 };
    expect(statusOf({ load }, 'load-overvoltage')).toBe('marginal');
    expect(statusOf({ load: { ...load, coilMaxDegC: 155 } }, 'load-overvoltage')).toBe('pass');
    const hot = { ...load, maximumReferenceDegC: 60 };
    expect(statusOf({ load: hot }, 'load-overvoltage')).toBe('pass');
  });

  it('states what has no limit without touching the verdict', () => {
    expect(statusOf({}, 'base-current')).toBe('stated');
    expect(statusOf({ load: { ...RELAY_FILE.load, maximumV: null } }, 'load-overvoltage')).toBe(
      'stated',
    );
    expect(statusOf(limits({ veboV: null }), 'reverse-base-voltage')).toBe('stated');
  });

  it('finds a stage overdriven above five times what the policy asks', () => {
    const evaluation = evaluateStage(
      relayStage({
        baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: 240 },
        policy: { name: 'General practice', overdriveFactor: 1.2 },
      }),
    );
    expect(evaluation.findings.map(({ id }) => id)).toContain('overdriven');
  });

  it('finds a thermal runaway and fails', () => {
    const evaluation = evaluateStage(relayStage(part({ thermal: { rthJaKPerW: 90_000 } })));
    expect(evaluation.findings.map(({ id }) => id)).toContain('thermal-runaway');
    expect(evaluation.verdict).toBe('fail');
  });
});
