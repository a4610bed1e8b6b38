/**
 * onsemi, General Purpose Transistors 2N3903/2N3904, publication 2N3903/D, Rev. 9: maximum ratings (625 mW, 5.0 mW/K,
 * 200 K/W junction to ambient, 83.3 K/W to case) and electrical characteristics.
 */
import { describe, expect, it } from 'vitest';
import { gainTable, minimumGain } from '../../shared/physics/gain.ts';
import { maximumVbeV, minimumVbeV } from '../../shared/physics/base-emitter.ts';
import { pieceAt } from '../../shared/physics/saturation.ts';
import { thermalResistanceInUse } from '../../shared/physics/thermal.ts';
import { partModel } from '../../shared/stage/part-model.ts';
import { relayStage } from '../shared/relay-stage.ts';

const { transistor, policy } = relayStage();
const part = partModel(transistor, policy);

describe('2N3904 by its data sheet', () => {
  it('has 200 K/W by its power rating as well as by print', () => {
    expect(thermalResistanceInUse(null, 0.625, 150)).toBeCloseTo(200, 9);
    expect(part.rthJaKPerW).toBeCloseTo(200, 9);
  });

  it.each(transistor.gain.map((row) => [row.icA, row.min ?? NaN]))(
    'reproduces hFE min at %d A: %d',
    (icA, min) => {
      const table = gainTable(transistor.gain, transistor.saturation, 2.4);
      expect(table === null ? NaN : minimumGain(table, icA)).toBeCloseTo(min, 9);
    },
  );

  it.each(transistor.saturation.map((row) => [row.icA, row.maxV ?? NaN]))(
    'reproduces VCE(sat) max at %d A: %d V',
    (icA, maxV) => {
      const line = part.saturation;
      expect(line).not.toBeNull();
      if (line === null) return;
      const k = pieceAt(line, icA);
      expect((line.interceptV[k] ?? 0) + (line.slopeOhm[k] ?? 0) * icA).toBeCloseTo(maxV, 12);
    },
  );

  it('reproduces VBE(sat): 0.65 to 0.85 V at 10 mA, at most 0.95 V at 50 mA', () => {
    expect(minimumVbeV(part.baseEmitter, 0.01)).toBe(0.65);
    expect(maximumVbeV(part.baseEmitter, 0.01)).toBe(0.85);
    expect(maximumVbeV(part.baseEmitter, 0.05)).toBeCloseTo(0.95, 12);
  });
});
