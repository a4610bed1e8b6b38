import { describe, expect, it } from 'vitest';
import { deriveClamp } from '../../../shared/parts/derive-clamp.ts';
import { diodes, find } from './library-file.ts';

describe('deriveClamp', () => {
  it('takes the forward voltage at the tested current that reaches the coil’s', () => {
    expect(deriveClamp(find(diodes, 'BAS16'), 0.03)).toMatchObject({
      ok: true,
      data: { kind: 'diode', forwardV: 1, reverseV: 75, currentRatingA: 0.2 },
      remarks: [],
    });
  });

  it('says when the coil current lies above every tested one', () => {
    expect(deriveClamp(find(diodes, '1N4148'), 0.03)).toMatchObject({
      data: { forwardV: 1 },
      remarks: ['The coil current lies above the largest tested forward current.'],
    });
  });

  it('judges a zener by its breakdown and a TVS by its clamping voltage', () => {
    expect(deriveClamp(find(diodes, 'BZX55C24'), 0.02)).toMatchObject({
      data: { kind: 'zener-across-transistor', zenerV: { min: 22.8, max: 25.6 } },
    });
    expect(deriveClamp(find(diodes, 'SMBJ24A'), 0.02)).toMatchObject({
      data: {
        kind: 'tvs-across-transistor',
        zenerV: { min: 26.7, max: 38.9 },
        standOffV: 24,
      },
    });
  });

  it('derives every diode of the library, and refuses one without forward voltage', () => {
    expect(diodes.every((diode) => deriveClamp(diode, 0.05).ok)).toBe(true);
    expect(deriveClamp({ ...find(diodes, '1N4148'), forward: [] }, 0.05)).toEqual({
      ok: false,
      reason: '1N4148 lacks figures a clamp needs.',
    });
  });
});
