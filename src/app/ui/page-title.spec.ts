import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, TitleStrategy } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { PageFocus, PageHeading } from './page-focus.ts';
import { PageTitle, usePageTrail } from './page-title.ts';

const code = signal<string | null>(null);

@Component({
  selector: 'app-record',
  imports: [PageHeading],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: '<h1 appPageHeading>Record</h1>',
})
class RecordPage {
  constructor() {
    usePageTrail(() => {
      const text = code();
      return text === null ? [] : [{ text: 'Projects', link: ['/projects'] }, { text }];
    });
  }
}

@Component({
  selector: 'app-plain',
  imports: [PageHeading],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: '<h1 appPageHeading>Plain</h1>',
})
class PlainPage {}

describe('the title of a page', () => {
  beforeEach(() => {
    code.set(null);
    TestBed.configureTestingModule({
      providers: [
        provideRouter([
          { path: 'plain', title: 'Plain', component: PlainPage },
          { path: 'record', title: 'Project', component: RecordPage },
        ]),
        { provide: TitleStrategy, useExisting: PageTitle },
      ],
    });
    TestBed.inject(PageFocus);
  });

  it('is that of the route until the page knows its names, then what - where - product', async () => {
    const harness = await RouterTestingHarness.create('/record');
    expect(document.title).toBe('Project - Sinkwell');
    code.set('CR-40 Cold-room controller');
    await harness.fixture.whenStable();
    expect(document.title).toBe('CR-40 Cold-room controller - Projects - Sinkwell');
  });

  it('goes with its page', async () => {
    code.set('CR-40');
    const harness = await RouterTestingHarness.create('/record');
    await harness.navigateByUrl('/plain');
    await harness.fixture.whenStable();
    expect(document.title).toBe('Plain - Sinkwell');
  });

  it('takes focus to the heading after a change of page, but not on the first page or for a query', async () => {
    const harness = await RouterTestingHarness.create('/plain');
    document.body.append(harness.fixture.nativeElement as Node);
    expect(document.activeElement?.tagName).not.toBe('H1');
    await harness.navigateByUrl('/record');
    await harness.fixture.whenStable();
    expect(document.activeElement?.textContent).toBe('Record');
    (document.activeElement as HTMLElement).blur();
    await harness.navigateByUrl('/record?search=x');
    await harness.fixture.whenStable();
    expect(document.activeElement?.tagName).not.toBe('H1');
  });
});
