import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { provideZonelessChangeDetection } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { draftOf, type Draft } from './draft.ts';
import { AUTOSAVE_MS, RETRY_MS, SaveQueue } from './save-queue.ts';
import { draftRevision } from './testing/stage-samples.ts';

const revision = draftRevision();
const titled = (title: string): Draft => {
  const draft = draftOf(revision);
  return { ...draft, definition: { ...draft.definition, title } };
};

describe('SaveQueue', () => {
  let http: HttpTestingController;
  let queue: SaveQueue;
  const adopted: string[] = [];
  const answer = (title: string, etag: string) => {
    const request = http.expectOne({ method: 'PUT' });
    request.flush(
      { ...revision, definition: titled(title).definition, savedAtMs: 5 },
      { headers: { ETag: etag } },
    );
    return request.request;
  };
  const problem = (code: string, status: number) => ({
    body: { type: 't', title: 't', status, code, detail: 'd', reference: 'r' },
    options: { status, statusText: 'x' },
  });

  beforeEach(() => {
    vi.useFakeTimers();
    adopted.length = 0;
    TestBed.configureTestingModule({
      providers: [
        provideZonelessChangeDetection(),
        provideHttpClient(),
        provideHttpClientTesting(),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    queue = TestBed.runInInjectionContext(
      () => new SaveQueue((saved) => adopted.push(saved.definition.title)),
    );
    queue.start(revision.id, '"1"', draftOf(revision), 1);
  });
  afterEach(() => {
    queue.stop();
    http.verify();
    vi.useRealTimers();
  });

  it('saves once, 800 ms after the last of several changes, with the ETag it read', async () => {
    queue.request(titled('One'));
    await vi.advanceTimersByTimeAsync(AUTOSAVE_MS - 1);
    queue.request(titled('Two'));
    await vi.advanceTimersByTimeAsync(AUTOSAVE_MS - 1);
    http.expectNone({ method: 'PUT' });
    expect(queue.state().kind).toBe('waiting');
    await vi.advanceTimersByTimeAsync(1);
    expect(queue.state().kind).toBe('saving');
    const request = answer('Two', '"2"');
    expect(request.headers.get('If-Match')).toBe('"1"');
    expect((request.body as Draft).definition.title).toBe('Two');
    await vi.advanceTimersByTimeAsync(0);
    expect(queue.state()).toEqual({ kind: 'saved', atMs: 5 });
    expect(queue.etag).toBe('"2"');
    expect(adopted).toEqual(['Two']);
  });

  it('sends what was typed while a save was under way in a second one', async () => {
    queue.request(titled('One'));
    await vi.advanceTimersByTimeAsync(AUTOSAVE_MS);
    queue.request(titled('Two'));
    answer('One', '"2"');
    await vi.advanceTimersByTimeAsync(0);
    expect(queue.unsent()).toBe(true);
    await vi.advanceTimersByTimeAsync(AUTOSAVE_MS);
    expect(answer('Two', '"3"').headers.get('If-Match')).toBe('"2"');
    await vi.advanceTimersByTimeAsync(0);
    expect(queue.unsent()).toBe(false);
  });

  it('says so when the server cannot be reached, and tries again', async () => {
    queue.request(titled('One'));
    await vi.advanceTimersByTimeAsync(AUTOSAVE_MS);
    http.expectOne({ method: 'PUT' }).error(new ProgressEvent('error'));
    await vi.advanceTimersByTimeAsync(0);
    expect(queue.state().kind).toBe('retrying');
    await vi.advanceTimersByTimeAsync(RETRY_MS);
    answer('One', '"2"');
    await vi.advanceTimersByTimeAsync(0);
    expect(queue.state().kind).toBe('saved');
  });

  it('stops at a conflict, keeps the draft, and saves the resolved one over theirs', async () => {
    queue.request(titled('Mine'));
    await vi.advanceTimersByTimeAsync(AUTOSAVE_MS);
    const { body, options } = problem('version-conflict', 412);
    http.expectOne({ method: 'PUT' }).flush(body, options);
    await vi.advanceTimersByTimeAsync(0);
    expect(queue.state().kind).toBe('conflict');
    queue.request(titled('Mine, more'));
    await vi.advanceTimersByTimeAsync(10 * AUTOSAVE_MS);
    http.expectNone({ method: 'PUT' });
    const done = queue.resolve('"7"', titled('Theirs'), titled('Both'));
    await vi.advanceTimersByTimeAsync(0);
    expect(answer('Both', '"8"').headers.get('If-Match')).toBe('"7"');
    await done;
    expect(queue.state().kind).toBe('saved');
  });

  it('does not try again what the server refuses', async () => {
    queue.request(titled('One'));
    await vi.advanceTimersByTimeAsync(AUTOSAVE_MS);
    const { body, options } = problem('invalid-input', 422);
    http.expectOne({ method: 'PUT' }).flush(body, options);
    await vi.advanceTimersByTimeAsync(10 * RETRY_MS);
    expect(queue.state().kind).toBe('refused');
    expect(queue.unsent()).toBe(true);
  });

  it('sends nothing when the draft is back where it was', async () => {
    queue.request(titled('One'));
    queue.request(draftOf(revision));
    await vi.advanceTimersByTimeAsync(AUTOSAVE_MS);
    http.expectNone({ method: 'PUT' });
    expect(queue.state().kind).toBe('saved');
  });
});
