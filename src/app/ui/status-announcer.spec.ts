import { LiveAnnouncer } from '@angular/cdk/a11y';
import { TestBed } from '@angular/core/testing';
import { StatusAnnouncer } from './status-announcer.ts';

describe('StatusAnnouncer', () => {
  it('says the first and the last message of a burst, one a second', () => {
    vi.useFakeTimers();
    const announce = vi.spyOn(TestBed.inject(LiveAnnouncer), 'announce').mockResolvedValue();
    const status = TestBed.inject(StatusAnnouncer);
    for (const message of ['one', 'two', 'three']) status.say(message);
    vi.advanceTimersByTime(1100);
    expect(announce.mock.calls.map(([message]) => message)).toEqual(['one', 'three']);
    vi.useRealTimers();
  });
});
