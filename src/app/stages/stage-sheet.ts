import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatMenuModule } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import type { PartKey } from '../../../shared/report/schematic/drawing.ts';
import { topologyName } from '../../../shared/report/schematic/schematic-name.ts';
import { toApiProblem, type ApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { StateChip } from '../ui/state-chip.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { PolicyDifferenceTable } from '../ui/policy-difference-table.ts';
import { StripCell, TitleStrip } from '../ui/title-strip.ts';
import { VerdictMark } from '../ui/verdict-mark.ts';
import { BrowserEngine } from './browser-engine.ts';
import { CircuitPanel } from './circuit-panel.ts';
import { CurvesPanel } from './curves/curves-panel.ts';
import { fieldId } from './field-row.ts';
import { FormPanel, mainField } from './form-panel.ts';
import { PartsForStage } from './parts-for-stage.ts';
import { SaveStatus } from './save-status.ts';
import { SheetActs } from './sheet-acts.ts';
import { SheetForm } from './sheet-form.ts';
import { sheetLayout } from './sheet-layout.ts';
import { SheetNotes } from './sheet-notes.ts';
import { StageStore } from './stage-store.ts';
import { submitNote } from './submit-note.ts';
import type { KeepsWork } from './unsaved-guard.ts';
import { VerdictPanel } from './verdict-panel.ts';
import { countWords, verdictSentence } from './verdict-words.ts';
import { WindowLadder } from './window-ladder.ts';

type Tab = 'circuit' | 'values' | 'verdicts' | 'charts';
const TABS: readonly (readonly [Tab, string])[] = [
  ['circuit', 'Circuit'],
  ['values', 'Values'],
  ['verdicts', 'Verdicts'],
  ['charts', 'Charts'],
];

/** The main screen: form, circuit, window and verdicts of one revision, side by side and live. */
@Component({
  selector: 'app-stage-sheet',
  imports: [
    CircuitPanel,
    CurvesPanel,
    FormPanel,
    Icon,
    MatButton,
    MatMenuModule,
    NotAllowed,
    PartsForStage,
    PolicyDifferenceTable,
    RouterLink,
    SaveStatus,
    SheetNotes,
    StateChip,
    StripCell,
    SymbolText,
    TitleStrip,
    VerdictMark,
    VerdictPanel,
    WindowLadder,
  ],
  providers: [BrowserEngine, SheetActs, SheetForm, StageStore],
  templateUrl: './stage-sheet.html',
  styleUrl: './stage-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    '[class]': 'layout()',
    '(document:keydown)': 'shortcut($event)',
    '(window:beforeunload)': 'beforeUnload($event)',
  },
})
export class StageSheet implements KeepsWork {
  readonly projectId = input.required<string>();
  readonly stageId = input.required<string>();
  readonly revisionId = input.required<string>();

  private readonly announcer = inject(StatusAnnouncer);
  protected readonly store = inject(StageStore);
  protected readonly acts = inject(SheetActs);
  protected readonly form = inject(SheetForm).form;

  protected readonly layout = sheetLayout();
  protected readonly tabs = TABS;
  protected readonly tab = signal<Tab>('circuit');
  protected readonly drawerOpen = signal(false);
  protected readonly selected = signal<PartKey | null>(null);
  protected readonly cornerAt = signal('overdrive-factor');
  protected readonly failure = signal<ApiProblem | null>(null);

