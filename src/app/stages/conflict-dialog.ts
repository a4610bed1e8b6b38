import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { Icon } from '../ui/icon.ts';
import { conflictRows, merged, type Side } from './conflict-rows.ts';
import type { Draft } from './draft.ts';

export interface ConflictData {
  readonly base: Draft;
  readonly yours: Draft;
  readonly theirs: Draft;
  /** Who saved in the meantime. */
  readonly savedBy: string;
}

/** Yours, theirs and the result, field by field; nothing is written until somebody takes the result. */
@Component({
  selector: 'app-conflict-dialog',
  imports: [Icon, MatButton, MatDialogModule],
  templateUrl: './conflict-dialog.html',
  styleUrl: './conflict-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConflictDialog {
  private readonly dialog = inject<MatDialogRef<ConflictDialog, Draft>>(MatDialogRef);
  protected readonly data = inject<ConflictData>(MAT_DIALOG_DATA);

  protected readonly rows = conflictRows(this.data.base, this.data.yours, this.data.theirs);
  protected readonly clashes = this.rows.filter(({ clash }) => clash).length;
  protected readonly sides = signal<ReadonlyMap<string, Side>>(
    new Map(this.rows.map(({ key, proposed }) => [key, proposed])),
  );
  protected readonly result = computed(() =>
    merged(this.data.yours, this.data.theirs, this.sides()),
  );

  protected choose(key: string, side: Side): void {
    this.sides.update((sides) => new Map(sides).set(key, side));
  }

  protected chooseAll(side: Side): void {
    this.sides.set(new Map(this.rows.map(({ key }) => [key, side])));
  }

  protected take(): void {
    const result = this.result();
    if (result !== null) this.dialog.close(result);
  }
}
