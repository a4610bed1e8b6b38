import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { DeskPage } from './desk-page.ts';

const id = (n: number) => `0b7a1e0c-6d1f-4f27-9a39-${String(n).padStart(12, '0')}`;
const item = (n: number, reference: string, note: string | null) => ({
  revisionId: id(n),
  stageId: id(n + 1),
  projectId: id(n + 2),
  projectCode: 'CR-40',
  projectTitle: 'Cold-room controller',
  reference,
  letter: 'B',
  title: 'Humidifier valve',
  state: 'in-check',
  verdict: 'marginal',
  least: { criterionId: 'load-voltage', margin: 0.029 },
  sinceMs: 0,
  from: 'A. Designer',
  note,
});
const desk = {
  groups: [
    { kind: 'to-check', items: [item(10, 'Q6', null), item(20, 'Q5', 'half done, 12 of 21')] },
    { kind: 'own-drafts', items: [] },
  ],
  waitingForOthers: [item(30, 'Q9', null)],
  activity: [],
  month: { checksDone: 11, returned: 3, largestDifference: null, medianHoursToCheck: 26 },
};

describe('My desk', () => {
  const open = async (view?: string, body: object = desk) => {
    TestBed.configureTestingModule({
      providers: [provideRouter([]), provideHttpClient(), provideHttpClientTesting()],
    });
    const fixture = TestBed.createComponent(DeskPage);
    fixture.componentRef.setInput('view', view);
    fixture.detectChanges();
    const http = TestBed.inject(HttpTestingController);
    (await vi.waitFor(() => http.expectOne('/api/desk'), 10_000)).flush(body);
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  };

  it('leads each waiting thing to where it is done, and fills the first act only', async () => {
    const page = await open();
    expect(page.textContent).toContain('Two things wait for you.');
    const acts = [...page.querySelectorAll<HTMLAnchorElement>('li a')];
    expect(acts.map((act) => act.getAttribute('href')?.split('/').at(-1))).toEqual([
      'check',
      'check',
    ]);
    expect(acts.map((act) => act.textContent.trim())).toEqual([
      'Start check Q6 B',
      'Continue Q5 B',
    ]);
    expect(page.querySelectorAll('.mat-mdc-unelevated-button')).toHaveLength(1);
  });

  it('tells the least margin, how far a check has come, and leaves empty groups out', async () => {
    const page = await open();
    expect(page.textContent).toContain('least 2.9\u00a0%, coil voltage');
    expect(page.textContent).toContain('half done, 12 of 21');
    expect(page.textContent).not.toContain('My own drafts');
  });

  it('shows what waits for others when asked', async () => {
    const page = await open('others');
    expect([...page.querySelectorAll('.reference')].map((each) => each.textContent)).toEqual([
      'Q9',
    ]);
  });

  it('says so when nothing waits', async () => {
    const page = await open(undefined, { ...desk, groups: [] });
    expect(page.querySelector('app-empty-state')?.textContent).toContain('Nothing waits for you');
  });
});
