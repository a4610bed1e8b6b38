import { expect, it } from 'vitest';
import { portVerdicts } from '../../../shared/checks/port-current.ts';
import { portSentence } from '../../../shared/report/port-sentence.ts';

it.each([
  [0.0473 / 12, 0.08, 12, 'Port PB: 47.3 mA of 80 mA over 12 pins, margin 41 %'],
  [0.1, 0.08, 1, 'Port PB: 100 mA of 80 mA over one pin, margin −25 %'],
  [0.004, null, 2, 'Port PB: 8.00 mA, no limit stated over 2 pins'],
  [null, 0.08, 2, 'Port PB: current not known of 80 mA over 2 pins'],
])('a port in words: %s A, %s A, %i pins', (portCurrentA, portLimitA, quantity, words) => {
  const [verdict] = portVerdicts([{ port: 'PB', portCurrentA, portLimitA, quantity }], 0.1);
  expect(portSentence(verdict!).replaceAll('\u00a0', ' ')).toBe(words);
});
