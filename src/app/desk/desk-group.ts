import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { criterionInSentence } from '../../../shared/checks/criterion-in-sentence.ts';
import { marginText } from '../ui/fixed-figure.ts';
import { Icon } from '../ui/icon.ts';
import { StateChip } from '../ui/state-chip.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { dayText, waitingText } from '../ui/time-text.ts';
import { VerdictMark } from '../ui/verdict-mark.ts';
import type { Item, ShownGroup } from './desk-groups.ts';

/** One group of waiting work; each row leads to the page where it is done. */
@Component({
  selector: 'app-desk-group',
  imports: [Icon, MatButton, RouterLink, StateChip, SymbolText, VerdictMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './desk-group.html',
  styleUrl: './desk-group.scss',
})
export class DeskGroup {
  readonly group = input.required<ShownGroup>();
  readonly nowMs = input.required<number>();
  /** The revision whose act is the page's filled button. */
  readonly firstId = input<string>();

  protected readonly waitingText = waitingText;

  protected link(item: Item): readonly string[] {
    const sheet = ['/p', item.projectId, 's', item.stageId, 'r', item.revisionId];
    return this.group().page === '' ? sheet : [...sheet, this.group().page];
  }

  protected least(item: Item): string {
    if (!item.least) return '';
    const { criterionId, margin } = item.least;
    const name = criterionInSentence(criterionId);
    return margin === null ? name : `least ${marginText(margin)}, ${name}`;
  }

  /** Second line: the finding or the changed part, else the project. */
  protected place(item: Item): string {
    if (item.note !== null && !this.begun(item)) return `${item.note}, revision ${item.letter}`;
    return `${item.projectCode} ${item.projectTitle}, revision ${item.letter}`;
  }

  protected origin(item: Item): string {
    if (item.note !== null && this.begun(item)) return item.note;
    return item.from === null
      ? `since ${dayText(item.sinceMs, this.nowMs())}`
      : `from ${item.from}`;
  }

  protected act(item: Item): string {
    return this.begun(item) ? 'Continue' : this.group().act;
  }

  /** A check that is half done: its note tells how far. */
  private begun(item: Item): boolean {
    return this.group().noteTells === 'progress' && item.note !== null;
  }
}
