import { describe, expect, it } from 'vitest';
import { cornerNumber } from '../../../shared/stage/corners.ts';
import { OperatingPoint } from '../../../shared/stage/operating-point.ts';
import { stageModel } from '../../../shared/stage/stage-model.ts';
import { highSideStage, relayStage, RELAY_FILE, TYPE_2N3904 } from '../relay-stage.ts';

const K = 273.15;
const Q_OVER_K = 1.602176634e-19 / 1.380649e-23;

/** A root of a rising or falling function, by halving. */
function root(f: (x: number) => number, low: number, high: number): number {
  const rising = f(high) > f(low);
  for (let step = 0; step < 200; step++) {
    const middle = (low + high) / 2;
    if (f(middle) > 0 === rising) high = middle;
    else low = middle;
  }
  return (low + high) / 2;
}

/**
 * The 2N3904 relay stage at one corner, written out a second time from the rules with the data sheet's numbers in
 * place: no tables, no pieces, the junction and the load line solved by halving.
 */
function secondMethod(supplyV: number, ambient: number, coilDegC: number, rb: number, rbe: number) {
  const coilOhm = (1440 * 0.9 * (234.5 + coilDegC)) / 254.5;
  const full = supplyV / coilOhm;
  const gain25 = 100 * (60 / 100) ** (Math.log(full / 0.01) / Math.log(5));
  const vbe25 = 0.85 + (0.1 * Math.log(full / 0.01)) / Math.log(5);
  const at = (tj: number) => {
    const vbe = vbe25 - 0.002 * (tj - 25);
    const gain = tj < 25 ? gain25 * ((tj + K) / 298.15) ** 2.4 : gain25;
    const ib = (3 - vbe) / (75 + rb) - vbe / rbe;
    const beta = full / ib;
    const vt = (tj + K) / Q_OVER_K;
    const more =
      beta > 10
        ? vt *
          Math.log(
            ((1 + (beta + 1) / 0.5) / (1 + 11 / 0.5)) * ((1 - 10 / gain) / (1 - beta / gain)),
          )
        : 0;
    const hot = Math.max(0, tj - 25);
    const drop = (ic: number) =>
      (0.175 * (298.15 + hot)) / 298.15 + 2.5 * (1 + 0.004 * hot) * ic + more;
    const ic = root((x) => supplyV - drop(x) - x * coilOhm, 0, full);
    const vce = supplyV - ic * coilOhm;
    return { ib, ic, vce, beta, odf: gain / beta, power: vce * ic + vbe * ib };
  };
  const tj = root((t) => t - ambient - 200 * at(t).power, ambient, 300);
  return { tj, start: at(ambient), settled: at(tj) };
}

describe('OperatingPoint', () => {
  it.each([
    [26.4, -20, 'min', 1000],
    [26.4, 60, 'max', 1000],
    [21.6, 60, 'max', 620],
  ] as const)('agrees with a second method at %d V, %d °C', (supplyV, ambient, end, rb) => {
    const point = new OperatingPoint(stageModel(relayStage()));
    const corner = {
      supply: supplyV > 24 ? 'max' : 'min',
      ambient: end,
      drive: 'weak',
      rb: '+',
      rbe: '-',
      load: '-',
      gain: 'min',
      vbe: 'max',
      vceSat: 'max',
    };
    const { corners } = point.model;
    const start = secondMethod(supplyV, ambient, ambient, rb * 1.05, 22000 * 0.95);
    point.place(cornerNumber(corners, { ...corner, instant: 'start' }), rb);
    point.solve(ambient);
    expect(point.ibA).toBeCloseTo(start.start.ib, 12);
    expect(point.icA).toBeCloseTo(start.start.ic, 10);
    expect(point.vceV).toBeCloseTo(start.start.vce, 9);
    expect(point.overdrive).toBeCloseTo(start.start.odf, 9);
    const warm = secondMethod(supplyV, ambient, ambient + 20, rb * 1.05, 22000 * 0.95);
    point.place(cornerNumber(corners, { ...corner, instant: 'settled' }), rb);
    point.settle(ambient);
    expect(point.tjDegC).toBeCloseTo(warm.tj, 5);
    expect(point.powerW).toBeCloseTo(warm.settled.power, 8);
    expect(point.forcedBeta).toBeCloseTo(warm.settled.beta, 6);
  });

  it('drives a PNP from the supply down: I_R = (VS − VEB)/(VOL/IOL + RB)', () => {
    const input = highSideStage();
    const point = new OperatingPoint(stageModel(input));
    point.place(cornerNumber(point.model.corners, { supply: 'max' }), 6800);
    point.solve(25);
    expect(point.driveA).toBeCloseTo((26.4 - point.vbeV) / (40 + 6800 * 0.95), 12);
  });

  it('bends the output beyond its tested current to three times the drop per ampere', () => {
    const point = new OperatingPoint(stageModel(relayStage()));
    point.place(cornerNumber(point.model.corners, { vbe: 'min' }), 100);
    point.solve(25);
    expect(point.beyondPin).toBe(true);
    const outputV = point.vbeV + point.driveA * point.rbOhm;
    expect(outputV).toBeCloseTo(3 - 0.6 - (3 * 0.6 * (point.driveA - 0.008)) / 0.008, 12);
  });

  it('leaves a weakly driven transistor unsaturated: IC = hFE·IB, VCE on the load line', () => {
    const point = new OperatingPoint(stageModel(relayStage()));
    point.place(cornerNumber(point.model.corners, { vbe: 'max', load: '-' }), 20_000);
    point.solve(25);
    expect(point.saturated).toBe(false);
    expect(point.icA).toBeCloseTo(point.gain * point.ibA, 15);
    expect(point.vceV).toBeCloseTo(21.6 - point.icA * point.condition.loadOhm, 12);
  });

  it('finds a runaway where the loss cannot leave', () => {
    const transistor = {
      ...TYPE_2N3904,
      thermal: { rthJaKPerW: 90_000 },
    };
    const point = new OperatingPoint(stageModel(relayStage({ transistor })));
    point.place(cornerNumber(point.model.corners, { supply: 'max', vceSat: 'max' }), 1000);
    point.settle(25);
    expect(point.runaway).toBe(true);
  });

  it('counts the duty only from 100 Hz on', () => {
    const power = (frequencyHz: number, duty: number) => {
      const point = new OperatingPoint(
        stageModel(
          relayStage({
            frequencyHz,
            duty,
            transistor: { ...TYPE_2N3904, switching: null },
          }),
        ),
      );
      point.placeNominal(1000);
      point.solve(25);
      return point.powerW;
    };
    expect(power(99, 0.5)).toBe(power(0, 1));
    expect(power(100, 0.5)).toBeCloseTo(power(0, 1) / 2, 12);
  });

  it('takes the rail from the supply where the output runs from it', () => {
    const drive = { ...RELAY_FILE.drive, railTracksSupply: true };
    const point = new OperatingPoint(stageModel(relayStage({ drive })));
    point.place(cornerNumber(point.model.corners, { supply: 'max', drive: 'strong' }), 1000);
    expect(point.drive.openV).toBe(26.4);
  });
});
