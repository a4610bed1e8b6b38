import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { sizeStage } from '../../../shared/sizing/size-stage.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { HIGH_SIDE_FILE, RELAY_FILE, relayStage, TYPE_2N3904 } from '../relay-stage.ts';

/** The figure a way out names right before a unit or word. */
function named(stage: StageInput, pattern: RegExp): number {
  const ways = sizeStage(stage).conflict?.ways ?? [];
  const found = ways.map((way) => pattern.exec(way)).find((match) => match !== null);
  if (found?.[1] === undefined)
    throw new Error(`nothing like ${pattern.source} in: ${ways.join(' ')}`);
  return Number(found[1]);
}

const pin = (sourceLimitA: number) => ({ drive: { ...RELAY_FILE.drive, sourceLimitA } });
const isOpen = (stage: StageInput) => sizeStage(stage).recommendedOhm !== null;

/** Rounding of a figure named to three digits. */
const ROOM = 1.006;

describe('an empty window', () => {
  const weak = relayStage(pin(0.002));

  it('names the criterion that asks for a smaller and the one that asks for a larger resistor', () => {
    expect(sizeStage(weak).conflict?.between).toEqual(['forced-beta', 'drive-current']);
  });

  it('says what current the output must be rated for, and that opens it', () => {
    const neededA = named(weak, /rated for ([\d.]+)\smA/) / 1e3;
    // By itself: the strong drive current at the largest RB that meets forced β, 680 Ω, over the derating.
    const at680 = evaluateStage({
      ...weak,
      baseResistor: { ...weak.baseResistor, valueOhm: 680 },
    }).criteria.find(({ id }) => id === 'drive-current')?.value;
    expect(neededA).toBeCloseTo((at680 ?? NaN) / 0.8, 4);
    expect(isOpen(relayStage(pin(neededA * ROOM)))).toBe(true);
    expect(isOpen(relayStage(pin(neededA * 0.98)))).toBe(false);
  });

  it('says up to what IC/IB the sheet must guarantee VCE(sat), and that opens it', () => {
    const beta = named(weak, /up to IC\/IB of ([\d.]+)/);
    const guaranteed = (ratio: number) =>
      relayStage({
        ...pin(0.002),
        transistor: {
          ...TYPE_2N3904,
          gain: TYPE_2N3904.gain.map((row) => ({ ...row, min: 10 * row.min, max: 3000 })),
          saturation: TYPE_2N3904.saturation.map((row) => ({ ...row, ibA: row.icA / ratio })),
        },
        policy: { name: 'own', forcedBeta: 100 },
      });
    expect(isOpen(guaranteed(beta * ROOM))).toBe(true);
    expect(isOpen(guaranteed(beta * 0.95))).toBe(false);
  });

  it('says how much more gain is needed, and that is what opens it', () => {
    // 48 mA from a 4 mA output; the policy asks for no guaranteed rows, so the gain decides.
    const stage = (times: number) =>
      relayStage({
        ...pin(0.004),
        load: { ...RELAY_FILE.load, resistanceOhm: 720 },
        transistor: {
          ...TYPE_2N3904,
          gain: TYPE_2N3904.gain.map(({ icA, vceV, min }) => ({
            icA,
            vceV,
            min: min * times,
            max: 1000,
          })),
        },
        policy: { name: 'own', forcedBeta: 1000, guaranteedOnly: false },
      });
    expect(sizeStage(stage(1)).conflict?.between).toEqual(['overdrive-factor', 'drive-current']);
    const times = named(stage(1), /with ([\d.]+) times the guaranteed gain/);
    expect(times).toBeGreaterThan(1);
    expect(isOpen(stage(times * ROOM))).toBe(true);
    expect(isOpen(stage(times * 0.97))).toBe(false);
  });

  it('says what rating the base resistor needs', () => {
    const stage = (ratingW: number) =>
      relayStage({
        drive: { ...RELAY_FILE.drive, railV: { min: 22, max: 26 } },
        baseResistor: { valueOhm: null, tolerance: 0.05, ratingW },
      });
    expect(sizeStage(stage(0.01)).conflict?.between).toEqual(['forced-beta', 'rb-dissipation']);
    const neededW = named(stage(0.01), /must be rated for ([\d.]+)\smW/) / 1e3;
    expect(isOpen(stage(neededW * ROOM))).toBe(true);
    expect(isOpen(stage(neededW * 0.97))).toBe(false);
  });

  it('says which base–emitter resistor a reset asks for, and what it takes of the drive', () => {
    const reset = { kind: 'pull-up', pullUpOhm: 10_000 };
    const stage = relayStage({ drive: { ...RELAY_FILE.drive, reset } });
    const { between = [], ways = [] } = sizeStage(stage).conflict ?? {};
    expect(between).toContain('reset-off');
    expect(ways.join(' ')).toMatch(
      /at most 1\.2\skΩ brings it down, and takes \d+\s% of the drive/,
    );
  });

  it('says that no value helps where the output cannot lift the base at all', () => {
    const drive = { ...RELAY_FILE.drive, railV: { min: 0.7, max: 1.8 } };
    expect(sizeStage(relayStage({ drive })).conflict?.ways.join(' ')).toContain(
      'must give more voltage',
    );
  });

  it('tells a transistor in front from the one behind', () => {
    const stage = relayStage({
      topology: 'two-transistor-high-side',
      transistor: HIGH_SIDE_FILE.transistor,
      baseResistor: { valueOhm: 6200, tolerance: 0.05, ratingW: 0.5 },
      preDriver: {
        transistor: TYPE_2N3904,
        baseResistor: { valueOhm: 47_000, tolerance: 0.05, ratingW: 0.1 },
        shuntResistor: null,
      },
    });
    const { between = [], ways = [] } = sizeStage(stage).conflict ?? {};
    expect(between).toEqual(['forced-beta', 'pre-forced-beta']);
    expect(ways[1]).toContain('of the transistor in front');
  });
});
