import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { changePerson, listPeople } from '../../../shared/contract/people.ts';
import { signOut } from '../../../shared/contract/session.ts';
import { ApiClient } from './api-client.ts';

const PERSON = {
  id: '0b7a1e0c-6d1f-4f27-9a39-0f5d6a4f2a11',
  name: 'A. Designer',
  email: 'designer@coldstore.example',
  administrator: false,
  state: 'active',
  createdAtMs: 1,
  lastSignInAtMs: null,
};

describe('ApiClient', () => {
  let api: ApiClient;
  let http: HttpTestingController;

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting()],
    });
    api = TestBed.inject(ApiClient);
    http = TestBed.inject(HttpTestingController);
  });

  afterEach(() => {
    http.verify();
  });

  it('fills the address, sends If-Match with the body and hands back the parsed reply and its ETag', async () => {
    const answer = api.send(changePerson, {
      params: { personId: PERSON.id },
      body: { disabled: true },
      etag: '"7"',
    });
    const call = http.expectOne(`/api/people/${PERSON.id}`);
    expect(call.request.method).toBe('PATCH');
    expect(call.request.headers.get('If-Match')).toBe('"7"');
    expect(call.request.body).toEqual({ disabled: true });
    call.flush({ ...PERSON, secret: 'dropped' }, { headers: { ETag: '"8"' } });
    expect(await answer).toEqual({ value: PERSON, etag: '"8"' });
  });

  it('answers null where the route has no reply', async () => {
    const answer = api.send(signOut);
    http
      .expectOne({ method: 'DELETE', url: '/api/session' })
      .flush(null, { status: 204, statusText: '' });
    expect((await answer).value).toBeNull();
  });

  it('turns a problem document into an ApiProblem with its fields', async () => {
    const answer = api.send(listPeople);
    http.expectOne('/api/people').flush(
      {
        type: 'about:blank',
        title: 'Not permitted',
        status: 403,
        code: 'not-permitted',
        detail: 'Only an administrator sees the accounts.',
        reference: 'r-3',
        errors: [{ pointer: '/name', message: 'expected a name' }],
      },
      { status: 403, statusText: 'Forbidden' },
    );
    await expect(answer).rejects.toMatchObject({
      code: 'not-permitted',
      detail: 'Only an administrator sees the accounts.',
      reference: 'r-3',
      errors: [{ pointer: '/name', message: 'expected a name' }],
    });
  });

  it('says so when the server cannot be reached', async () => {
    const answer = api.send(listPeople);
    http.expectOne('/api/people').error(new ProgressEvent('error'));
    await expect(answer).rejects.toMatchObject({ code: 'unreachable' });
  });

  it('refuses a reply the contract does not know', async () => {
    const answer = api.send(listPeople);
    http.expectOne('/api/people').flush({ people: [{ id: 1 }] });
    await expect(answer).rejects.toMatchObject({ code: 'unknown-answer' });
  });
});
