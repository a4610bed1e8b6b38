import { GENERAL_PRACTICE } from '../../../shared/stage/policy.ts';
import { limitName, limitText, POLICY_LIMITS } from './policy-limits.ts';

describe('policy limits in words', () => {
  it('name every limit of a policy', () => {
    const { name, ...limits } = GENERAL_PRACTICE;
    expect(name).toBe('General practice');
    expect(Object.keys(POLICY_LIMITS).sort()).toEqual(Object.keys(limits).sort());
  });

  it.each([
    ['voltageDerating', 0.8, '80\u00a0%'],
    ['offCurrentA', 1e-4, '100\u00a0µA'],
    ['largestOhm', 1e7, '10\u00a0MΩ'],
    ['guaranteedOnly', true, 'yes'],
    ['series', 'E24', 'E24'],
    ['overdriveFactor', 2, '2'],
  ])('write %s', (key, value, text) => {
    expect(limitText(key, value)).toBe(text);
  });

  it('call the policy by its own word', () => {
    expect(limitName('name')).toBe('Policy');
  });
});
