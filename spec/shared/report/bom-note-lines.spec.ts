import { describe, expect, it } from 'vitest';
import { mergeLines } from '../../../shared/report/bom-note-lines.ts';
import type { NoteSource } from '../../../shared/report/bom-note-source.ts';
import { descriptionText, ratingText, valueText } from '../../../shared/report/bom-note-text.ts';
import { fittedParts } from '../../../shared/report/fitted-parts.ts';
import type { StageFile } from '../../../shared/stage/stage-input.ts';
import { PNP, Q1, Q12, Q12_IN_CHECK, Q2, source } from './bom-note-fixture.ts';

const merged = (...sources: NoteSource[]) =>
  mergeLines(sources.flatMap(fittedParts)).map(({ line }) => line);

/** Quantity, designators, description, value, tolerance and rating, part number, as one reads them. */
function rows(...sources: NoteSource[]): string[] {
  return merged(...sources).map((line) =>
    [
      line.quantity,
      line.designators.map(({ text }) => text).join(', '),
      descriptionText(line),
      valueText(line),
      ratingText(line),
      line.partNumber ?? '–',
    ]
      .join(' | ')
      .replaceAll('\u00a0', ' '),
  );
}

describe('merged lines', () => {
  it('puts equal parts of all stages on one line, designators in natural order', () => {
    expect(rows(Q12, Q2, Q1)).toEqual([
      '3 | Q1, Q2, Q12 | Transistor, NPN | 40 V | 0.2 A | 2N3904',
      '1 | R6 | Resistor | 430 Ω | ±5 %, 0.1 W | –',
      '2 | R4, R30 | Resistor | 620 Ω | ±5 %, 0.1 W | –',
      '3 | R5, R7, R31 | Resistor | 22 kΩ | ±5 %, 0.1 W | –',
      '3 | D1, D2, D9 | Diode, coil clamp | 75 V | 0.2 A | 1N4148W type',
      '3 | K1, K2, K5 | Coil (relay, valve) | 1.44 kΩ | ±10 %, 20 °C | RL-24-1440',
    ]);
  });

  it('does not depend on the order in which the stages come', () => {
    expect(rows(Q1, Q2, Q12)).toEqual(rows(Q12, Q1, Q2));
  });

  it('counts every copy of a stage the board has more than once', () => {
    const twice = source({ reference: 'Q3', quantity: 2 }, { baseResistor: 'R9' });
    const [transistors, resistors] = rows(Q1, twice);
    expect(transistors).toBe('3 | Q1, Q3 ×2 | Transistor, NPN | 40 V | 0.2 A | 2N3904');
    expect(resistors).toBe('3 | R4, R9 ×2 | Resistor | 620 Ω | ±5 %, 0.1 W | –');
  });

  it.each<[string, Partial<StageFile>]>([
    ['tolerance', { baseResistor: { valueOhm: 620, tolerance: 0.01, ratingW: 0.1 } }],
    ['rating', { baseResistor: { valueOhm: 620, tolerance: 0.05, ratingW: 0.25 } }],
    ['value', { baseResistor: { valueOhm: 621, tolerance: 0.05, ratingW: 0.1 } }],
  ])('keeps resistors of different %s apart', (_, stage) => {
    const other = source({ reference: 'Q3', ...stage }, { baseResistor: 'R9' });
    expect(rows(Q1, other).filter((row) => /\| R(4|9) \|/.test(row))).toHaveLength(2);
  });

  it('keeps parts of different library revisions apart', () => {
    const [first] = Q1.parts;
    const newer = { ...Q2, parts: [{ ...first!, revision: 3, latestRevision: 3 }] };
    const transistors = merged(Q1, newer).filter(({ partNumber }) => partNumber === '2N3904');
    expect(transistors.map(({ partRevision }) => partRevision)).toEqual([2, 3]);
  });

  it('takes the recommended base resistor where the definition leaves it open', () => {
    const open = source(
      { reference: 'Q3', baseResistor: { valueOhm: null, tolerance: 0.05 }, shuntResistor: null },
      { baseResistor: 'R9' },
      { evaluation: { verdict: 'pass', baseResistorOhm: 470 } },
    );
    expect(rows(open)[1]).toBe('1 | R9 | Resistor | 470 Ω | ±5 % | –');
  });

  it('lists both transistors and all resistors of a two-transistor high side', () => {
    const stage = source(
      {
        reference: 'Q6',
        topology: 'two-transistor-high-side',
        transistor: PNP,
        preDriver: {
          transistor: { ...PNP, partNumber: '2N3904', polarity: 'npn' },
          baseResistor: { valueOhm: 4700, tolerance: 0.05 },
          shuntResistor: { valueOhm: 10000, tolerance: 0.05 },
        },
        clamp: { kind: 'none' },
        load: { kind: 'resistor', resistanceOhm: 820, tolerance: 0.05 },
      },
      {
        baseResistor: 'R1',
        shuntResistor: 'R2',
        preDriver: 'Q7',
        preBaseResistor: 'R3',
        preShuntResistor: 'R4',
        load: 'H1',
      },
    );
    expect(rows(stage)).toEqual([
      '1 | Q7 | Transistor, NPN | 40 V | 0.2 A | 2N3904',
      '1 | Q6 | Transistor, PNP | 40 V | 0.2 A | 2N3906',
      '1 | R1 | Resistor | 620 Ω | ±5 %, 0.1 W | –',
      '1 | R3 | Resistor | 4.7 kΩ | ±5 % | –',
      '1 | R4 | Resistor | 10 kΩ | ±5 % | –',
      '1 | R2 | Resistor | 22 kΩ | ±5 %, 0.1 W | –',
      '1 | H1 | Load, resistive | 820 Ω | ±5 % | RL-24-1440',
    ]);
  });

  it('lists pull-up, speed-up capacitor, and diode with Zener', () => {
    const stage = source(
      {
        reference: 'Q3',
        drive: {
          kind: 'open-collector',
          railV: { min: 3, max: 3.6 },
          low: { levelV: 0.4, currentA: 0.008 },
          sourceLimitA: null,
          sinkLimitA: 0.02,
          pullUp: { valueOhm: 4700, tolerance: 0.05 },
        },
        shuntResistor: null,
        speedUpCapacitorF: 470e-12,
        clamp: {
          kind: 'diode-zener',
          forwardV: 1,
          reverseV: 75,
          currentRatingA: 0.2,
          zenerV: { min: 22.8, max: 25.6 },
          powerRatingW: 0.5,
        },
      },
      { pullUp: 'R8', speedUpCapacitor: 'C2', clamp: 'D3', clampZener: 'D4', baseResistor: 'R7' },
    );
    expect(rows(stage).slice(1, 6)).toEqual([
      '1 | R7 | Resistor | 620 Ω | ±5 %, 0.1 W | –',
      '1 | R8 | Resistor | 4.7 kΩ | ±5 % | –',
      '1 | C2 | Capacitor, speed-up | 470 pF | – | –',
      '1 | D3 | Diode, coil clamp | 75 V | 0.2 A | 1N4148W type',
      '1 | D4 | Zener diode, coil clamp | 22.8…25.6 V | 0.5 W | –',
    ]);
  });

  it('lists the series resistor of LEDs, and no base resistor where a wire stands for it', () => {
    const stage = source(
      {
        reference: 'Q9',
        topology: 'low-side-pre-biased',
        load: {
          kind: 'led-string',
          count: 2,
          forwardV: { min: 1.8, max: 2.2 },
          resistanceOhm: 680,
          tolerance: 0.05,
          maximumA: 0.03,
          minimumA: null,
        },
        transistor: { ...PNP, polarity: 'npn', internal: { r1Ohm: 10_000, r2Ohm: 10_000 } },
        baseResistor: { valueOhm: 0, tolerance: 0 },
        shuntResistor: null,
        clamp: null,
      },
      { load: 'D4', loadResistor: 'R12' },
    );
    expect(rows(stage).map((row) => row.split(' | ').slice(0, 4).join(' | '))).toEqual([
      '1 | Q9 | Transistor, NPN pre-biased | 40 V',
      '1 | R12 | Resistor | 680 Ω',
      '1 | D4 | LED, string of 2 | 1.8…2.2 V',
    ]);
  });

  it.each<[StageFile['load'], string]>([
    [
      {
        kind: 'led-string',
        count: 5,
        forwardV: { min: 1.8, max: 2.2 },
        resistanceOhm: 680,
        tolerance: 0.05,
        maximumA: 0.03,
        minimumA: null,
      },
      '1 | H1 | LED, string of 5 | 1.8…2.2 V | 0.03 A | RL-24-1440',
    ],
    [
      { kind: 'lamp', nominalV: 24, currentA: 0.08, coldRatio: 10 },
      '1 | H1 | Lamp, filament | 24 V | 0.08 A | RL-24-1440',
    ],
    [
      {
        kind: 'logic-input',
        pullUpOhm: 10000,
        tolerance: 0.05,
        ratingW: 0.1,
        count: 1,
        vilV: 0.8,
        vihV: 2,
        leakageA: 1e-6,
        lowCurrentA: 1e-4,
        capacitanceF: null,
        wiringF: null,
        riseTimeLimitSec: null,
      },
      '1 | H1 | Resistor | 10 kΩ | ±5 %, 0.1 W | –',
    ],
  ])('lists the load %o', (load, row) => {
    const clamp = { kind: 'none' } as const;
    expect(rows(source({ reference: 'Q3', load, clamp }, { load: 'H1' }))).toContain(row);
  });

  it('labels transistor figures typed by hand, and says where a name is missing', () => {
    const typed = { ...source({ reference: 'Q3' }), parts: [] };
    expect(rows(typed)).toEqual([
      '1 | Q3 | Transistor, NPN; data unverified | 40 V | 0.2 A | 2N3904',
      '1 | RB of Q3 | Resistor | 620 Ω | ±5 %, 0.1 W | –',
      '1 | RBE of Q3 | Resistor | 22 kΩ | ±5 %, 0.1 W | –',
      '1 | clamp diode of Q3 | Diode, coil clamp | 75 V | 0.2 A | –',
      '1 | load of Q3 | Coil (relay, valve) | 1.44 kΩ | ±10 %, 20 °C | –',
    ]);
  });

  it('flags the designators of a revision that is not locked, and no others', () => {
    const [transistors] = merged(Q1, Q12_IN_CHECK);
    expect(transistors?.designators).toEqual([
      { text: 'Q1', flagged: false },
      { text: 'Q12', flagged: true },
    ]);
  });
});
