/**
 * STMicroelectronics, 2N2219A/2N2222A High Speed Switches, June 1999: VCE(sat) 0.3 V at 150/15 mA and 1 V at 500/50 mA,
 * both exactly 2.0 Ω; hFE 75 at 10 mA, 35 at −55 °C; 100 at 150 mA and VCE 10 V, 50 at VCE 1 V; 40 at 500 mA, 10 V.
 */
import { describe, expect, it } from 'vitest';
import { gainRatio, gainTable, minimumGain } from '../../shared/physics/gain.ts';
import { saturationLine } from '../../shared/physics/saturation.ts';

const GAIN = [
  { icA: 0.01, vceV: 10, min: 75, typ: null, max: null, tempDegC: 25 },
  { icA: 0.01, vceV: 10, min: 35, typ: null, max: null, tempDegC: -55 },
  { icA: 0.15, vceV: 10, min: 100, typ: null, max: 300, tempDegC: 25 },
  { icA: 0.15, vceV: 1, min: 50, typ: null, max: null, tempDegC: 25 },
  { icA: 0.5, vceV: 10, min: 40, typ: null, max: null, tempDegC: 25 },
];

describe('2N2222A by its data sheet', () => {
  const line = saturationLine(
    [
      { icA: 0.15, ibA: 0.015, maxV: 0.3 },
      { icA: 0.5, ibA: 0.05, maxV: 1 },
    ],
    null,
    false,
  );

  it('has an RCE(sat) of 2.0 Ω between its rows and no offset', () => {
    expect(line?.slopeOhm[1]).toBeCloseTo(2, 9);
    expect(line?.interceptV[1]).toBeCloseTo(0, 9);
  });

  const table = gainTable(GAIN, [], 1);

  it('loses gain in the cold with an exponent of 2.4 by its own rows', () => {
    expect(table?.exponent).toBeCloseTo(2.44, 2);
    expect(75 * gainRatio(-55, table?.exponent ?? NaN)).toBeCloseTo(35, 9);
  });

  it('takes the lower minimum at 150 mA and halves what is printed at VCE 10 V above it', () => {
    expect(table === null ? NaN : minimumGain(table, 0.15)).toBeCloseTo(50, 9);
    expect(table === null ? NaN : minimumGain(table, 0.5)).toBeCloseTo(20, 9);
  });
});
