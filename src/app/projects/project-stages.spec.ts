import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import { MatMenuHarness } from '@angular/material/menu/testing';
import { MatSortHarness } from '@angular/material/sort/testing';
import { MatTableHarness } from '@angular/material/table/testing';
import {
  provideRouter,
  Router,
  withComponentInputBinding,
  withRouterConfig,
} from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { GENERAL_PRACTICE } from '../../../shared/stage/policy.ts';
import { ProjectPage } from './project-page.ts';
import { ProjectStages } from './project-stages.ts';

const id = (n: number) => `0b7a1e0c-6d1f-4f27-9a39-${String(n).padStart(12, '0')}`;
const PROJECT = id(1);
const { name, ...limits } = GENERAL_PRACTICE;

const project = {
  id: PROJECT,
  code: 'CR-40',
  title: 'Cold-room controller',
  supplementaryTitle: null,
  legalOwner: 'Coldstore Controls',
  department: null,
  policy: { id: id(2), name, version: 1, limits },
  unverifiedBlocksLock: false,
  members: [],
  counts: { draft: 1, 'in-check': 0, checked: 1, locked: 0, withdrawn: 0, superseded: 0 },
  ports: [],
  ownRoles: ['designer'],
  mayManage: false,
};
const row = (n: number, reference: string, state: string) => ({
  stageId: id(n),
  revisionId: id(n + 100),
  letter: 'A',
  state,
  reference,
  title: `Relay ${n}`,
  quantity: 1,
  topology: 'low-side-npn',
  loadKind: 'coil',
  loadText: 'Coil, 1.44 kΩ',
  transistor: '2N3904',
  baseResistorOhm: 620,
  overdriveFactor: 5.731,
  vceSatV: 0.2447,
  powerW: 0.01,
  verdict: 'marginal',
  least: { criterionId: 'load-voltage', margin: 0.029 },
  unverified: false,
  partDataChanged: false,
  savedAtMs: 1,
});
const rows = {
  stages: [row(10, 'Q1', 'draft'), row(11, 'Q2', 'checked')],
  matching: 2,
  total: 2,
  superseded: 0,
  transistors: ['2N3904'],
  loads: ['coil'],
};

// Harnesses read a whole page cell by cell: slow on a busy machine.
describe('the stages of a project', { timeout: 30_000 }, () => {
  const open = async (query = '') => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter(
          [
            {
              path: 'p/:projectId',
              component: ProjectPage,
              children: [{ path: 'stages', component: ProjectStages }],
            },
          ],
          withComponentInputBinding(),
          withRouterConfig({ paramsInheritanceStrategy: 'always' }),
        ),
      ],
    });
    const http = TestBed.inject(HttpTestingController);
    // Not awaited yet: the page is stable only once its calls have been answered.
    const opening = RouterTestingHarness.create(`/p/${PROJECT}/stages${query}`);
    const flush = async (path: string, body: object) => {
      const call = await vi.waitFor(
        () => http.expectOne((request) => request.url.split('?')[0] === path),
        10_000,
      );
      call.flush(body);
      return call.request.urlWithParams;
    };
    await flush(`/api/projects/${PROJECT}`, project);
    const asked = await flush(`/api/projects/${PROJECT}/stages`, rows);
    const harness = await opening;
    await harness.fixture.whenStable();
    const loader = TestbedHarnessEnvironment.loader(harness.fixture);
    return { asked, flush, harness, loader, element: harness.fixture.nativeElement as HTMLElement };
  };

  it('show every figure with the same decimals all down its column', async () => {
    const { loader } = await open();
    const table = await loader.getHarness(MatTableHarness);
    const cells = await table.getCellTextByColumnName();
    expect(cells['overdriveFactor']?.text).toEqual(['5.73', '5.73']);
    expect(cells['vceSat']?.text).toEqual(['0.245', '0.245']);
    expect(cells['power']?.text).toEqual(['10.0', '10.0']);
    expect(cells['verdict']?.text).toEqual(['Marginal', 'Marginal']);
    expect(cells['state']?.text).toEqual(['Draft', 'Checked']);
  });

  it('ask the server for what the address says', async () => {
    const { asked } = await open('?search=relay&state=draft&sort=margin&direction=desc');
    expect(asked).toContain('search=relay');
    expect(asked).toContain('state=draft');
    expect(asked).toContain('sort=margin');
    expect(asked).toContain('direction=desc');
  });

  it('put filter and sort into the address', async () => {
    const { loader, flush } = await open();
    const menus = await loader.getAllHarnesses(MatMenuHarness);
    await menus[1]!.open();
    const filtering = menus[1]!.clickItem({ text: 'Marginal' });
    const filtered = await flush(`/api/projects/${PROJECT}/stages`, rows);
    await filtering;
    expect(filtered).toContain('verdict=marginal');
    const sort = await loader.getHarness(MatSortHarness);
    const [header] = await sort.getSortHeaders({ label: 'Title' });
    const sorting = header!.click();
    await flush(`/api/projects/${PROJECT}/stages`, rows);
    await sorting;
    expect(TestBed.inject(Router).url).toContain('verdict=marginal&sort=title');
  });

  it('say why a chosen stage cannot be submitted', async () => {
    const { loader, element, harness } = await open();
    const boxes = await loader.getAllHarnesses(MatCheckboxHarness);
    await boxes[2]!.check();
    await harness.fixture.whenStable();
    expect(element.querySelector('app-stage-selection')?.textContent).toContain(
      'Submit needs drafts; Q2 is not.',
    );
  });
});
