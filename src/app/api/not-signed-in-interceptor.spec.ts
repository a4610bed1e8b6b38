import { HttpClient, provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { notSignedInInterceptor } from './not-signed-in-interceptor.ts';
import { SessionEnd } from './session-end.ts';

describe('notSignedInInterceptor', () => {
  const answer = (code: string) => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(withInterceptors([notSignedInInterceptor])),
        provideHttpClientTesting(),
      ],
    });
    let ended = 0;
    TestBed.inject(SessionEnd).events.subscribe(() => ended++);
    const failed = vi.fn();
    TestBed.inject(HttpClient).get('/api/desk').subscribe({ error: failed });
    TestBed.inject(HttpTestingController)
      .expectOne('/api/desk')
      .flush(
        { type: 'about:blank', title: '', status: 401, code, detail: '', reference: '' },
        { status: 401, statusText: 'Unauthorized' },
      );
    expect(failed).toHaveBeenCalledOnce();
    return ended;
  };

  it('announces the end of the session', () => {
    expect(answer('not-signed-in')).toBe(1);
  });

  it('keeps quiet about a wrong password, which is a matter of the form', () => {
    expect(answer('wrong-credentials')).toBe(0);
  });
});
