import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { sizeShunt } from '../../../shared/sizing/size-shunt.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { seriesDecade } from '../../../shared/units/preferred-values.ts';
import { HIGH_SIDE_FILE, highSideStage, RELAY_FILE, relayStage } from '../relay-stage.ts';

const nextIn24 = (valueOhm: number) => {
  const decade = 10 ** Math.floor(Math.log10(valueOhm) + 1e-9);
  const mantissas = [...seriesDecade('E24'), 10];
  return (mantissas.find((each) => each > (valueOhm / decade) * 1.001) ?? 10) * decade;
};
const withShunt = (stage: StageInput, valueOhm: number): StageInput => ({
  ...stage,
  shuntResistor: { valueOhm, tolerance: 0.05, ratingW: 0.1 },
});
const statusOf = (stage: StageInput, id: string) =>
  evaluateStage(stage).criteria.find((each) => each.id === id)?.status;

describe('the base–emitter resistor', () => {
  it('of a PNP on an open drain is the largest that leakage leaves off, by hand', () => {
    const sized = sizeShunt(highSideStage());
    // TJ 61…63 °C: ICBO 50 nA doubled every 10 K and 1 µA of the drain into RBE + 5 %, 10 % below the limit.
    const at = (degC: number) => {
      const icboA = 50e-9 * 2 ** ((degC - 25) / 10);
      return (0.9 * (0.5 - 0.002 * (degC - 25))) / (1.05 * (icboA + 1e-6));
    };
    expect(sized?.recommendedOhm).toBeLessThanOrEqual(at(61));
    expect(nextIn24(sized?.recommendedOhm ?? 0)).toBeGreaterThan(at(64));
    expect(sized).toMatchObject({ setBy: 'off-base-voltage', floatingAssumed: false });
  });

  it.each([
    [
      'NPN with a floating reset',
      relayStage({ drive: { ...RELAY_FILE.drive, reset: { kind: 'high-z' } } }),
    ],
    ['PNP on an open drain', highSideStage()],
    [
      'PNP with a leaky drain',
      highSideStage({ drive: { ...HIGH_SIDE_FILE.drive, leakageA: 2e-5 } }),
    ],
  ])('passes every off-state criterion of an %s, and the next value does not', (_, stage) => {
    const sized = sizeShunt(stage);
    const valueOhm = sized?.recommendedOhm ?? NaN;
    const off = ['off-base-voltage', 'off-collector-current', 'reset-off', 'reset-off-current'];
    for (const id of off) {
      expect(['pass', undefined], id).toContain(statusOf(withShunt(stage, valueOhm), id));
    }
    const next = withShunt(stage, nextIn24(valueOhm));
    expect(statusOf(next, sized?.setBy ?? '')).not.toBe('pass');
    expect(sized?.driveShare).toBeLessThanOrEqual(0.1);
  });

  it('is sized for a floating pin where the stage says nothing of reset', () => {
    const stated = sizeShunt(
      relayStage({ drive: { ...RELAY_FILE.drive, reset: { kind: 'high-z' } } }),
    );
    const silent = sizeShunt(relayStage());
    expect(silent).toEqual({ ...stated, floatingAssumed: true });
  });

  it('is not recommended where it would take more than a tenth of the drive', () => {
    const reset = { kind: 'pull-up', pullUpOhm: 10_000 };
    const sized = sizeShunt(relayStage({ drive: { ...RELAY_FILE.drive, reset } }));
    expect(sized).toMatchObject({ recommendedOhm: null, setBy: 'reset-off' });
    // VBE/RBE over (VBE/RBE + IB): by hand from the cold weak corner, 3 V behind 75 Ω and 1050 Ω.
    const vbeV = 0.85 + (0.1 * Math.log(0.0242 / 0.01)) / Math.log(5) + 0.09;
    const shuntA = vbeV / ((sized?.largestOhm ?? NaN) * 0.95);
    expect(sized?.driveShare).toBeCloseTo(shuntA / ((3 - vbeV) / 1125), 2);
  });

  it('is none of a pre-biased part’s, nor of a stage without RB', () => {
    const open = { ...RELAY_FILE.baseResistor, valueOhm: null };
    expect(sizeShunt(relayStage({ baseResistor: open }))).toBeNull();
  });
});
