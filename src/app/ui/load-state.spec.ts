import { TestBed } from '@angular/core/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { signal } from '@angular/core';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatProgressBarHarness } from '@angular/material/progress-bar/testing';
import { ApiProblem } from '../api/api-problem.ts';
import { LoadState } from './load-state.ts';

describe('LoadState', () => {
  const create = async (error: Error | undefined) => {
    const reload = vi.fn(() => true);
    const fixture = TestBed.createComponent(LoadState);
    fixture.componentRef.setInput('resource', { error: signal(error), reload });
    fixture.componentRef.setInput('what', 'The project');
    await fixture.whenStable();
    return {
      reload,
      element: fixture.nativeElement as HTMLElement,
      loader: TestbedHarnessEnvironment.loader(fixture),
    };
  };

  it('shows a line while it loads', async () => {
    const { loader } = await create(undefined);
    expect(await loader.getAllHarnesses(MatProgressBarHarness)).toHaveLength(1);
  });

  it('says what failed, with the reference, and offers to try again', async () => {
    const problem = new ApiProblem('internal', 'Wrong', 'Something went wrong.', [], 'r-17');
    const { element, loader, reload } = await create(problem);
    expect(element.querySelector('[role=alert]')?.textContent).toContain(
      'The project could not be loaded',
    );
    expect(element.textContent).toContain('r-17');
    await (await loader.getHarness(MatButtonHarness)).click();
    expect(reload).toHaveBeenCalledOnce();
  });
});
