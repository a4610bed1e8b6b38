import { describe, expect, it } from 'vitest';
import { contactNames, deriveLoad, type LoadChoice } from '../../../shared/parts/derive-load.ts';
import { LoadRecord } from '../../../shared/parts/load-record.ts';
import { find, loads } from './library-file.ts';

function derived(name: string, choice: LoadChoice) {
  const result = deriveLoad(find(loads, name), choice);
  if (!result.ok) throw new Error(result.reason);
  return result;
}

const coilAt = (name: string, nominalV: number) =>
  find(loads, name).coils.findIndex((coil) => coil.nominalV === nominalV);

describe('deriveLoad', () => {
  it('gives the 24 V coil of the DS relay data sheet in volts', () => {
    const coil = coilAt('signal-0.4W', 24);
    expect(derived('signal-0.4W', { coil, contacts: '2c,4c' }).data).toMatchObject({
      kind: 'coil',
      resistanceOhm: 1440,
      tolerance: 0.1,
      referenceDegC: 20,
      operateV: 16.8,
      releaseV: 2.4,
      maximumV: 36,
      maximumReferenceDegC: 50,
      inductanceH: null,
    });
  });

  it('takes the hardest levels where the contacts are open', () => {
    expect(contactNames(find(loads, 'signal-0.2W'))).toEqual(['1c', '2c,4c']);
    const coil = coilAt('signal-0.2W', 12);
    expect(derived('signal-0.2W', { coil }).data).toMatchObject({ operateV: 9.6, maximumV: 19.2 });
    expect(derived('signal-0.2W', { coil, contacts: '2c,4c' }).data).toMatchObject({
      operateV: 8.4,
      maximumV: 24,
    });
  });

  it('prefers absolute voltages and says what it assumed', () => {
    const { data, remarks } = derived('power-20A-1W', { coil: 0 });
    expect(data).toMatchObject({ operateV: 9, releaseV: 1.2, tolerance: 0.1, referenceDegC: 20 });
    expect(data).toHaveProperty('resistanceOhm', expect.closeTo(144.58, 2));
    expect(remarks).toHaveLength(4);
  });

  it('takes the operative range where no operate voltage is printed', () => {
    expect(derived('two-pole-8A-sensitive', {}).data).toMatchObject({
      operateV: 8.8,
      maximumV: 18,
      releaseV: null,
    });
    expect(derived('industrial-plug-in', { coil: 1 }).data).toMatchObject({
      resistanceOhm: 768,
      operateV: 21.6,
      releaseV: 2.4,
      maximumV: 33.6,
    });
  });

  it('gives a lamp its hot to cold ratio', () => {
    const general = find(loads, 'filament-lamp-general');
    expect(deriveLoad(general)).toEqual({
      ok: false,
      reason: 'filament-lamp-general prints no nominal voltage and current: enter them.',
    });
    const filament = { ...general.filament!, nominalV: 24, currentA: 0.1 };
    expect(deriveLoad({ ...general, filament })).toMatchObject({
      data: { kind: 'lamp', nominalV: 24, currentA: 0.1, coldRatio: 15 },
    });
  });

  it('refuses what no stage can take', () => {
    const reason = (record: LoadRecord, choice: LoadChoice = {}) => {
      const result = deriveLoad(record, choice);
      return result.ok ? 'derived' : result.reason;
    };
    expect(reason(find(loads, 'led-general'))).toContain('enter the string');
    expect(reason(find(loads, 'relay-coils-general'))).toContain('no such coil');
    expect(reason(find(loads, 'signal-0.2W'), { coil: 99 })).toContain('no such coil');
    const bare = LoadRecord.parse({
      kind: 'load',
      partNumber: 'K9',
      confidence: 'memory',
      sources: [{ of: 'all', source: 'MEM' }],
      family: 'relay',
      coils: [{ nominalV: 12 }],
    });
    expect(reason(bare)).toContain('neither resistance, current nor power');
  });
});
