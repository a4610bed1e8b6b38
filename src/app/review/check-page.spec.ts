import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { provideZonelessChangeDetection } from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatButtonToggleHarness } from '@angular/material/button-toggle/testing';
import { provideRouter } from '@angular/router';
import type { Revision } from '../../../shared/contract/revision.ts';
import { CheckPage } from './check-page.ts';
import { CHECKER, IN_CHECK, permissions, REVISION_ID } from './review-fixture.ts';

const AT = `/api/revisions/${REVISION_ID}`;

// Autosave waits, and rendering takes long on a busy machine.
vi.setConfig({ testTimeout: 30_000 });

describe('check page', () => {
  let fixture: ComponentFixture<CheckPage>;
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
    fixture = TestBed.createComponent(CheckPage);
    fixture.componentRef.setInput('revisionId', REVISION_ID);
    TestBed.tick();
    server.expectOne(AT).flush(revision, { headers: { ETag: '"7"' } });
    await fixture.whenStable();
  }

  const page = () => fixture.nativeElement as HTMLElement;
  const text = () => page().textContent.replace(/\s+/g, ' ');
  const find = (selector: string) => page().querySelector<HTMLInputElement>(selector)!;

  async function type(selector: string, value: string) {
    const field = find(selector);
    field.value = value;
    field.dispatchEvent(new Event('input'));
    await fixture.whenStable();
  }

  it('shows each criterion with value, limit, margin and worst corner', async () => {
    await open(IN_CHECK);
    const rows = [...page().querySelectorAll('app-criteria-list tbody tr')].map((row) =>
      row.textContent.replace(/\s+/g, ' '),
    );
    expect(rows).toHaveLength(2);
    expect(rows[1]).toContain('Marginal');
    expect(rows[1]).toContain('21.37 V');
    expect(rows[1]).toContain('≥ 20.76 V');
    expect(rows[1]).toContain('2.9');
    expect(rows[1]).toContain('supply high, cold');
    server.verify();
  });

  it('asks a reason only where the own figure lies more than 5 % off', async () => {
    await open(IN_CHECK);
    await type('#own-figure', '5,55');
    expect(text()).toContain('Difference 3.1 %');
    expect(page().querySelector('#difference-reason')).toBeNull();
    await type('#own-figure', '5.0');
    expect(text()).toContain('Above 5 %');
    expect(find('#difference-reason')).not.toBeNull();
  });

  it('says why it cannot pass, and does not send a pass', async () => {
    await open(IN_CHECK);
    const loader = TestbedHarnessEnvironment.loader(fixture);
    const pass = await loader.getHarness(MatButtonHarness.with({ text: 'Pass' }));
    await pass.click();
    expect(await (await pass.host()).getAttribute('aria-describedby')).toBe('pass-reason');
    expect(find('#pass-reason').textContent).toContain('Pass opens once');
    server.verify();
  });

  it('saves what is entered under the ETag it read', async () => {
    await open(IN_CHECK);
    const loader = TestbedHarnessEnvironment.loader(fixture);
    await (await loader.getHarness(MatButtonToggleHarness.with({ text: 'Bench reading' }))).check();
    const call = await vi.waitFor(() => server.expectOne(`${AT}/check`), 10_000);
    expect(call.request.headers.get('If-Match')).toBe('"7"');
    expect(call.request.body).toMatchObject({ method: 'bench', overdriveFactor: null });
    const entered = call.request.body as object;
    const check = { ...entered, checker: CHECKER, savedAtMs: 1, difference: null, missing: [] };
    call.flush({ ...IN_CHECK, check }, { headers: { ETag: '"8"' } });
    await vi.waitFor(() => {
      expect(text()).toContain('Saved');
    }, 10_000);
  });

  it('keeps what was typed when somebody else saved first', async () => {
    await open(IN_CHECK);
    await type('#figure-note', 'my note');
    const call = await vi.waitFor(() => server.expectOne(`${AT}/check`), 10_000);
    const problem = {
      type: 'about:blank',
      title: 'Somebody else saved in the meantime',
      status: 412,
      code: 'version-conflict',
      detail: 'The revision moved on.',
      reference: 'r',
    };
    call.flush(problem, { status: 412, statusText: 'Precondition Failed' });
    await vi.waitFor(() => {
      expect(text()).toContain('Nothing you entered is lost');
    }, 10_000);
    const loader = TestbedHarnessEnvironment.loader(fixture);
    await (
      await loader.getHarness(MatButtonHarness.with({ text: /Load the newer version/ }))
    ).click();
    const check = {
      overdriveFactor: 5.6,
      method: 'hand',
      note: '',
      reason: '',
      justifications: {},
      read: [],
      checker: CHECKER,
      savedAtMs: 2,
      difference: null,
      missing: [],
    };
    server.expectOne(AT).flush({ ...IN_CHECK, check }, { headers: { ETag: '"9"' } });
    const again = await vi.waitFor(() => server.expectOne(`${AT}/check`), 10_000);
    expect(again.request.headers.get('If-Match')).toBe('"9"');
    expect(again.request.body).toMatchObject({
      note: 'my note',
      overdriveFactor: 5.6,
      method: 'hand',
    });
  });

  it('has no control to edit for who may not check, and says why', async () => {
    await open({
      ...IN_CHECK,
      may: permissions([], 'You worked on this revision; another person checks it.'),
    });
    expect(page().querySelectorAll('input, textarea, select')).toHaveLength(0);
    expect(text()).toContain('You worked on this revision');
  });
});
