import { describe, expect, it } from 'vitest';
import { describePart } from '../../../shared/parts/describe-part.ts';
import { diodes, find, loads, logicOutputs, transistors } from './library-file.ts';

const all = [...transistors, ...loads, ...logicOutputs, ...diodes];

describe('describePart', () => {
  it.each([
    ['2N3904', 'NPN, 40 V, 200 mA'],
    ['TIP127', 'PNP Darlington, 100 V, 5 A'],
    ['DTC114E', 'NPN pre-biased, 50 V, 50 mA, 10 kΩ and 10 kΩ'],
    ['ULN2003A', 'NPN Darlington array, 50 V, 500 mA'],
    ['signal-0.4W', 'relay coil, 1.5 V to 48 V'],
    ['contactor-24V-250mA', 'contactor coil, 24 V'],
    ['filament-lamp-general', 'lamp, cold filament against hot, any make'],
    ['74HC', 'push-pull output, 2 V to 6 V, tested to 5.2 mA, 25 mA maximum'],
    ['open-collector / open-drain', 'open collector, tested to 40 mA'],
    ['1N4148', 'switching diode, 75 V, 200 mA'],
    ['BZX55C24', 'zener diode, 22.8 V to 25.6 V, 500 mW'],
    ['SMBJ24A', 'TVS diode, 26.7 V to 29.5 V, 24 V stand-off'],
  ])('says what %s is', (partNumber, words) => {
    expect(describePart(find(all, partNumber)).replaceAll('\u00a0', ' ')).toBe(words);
  });

  it('has a line for every part of the library', () => {
    for (const record of all) expect(describePart(record)).toMatch(/^\S.*\S, \S/);
  });
});
