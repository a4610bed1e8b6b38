import { EMPTY_CHECK, mergeDrafts, sameDraft, type CheckDraft } from './check-draft.ts';

const base: CheckDraft = { ...EMPTY_CHECK, note: 'first', read: ['a', 'b'] };

describe('merge of two checkers’ drafts', () => {
  it('keeps what one typed and takes the rest from the newer version', () => {
    const mine = { ...base, note: 'mine', justifications: { x: 'my words' } };
    const theirs: CheckDraft = { ...base, method: 'bench', justifications: { y: 'their words' } };
    expect(mergeDrafts(base, mine, theirs)).toMatchObject({
      note: 'mine',
      method: 'bench',
      justifications: { x: 'my words', y: 'their words' },
    });
  });

  it('keeps ticks of both and takes away only what one unticked oneself', () => {
    const mine = { ...base, read: ['b', 'c'] };
    const theirs = { ...base, read: ['a', 'b', 'd'] };
    expect(mergeDrafts(base, mine, theirs).read.sort()).toEqual(['b', 'c', 'd']);
  });

  it('does not count spaces or the order of ticks as a change', () => {
    expect(sameDraft(base, { ...base, note: ' first ', read: ['b', 'a'] })).toBe(true);
    expect(sameDraft(base, { ...base, justifications: { x: ' ' } })).toBe(true);
    expect(sameDraft(base, { ...base, read: ['a'] })).toBe(false);
  });
});
