import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { type PortLoad, portVerdicts, strongDriveA } from '../../../shared/checks/port-current.ts';
import { HIGH_SIDE_FILE, RELAY_FILE, relayStage } from '../relay-stage.ts';

const load = (change: Partial<PortLoad> = {}): PortLoad => ({
  ...{ port: 'PB', portCurrentA: 0.005, portLimitA: 0.08, quantity: 1 },
  ...change,
});

describe('the current of a port', () => {
  // Expected sums by hand.
  it('is the sum over its stages, each as often as it is built, against the derated total', () => {
    const [verdict, ...others] = portVerdicts([load(), load({ quantity: 10 })], 0.1);
    expect(others).toEqual([]);
    expect(verdict).toMatchObject({ port: 'PB', pins: 11 });
    const { value, margin, ...rest } = verdict!.criterion;
    expect(value).toBeCloseTo(0.055, 12);
    expect(margin).toBeCloseTo(0.3125, 12);
    expect(rest).toEqual({
      ...{ id: 'port-current', limit: 0.08, relation: '<=', unit: 'A', status: 'pass' },
      corner: null,
    });
  });

  it.each([
    [14, 'pass'],
    [15, 'marginal'],
    [16, 'marginal'],
    [17, 'fail'],
  ])('of %i pins at 5 mA each of 80 mA is a %s', (quantity, status) => {
    expect(portVerdicts([load({ quantity })], 0.1)[0]?.criterion.status).toBe(status);
  });

  it('is held against the tightest limit that any stage states', () => {
    const loads = [load(), load({ portLimitA: 0.008 }), load({ portLimitA: null })];
    expect(portVerdicts(loads, 0.1)[0]?.criterion).toMatchObject({ limit: 0.008, status: 'fail' });
  });

  it('is stated without a limit, and open where one stage has no figure', () => {
    const stated = portVerdicts([load({ portLimitA: null })], 0.1)[0]?.criterion;
    expect(stated).toMatchObject({ value: 0.005, limit: null, margin: null, status: 'stated' });
    const open = portVerdicts([load(), load({ portCurrentA: null })], 0.1)[0]?.criterion;
    expect(open).toMatchObject({ value: null, margin: null, status: 'open' });
  });

  it('keeps ports apart, in the order of their names, and leaves out drives without one', () => {
    const loads = [load({ port: 'PC' }), load({ port: null }), load({ port: 'PA' })];
    expect(portVerdicts(loads, 0.1).map(({ port, pins }) => [port, pins])).toEqual([
      ...[['PA', 1]],
      ...[['PC', 1]],
    ]);
  });
});

describe('the current a stage asks of its pin', () => {
  it('is the drive current at its strong corner', () => {
    const current = strongDriveA(evaluateStage(relayStage()));
    // 3.6 V into 950 Ω: coldest, VBE min 0.65 V and 2 mV/K up to 45 K, a little more for the current.
    expect(current).toBeGreaterThan((3.6 - 0.8) / 950);
    expect(current).toBeLessThan(3.6 / 950);
  });

  it('is that of the transistor in front where there are two', () => {
    const stage = relayStage({
      topology: 'two-transistor-high-side',
      transistor: HIGH_SIDE_FILE.transistor,
      baseResistor: { valueOhm: 6200, tolerance: 0.05, ratingW: 0.5 },
      preDriver: {
        transistor: RELAY_FILE.transistor,
        baseResistor: { valueOhm: 4700, tolerance: 0.05, ratingW: 0.1 },
        shuntResistor: null,
      },
    });
    const current = strongDriveA(evaluateStage(stage));
    expect(current).toBeGreaterThan((3.6 - 0.8) / 4465);
    expect(current).toBeLessThan(3.6 / 4465);
  });
});
