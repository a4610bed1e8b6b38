import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { BomNote } from '../../../shared/report/bom-note.ts';
import {
  contentText,
  NOT_ISSUED,
  noteFacts,
  peopleText,
} from '../../../shared/report/bom-note-facts.ts';
import {
  descriptionText,
  NOTHING,
  occasionText,
  ratingText,
  shortHash,
  signedText,
  statusText,
  utcDate,
  valueText,
} from '../../../shared/report/bom-note-text.ts';
import { BrandMark } from '../ui/brand-mark.ts';

/** A BOM note as the sheet it will be: what the PDF shows, in the page. */
@Component({
  selector: 'app-bom-note-sheet',
  imports: [BrandMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './bom-note-sheet.html',
  styleUrl: './bom-note-sheet.scss',
  host: { '[class.not-released]': '!note().released' },
})
export class BomNoteSheet {
  readonly note = input.required<BomNote>();

  protected readonly identification = computed(
    () => this.note().issue?.identification ?? NOT_ISSUED,
  );
  protected readonly occasion = computed(() => occasionText(this.note()));
  protected readonly facts = computed(() => noteFacts(this.note()));
  protected readonly content = computed(() => contentText(this.note()).short);
  protected readonly lines = computed(() =>
    this.note().lines.map((line) => ({
      ...line,
      description: descriptionText(line),
      value: valueText(line),
      rating: ratingText(line),
      package: line.package ?? NOTHING,
      partNumber: line.partNumber ?? NOTHING,
      sources: line.approvedSources.join(', ') || NOTHING,
      revision: line.partRevision ?? NOTHING,
    })),
  );
  protected readonly revisions = computed(() =>
    this.note().revisions.map((revision) => ({
      ...revision,
      signed: signedText(revision),
      hash: revision.hash === null ? 'none' : shortHash(revision.hash),
      flagged: !revision.locked || revision.partDataChanged,
    })),
  );
  /** The title block of ISO 7200 in reading order. */
  protected readonly block = computed<readonly BlockField[]>(() => {
    const note = this.note();
    const { titleBlock, issue } = note;
    return [
      { label: 'Legal owner', value: titleBlock.legalOwner },
      { label: 'Creator', value: peopleText(titleBlock.creators) },
      { label: 'Checker', value: peopleText(titleBlock.checkers) },
      { label: 'Document type', value: titleBlock.documentType },
      { label: 'Responsible department', value: titleBlock.department ?? NOTHING },
      { label: 'Approval person', value: peopleText(titleBlock.approvers) },
      { label: 'Document status', value: statusText(note), status: true },
      { label: 'Date of issue', value: issue === null ? 'none' : utcDate(note.atMs) },
      { label: 'Title', value: titleBlock.title, below: titleBlock.supplementaryTitle },
      { label: 'Identification number', value: this.identification() },
      { label: 'Rev', value: issue === null ? NOTHING : 'A' },
      { label: 'Lang.', value: titleBlock.language },
    ];
  });
}

interface BlockField {
  readonly label: string;
  readonly value: string;
  readonly below?: string | null;
  readonly status?: boolean;
}
