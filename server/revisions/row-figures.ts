import type { Criterion, Evaluation, Verdict } from '../../shared/checks/evaluation.ts';
import { strongDriveA } from '../../shared/checks/port-current.ts';
import type { Load } from '../../shared/stage/load.ts';
import type { StageInput } from '../../shared/stage/stage-input.ts';
import { formatQuantity } from '../../shared/units/engineering-notation.ts';

/** What lists show of a revision and sort by. */
export interface RowFigures {
  readonly title: string;
  readonly quantity: number;
  readonly topology: string;
  readonly loadKind: string;
  /** "Coil, 1.44 kΩ" */
  readonly loadText: string;
  /** Part numbers, separated by a comma where there are two. */
  readonly transistor: string;
  readonly baseResistorOhm: number | null;
  readonly overdriveFactor: number | null;
  readonly vceSatV: number | null;
  readonly powerW: number | null;
  readonly verdict: Verdict;
  readonly leastCriterion: string | null;
  readonly leastMargin: number | null;
  /** Port of the drive, the current one stage asks of it at its worst corner, and the derated limit. */
  readonly port: string | null;
  readonly portCurrentA: number | null;
  readonly portLimitA: number | null;
}

/** Takes the figures of a row from a definition and its result. */
export function rowFigures(definition: StageInput, evaluation: Evaluation): RowFigures {
  const value = (id: string) => criterion(evaluation, id)?.value ?? null;
  const least = leastMargin(evaluation);
  const { drive, policy, preDriver } = definition;
  const parts = [definition.transistor.partNumber, preDriver?.transistor.partNumber];
  return {
    title: definition.title,
    quantity: definition.quantity,
    topology: definition.topology,
    loadKind: definition.load.kind,
    loadText: loadText(definition.load),
    transistor: parts.filter((part) => part !== undefined).join(', '),
    baseResistorOhm: definition.baseResistor.valueOhm ?? evaluation.baseResistorOhm,
    overdriveFactor: value('overdrive-factor'),
    vceSatV: value('saturation-voltage'),
    powerW: value('dissipation'),
    verdict: evaluation.verdict,
    leastCriterion: least?.id ?? null,
    leastMargin: least?.margin ?? null,
    port: drive.port,
    portCurrentA: strongDriveA(evaluation),
    portLimitA: drive.portTotalA === null ? null : drive.portTotalA * policy.driveDerating,
  };
}

/** The criterion that decides the verdict most: the worst status first, then the smallest margin. */
function leastMargin({ criteria, verdict }: Evaluation): Criterion | null {
  if (verdict === 'open') {
    return criteria.find(({ status }) => status === 'open') ?? null;
  }
  const judged = criteria.filter(({ margin, status }) => margin !== null && status !== 'stated');
  return judged.reduce<Criterion | null>(
    (least, next) => (least === null || (next.margin ?? 0) < (least.margin ?? 0) ? next : least),
    null,
  );
}

function criterion({ criteria }: Evaluation, id: string): Criterion | undefined {
  return criteria.find((candidate) => candidate.id === id);
}

function loadText(load: Load): string {
  switch (load.kind) {
    case 'coil':
      return `Coil, ${formatQuantity(load.resistanceOhm, 'Ohm')}`;
    case 'resistor':
      return `Resistor, ${formatQuantity(load.resistanceOhm, 'Ohm')}`;
    case 'led-string':
      return `LED string, ${load.count}`;
    case 'lamp':
      return `Lamp, ${formatQuantity(load.currentA, 'A')}`;
    case 'logic-input':
      return `Logic input, ${formatQuantity(load.pullUpOhm, 'Ohm')}`;
  }
}
