import { delay, of, Subject } from 'rxjs';
import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import type { Sizing } from '../../../shared/sizing/sizing.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { DraftHistory } from './draft-history.ts';
import { draftOf } from './draft.ts';
import { judgements, type Judgement } from './judgement-stream.ts';
import { draftRevision } from './testing/stage-samples.ts';

const revision = draftRevision();
const withRb = (valueOhm: number | null): StageInput => ({
  ...revision.definition,
  baseResistor: { ...revision.definition.baseResistor, valueOhm },
});
const sizing: Sizing = {
  rbMinOhm: 240,
  rbMaxOhm: 680,
  setBy: { min: null, max: null },
  recommendedOhm: 620,
  candidates: [],
  conflict: null,
};

describe('judgements', () => {
  const evaluated: (number | null)[] = [];
  const engine = {
    evaluate: ({ baseResistor }: StageInput) => {
      evaluated.push(baseResistor.valueOhm);
      const evaluation: Evaluation = {
        ...revision.evaluation,
        baseResistorOhm: baseResistor.valueOhm,
      };
      return of(evaluation);
    },
    size: () => of(sizing).pipe(delay(100)),
  };
  let inputs: Subject<StageInput>;
  let seen: Judgement[];

  beforeEach(() => {
    vi.useFakeTimers();
    evaluated.length = 0;
    seen = [];
    inputs = new Subject();
    judgements(inputs, engine).subscribe((judgement) => seen.push(judgement));
  });
  afterEach(() => {
    vi.useRealTimers();
  });

  it('gives the verdicts at once and the window later', () => {
    inputs.next(withRb(620));
    expect(seen.map((judgement) => judgement.sizing)).toEqual([null]);
    vi.advanceTimersByTime(500);
    expect(seen.map((judgement) => judgement.sizing)).toEqual([null, sizing]);
  });

  it('judges each keystroke of a burst and sizes the last', () => {
    for (const valueOhm of [6, 62, 620]) inputs.next(withRb(valueOhm));
    vi.advanceTimersByTime(1000);
    expect(evaluated).toEqual([6, 62, 620]);
    const sized = seen.filter((judgement) => judgement.sizing !== null);
    expect(sized.map(({ input }) => input.baseResistor.valueOhm)).toEqual([620]);
  });

  it('drops the window of a state that is no longer there', () => {
    inputs.next(withRb(620));
    vi.advanceTimersByTime(150);
    inputs.next(withRb(680));
    vi.advanceTimersByTime(1000);
    const sized = seen.filter((judgement) => judgement.sizing !== null);
    expect(sized.map(({ input }) => input.baseResistor.valueOhm)).toEqual([680]);
  });

  it('judges an open resistor at the recommended value', () => {
    inputs.next(withRb(null));
    vi.advanceTimersByTime(1000);
    expect(evaluated).toEqual([620]);
    expect(seen.at(-1)?.input.baseResistor.valueOhm).toBeNull();
  });
});

describe('DraftHistory', () => {
  const draft = (title: string) => {
    const base = draftOf(revision);
    return { ...base, definition: { ...base.definition, title } };
  };

  it('undoes and redoes a hundred steps to the same text', () => {
    const history = new DraftHistory();
    history.start(draft('0'));
    for (let step = 1; step <= 100; step++) history.record(draft(String(step)), '', step);
    const back = Array.from({ length: 100 }, () => history.undo()?.definition.title);
    expect(back.at(0)).toBe('99');
    expect(back.at(-1)).toBe('0');
    expect(history.undo()).toBeNull();
    const forth = Array.from({ length: 100 }, () => history.redo()?.definition.title);
    expect(forth.at(-1)).toBe('100');
  });

  it('makes one step of what is typed into one field without a pause', () => {
    const history = new DraftHistory();
    history.start(draft(''));
    history.record(draft('a'), 'title', 1000);
    history.record(draft('ab'), 'title', 1200);
    history.record(draft('abc'), 'title', 3000);
    expect(history.undo()?.definition.title).toBe('ab');
    expect(history.undo()?.definition.title).toBe('');
  });

  it('forgets what was undone once something new is done', () => {
    const history = new DraftHistory();
    history.start(draft('a'));
    history.record(draft('b'), '', 1);
    history.undo();
    history.record(draft('c'), '', 2);
    expect(history.redo()).toBeNull();
  });
});
