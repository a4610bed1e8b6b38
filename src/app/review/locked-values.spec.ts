import type { Revision } from '../../../shared/contract/revision.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';
import { lockedValues } from './locked-values.ts';
import { IN_CHECK } from './review-fixture.ts';

const { definition } = IN_CHECK;

/** Label and text of what an approver reads, with plain spaces. */
function values(change: Partial<StageInput>): Record<string, string> {
  const revision: Revision = {
    ...IN_CHECK,
    definition: StageInput.parse({ ...definition, ...change }),
  };
  return Object.fromEntries(
    lockedValues(revision).map(({ label, text }) => [label, text.replaceAll('\u00a0', ' ')]),
  );
}

describe('the values an approver reads', () => {
  it('name the transistor in front with its network', () => {
    const shown = values({
      topology: 'two-transistor-high-side',
      transistor: { ...definition.transistor, partNumber: '2N3906', polarity: 'pnp' },
      preDriver: {
        transistor: definition.transistor,
        baseResistor: { valueOhm: 4700, tolerance: 0.05, ratingW: null },
        shuntResistor: null,
      },
    });
    expect(shown).toMatchObject({
      Topology: 'Two-transistor high side',
      Transistor: '2N3906',
      'Pre-driver': '2N3904',
      RB1: '4.7 kΩ ±5 %',
      RBE1: 'none',
    });
  });

  it('name the resistors inside a pre-biased part, and that none stands before it', () => {
    const shown = values({
      topology: 'low-side-pre-biased',
      baseResistor: { valueOhm: 0, tolerance: 0, ratingW: null },
      transistor: {
        ...definition.transistor,
        internal: {
          ...{ r1Ohm: 4700, r2Ohm: 10_000, r1Tolerance: 0.3, ratioTolerance: 0.2 },
          input: null,
        },
      },
    });
    expect(shown).toMatchObject({ RB: 'none', 'R1 and R2 inside': '4.7 kΩ, 10 kΩ' });
  });

  it('say how a stage is switched, and nothing of it where it is held', () => {
    expect(values({ frequencyHz: 1000, duty: 0.25 })).toMatchObject({
      Switching: '1 kHz, 25 % on',
    });
    expect(values({})).not.toHaveProperty('Switching');
  });
});
