import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { provideRouter, Router } from '@angular/router';
import { SessionStore } from './session-store.ts';
import { SignIn } from './sign-in.ts';

const SESSION = {
  person: null,
  setupNeeded: false,
  workspace: 'Coldstore Controls',
  demo: true,
  demoAccounts: [
    { email: 'checker@coldstore.example', password: 'a long demo password', does: 'Checks' },
  ],
  idleEndsAtMs: null,
};
const PERSON = {
  id: '0b7a1e0c-6d1f-4f27-9a39-0f5d6a4f2a11',
  name: 'B. Checker',
  email: 'checker@coldstore.example',
  administrator: false,
};

describe('SignIn', () => {
  const create = async (next?: string) => {
    TestBed.configureTestingModule({
      providers: [provideRouter([]), provideHttpClient(), provideHttpClientTesting()],
    });
    const http = TestBed.inject(HttpTestingController);
    const loaded = TestBed.inject(SessionStore).load();
    http.expectOne({ method: 'GET', url: '/api/session' }).flush(SESSION);
    await loaded;
    const go = vi.spyOn(TestBed.inject(Router), 'navigateByUrl').mockResolvedValue(true);
    const fixture = TestBed.createComponent(SignIn);
    fixture.componentRef.setInput('next', next);
    await fixture.whenStable();
    const loader = TestbedHarnessEnvironment.loader(fixture);
    const element = fixture.nativeElement as HTMLElement;
    return { fixture, http, go, loader, element };
  };
  const fill = async ({ loader }: Awaited<ReturnType<typeof create>>) => {
    const [email, password] = await loader.getAllHarnesses(MatInputHarness);
    await email!.setValue('checker@coldstore.example');
    await password!.setValue('a long demo password');
  };

  it('names the workspace', async () => {
    const { element } = await create();
    expect(element.querySelector('h1')?.textContent).toBe('Sign in');
    expect(element.textContent).toContain('Coldstore Controls, demo workspace');
  });

  it('signs in and goes to the page one came for', async () => {
    const page = await create('/p/1/stages?state=draft');
    await fill(page);
    await (await page.loader.getHarness(MatButtonHarness.with({ text: 'Sign in' }))).click();
    const call = page.http.expectOne({ method: 'POST', url: '/api/session' });
    expect(call.request.body).toEqual({
      email: 'checker@coldstore.example',
      password: 'a long demo password',
    });
    call.flush({ ...SESSION, person: PERSON, idleEndsAtMs: 1 });
    await vi.waitFor(() => {
      expect(page.go).toHaveBeenCalledWith('/p/1/stages?state=draft');
    });
  });

  it.each(['https://elsewhere.example', '//elsewhere.example', '/\\elsewhere.example'])(
    'refuses to lead to %s',
    async (next) => {
      const page = await create(next);
      await fill(page);
      await (await page.loader.getHarness(MatButtonHarness.with({ text: 'Sign in' }))).click();
      page.http
        .expectOne({ method: 'POST', url: '/api/session' })
        .flush({ ...SESSION, person: PERSON, idleEndsAtMs: 1 });
      await vi.waitFor(() => {
        expect(page.go).toHaveBeenCalledWith('/desk');
      });
    },
  );

  it('names the field that is wrong and sends nothing', async () => {
    const page = await create();
    await (await page.loader.getHarness(MatButtonHarness.with({ text: 'Sign in' }))).click();
    page.http.expectNone({ method: 'POST', url: '/api/session' });
    expect(page.element.textContent).toContain('Expected an e-mail address such as');
  });

  it('says what the server says about wrong credentials', async () => {
    const page = await create();
    await fill(page);
    await (await page.loader.getHarness(MatButtonHarness.with({ text: 'Sign in' }))).click();
    page.http.expectOne({ method: 'POST', url: '/api/session' }).flush(
      {
        type: 'about:blank',
        title: 'E-mail or password is not right',
        status: 401,
        code: 'wrong-credentials',
        detail: 'E-mail or password is not right.',
        reference: 'r-1',
      },
      { status: 401, statusText: 'Unauthorized' },
    );
    await vi.waitFor(() => {
      expect(page.element.querySelector('[role=alert]')?.textContent).toBe(
        'E-mail or password is not right.',
      );
    });
  });

  it('signs in a demo account by one click', async () => {
    const page = await create();
    page.element.querySelector<HTMLButtonElement>('.demo button')!.click();
    await page.fixture.whenStable();
    const call = page.http.expectOne({ method: 'POST', url: '/api/session' });
    expect(call.request.body).toMatchObject({ email: 'checker@coldstore.example' });
  });
});
