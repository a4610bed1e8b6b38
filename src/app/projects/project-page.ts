import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog, MatDialogConfig } from '@angular/material/dialog';
import { MatTabsModule } from '@angular/material/tabs';
import { RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import type { PortVerdict } from '../../../shared/contract/project.ts';
import { formatPercent } from '../../../shared/units/engineering-notation.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { QuantityText } from '../ui/quantity-text.ts';
import { StripCell, TitleStrip } from '../ui/title-strip.ts';
import { VerdictMark } from '../ui/verdict-mark.ts';
import { ProjectStore } from './project-store.ts';
import { StateCounts } from './state-counts.ts';
import { countsText, stageCount } from './state-counts-text.ts';
import { StageList } from './stage-list-store.ts';

/** A project: its title strip and tabs; the tab's page stands below. */
@Component({
  selector: 'app-project-page',
  imports: [
    Icon,
    LoadState,
    MatButton,
    MatTabsModule,
    QuantityText,
    RouterLink,
    RouterLinkActive,
    RouterOutlet,
    StateCounts,
    StripCell,
    TitleStrip,
    VerdictMark,
  ],
  providers: [ProjectStore, StageList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './project-page.html',
  styleUrl: './project-page.scss',
})
export class ProjectPage {
  private readonly dialog = inject(MatDialog);
  private readonly stages = inject(StageList);
  protected readonly store = inject(ProjectStore);

  protected readonly project = this.store.project;
  protected readonly fullTitle = computed(() =>
    [this.project()?.title, this.project()?.supplementaryTitle].filter(Boolean).join(', '),
  );
  protected readonly counts = computed(() => countsText(this.project()?.counts));
  protected readonly stageCount = computed(() => stageCount(this.project()?.counts));
  protected readonly tabs = [
    { path: 'stages', text: 'Stages' },
    { path: 'bom-note', text: 'BOM note' },
    { path: 'policy', text: 'Policy' },
    { path: 'members', text: 'Members' },
    { path: 'activity', text: 'Activity' },
  ] as const;

  /** Why stages cannot be added by the person asking. */
  protected readonly addRefusal = computed(() =>
    this.project()?.ownRoles.includes('designer') === true
      ? null
      : 'Only a designer of the project adds stages.',
  );

  protected portLabel({ port, criterion: { margin } }: PortVerdict): string {
    return margin === null
      ? `Port ${port}`
      : `Port ${port}, margin ${formatPercent(margin, { digits: 2 })}`;
  }

  protected async importFiles(): Promise<void> {
    const project = this.project();
    if (!project) return;
    const config = Object.assign(new MatDialogConfig<typeof project>(), { data: project });
    const { StageImport } = await import('./stage-import.ts');
    this.dialog
      .open(StageImport, config)
      .afterClosed()
      .subscribe(() => {
        this.store.answer.reload();
        this.stages.reload();
      });
  }
}
