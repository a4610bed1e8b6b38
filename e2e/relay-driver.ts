import type { StageFile } from '../shared/stage/stage-input.ts';
import { RELAY_FILE } from '../spec/shared/relay-stage.ts';

/** A relay on a 3.3 V output with every rating that a verdict asks for: marginal at 620 Ω. */
export function relayDriver(reference: string, valueOhm: number): StageFile {
  return {
    ...RELAY_FILE,
    ...{ reference, title: `Pilot relay ${reference}` },
    load: { ...RELAY_FILE.load, maximumV: 31, maximumReferenceDegC: 60, coilMaxDegC: 130 },
    baseResistor: { ...RELAY_FILE.baseResistor, valueOhm },
  };
}
