import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { provideZonelessChangeDetection } from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { provideRouter } from '@angular/router';
import type { Revision } from '../../../shared/contract/revision.ts';
import { LockPage } from './lock-page.ts';
import { CHECKED, HASH, IN_CHECK, LOCKED, REVISION_ID } from './review-fixture.ts';

const AT = `/api/revisions/${REVISION_ID}`;

// Rendering takes long on a busy machine.
vi.setConfig({ testTimeout: 30_000 });

describe('lock page', () => {
  let fixture: ComponentFixture<LockPage>;
  let server: HttpTestingController;

  async function open(revision: Revision) {
    TestBed.configureTestingModule({
      providers: [
        provideZonelessChangeDetection(),
        provideRouter([]),
        provideHttpClient(),
        provideHttpClientTesting(),
      ],
    });
    server = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(LockPage);
    fixture.componentRef.setInput('revisionId', REVISION_ID);
    TestBed.tick();
    server.expectOne(AT).flush(revision, { headers: { ETag: '"7"' } });
    await vi.waitFor(() => {
      expect(page().querySelector('app-review-strip')).not.toBeNull();
    }, 10_000);
  }

  const page = () => fixture.nativeElement as HTMLElement;
  const text = () => page().textContent.replace(/\s+/g, ' ');
  const button = (words: string | RegExp) =>
    TestbedHarnessEnvironment.loader(fixture).getHarness(MatButtonHarness.with({ text: words }));

  it('shows who, what, hash and meaning, and locks with the password and the hash shown', async () => {
    await open(CHECKED);
    const preview = await vi.waitFor(() => server.expectOne(`${AT}/lock`), 10_000);
    preview.flush({ meaning: 'I release Q7 B.', hash: HASH, recomputed: true });
    await fixture.whenStable();
    for (const words of [
      'I release Q7 B.',
      '01234567',
      'A. Designer',
      'B. Checker',
      'Lock revision B',
    ]) {
      expect(text()).toContain(words);
    }
    await (await button('Sign and lock B')).click();
    server.verify();
    const field = page().querySelector<HTMLInputElement>('#signature-password')!;
    field.value = 'a long password';
    field.dispatchEvent(new Event('input'));
    await (await button('Sign and lock B')).click();
    const call = await vi.waitFor(
      () => server.expectOne({ method: 'POST', url: `${AT}/lock` }),
      10_000,
    );
    expect(call.request.body).toEqual({ password: 'a long password', hash: HASH });
    expect(call.request.headers.get('If-Match')).toBe('"7"');
    call.flush(LOCKED, { headers: { ETag: '"8"' } });
    await vi.waitFor(() => {
      expect(text()).toContain('Revision B is locked');
    }, 10_000);
  });

  it('tells who may not lock why, and asks no password', async () => {
    await open(IN_CHECK);
    expect(text()).toContain('You cannot lock it: The revision is in check.');
    expect(page().querySelectorAll('input')).toHaveLength(0);
  });

  it('verifies a locked revision and names what differs', async () => {
    await open(LOCKED);
    expect(page().querySelectorAll('input, textarea, select')).toHaveLength(0);
    await (await button('Verify')).click();
    const call = await vi.waitFor(() => server.expectOne(`${AT}/verification`), 10_000);
    call.flush({
      whole: false,
      storedHash: HASH,
      recomputedHash: HASH,
      differences: ['criterion forced-beta: 8.9 stored, 9.1 recomputed'],
    });
    await vi.waitFor(() => {
      expect(text()).toContain('Not whole');
    }, 10_000);
    expect(text()).toContain('8.9 stored, 9.1 recomputed');
  });
});
