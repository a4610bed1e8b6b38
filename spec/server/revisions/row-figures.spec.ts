import { expect, it } from 'vitest';
import { rowFigures } from '../../../server/revisions/row-figures.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { strongDriveA } from '../../../shared/checks/port-current.ts';
import { RELAY_FILE, relayStage } from '../../shared/relay-stage.ts';

it('a row keeps what the stage asks of its port, and the derated limit', () => {
  const stage = relayStage({ drive: { ...RELAY_FILE.drive, port: 'PB', portTotalA: 0.1 } });
  const evaluation = evaluateStage(stage);
  const row = rowFigures(stage, evaluation);
  expect([row.port, row.portCurrentA]).toEqual(['PB', strongDriveA(evaluation)]);
  expect(row.portLimitA).toBeCloseTo(0.08, 12); // General practice derates to 0.8
});
