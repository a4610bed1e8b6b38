import { LimitSet } from '../../../shared/parts/transistor-limits.ts';
import { GENERAL_PRACTICE } from '../../../shared/stage/policy.ts';
import { usableLimits } from './usable-limits.ts';

describe('usable limits', () => {
  // Printed ratings of the 2N3904: onsemi 2N3903/D, Rev. 9, August 2021, maximum ratings.
  const set = LimitSet.parse({
    vceoV: 40,
    vcboV: 60,
    veboV: 6,
    icA: 0.2,
    powerW: 0.625,
    rthJaKPerW: 200,
    tjMaxDegC: 150,
  });
  const usable = Object.fromEntries(
    usableLimits(set, GENERAL_PRACTICE).map((limit) => [limit.rating, limit.usable]),
  );

  it('derates voltage, currents, power and junction by 0.8, VEBO not at all', () => {
    expect(usable).toMatchObject({
      VCEO: '32\u00a0V',
      VEBO: '6\u00a0V',
      IC: '160\u00a0mA',
      'Ptot, 25 °C': '500\u00a0mW',
      TJ: '120\u00a0°C',
    });
  });

  it('uses IC where no peak is printed and leaves out what nobody prints', () => {
    expect(usable['IC peak']).toBe('160\u00a0mA');
    expect(usable).not.toHaveProperty('IB');
  });
});
