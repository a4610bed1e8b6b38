import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { deriveClamp } from '../../../shared/parts/derive-clamp.ts';
import { deriveDrive } from '../../../shared/parts/derive-drive.ts';
import { deriveLoad } from '../../../shared/parts/derive-load.ts';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import type { Derived } from '../../../shared/parts/derived.ts';
import { StageInput, type Topology } from '../../../shared/stage/stage-input.ts';
import type { TransistorData } from '../../../shared/stage/transistor-data.ts';
import { diodes, find, loads, logicOutputs, transistors } from './library-file.ts';

function data<T>(derived: Derived<T>): T {
  if (!derived.ok) throw new Error(derived.reason);
  return derived.data;
}

function topologyOf({ internal, darlington, polarity }: TransistorData): Topology {
  if (internal !== null) return 'low-side-pre-biased';
  if (polarity === 'pnp') return 'high-side-pnp';
  return darlington ? 'low-side-darlington' : 'low-side-npn';
}

/** A pilot relay on a controller pin, every part from the library. */
function relayStage(partNumber: string) {
  const transistor = data(deriveTransistor(find(transistors, partNumber)));
  const relay = find(loads, 'signal-0.4W');
  const coil = relay.coils.findIndex(({ nominalV }) => nominalV === 24);
  const levels = data(deriveDrive(find(logicOutputs, 'MCU 3.3 V, 8 mA class'), 0));
  return StageInput.parse({
    format: 'sinkwell-stage/1',
    reference: 'Q1',
    title: 'Pilot relay from the library',
    topology: topologyOf(transistor),
    supplyV: { min: 21.6, max: 26.4 },
    ambientDegC: { min: -20, max: 60 },
    drive: { ...levels, railV: { min: 3, max: 3.6 } },
    load: { ...data(deriveLoad(relay, { coil })), inductanceH: 4, temperatureRiseK: 20 },
    baseResistor: { valueOhm: 1000, tolerance: 0.05 },
    shuntResistor: { valueOhm: 22_000, tolerance: 0.05 },
    clamp: data(deriveClamp(find(diodes, '1N4148'), 0.03)),
    transistor,
    policy: { name: 'General practice' },
  });
}

const namesOf = (matches: (record: (typeof transistors)[number]) => boolean) =>
  transistors.filter(matches).map(({ partNumber }) => partNumber);

describe('a stage made of library parts', () => {
  it('gives the figures of an independent calculation for the 2N3904 at 1 kΩ', () => {
    const stage = relayStage('2N3904');
    const evaluation = evaluateStage({
      ...stage,
      drive: {
        ...stage.drive,
        kind: 'push-pull',
        high: { dropV: 0.6, currentA: 0.008, unloadedDropV: 0 },
        low: { levelV: 0.4, currentA: 0.008, unloadedV: 0.1 },
        pullUp: null,
        sourceLimitA: 0.02,
        sinkLimitA: 0.02,
      },
    });
    const value = (id: string) => evaluation.criteria.find((row) => row.id === id)?.value ?? NaN;
    const within = (id: string, figure: number) => {
      expect(Math.abs(value(id) / figure - 1), id).toBeLessThan(0.005);
    };
    within('overdrive-factor', 3.66);
    within('forced-beta', 13.9);
    within('collector-current', 0.0242);
    within('junction-temperature', 61.3);
    within('peak-collector-voltage', 27.4);
    within('load-voltage', 21.37);
  });

  it.each(namesOf(({ family }) => family === 'transistor'))('judges %s without a fault', (name) => {
    const { criteria } = evaluateStage(relayStage(name));
    expect(criteria.length).toBeGreaterThan(10);
    for (const { value } of criteria) expect(value === null || Number.isFinite(value)).toBe(true);
  });

  it.each(namesOf(({ family }) => family === 'darlington' || family === 'pre-biased'))(
    'makes a valid stage file with %s',
    (name) => {
      expect(() => relayStage(name)).not.toThrow();
    },
  );
});
