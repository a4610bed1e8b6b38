import { describe, expect, it } from 'vitest';
import {
  type BaseEmitterPoint,
  baseEmitterTable,
  maximumVbeV,
  minimumVbeV,
} from '../../../shared/physics/base-emitter.ts';
import { thermalVoltageV } from '../../../shared/physics/constants.ts';

const row = (icA: number, more: Partial<BaseEmitterPoint>): BaseEmitterPoint => ({
  kind: 'sat',
  icA,
  minV: null,
  typV: null,
  maxV: null,
  ...more,
});

const DECADE_V = thermalVoltageV(25) * Math.log(10);

describe('maximumVbeV', () => {
  const table = baseEmitterTable([row(0.01, { maxV: 0.85 }), row(0.1, { maxV: 1.05 })], 0.55);

  it('runs straight in ln IC between rows and is held below the first', () => {
    expect(maximumVbeV(table, Math.sqrt(0.001))).toBeCloseTo(0.95, 12);
    expect(maximumVbeV(table, 1e-4)).toBe(0.85);
  });

  it('goes on straight in IC above the last where that is more than the junction law', () => {
    expect(maximumVbeV(table, 0.19)).toBeCloseTo(1.25, 12);
    const single = baseEmitterTable([row(0.01, { maxV: 0.85 })], 0.55);
    expect(maximumVbeV(single, 0.1)).toBeCloseTo(0.85 + DECADE_V, 12);
  });

  it('stands in VBE(on) + 0.05 V, else typical + 0.15 V, and says it is no guarantee', () => {
    const part = baseEmitterTable(
      [
        row(0.01, { typV: 0.7 }),
        row(0.1, { typV: 0.9 }),
        row(0.01, { kind: 'on', maxV: 0.77 }),
        row(0.002, { kind: 'on', minV: 0.55, maxV: 0.7 }),
      ],
      0.55,
    );
    expect(part.guaranteed).toBe(false);
    expect(maximumVbeV(part, 0.01)).toBeCloseTo(0.82, 12);
    expect(maximumVbeV(part, 0.1)).toBeCloseTo(1.05, 12);
    const onOnly = baseEmitterTable([row(0.3, { kind: 'on', maxV: 1.2 })], 0.55);
    expect(maximumVbeV(onOnly, 0.3)).toBeCloseTo(1.25, 12);
  });
});

describe('minimumVbeV', () => {
  it('follows the junction law below the first row and is held above the last', () => {
    const table = baseEmitterTable([row(0.01, { minV: 0.65, maxV: 0.85 })], 0.55);
    expect(minimumVbeV(table, 0.001)).toBeCloseTo(0.65 - DECADE_V, 12);
    expect(minimumVbeV(table, 1)).toBe(0.65);
  });

  it('stands in typical − 0.1 V, else the usual minimum', () => {
    const typical = baseEmitterTable([row(0.01, { typV: 0.72, maxV: 0.85 })], 0.55);
    expect(minimumVbeV(typical, 0.01)).toBeCloseTo(0.62, 12);
    expect(minimumVbeV(baseEmitterTable([row(0.01, { maxV: 0.85 })], 0.55), 0.01)).toBe(0.55);
  });
});
