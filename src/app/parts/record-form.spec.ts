import { PartRecord, type PartFile } from '../../../shared/parts/part-record.ts';
import { groupOf, placeIssues, valueOf } from './record-form.ts';
import { outlineOfKind } from './record-schemas.ts';

const FILE: PartFile = {
  kind: 'transistor',
  partNumber: 'DEMO-1',
  confidence: 'high',
  sources: [{ of: 'all', source: 'DOC' }],
  documents: [{ id: 'DOC', title: 'Invented maker, demo sheet' }],
  polarity: 'npn',
  limits: {
    vceoV: 40,
    icA: 0.2,
    tjMaxDegC: 150,
    powerAt: [{ place: 'case', tempDegC: 25, powerW: 1.5 }],
  },
  gain: [{ icA: 1.5e-4, vceV: 1, min: 40 }],
  saturation: [{ icA: 0.01, ibA: 0.001, maxV: 0.2, confidence: 'memory' }],
  outputCapacitance: { maxF: 4e-12, vcbV: 5 },
  input: { r1: { typOhm: 4700 }, on: [{ minV: 2, outputA: 0.01 }] },
};
const LOAD: PartFile = {
  kind: 'load',
  partNumber: 'DEMO-2',
  confidence: 'medium',
  sources: [{ of: 'all', source: 'DOC' }],
  family: 'relay',
  tolerance: 0.1,
  levels: [{ operate: 0.75, release: 0.1 }],
  coils: [{ nominalV: 24, resistanceOhm: 1600, currentA: 0.071429, rangeV: { min: 18, max: 30 } }],
};

describe('form of a part record', () => {
  it.each([FILE, LOAD])('gives back the record it was filled from', (file) => {
    const record = PartRecord.parse(file);
    const outline = outlineOfKind(record.kind);
    const form = groupOf(outline, record);
    expect(form.valid).toBe(true);
    expect(PartRecord.parse({ kind: record.kind, ...(valueOf(outline, form) as object) })).toEqual(
      record,
    );
  });

  it('reads figures as designers type them and leaves empty ones unknown', () => {
    const outline = outlineOfKind('transistor');
    const form = groupOf(outline, PartRecord.parse(FILE));
    form.get('limits.icA')?.setValue('150 mA');
    form.get('limits.vceoV')?.setValue('');
    expect(valueOf(outline, form)).toMatchObject({ limits: { icA: 0.15 } });
    expect((valueOf(outline, form) as { limits: object }).limits).not.toHaveProperty('vceoV');
  });

  it('says at the field what was not understood', () => {
    const form = groupOf(outlineOfKind('transistor'), PartRecord.parse(FILE));
    const field = form.get('limits.vceoV')!;
    field.setValue('forty');
    expect(field.errors?.['schema']).toMatch(/voltage/i);
  });

  it('asks once where an entry can be read in two ways, and takes it at the next judgement', () => {
    const form = groupOf(outlineOfKind('transistor'), PartRecord.parse(FILE));
    const field = form.get('limits.icA')!;
    field.setValue('71.429 mA');
    expect(field.errors?.['schema']).toContain('Did you mean');
    field.updateValueAndValidity();
    expect(field.valid).toBe(true);
  });

  it('places what the schema found at the field it names', () => {
    const outline = outlineOfKind('transistor');
    const form = groupOf(outline, PartRecord.parse(FILE));
    form.get('gain.0.icA')?.setValue('');
    const parsed = PartRecord.safeParse({
      kind: 'transistor',
      ...(valueOf(outline, form) as object),
    });
    expect(placeIssues(form, parsed.error?.issues ?? [])).toEqual(['gain.0.icA']);
    expect(form.get('gain.0.icA')?.errors?.['schema']).toContain('expected a current');
  });
});