  protected readonly view = computed(() => {
    const [revision, draft, evaluation] = [
      this.store.revision(),
      this.store.draft(),
      this.store.evaluation(),
    ];
    return revision === null || draft === null || evaluation === null
      ? null
      : { revision, draft, evaluation };
  });
  protected readonly topology = computed(() =>
    topologyName(this.view()?.draft.definition.topology ?? 'low-side-npn'),
  );
  protected readonly inUseOhm = computed(() => {
    const view = this.view();
    return view?.draft.definition.baseResistor.valueOhm ?? null;
  });
  protected readonly partData = computed(() => {
    const standing = this.store.revision()?.partStanding ?? [];
    const transistor = this.store.draft()?.parts.transistor ?? null;
    return {
      changed: standing.filter(({ revision, latestRevision }) => latestRevision > revision),
      verified: transistor !== null && standing.length > 0 && standing.every((p) => p.verified),
    };
  });
  protected readonly sentence = computed(() => {
    const evaluation = this.store.evaluation();
    return evaluation === null ? '' : verdictSentence(evaluation);
  });
  protected readonly counts = computed(() => countWords(this.store.evaluation()?.criteria ?? []));
  protected readonly note = computed(() => {
    const view = this.view();
    return view === null ? '' : submitNote(view.revision, view.evaluation);
  });
  protected readonly submitReason = computed(() => {
    const may = this.view()?.revision.may.submit;
    if (may?.allowed === false) return may.reason ?? 'Not possible now.';
    return this.store.faults().length > 0 ? 'Correct the marked fields first.' : null;
  });

  constructor() {
    usePageTrail(() => {
      const view = this.view();
      if (view === null) return [];
      const { projectId, projectCode, projectTitle } = view.revision;
      return [
        { text: 'Projects', link: ['/projects'] },
        { text: `${projectCode} ${projectTitle}`, link: ['/p', projectId] },
        { text: 'Stages', link: ['/p', projectId, 'stages'] },
        { text: view.draft.definition.reference },
      ];
    });
    effect(() => {
      const revisionId = this.revisionId();
      untracked(() => void this.load(revisionId));
    });
    effect(() => {
      if (this.store.saving.state().kind === 'conflict') untracked(() => void this.acts.resolve());
    });
    effect(() => {
      const evaluation = this.store.evaluation();
      if (evaluation !== null) this.announcer.say(`Verdict ${evaluation.verdict}`);
    });
  }

  async leaveUnsent(): Promise<boolean> {
    if (!this.store.editable()) return false;
    await this.store.saving.flush();
    return this.store.saving.unsent() || this.store.faults().length > 0;
  }

  /** A part chosen on the drawing: its field gets the focus. */
  protected choosePart(part: PartKey): void {
    this.selected.set(part);
    const stage = this.view()?.draft.definition;
    if (stage === undefined) return;
    const path = mainField(part, stage);
    if (this.layout() === 'medium') this.drawerOpen.set(true);
    setTimeout(() => {
      const picker = part === 'preDriver' ? 'pick-preDriver' : 'pick-transistor';
      const id = path === null ? picker : fieldId(path);
      document.getElementById(id)?.focus();
    });
  }

  /** Arrow keys move along the tabs (ARIA practice). */
  protected tabKey(event: KeyboardEvent): void {
    const step = { ArrowLeft: -1, ArrowRight: 1 }[event.key];
    if (step === undefined) return;
    const now = TABS.findIndex(([key]) => key === this.tab());
    const next = TABS[(now + step + TABS.length) % TABS.length]?.[0] ?? 'circuit';
    this.tab.set(next);
    document.getElementById(`tab-${next}`)?.focus();
  }

  protected takeValue(valueOhm: number): void {
    this.selected.set('baseResistor');
    this.acts.takeValue(valueOhm);
  }

  protected showCorner(criterionId: string): void {
    this.cornerAt.set(criterionId);
    if (this.layout() === 'phone') this.tab.set('circuit');
  }

  /** Ctrl+Z and Shift+Ctrl+Z; a field that is being typed into undoes its own text first. */
  protected shortcut(event: KeyboardEvent): void {
    if (!(event.ctrlKey || event.metaKey) || !this.store.editable()) return;
    const key = event.key.toLowerCase();
    const redo = (key === 'z' && event.shiftKey) || key === 'y';
    if (key !== 'z' && !redo) return;
    if (event.target instanceof HTMLTextAreaElement) return;
    event.preventDefault();
    if (redo) this.store.redo();
    else this.store.undo();
  }

  protected beforeUnload(event: BeforeUnloadEvent): void {
    if (this.store.editable() && this.store.saving.unsent()) event.preventDefault();
  }

  private async load(revisionId: string): Promise<void> {
    this.failure.set(null);
    try {
      await this.store.load(revisionId);
    } catch (error) {
      this.failure.set(toApiProblem(error));
    }
  }
}
