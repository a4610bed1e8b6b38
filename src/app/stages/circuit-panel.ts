import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { figuresAtCorner, nominalFigures } from '../../../shared/checks/corner-figures.ts';
import type { CornerFigures, Evaluation } from '../../../shared/checks/evaluation.ts';
import type { Designators } from '../../../shared/contract/revision.ts';
import { describeSchematic } from '../../../shared/report/schematic/describe-schematic.ts';
import type { PartKey } from '../../../shared/report/schematic/drawing.ts';
import { drawSchematic } from '../../../shared/report/schematic/schematic.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { criterionName } from '../../../shared/report/criterion-name.ts';
import { SchematicView } from '../schematic/schematic-view.ts';
import { Icon } from '../ui/icon.ts';
import { storedResistorStyle, storeResistorStyle, type ResistorStyle } from './resistor-style.ts';
import { hasFigures, judgedStage, NOMINAL, shownCorner } from './shown-corner.ts';

/** The circuit with the figures of one corner, as a drawing or as text. */
@Component({
  selector: 'app-circuit-panel',
  imports: [Icon, MatButton, MatButtonToggle, MatButtonToggleGroup, SchematicView],
  templateUrl: './circuit-panel.html',
  styleUrl: './circuit-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CircuitPanel {
  readonly stage = input.required<StageInput>();
  readonly evaluation = input.required<Evaluation>();
  readonly designators = input.required<Designators>();
  readonly compact = input(false);
  readonly selected = input<PartKey | null>(null);
  /** The criterion whose worst corner is shown, or `nominal`. */
  readonly at = input.required<string>();
  readonly atChange = output<string>();
  readonly chosen = output<PartKey>();

  protected readonly nominal = NOMINAL;
  protected readonly asText = signal(false);
  protected readonly style = linkedSignal<ResistorStyle>(() => storedResistorStyle());
  protected readonly corners = computed(() =>
    this.evaluation()
      .criteria.filter(({ corner }) => corner !== null)
      .map(({ id }) => ({ id, text: `${criterionName(id)}, worst corner` })),
  );
  /** What the figures are shown at: a criterion that this stage does not have leaves the middle. */
  protected readonly shownAt = computed(() =>
    this.corners().some(({ id }) => id === this.at()) ? this.at() : NOMINAL,
  );
  private readonly judged = computed(() => judgedStage(this.stage(), this.evaluation()));
  private readonly figures = computed<CornerFigures | null>(() => {
    const stage = this.judged();
    if (!hasFigures(stage, this.evaluation())) return null;
    const corner = shownCorner(this.evaluation(), this.shownAt());
    return corner === null ? nominalFigures(stage) : figuresAtCorner(stage, corner);
  });
  protected readonly drawing = computed(() =>
    drawSchematic(this.judged(), this.figures(), this.designators(), {
      layout: this.compact() ? 'compact' : 'wide',
      resistor: this.style(),
    }),
  );
  protected readonly lines = computed(() => describeSchematic(this.drawing()));

  protected setStyle(style: ResistorStyle): void {
    this.style.set(style);
    storeResistorStyle(style);
  }
}
