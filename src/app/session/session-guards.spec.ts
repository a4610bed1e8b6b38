import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { administratorGuard, signedInGuard, signedOutGuard } from './session-guards.ts';
import { SessionStore } from './session-store.ts';

@Component({ selector: 'app-empty', changeDetection: ChangeDetectionStrategy.OnPush, template: '' })
class Empty {}

const person = (administrator: boolean) => ({
  id: '0b7a1e0c-6d1f-4f27-9a39-0f5d6a4f2a11',
  name: 'A. Designer',
  email: 'designer@coldstore.example',
  administrator,
});

describe('session guards', () => {
  const urlAfter = async (url: string, session: object) => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([
          { path: 'sign-in', canActivate: [signedOutGuard], component: Empty },
          { path: 'set-up', canActivate: [signedOutGuard], component: Empty },
          { path: 'desk', canActivate: [signedInGuard], component: Empty },
          { path: 'admin', canActivate: [signedInGuard, administratorGuard], component: Empty },
        ]),
      ],
    });
    const loaded = TestBed.inject(SessionStore).load();
    TestBed.inject(HttpTestingController)
      .expectOne('/api/session')
      .flush({
        person: null,
        setupNeeded: false,
        workspace: 'W',
        demo: false,
        demoAccounts: [],
        idleEndsAtMs: null,
        ...session,
      });
    await loaded;
    await RouterTestingHarness.create(url);
    return TestBed.inject(Router).url;
  };

  it('send who is not signed in to the sign-in page, which knows the way back', async () => {
    expect(await urlAfter('/desk?view=all', {})).toBe('/sign-in?next=%2Fdesk%3Fview%3Dall');
  });

  it('send everybody to the set-up page while there is no administrator, and nobody afterwards', async () => {
    expect(await urlAfter('/desk', { setupNeeded: true })).toBe('/set-up');
    TestBed.resetTestingModule();
    expect(await urlAfter('/set-up', {})).toBe('/sign-in');
  });

  it('keep signed-in people off the sign-in page, and others than administrators off administration', async () => {
    expect(await urlAfter('/sign-in', { person: person(false) })).toBe('/desk');
    TestBed.resetTestingModule();
    expect(await urlAfter('/admin', { person: person(false) })).toBe('/desk');
    TestBed.resetTestingModule();
    expect(await urlAfter('/admin', { person: person(true) })).toBe('/admin');
  });
});
