import { EMPTY_CHECK, type CheckDraft } from './check-draft.ts';
import { passItems, passReason } from './pass-items.ts';
import { IN_CHECK } from './review-fixture.ts';

const DONE: CheckDraft = {
  overdriveFactor: 5.55,
  method: 'hand',
  note: 'Gain read from the table.',
  reason: '',
  justifications: { 'load-voltage': 'The supply never falls below 22 V.' },
  read: ['overdrive-factor', 'load-voltage'],
};
const { evaluation } = IN_CHECK;

describe('conditions of a pass', () => {
  it('has nothing against a complete check', () => {
    expect(passReason(passItems(DONE, evaluation, []))).toBeNull();
  });

  it('names everything that is missing in one sentence', () => {
    expect(passReason(passItems(EMPTY_CHECK, evaluation, []))).toBe(
      'Pass opens once your own figure is complete, one justification is written and all criteria are read.',
    );
  });

  it('asks a reason for a figure more than 5 % off', () => {
    const items = passItems({ ...DONE, overdriveFactor: 5.4 }, evaluation, []);
    expect(passReason(items)).toBe('Pass opens once your own figure is complete.');
    expect(
      passReason(passItems({ ...DONE, overdriveFactor: 5.4, reason: 'Read low.' }, evaluation, [])),
    ).toBeNull();
  });

  it('holds an open finding and a failing criterion against it', () => {
    const finding = {
      id: 'f',
      number: 2,
      subject: { kind: 'criterion', id: 'load-voltage' },
      title: 'Too close',
      state: 'answered',
      history: [],
    } as const;
    expect(passReason(passItems(DONE, evaluation, [{ ...finding, history: [] }]))).toBe(
      'Pass opens once finding 2 is closed.',
    );
    const failing = { ...evaluation, verdict: 'fail' as const };
    expect(passReason(passItems(DONE, failing, []))).toBe('Pass opens once nothing fails.');
  });
});
