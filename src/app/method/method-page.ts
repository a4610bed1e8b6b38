import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  effect,
  inject,
  Injector,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute } from '@angular/router';
import { CRITERIA, ownCriterionIds, type CriterionGroup } from '../../../shared/checks/criteria.ts';
import { CAUTIONS } from '../../../shared/method/cautions.ts';
import { CRITERION_LAWS_OF, SHARED_LAWS } from '../../../shared/method/criterion-laws.ts';
import { CRITERIA_TEXT } from '../../../shared/method/criteria-text.ts';
import { DECISIONS } from '../../../shared/method/decisions.ts';
import { symbolRuns } from '../../../shared/method/formula-text.ts';
import { GLOSSARY } from '../../../shared/method/glossary.ts';
import { JUDGEMENTS, PROOF } from '../../../shared/method/judgements.ts';
import { lawSymbol, symbolIds } from '../../../shared/method/symbols.ts';
import { inSentence } from '../../../shared/checks/criterion-in-sentence.ts';
import { FormulaText } from '../ui/formula-text.ts';
import { Icon } from '../ui/icon.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { FieldProblems } from './field-problems.ts';
import { LawList } from './law-list.ts';

const GROUP_WORDS: Record<CriterionGroup, string> = {
  'on-state': 'On state',
  'off-state': 'Off state',
  'turn-off': 'Turn-off',
  switching: 'Switching',
  data: 'Data',
};

/** What is judged and how, the words used, and the cautions. Each criterion has an anchor of its id. */
@Component({
  selector: 'app-method-page',
  imports: [FieldProblems, FormulaText, Icon, LawList, PageHeading, SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './method-page.html',
  styleUrl: './method-page.scss',
  host: { class: 'page' },
})
export class MethodPage {
  private readonly injector = inject(Injector);
  private readonly fragment = toSignal(inject(ActivatedRoute).fragment);

  protected readonly cautions = CAUTIONS;
  protected readonly glossary = GLOSSARY;
  protected readonly decisions = DECISIONS;
  protected readonly shared = SHARED_LAWS;
  protected readonly judgements = JUDGEMENTS;
  protected readonly proof = PROOF;
  protected readonly symbols = symbolIds().map((id) => ({
    runs: symbolRuns(id),
    meaning: lawSymbol(id).meaning,
  }));
  protected readonly groups = Object.entries(GROUP_WORDS).map(([group, name]) => ({
    id: group,
    name,
    criteria: ownCriterionIds()
      .filter((id) => CRITERIA[id].group === group)
      .map((id) => ({
        id,
        name: CRITERIA[id].name,
        relation: CRITERIA[id].relation === '>=' ? '≥ limit' : '≤ limit',
        ...CRITERIA_TEXT[id],
        laws: CRITERION_LAWS_OF[id] ?? [],
        cure: `If missed: ${inSentence(CRITERIA_TEXT[id]?.cure ?? '')}`,
      })),
  }));
  protected readonly contents = [
    { id: 'cautions', text: 'Cautions' },
    { id: 'criteria', text: 'Criteria' },
    { id: 'formulas', text: 'Formulas' },
    { id: 'judgement', text: 'Judgement' },
    { id: 'field-problems', text: 'Field problems' },
    { id: 'glossary', text: 'Glossary' },
    { id: 'decisions', text: 'Decisions' },
  ];

  constructor() {
    effect(() => {
      const id = this.fragment();
      if (!id) return;
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

  private show(id: string): void {
    const target = document.getElementById(id);
    target?.scrollIntoView();
    target?.focus({ preventScroll: true });
  }
}
