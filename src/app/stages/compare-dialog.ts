import { ChangeDetectionStrategy, Component, inject, resource } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule } from '@angular/material/dialog';
import { readRevision, type Revision } from '../../../shared/contract/revision.ts';
import { revisionDiff, type ComparedRevision } from '../../../shared/report/revision-diff.ts';
import { ApiClient } from '../api/api-client.ts';
import { LoadState } from '../ui/load-state.ts';
import { SymbolText } from '../ui/symbol-text.ts';

export interface ComparedPair {
  /** The sheet as it stands, unsaved changes included. */
  readonly after: ComparedRevision;
  readonly afterLetter: string;
  readonly previous: { readonly id: string; readonly letter: string };
}

/** What changed since an earlier revision: values, part data and results, with units. */
@Component({
  selector: 'app-compare-dialog',
  imports: [LoadState, MatButton, MatDialogModule, SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './compare-dialog.html',
  styleUrl: './conflict-dialog.scss',
})
export class CompareDialog {
  private readonly api = inject(ApiClient);
  protected readonly pair = inject<ComparedPair>(MAT_DIALOG_DATA);

  protected readonly groups = resource({
    loader: async () => {
      const params = { revisionId: this.pair.previous.id };
      const { value } = await this.api.send(readRevision, { params });
      const diff = revisionDiff(comparedRevision(value), this.pair.after);
      return [
        { title: 'Definition', lines: diff.definition },
        { title: 'Part data', lines: diff.partData },
        { title: 'Results', lines: diff.results },
      ];
    },
  });
}

/** What of a revision is compared. */
export const comparedRevision = (revision: Revision): ComparedRevision => ({
  definition: revision.definition,
  evaluation: revision.evaluation,
  parts: revision.partStanding,
});
