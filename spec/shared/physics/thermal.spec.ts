import { describe, expect, it } from 'vitest';
import { powerShare, thermalResistanceInUse } from '../../../shared/physics/thermal.ts';

describe('thermalResistanceInUse', () => {
  it('takes the larger of the printed and the implied one', () => {
    expect(thermalResistanceInUse(200, 0.5, 150)).toBe(250);
    expect(thermalResistanceInUse(357, 0.625, 150)).toBe(357);
  });

  it('takes the only one there is, and is null without any', () => {
    expect(thermalResistanceInUse(200, null, 150)).toBe(200);
    expect(thermalResistanceInUse(null, 0.625, 150)).toBe(200);
    expect(thermalResistanceInUse(null, null, 150)).toBeNull();
  });
});

describe('powerShare', () => {
  it('is whole up to 25 °C, straight to nothing at TJmax and nothing beyond', () => {
    expect(powerShare(-55, 150)).toBe(1);
    expect(powerShare(87.5, 150)).toBe(0.5);
    expect(powerShare(150, 150)).toBe(0);
    expect(powerShare(300, 150)).toBe(0);
  });
});
