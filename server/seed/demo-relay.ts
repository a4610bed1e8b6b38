import { PartRecord, type PartFile } from '../../shared/parts/part-record.ts';
import { DEMO_RELAY } from './demo-stages.ts';

/** An invented relay, so that its data can change without misquoting a maker. */
export function demoRelay(operateV: number): PartRecord {
  const file: PartFile = {
    kind: 'load',
    family: 'relay',
    partNumber: DEMO_RELAY,
    description: 'Invented relay of the demo, 24 V coil',
    confidence: 'memory',
    sources: [{ of: 'all', source: 'DEMO-SHEET' }],
    documents: [{ id: 'DEMO-SHEET', title: 'Invented data sheet of the demo, issue 1' }],
    notes: ['Invented for the demo: no such relay can be bought.'],
    referenceDegC: 20,
    tolerance: 0.1,
    maximumReferenceDegC: 60,
    coils: [{ nominalV: 24, resistanceOhm: 1600, inductanceH: 4, operateV, releaseV: 2.4 }],
    levels: [{ maximum: 1.29 }],
  };
  return PartRecord.parse(file);
}
