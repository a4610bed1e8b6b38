import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import type { FormControl } from '@angular/forms';
import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import type { Designators } from '../../../shared/contract/revision.ts';
import type { PartKey } from '../../../shared/report/schematic/drawing.ts';
import type { Sizing } from '../../../shared/sizing/sizing.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { formatQuantity } from '../../../shared/units/engineering-notation.ts';
import { preferredValues } from '../../../shared/units/preferred-values.ts';
import { Icon } from '../ui/icon.ts';
import { needsOf } from '../../../shared/stage/topology-needs.ts';
import type { PartRole } from '../../../shared/parts/part-fit.ts';
import { DesignatorGroup } from './designator-group.ts';
import { FIELD_GROUPS, GROUP_TITLES, type ChoiceSpec, type FieldGroup } from './field-spec.ts';
import { FieldRow } from './field-row.ts';
import type { FieldFault } from './form-to-stage.ts';
import { groupFigure } from './group-figure.ts';
import { PolicyGroup } from './policy-group.ts';
import {
  applies,
  FIELD_PATHS,
  fieldLabel,
  fieldSpec,
  isFolded,
  shapeOf,
  type FieldPath,
} from './stage-fields.ts';
import { ShuntAdvice } from './shunt-advice.ts';
import type { StageForm } from './stage-form.ts';
import { stageToForm } from './stage-to-form.ts';

const ROLE_OF_GROUP: Partial<Record<FieldGroup, PartRole>> = {
  drive: 'drive',
  load: 'load',
  clamp: 'clamp',
};

/** Parts of the drawing with a designator of their own, by the key of the list of designators. */
const DESIGNATED: readonly PartKey[] = [
  'baseResistor',
  'shuntResistor',
  'pullUp',
  'speedUpCapacitor',
  'load',
  'loadResistor',
  'clamp',
  'drive',
  'preBaseResistor',
  'preShuntResistor',
];

