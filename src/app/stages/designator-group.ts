import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { Designators } from '../../../shared/contract/revision.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { Icon } from '../ui/icon.ts';

type Key = keyof Designators;

const NAMES: Readonly<Record<Key, string>> = {
  baseResistor: 'Base resistor',
  shuntResistor: 'Base–emitter resistor',
  preDriver: 'Pre-driver',
  preBaseResistor: 'Its base resistor',
  preShuntResistor: 'Its base–emitter resistor',
  pullUp: 'Pull-up',
  speedUpCapacitor: 'Speed-up capacitor',
  load: 'Load',
  loadResistor: 'Series resistor',
  clamp: 'Clamp',
  clampZener: 'Zener of the clamp',
  drive: 'Logic output',
};

/** What the parts around the transistor are called on the board's drawing. */
@Component({
  selector: 'app-designator-group',
  imports: [Icon],
  templateUrl: './designator-group.html',
  styleUrl: './designator-group.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DesignatorGroup {
  readonly designators = input.required<Designators>();
  readonly stage = input.required<StageInput>();
  readonly readOnly = input(false);
  readonly changed = output<{ designators: Designators; field: string }>();

  protected readonly wrong = signal<Key | null>(null);
  protected readonly rows = computed(() => {
    const { baseResistor, shuntResistor, drive, speedUpCapacitorF, clamp, load, ...rest } =
      this.stage();
    const front = rest.topology === 'two-transistor-high-side' ? rest.preDriver : null;
    const there: Partial<Record<Key, boolean>> = {
      baseResistor: baseResistor.valueOhm !== 0,
      shuntResistor: shuntResistor !== null,
      preDriver: front !== null,
      preBaseResistor: front !== null,
      preShuntResistor: (front?.shuntResistor ?? null) !== null,
      loadResistor: load.kind === 'led-string',
      pullUp: drive.kind === 'open-collector',
      speedUpCapacitor: speedUpCapacitorF !== null,
      clamp: clamp.kind !== 'none',
      clampZener: clamp.kind === 'diode-zener',
    };
    return (Object.keys(NAMES) as Key[])
      .filter((key) => there[key] ?? true)
      .map((key) => ({ key, name: NAMES[key], value: this.designators()[key] }));
  });

  /** On leaving the field: an empty one means none is given. */
  protected enter(key: Key, text: string): void {
    const candidate = text.trim() === '' ? null : text.trim();
    const parsed = Designators.shape[key].safeParse(candidate);
    this.wrong.set(parsed.success ? null : key);
    if (parsed.success && parsed.data !== this.designators()[key]) {
      this.changed.emit({ designators: { ...this.designators(), [key]: parsed.data }, field: key });
    }
  }
}
