import { readStageFile } from './read-stage-file.ts';

describe('reading a stage file', () => {
  it('says so when it is not JSON, or holds nothing', () => {
    expect(readStageFile('a.json', 'Q12')[0]?.faults).toEqual(['The file is not JSON.']);
    expect(readStageFile('a.json', '[]')[0]?.faults).toEqual(['The file holds no stage.']);
  });

  it('names each field at fault by its path', () => {
    const [stage] = readStageFile(
      'a.json',
      JSON.stringify({
        format: 'sinkwell-stage/1',
        reference: 'Q12',
        title: 'Relay',
        supplyV: { min: -1, max: 2 },
      }),
    );
    expect(stage?.definition).toBeNull();
    expect(stage?.name).toBe('Q12');
    expect(stage?.faults.some((fault) => fault.startsWith('supplyV.min: expected a voltage'))).toBe(
      true,
    );
    expect(stage?.faults.some((fault) => fault.startsWith('load'))).toBe(true);
  });

  it('reads every stage of an array', () => {
    const stages = readStageFile('a.json', JSON.stringify([{ reference: 'Q1' }, 7]));
    expect(stages.map((stage) => stage.name)).toEqual(['Q1', 'Stage 2']);
  });
});