/** The whole definition as rows in groups; seldom used fields are folded in their group. */
@Component({
  selector: 'app-form-panel',
  imports: [DesignatorGroup, FieldRow, Icon, PolicyGroup, ShuntAdvice],
  templateUrl: './form-panel.html',
  styleUrl: './form-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FormPanel {
  readonly form = input.required<StageForm>();
  readonly stage = input.required<StageInput>();
  readonly designators = input.required<Designators>();
  readonly evaluation = input.required<Evaluation>();
  readonly sizing = input.required<Sizing | null>();
  readonly policyVersion = input.required<number>();
  readonly faults = input<readonly FieldFault[]>([]);
  readonly selected = input<PartKey | null>(null);
  readonly readOnly = input(false);
  readonly partAsked = output<PartRole>();
  readonly shuntTaken = output<number>();
  readonly designatorsChange = output<{ designators: Designators; field: string }>();
  readonly focusedPart = output<PartKey | null>();

  private readonly opened = signal<ReadonlySet<FieldGroup>>(new Set());
  private readonly values = computed(() => stageToForm(this.stage()));
  private readonly shape = computed(() => shapeOf(this.values()));
  protected readonly steps = computed(() => {
    const { series, smallestOhm, largestOhm } = this.stage().policy;
    return preferredValues(series, smallestOhm, largestOhm);
  });
  protected readonly groups = computed(() =>
    FIELD_GROUPS.map((group) => {
      const paths = FIELD_PATHS.filter(
        (path) => fieldSpec(path).group === group && applies(path, this.shape()),
      );
      const folded = paths.filter((path) => isFolded(path, this.shape()));
      return {
        group,
        title: GROUP_TITLES[group],
        figure: groupFigure(group, this.stage(), this.evaluation(), this.sizing()),
        role: this.roleOf(group),
        transistor: this.transistorOf(group),
        plain: paths.filter((path) => !isFolded(path, this.shape())),
        folded,
        open:
          this.readOnly() || this.opened().has(group) || folded.some((path) => this.faultOf(path)),
      };
    }).filter(({ plain, folded, transistor }) => plain.length + folded.length > 0 || transistor),
  );

  protected control(path: FieldPath): FormControl<unknown> {
    return this.form().controls[path] as FormControl<unknown>;
  }

  protected valueOf(path: FieldPath): unknown {
    return this.values()[path];
  }

  protected faultOf(path: FieldPath): string | null {
    const fault = this.faults().find((each) => each.path === path);
    // A field that is not understood says so itself.
    if (fault === undefined || fault.message === '') return null;
    return `${fault.message.charAt(0).toUpperCase()}${fault.message.slice(1)}.`;
  }

  /** Whether the row belongs to the part chosen on the drawing. Its main figure stands for a part. */
  protected isSelected(path: FieldPath): boolean {
    const part = this.selected();
    return part !== null && mainField(part, this.stage()) === path;
  }

  protected designatorOf(path: FieldPath): string | null {
    const part = DESIGNATED.find((each) => mainField(each, this.stage()) === path);
    return part === undefined ? null : this.designators()[part as keyof Designators];
  }

  /** Levels are guaranteed at a current: the label says which. */
  protected labelOf(path: FieldPath): string {
    const label = fieldLabel(path, this.shape());
    const { high, low } = this.stage().drive;
    const at = { 'drive/high/dropV': high?.currentA, 'drive/low/levelV': low.currentA }[
      path as string
    ];
    return at === undefined ? label : `${label} at ${formatQuantity(at, 'A')}`;
  }

  /** Only loads that the topology can drive. */
  protected optionsOf(path: FieldPath): ChoiceSpec['options'] | null {
    const spec = fieldSpec(path);
    if (path !== 'load/kind' || spec.kind !== 'choice') return null;
    const { loads } = needsOf(this.stage().topology);
    return spec.options.filter(([kind]) => loads.some((load) => load === kind));
  }

  protected stepsOf(path: FieldPath): readonly number[] {
    const spec = fieldSpec(path);
    return spec.kind === 'quantity' && spec.preferred === true ? this.steps() : [];
  }

  protected rangeOf(path: FieldPath): string | null {
    if (path !== 'baseResistor/valueOhm' && path !== 'shuntResistor/valueOhm') return null;
    const { topology, policy } = this.stage();
    const { series, smallestOhm, largestOhm } = policy;
    if (path === 'baseResistor/valueOhm' && topology === 'low-side-pre-biased') {
      return `0 … ${formatQuantity(largestOhm, 'Ohm')}, 0: none`;
    }
    return `${formatQuantity(smallestOhm, 'Ohm')} … ${formatQuantity(largestOhm, 'Ohm')}, ${series}`;
  }

  /** What the library has for a group. */
  private roleOf(group: FieldGroup): PartRole | null {
    const { loads } = needsOf(this.stage().topology);
    if (group === 'load' && !loads.includes('coil')) return null;
    return ROLE_OF_GROUP[group] ?? null;
  }

  /** The transistor a group is about, taken whole from its record. */
  private transistorOf(group: FieldGroup) {
    const { transistor, preDriver, topology } = this.stage();
    if (group === 'transistor') return { role: 'transistor', data: transistor } as const;
    if (group !== 'preDriver' || preDriver === null) return null;
    return topology === 'two-transistor-high-side'
      ? ({ role: 'preDriver', data: preDriver.transistor } as const)
      : null;
  }

  protected toggle(group: FieldGroup): void {
    this.opened.update((open) => {
      const next = new Set(open);
      if (!next.delete(group)) next.add(group);
      return next;
    });
  }

  protected entered(path: FieldPath): void {
    this.focusedPart.emit(fieldSpec(path).part ?? null);
  }
}

const LOAD_FIELD: Readonly<Record<StageInput['load']['kind'], FieldPath>> = {
  coil: 'load/resistanceOhm',
  resistor: 'load/resistanceOhm',
  'led-string': 'load/count',
  lamp: 'load/nominalV',
  'logic-input': 'load/pullUpOhm',
};

/** The field that choosing a part on the drawing leads to; null for transistors, which have a picker. */
export function mainField(part: PartKey, { load }: StageInput): FieldPath | null {
  const fields: Readonly<Record<PartKey, FieldPath | null>> = {
    supply: 'supplyV',
    drive: 'drive/kind',
    pullUp: 'drive/pullUp/valueOhm',
    baseResistor: 'baseResistor/valueOhm',
    speedUpCapacitor: 'speedUpCapacitorF',
    shuntResistor: 'shuntResistor/valueOhm',
    transistor: null,
    load: LOAD_FIELD[load.kind],
    loadResistor: load.kind === 'led-string' ? 'load/resistanceOhm' : null,
    logicInput: 'load/vihV',
    clamp: 'clamp/kind',
    preDriver: null,
    preBaseResistor: 'preDriver/baseResistor/valueOhm',
    preShuntResistor: 'preDriver/shuntResistor/valueOhm',
  };
  return fields[part];
}
