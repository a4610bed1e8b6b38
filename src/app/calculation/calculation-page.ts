import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  Injector,
  input,
  resource,
  signal,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { downloadCalculation } from '../../../shared/contract/calculation.ts';
import { readProject } from '../../../shared/contract/project.ts';
import { readRevision } from '../../../shared/contract/revision.ts';
import { address } from '../../../shared/contract/route.ts';
import { PRE } from '../../../shared/checks/criteria.ts';
import { calculationSheet } from '../../../shared/report/calculation-sheet.ts';
import {
  cornerHeading,
  cornerReference,
  cornerSentence,
  criterionHeading,
  criterionSentence,
} from '../../../shared/report/calculation-text.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { FileDownload } from '../api/file-download.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { VerdictMark } from '../ui/verdict-mark.ts';
import { CalculationHeader } from './calculation-header.ts';
import { CalculationLines } from './calculation-lines.ts';
import { CalculationTitleBlock } from './calculation-title-block.ts';
import { headOf } from './calculation-head.ts';

/** The worked calculation of a revision: to follow on screen, to print, and as PDF. */
@Component({
  selector: 'app-calculation-page',
  imports: [
    CalculationHeader,
    CalculationLines,
    CalculationTitleBlock,
    Icon,
    LoadState,
    MatButton,
    NotAllowed,
    RouterLink,
    SymbolText,
    VerdictMark,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './calculation-page.html',
  styleUrl: './calculation-page.scss',
  host: { class: 'page' },
})
export class CalculationPage {
  private readonly api = inject(ApiClient);
  private readonly files = inject(FileDownload);
  private readonly announcer = inject(StatusAnnouncer);
  private readonly injector = inject(Injector);
  private readonly fragment = toSignal(inject(ActivatedRoute).fragment);

  readonly revisionId = input.required<string>();

  protected readonly answer = resource({
    params: () => this.revisionId(),
    loader: async ({ params: revisionId }) => {
      const { value: revision } = await this.api.send(readRevision, { params: { revisionId } });
      const params = { projectId: revision.projectId };
      const { value: project } = await this.api.send(readProject, { params });
      return { revision, head: headOf(revision, project) };
    },
  });
  protected readonly loaded = computed(() =>
    this.answer.hasValue() ? this.answer.value() : undefined,
  );
  protected readonly sheet = computed(() => {
    const revision = this.loaded()?.revision;
    const rbOhm = revision?.evaluation.baseResistorOhm ?? null;
    return revision === undefined || rbOhm === null
      ? null
      : calculationSheet(revision.definition, rbOhm);
  });
  protected readonly criteria = computed(() =>
    (this.sheet()?.criteria ?? []).map((block) => ({
      id: block.criterion.id,
      status: block.criterion.status,
      name: criterionHeading(block),
      sentence: criterionSentence(block),
      method: block.criterion.id.replace(PRE, ''),
      corner: block.corner,
      reference: cornerReference(block),
      lines: block.lines,
    })),
  );
  protected readonly corners = computed(() =>
    (this.sheet()?.corners ?? []).map((block) => ({
      id: `corner-${block.letter}`,
      name: cornerHeading(block),
      sentence: cornerSentence(block),
      lines: block.lines,
    })),
  );
  protected readonly busy = signal(false);
  protected readonly outcome = signal('');

  constructor() {
    usePageTrail(() => {
      const revision = this.loaded()?.revision;
      if (revision === undefined) return [];
      const { projectId, projectCode, projectTitle, stageId, id, definition, letter } = revision;
      return [
        { text: 'Projects', link: ['/projects'] },
        { text: `${projectCode} ${projectTitle}`, link: ['/p', projectId] },
        {
          text: `${definition.reference} ${letter}`,
          link: ['/p', projectId, 's', stageId, 'r', id],
        },
        { text: 'Calculation' },
      ];
    });
    effect(() => {
      const id = this.fragment();
      if (!id || this.sheet() === null) return;
      afterNextRender(
        () => {
          this.show(id);
        },
        { injector: this.injector },
      );
    });
  }

  protected go(event: Event, id: string): void {
    event.preventDefault();
    this.show(id);
  }

  protected print(): void {
    window.print();
  }

  protected async download(): Promise<void> {
    this.busy.set(true);
    this.outcome.set('');
    try {
      const path = address(downloadCalculation.path, { revisionId: this.revisionId() });
      this.tell(`Saved ${await this.files.save(path)}.`);
    } catch (error) {
      this.tell(toApiProblem(error).detail);
    } finally {
      this.busy.set(false);
    }
  }

  private show(id: string): void {
    const target = document.getElementById(id);
    target?.scrollIntoView();
    target?.focus({ preventScroll: true });
  }

  private tell(message: string): void {
    this.outcome.set(message);
    this.announcer.say(message);
  }
}
