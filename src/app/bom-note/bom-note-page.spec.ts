import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatSlideToggleHarness } from '@angular/material/slide-toggle/testing';
import { provideRouter, Router } from '@angular/router';
import {
  BOM_NOTE_FORMAT,
  type BomNote,
  type BomRevision,
} from '../../../shared/report/bom-note.ts';
import { BomNotePage } from './bom-note-page.ts';

const PROJECT = '6f0d0b4e-3c1d-4c58-9a53-0e3a4d1f9b77';
const STAGES = [
  '0b8e1c52-7a0e-4c43-9d0b-3f1f4b6c9a01',
  '1b8e1c52-7a0e-4c43-9d0b-3f1f4b6c9a02',
] as const;
const NOTE = '2b8e1c52-7a0e-4c43-9d0b-3f1f4b6c9a03';
const preview = `/api/projects/${PROJECT}/bom-note?unlocked=`;
const notes = `/api/projects/${PROJECT}/bom-notes`;

const revision = (index: 0 | 1, locked: boolean): BomRevision => ({
  revisionId: STAGES[index],
  stageId: STAGES[index],
  reference: `Q${index + 1}`,
  letter: 'A',
  title: 'Vent relay',
  quantity: 1,
  state: locked ? 'Locked' : 'Draft',
  locked,
  partDataChanged: false,
  verdict: 'pass',
  designer: 'A. Designer',
  checker: null,
  approver: null,
  signedAtMs: locked ? 0 : null,
  hash: locked ? '41d70b93c6f8' : null,
});

function note(released: boolean): BomNote {
  const revisions = released ? [revision(0, true)] : [revision(0, true), revision(1, false)];
  const designators = revisions.map(({ reference, locked }) => ({
    text: reference,
    flagged: !locked,
  }));
  return {
    format: BOM_NOTE_FORMAT,
    released,
    atMs: 0,
    issue: null,
    titleBlock: {
      projectCode: 'GH-12',
      legalOwner: 'Glasshouse Works',
      department: null,
      title: 'Vent controller',
      supplementaryTitle: null,
      creators: ['A. Designer'],
      checkers: [],
      approvers: [],
      documentType: 'BOM note',
      language: 'en',
    },
    counts: {
      stages: revisions.length,
      locked: 1,
      lines: 1,
      partsPerBoard: revisions.length,
      partsChanged: 0,
      partsUnverified: 0,
    },
    lines: [
      {
        line: 1,
        quantity: revisions.length,
        designators,
        description: 'Resistor',
        value: { min: 4700, max: 4700, unit: 'Ohm' },
        tolerance: 0.05,
        ratings: [{ value: 0.1, unit: 'W' }],
        package: null,
        partNumber: null,
        approvedSources: [],
        partRevision: null,
        unverified: false,
      },
    ],
    revisions,
    cautions: [{ text: 'Coils store energy.', flagged: false }],
    program: 'Sinkwell',
    contentHash: null,
  };
}

function answer(released: boolean) {
  const reason = released ? null : 'Not locked: Q2 A (Draft).';
  return {
    note: note(released),
    stages: STAGES.map((stageId, index) => ({
      stageId,
      reference: `Q${index + 1}`,
      title: 'Vent relay',
      revisionId: stageId,
      letter: 'A',
      state: index === 0 ? 'locked' : 'draft',
      chosen: index === 0 || !released,
      reason: index === 1 && released ? 'No revision of Q2 is locked.' : null,
    })),
    issue: { allowed: released, reason },
  };
}

describe('BomNotePage', { timeout: 20_000 }, () => {
  const open = async () => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    const fixture = TestBed.createComponent(BomNotePage);
    fixture.componentRef.setInput('projectId', PROJECT);
    const http = TestBed.inject(HttpTestingController);
    const reply = (url: string, body: object) =>
      vi.waitFor(() => {
        TestBed.tick();
        http.expectOne(url).flush(body);
      });
    const flush = async (url: string, body: object) => {
      await reply(url, body);
      await fixture.whenStable();
    };
    await reply(`${preview}false`, answer(true));
    await flush(notes, { notes: [] });
    return {
      flush,
      http,
      text: () => (fixture.nativeElement as HTMLElement).textContent.replace(/\s+/g, ' '),
      loader: TestbedHarnessEnvironment.loader(fixture),
      root: TestbedHarnessEnvironment.documentRootLoader(fixture),
    };
  };

  it('shows the note of the locked stages as a sheet, and why a stage is not on it', async () => {
    const { loader, text } = await open();
    expect(text()).toContain('4.7 kΩ');
    expect(text()).toContain('±5 %, 0.1 W');
    expect(text()).toContain('No revision of Q2 is locked.');
    expect(text()).not.toContain('NOT RELEASED');
    const [, second] = await loader.getAllHarnesses(MatCheckboxHarness);
    expect(await second?.isDisabled()).toBe(true);
  });

  it('says NOT RELEASED with unlocked stages, and why it cannot be issued', async () => {
    const { flush, loader, text } = await open();
    const toggle = await loader.getHarness(MatSlideToggleHarness);
    // the click settles only after its request is answered
    await Promise.all([toggle.check(), flush(`${preview}true`, answer(false))]);
    expect(text()).toContain('NOT RELEASED, preview only');
    expect(text()).toContain('Not locked: Q2 A (Draft).');
    const button = await loader.getHarness(MatButtonHarness.with({ text: /Issue note/ }));
    expect(await (await button.host()).getAttribute('aria-disabled')).toBe('true');
  });

  it('asks for the note without a stage that was taken off', async () => {
    const { flush, loader, text } = await open();
    const [first] = await loader.getAllHarnesses(MatCheckboxHarness);
    const url = `${preview}false&without=${STAGES[0]}`;
    await Promise.all([first?.uncheck(), flush(url, answer(true))]);
    expect(text()).toContain('BOM note');
  });

  it('issues just the revisions on show after one more question, and goes to the note', async () => {
    const { http, loader, root } = await open();
    const navigate = vi.spyOn(TestBed.inject(Router), 'navigate').mockResolvedValue(true);
    await (await loader.getHarness(MatButtonHarness.with({ text: /Issue note/ }))).click();
    const dialog = await root.getHarness(MatDialogHarness);
    await (await dialog.getHarness(MatButtonHarness.with({ text: /Issue note/ }))).click();
    await vi.waitFor(() => {
      const request = http.expectOne({ method: 'POST', url: notes });
      expect(request.request.body).toEqual({ revisionIds: [STAGES[0]] });
      request.flush({
        id: NOTE,
        projectId: PROJECT,
        note: note(true),
        intact: true,
        download: { allowed: true, reason: null },
      });
    });
    await vi.waitFor(() => {
      expect(navigate).toHaveBeenCalledWith(['/p', PROJECT, 'bom-note', NOTE]);
    });
  });
});
