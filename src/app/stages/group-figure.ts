import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import type { Sizing } from '../../../shared/sizing/sizing.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import type { TransistorData } from '../../../shared/stage/transistor-data.ts';
import { formatQuantity } from '../../../shared/units/engineering-notation.ts';
import type { FieldGroup } from './field-spec.ts';

/** The one derived figure a group produces; it stands at the end of the group's head. */
export function groupFigure(
  group: FieldGroup,
  stage: StageInput,
  evaluation: Evaluation,
  sizing: Sizing | null,
): string {
  const figure = (id: string) => evaluation.criteria.find((each) => each.id === id)?.value ?? null;
  switch (group) {
    case 'drive':
      return sourceResistance(stage);
    case 'load': {
      const currentA = figure('collector-current');
      return currentA === null ? '' : `up to ${formatQuantity(currentA, 'A')}`;
    }
    case 'transistor':
      return rowsText(stage.transistor);
    case 'preDriver':
      return stage.preDriver === null ? '' : rowsText(stage.preDriver.transistor);
    case 'switching': {
      const storageSec = figure('storage-time');
      return storageSec === null ? '' : `storage and fall ${formatQuantity(storageSec, 's')}`;
    }
    case 'base':
      return windowText(sizing);
    case 'clamp': {
      const peakV = figure('peak-collector-voltage');
      return peakV === null ? '' : `peak ${formatQuantity(peakV, 'V')}`;
    }
    case 'stage':
    case 'supply':
    case 'limits':
      return '';
  }
}

/** ROH of a push-pull output, ROL of an output that turns a PNP on. */
function sourceResistance({ drive, topology }: StageInput): string {
  if (topology === 'high-side-pnp') {
    return `sink resistance ${formatQuantity(drive.low.levelV / drive.low.currentA, 'Ohm')}`;
  }
  if (drive.high === null) return '';
  const { dropV, unloadedDropV, currentA } = drive.high;
  return `source resistance ${formatQuantity((dropV - unloadedDropV) / currentA, 'Ohm')}`;
}

function rowsText(transistor: TransistorData): string {
  const { gain, saturation, baseEmitter, leakage } = transistor;
  const rows = gain.length + saturation.length + baseEmitter.length + leakage.length;
  return [transistor.package ?? '', rows === 0 ? 'no rows' : `${rows} rows`]
    .filter((word) => word !== '')
    .join(', ');
}

function windowText(sizing: Sizing | null): string {
  const [low, high] = [sizing?.rbMinOhm ?? null, sizing?.rbMaxOhm ?? null];
  if (low === null || high === null) return '';
  return `window ${formatQuantity(low, 'Ohm')} … ${formatQuantity(high, 'Ohm')}`;
}
