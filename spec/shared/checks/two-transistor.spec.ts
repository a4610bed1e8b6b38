import { describe, expect, it } from 'vitest';
import { figuresAtCorner, nominalFigures } from '../../../shared/checks/corner-figures.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { sizeStage } from '../../../shared/sizing/size-stage.ts';
import { cornerWords } from '../../../shared/report/corner-words.ts';
import { RELAY_FILE, relayStage, TYPE_2N3904, TYPE_2N3906 } from '../relay-stage.ts';

type Changes = Parameters<typeof relayStage>[0];

/** The 24 V relay behind a PNP that a 3.3 V output turns on through an NPN. */
const twoTransistors = (more: Changes = {}) =>
  relayStage({
    topology: 'two-transistor-high-side',
    transistor: TYPE_2N3906,
    baseResistor: { valueOhm: 6200, tolerance: 0.05, ratingW: 0.5 },
    preDriver: {
      transistor: TYPE_2N3904,
      baseResistor: { valueOhm: 4700, tolerance: 0.05, ratingW: 0.1 },
      shuntResistor: { valueOhm: 22000, tolerance: 0.05, ratingW: 0.1 },
    },
    ...more,
  });

describe('two-transistor high side', () => {
  const evaluation = evaluateStage(twoTransistors());
  const criterion = (id: string) => evaluation.criteria.find((each) => each.id === id);

  it('counts the corners of both passes: the NPN has two more for the VEB behind it', () => {
    expect(evaluation.corners).toBe(1024 + 2048);
    expect(criterion('pre-overdrive-factor')?.corner).toHaveProperty('veb');
    expect(criterion('overdrive-factor')?.corner).not.toHaveProperty('veb');
  });

  it('loads the NPN with RB between the supply less VEB and its collector', () => {
    const worst = criterion('pre-collector-current');
    // 26.4 V, smallest VEB (hot, settled), RB − 5 %: about 4.4 mA.
    expect(worst?.value).toBeGreaterThan((26.4 - 0.6) / 5890);
    expect(worst?.value).toBeLessThan((26.4 - 0.5) / 5890);
    expect(worst?.corner).toMatchObject({ supply: 'max', ambient: 'max', veb: 'min', load: '-' });
  });

  it('drives the PNP through RB from the supply down to the largest drop of the NPN', () => {
    const worst = criterion('overdrive-factor');
    expect(worst?.corner).toMatchObject({ ambient: 'min', drive: 'weak', rb: '+', rbe: '-' });
    const figures = figuresAtCorner(twoTransistors(), worst?.corner ?? {});
    const dropV = figures.supplyV - figures.vbeV - figures.driveA * 6200 * 1.05;
    const largestV = criterion('pre-saturation-voltage')?.value ?? NaN;
    expect(dropV).toBeGreaterThan(0.05);
    expect(dropV).toBeLessThanOrEqual(largestV + 1e-12);
    expect(figures.overdriveFactor).toBeCloseTo(worst?.value ?? NaN, 12);
  });

  it('is open in the off state where the NPN prints no leakage', () => {
    const preDriver = {
      transistor: { ...TYPE_2N3904, leakage: [] },
      baseResistor: { valueOhm: 4700, tolerance: 0.05, ratingW: 0.1 },
      shuntResistor: { valueOhm: 22000, tolerance: 0.05, ratingW: 0.1 },
    };
    const found = evaluateStage(twoTransistors({ preDriver })).criteria;
    const status = (id: string) => found.find((each) => each.id === id)?.status;
    expect(criterion('off-base-voltage')?.status).toBe('pass');
    expect(status('off-base-voltage')).toBe('open');
    expect(status('off-collector-current')).toBe('open');
  });

  it('judges the pin at the NPN and nowhere else', () => {
    expect(criterion('drive-current')).toBeUndefined();
    expect(criterion('pull-up-dissipation')).toBeUndefined();
    expect(criterion('pre-drive-current')?.limit).toBeCloseTo(0.016, 12);
    expect(criterion('pre-drive-current')?.value).toBeLessThan(3.6 / 4465);
  });

  it('holds the PNP off by RBE against what the hot NPN leaks', () => {
    const off = criterion('off-base-voltage');
    expect(off?.value).toBeGreaterThan(0.55e-6 * 2 * 22000);
    expect(off?.value).toBeLessThan(0.1);
    expect(criterion('pre-off-collector-voltage')?.value).toBe(26.4);
  });

  it('keeps the coil with the PNP: peak, release and clamp belong to it alone', () => {
    expect(criterion('peak-collector-voltage')?.value).toBeCloseTo(27.4, 9);
    expect(criterion('pre-peak-collector-voltage')).toBeUndefined();
    expect(criterion('pre-release-time')).toBeUndefined();
  });

  it('puts the whole RB current into the dissipation of RB', () => {
    const watt = criterion('rb-dissipation')?.value ?? NaN;
    expect(watt).toBeGreaterThan(0.95 * ((26.4 - 0.6) ** 2 / 6200) * 0.95);
    expect(watt).toBeLessThan(26.4 ** 2 / 5890);
  });

  it('can be sized between the NPN on one side and the PNP on the other', () => {
    const sizing = sizeStage(twoTransistors());
    expect(sizing.rbMinOhm).not.toBeNull();
    expect(sizing.setBy.max).toBe('forced-beta');
    const judged = evaluateStage(
      twoTransistors({
        baseResistor: { valueOhm: sizing.recommendedOhm, tolerance: 0.05, ratingW: 0.5 },
      }),
    );
    const status = (id: string) => judged.criteria.find((each) => each.id === id)?.status;
    expect(status('forced-beta')).toBe('pass');
    expect(status('pre-forced-beta')).not.toBe('fail');
  });

  it('shows either transistor in the drawing', () => {
    const front = figuresAtCorner(twoTransistors(), criterion('pre-forced-beta')?.corner ?? {});
    expect(front.icA).toBeLessThan(5e-3);
    expect(front.forcedBeta).toBeCloseTo(criterion('pre-forced-beta')?.value ?? NaN, 12);
    expect(nominalFigures(twoTransistors()).icA).toBeGreaterThan(0.01);
    expect(evaluation.nominal.icA).toBeCloseTo(nominalFigures(twoTransistors()).icA, 12);
  });

  it('names findings and corners of the NPN as the pre-driver’s', () => {
    const bare = evaluateStage(
      twoTransistors({
        preDriver: {
          transistor: TYPE_2N3904,
          baseResistor: RELAY_FILE.baseResistor,
          shuntResistor: null,
        },
      }),
    );
    expect(bare.findings.map(({ id }) => id)).toContain('pre-no-base-emitter-resistor');
    expect(cornerWords({ supply: 'max', ambient: 'min' }, 'pre-overdrive-factor')).toBe(
      'supply high, cold',
    );
  });

  it('fails a PNP in front', () => {
    const wrong = evaluateStage(
      twoTransistors({
        preDriver: {
          transistor: TYPE_2N3906,
          baseResistor: RELAY_FILE.baseResistor,
          shuntResistor: null,
        },
      }),
    );
    expect(wrong).toMatchObject({ verdict: 'fail', findings: [{ id: 'polarity' }] });
  });
});
