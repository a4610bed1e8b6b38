import { describe, expect, it } from 'vitest';
import { describeSchematic } from '../../../../shared/report/schematic/describe-schematic.ts';
import { bodyBox } from '../../../../shared/report/schematic/drawing-builder.ts';
import {
  GRID,
  type Box,
  type Drawing,
  type DrawingWire,
  type Point,
} from '../../../../shared/report/schematic/drawing.ts';
import { wrapped } from '../../../../shared/report/schematic/part-words.ts';
import { schematicSvg } from '../../../../shared/report/schematic/schematic-svg.ts';
import { drawSchematic } from '../../../../shared/report/schematic/schematic.ts';
import { placed, SYMBOLS } from '../../../../shared/report/schematic/symbols.ts';
import { textBox } from '../../../../shared/report/schematic/text-box.ts';
import type { CornerFigures } from '../../../../shared/checks/evaluation.ts';
import type { StageFile, Topology } from '../../../../shared/stage/stage-input.ts';
import {
  DESIGNATORS,
  FIGURES,
  NO_DESIGNATORS,
  PULL_UP_DRIVE,
  RELAY_DRIVER,
  stageWith,
} from './stage-samples.ts';

const LOADS: StageFile['load'][] = [
  RELAY_DRIVER.load,
  { kind: 'resistor', resistanceOhm: 1e6, tolerance: 0.05 },
  { kind: 'lamp', nominalV: 24, currentA: 0.05, coldRatio: 12 },
  {
    kind: 'led-string',
    count: 6,
    forwardV: { min: 1.8, max: 2.4 },
    resistanceOhm: 470,
    tolerance: 0.05,
    maximumA: null,
    minimumA: null,
  },
];
const CLAMPS: StageFile['clamp'][] = [
  null,
  { kind: 'diode', forwardV: 1, currentRatingA: 0.2 },
  { kind: 'diode-zener', forwardV: 1, zenerV: { min: 22.8, max: 25.6 } },
  { kind: 'zener-across-transistor', zenerV: { min: 34, max: 38 } },
  { kind: 'tvs-across-transistor', zenerV: { min: 34, max: 53.3 }, standOffV: 30 },
];

interface Case {
  readonly title: string;
  readonly drawing: Drawing;
}

const LOGIC_INPUT: StageFile['load'] = {
  kind: 'logic-input',
  pullUpOhm: 12_100,
  tolerance: 0.01,
  ratingW: 0.1,
  count: 2,
  vilV: 0.8,
  vihV: 3.5,
  leakageA: 1e-6,
  lowCurrentA: 0,
  capacitanceF: 1e-11,
  wiringF: 2e-11,
  riseTimeLimitSec: null,
};
const PRE_DRIVER: NonNullable<StageFile['preDriver']> = {
  transistor: RELAY_DRIVER.transistor,
  baseResistor: { valueOhm: 4700, tolerance: 0.05, ratingW: 0.1 },
  shuntResistor: { valueOhm: 22_000, tolerance: 0.05, ratingW: 0.1 },
};
const INSIDE = { r1Ohm: 4700, r2Ohm: 10_000, input: { onV: 2.5, onOutputA: 0.02, offV: 0.3 } };

interface Circuit {
  readonly topology: Topology;
  readonly loads: readonly StageFile['load'][];
  readonly change: (shunt: StageFile['shuntResistor']) => Partial<StageFile>;
  readonly figures?: CornerFigures;
}

const plain = () => ({});
const pnp = { polarity: 'pnp' } as const;
const front = (shuntResistor: StageFile['shuntResistor']) => ({
  preDriver: { ...PRE_DRIVER, shuntResistor },
});
const inside = (input: object | null) => () => ({
  transistor: { ...RELAY_DRIVER.transistor, internal: { ...INSIDE, input } },
});

const CIRCUITS: readonly Circuit[] = [
  { topology: 'low-side-npn', loads: [...LOADS, LOGIC_INPUT], change: plain },
  {
    topology: 'high-side-pnp',
    loads: LOADS,
    change: () => ({ transistor: { ...RELAY_DRIVER.transistor, ...pnp } }),
  },
  {
    topology: 'two-transistor-high-side',
    loads: LOADS,
    change: (shunt) => ({ ...front(shunt), transistor: { ...RELAY_DRIVER.transistor, ...pnp } }),
  },
  {
    topology: 'two-transistor-high-side',
    loads: LOADS,
    change: (shunt) => ({ ...front(shunt), transistor: { ...RELAY_DRIVER.transistor, ...pnp } }),
    figures: { ...FIGURES, corner: { ...FIGURES.corner, veb: 'min' } },
  },
  { topology: 'low-side-darlington', loads: [...LOADS, LOGIC_INPUT], change: plain },
  {
    topology: 'low-side-pre-biased',
    loads: [...LOADS, LOGIC_INPUT],
    change: () => ({
      ...inside(INSIDE.input)(),
      baseResistor: { valueOhm: 0, tolerance: 0 },
    }),
  },
  { topology: 'low-side-pre-biased', loads: LOADS, change: inside(null) },
  { topology: 'level-translator', loads: [LOGIC_INPUT], change: plain },
];

const cases: Case[] = CIRCUITS.flatMap(({ topology, loads, change, figures = FIGURES }) =>
  (['wide', 'compact'] as const).flatMap((layout) =>
    loads.flatMap((load) =>
      CLAMPS.flatMap((clamp) =>
        [RELAY_DRIVER.drive, PULL_UP_DRIVE].flatMap((drive) =>
          ([RELAY_DRIVER.shuntResistor, null] as const).flatMap((shuntResistor) =>
            [null, 1e-10].flatMap((speedUpCapacitorF) =>
              [DESIGNATORS, NO_DESIGNATORS].map((designators) => {
                const changed = change(shuntResistor);
                const transistor = {
                  ...(changed.transistor ?? RELAY_DRIVER.transistor),
                  partNumber: clamp === null ? '2N3904' : 'MMBT2222ALT1G',
                };
                const base = { valueOhm: 12_100, tolerance: 0.01, ratingW: 0.1 };
                const stage = stageWith({
                  ...{ topology, load, clamp, drive, shuntResistor, speedUpCapacitorF },
                  ...{ baseResistor: base, ...changed, transistor },
                });
                const drawing = drawSchematic(stage, figures, designators, {
                  layout,
                  resistor: 'box',
                });
                const title = [
                  topology,
                  layout,
                  load.kind,
                  stage.clamp.kind,
                  drive.kind,
                  shuntResistor === null ? 'no RBE' : 'RBE',
                  speedUpCapacitorF === null ? 'no C' : 'C',
                  designators === DESIGNATORS ? 'named' : 'unnamed',
                ].join(', ');
                return { title, drawing };
              }),
            ),
          ),
        ),
      ),
    ),
  ),
);

const wiresOf = (drawing: Drawing) =>
  drawing.elements.filter((element): element is DrawingWire => element.kind === 'wire');

const segmentsOf = (drawing: Drawing): [Point, Point][] =>
  wiresOf(drawing).flatMap(({ points }) =>
    points.slice(1).map((point, index): [Point, Point] => [points[index]!, point]),
  );

const symbolsOf = (drawing: Drawing) =>
  drawing.elements.filter((element) => element.kind === 'symbol');

const terminalsOf = (drawing: Drawing): Point[] =>
  symbolsOf(drawing).flatMap(({ symbol, at, turn }) =>
    Object.values(SYMBOLS[symbol].terminals).map((terminal) => placed(terminal, turn, at)),
  );

const same = (a: Point, b: Point) => a.x === b.x && a.y === b.y;

function lies(point: Point, [a, b]: [Point, Point]): boolean {
  const onX = point.x >= Math.min(a.x, b.x) && point.x <= Math.max(a.x, b.x);
  const onY = point.y >= Math.min(a.y, b.y) && point.y <= Math.max(a.y, b.y);
  return onX && onY && (a.x === b.x || a.y === b.y);
}

function overlap(a: Box, b: Box): boolean {
  return a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
}

/** Ways out of a point: along wires, and into symbols. */
function waysFrom(point: Point, drawing: Drawing): Set<string> {
  const ways = new Set<string>();
  for (const [a, b] of segmentsOf(drawing)) {
    if (!lies(point, [a, b])) continue;
    for (const end of [a, b]) {
      if (!same(end, point))
        ways.add(`${Math.sign(end.x - point.x)},${Math.sign(end.y - point.y)}`);
    }
  }
  for (const { symbol, at, turn } of symbolsOf(drawing)) {
    for (const terminal of Object.values(SYMBOLS[symbol].terminals)) {
      const end = placed(terminal, turn, at);
      if (!same(end, point)) continue;
      const box = bodyBox(symbol, at, turn);
      const centre = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
      const upright = Math.abs(end.y - centre.y) >= box.height / 2 - 1;
      ways.add(upright ? `0,${Math.sign(centre.y - end.y)}` : `${Math.sign(centre.x - end.x)},0`);
    }
  }
  return ways;
}

/** Titles of the cases that break a rule, with what breaks it. */
function faults(rule: (drawing: Drawing) => string[]): string[] {
  return cases.flatMap(({ title, drawing }) => rule(drawing).map((fault) => `${title}: ${fault}`));
}

describe('schematic', () => {
  it('draws every mix of topology, layout, load, clamp, drive and base network', () => {
    const loads = 5 + 4 + 4 + 4 + 5 + 5 + 4 + 1;
    expect(cases).toHaveLength(loads * 2 * 5 * 2 * 2 * 2 * 2);
    expect(cases.every(({ drawing }) => drawing.elements.length > 10)).toBe(true);
  });

  it('keeps every wire upright or level, with both ends on the grid', () => {
    const off = (drawing: Drawing) =>
      segmentsOf(drawing)
        .filter(
          ([a, b]) =>
            (a.x !== b.x && a.y !== b.y) ||
            [a.x, a.y, b.x, b.y].some((coordinate) => coordinate % GRID !== 0),
        )
        .map((segment) => JSON.stringify(segment));
    expect(faults(off)).toEqual([]);
  });

  it('joins every terminal of every symbol to a wire or another terminal', () => {
    const loose = (drawing: Drawing) => {
      const terminals = terminalsOf(drawing);
      return terminals
        .filter(
          (terminal, index) =>
            !segmentsOf(drawing).some((segment) => lies(terminal, segment)) &&
            !terminals.some((other, at) => at !== index && same(other, terminal)),
        )
        .map((terminal) => JSON.stringify(terminal));
    };
    expect(faults(loose)).toEqual([]);
  });

  it('ends every wire at a terminal, a dot or another wire', () => {
    const dangling = (drawing: Drawing) => {
      const terminals = terminalsOf(drawing);
      return wiresOf(drawing)
        .flatMap(({ points }) => [points[0]!, points.at(-1)!])
        .filter(
          (end) =>
            !terminals.some((terminal) => same(terminal, end)) &&
            !drawing.elements.some((dot) => dot.kind === 'dot' && same(dot.at, end)) &&
            wiresOf(drawing).filter(({ points }) => points.some((point) => same(point, end)))
              .length < 2,
        )
        .map((end) => JSON.stringify(end));
    };
    expect(faults(dangling)).toEqual([]);
  });

  it('puts a dot where three ways meet, and never one where four do', () => {
    const wrong = (drawing: Drawing) => {
      const dots = drawing.elements.filter((element) => element.kind === 'dot');
      const nodes = [...terminalsOf(drawing), ...wiresOf(drawing).flatMap(({ points }) => points)];
      const undotted = nodes.filter(
        (node) => waysFrom(node, drawing).size > 2 && !dots.some(({ at }) => same(at, node)),
      );
      const crowded = dots.filter(({ at }) => waysFrom(at, drawing).size !== 3);
      return [
        ...undotted.map((node) => `no dot at ${JSON.stringify(node)}`),
        ...crowded.map(({ at }) => `${waysFrom(at, drawing).size} ways at ${JSON.stringify(at)}`),
      ];
    };
    expect(faults(wrong)).toEqual([]);
  });

  it('lets no text touch a wire, a symbol or another text, nor leave the frame', () => {
    const clashes = (drawing: Drawing) => {
      const texts = drawing.elements
        .filter((element) => element.kind === 'text')
        .map((text) => ({ words: text.runs.map((run) => run.text).join(''), box: textBox(text) }));
      const wires = segmentsOf(drawing).map(([a, b]) => ({
        x: Math.min(a.x, b.x) - 0.75,
        y: Math.min(a.y, b.y) - 0.75,
        width: Math.abs(a.x - b.x) + 1.5,
        height: Math.abs(a.y - b.y) + 1.5,
      }));
      const bodies = symbolsOf(drawing).flatMap(({ symbol, at, turn }) =>
        symbol === 'npn' || symbol === 'pnp'
          ? [{ x: at.x + 14, y: at.y - 16, width: 38, height: 32 }]
          : symbol === 'darlington-npn'
            ? [{ x: at.x + 12, y: at.y - 24, width: 72, height: 64 }]
            : symbol === 'pre-biased-npn'
              ? [{ x: at.x + 10, y: at.y - 32, width: 78, height: 64 }]
              : symbol === 'coil'
                ? [{ x: at.x - 24, y: at.y - 12, width: 48, height: 24 }]
                : symbol === 'push-pull' || symbol === 'open-collector'
                  ? [{ x: at.x - 24, y: at.y - 24, width: 48, height: 48 }]
                  : [bodyBox(symbol, at, turn)],
      );
      return texts.flatMap(({ words, box }, index) => {
        const others = texts.filter((other, at) => at > index && overlap(box, other.box));
        return [
          ...others.map((other) => `“${words}” over “${other.words}”`),
          ...wires.filter((wire) => overlap(box, wire)).map(() => `“${words}” over a wire`),
          ...bodies.filter((body) => overlap(box, body)).map(() => `“${words}” over a symbol`),
          ...(box.x < 0 || box.y < 0 || box.x + box.width > drawing.width
            ? [`“${words}” cut`]
            : []),
        ];
      });
    };
    expect(faults(clashes)).toEqual([]);
  });

  it('writes the corner figures of the relay driver at their places', () => {
    const drawing = drawSchematic(stageWith(), FIGURES, DESIGNATORS, {
      layout: 'wide',
      resistor: 'box',
    });
    const lines = Object.fromEntries(
      describeSchematic(drawing).map(({ ref, value }) => [ref, value.replaceAll('\u00a0', ' ')]),
    );
    expect(lines).toMatchObject({
      vs: 'VS 26.4 V',
      rail: '3 V',
      vo: '2.79 V',
      ir: '2.76 mA',
      baseResistor: '620 Ω ±5 %',
      vbe: 'VBE 0.995 V',
      ib: 'IB 2.71 mA',
      ic: 'IC 24.0 mA',
      vce: '0.235 V',
      ishunt: '48.0 µA',
      'corner-resistors': 'R30 +, R31 −',
      'corner-coil': '−10 %',
    });
  });

  const wide = { layout: 'wide', resistor: 'box' } as const;
  const circuit = (topology: Topology) => {
    const { loads, change } = CIRCUITS.find((each) => each.topology === topology)!;
    return stageWith({ topology, load: loads.at(-1)!, clamp: null, ...change(null) });
  };
  const textOf = (drawing: Drawing) =>
    Object.fromEntries(
      describeSchematic(drawing).map(({ ref, value }) => [ref, value.replaceAll('\u00a0', ' ')]),
    );

  it('draws the transistor in front with its own network, and the base resistor between the two', () => {
    const stage = { ...circuit('two-transistor-high-side'), load: stageWith().load };
    const drawing = drawSchematic(stage, FIGURES, DESIGNATORS, wide);
    expect(textOf(drawing)).toMatchObject({
      'preDriver-0': '2N3904',
      preBaseResistor: '4.7 kΩ ±5 %',
      baseResistor: '620 Ω ±5 %',
      'ir-output': '2.76 mA',
      'vce-front': '2.79 V',
      vbe: 'VEB 0.995 V',
    });
    expect(drawing.name).toMatch(/pre-driver Q13, 2N3904; base resistor of the pre-driver R34/);
    expect(drawing.parts.map(({ key }) => key)).toEqual(
      expect.arrayContaining(['preDriver', 'preBaseResistor', 'baseResistor', 'transistor']),
    );
  });

  it('shows the figures of a corner at the transistor it belongs to', () => {
    const stage = circuit('two-transistor-high-side');
    const corner = { ...FIGURES.corner, veb: 'min' };
    const drawing = drawSchematic(stage, { ...FIGURES, corner }, DESIGNATORS, wide);
    const text = textOf(drawing);
    expect(text).toMatchObject({ vo: '2.79 V', vbe: 'VBE 0.995 V', 'ir-output': '24.0 mA' });
    expect(text).toMatchObject({ 'corner-resistors': 'R34 +, R35 −', 'corner-load': 'R30 −' });
    expect(text).not.toHaveProperty('vc');
  });

  it('leads a bare wire into a pre-biased part without a resistor before it', () => {
    const drawing = drawSchematic(circuit('low-side-pre-biased'), FIGURES, DESIGNATORS, wide);
    expect(textOf(drawing)).toMatchObject({ vbe: 'VI 0.995 V', ib: 'II 2.71 mA' });
    expect(drawing.parts.map(({ key }) => key)).not.toContain('baseResistor');
    expect(drawing.name).toContain('inside R1 4.7\u00a0kΩ, R2 10\u00a0kΩ');
    expect(drawing.name).not.toContain('base resistor');
  });

  it('draws the inputs behind a level translator between its two rails', () => {
    const drawing = drawSchematic(circuit('level-translator'), FIGURES, NO_DESIGNATORS, wide);
    expect(textOf(drawing)).toMatchObject({
      vs: 'V2 26.4 V',
      rail: 'V1 3 V',
      logicInput: '2 inputs',
      'load-0': '12.1 kΩ ±1 %',
    });
    expect(drawing.name).toContain('load RC 12.1');
  });

  it('breaks a long name at its space, else where the line ends', () => {
    expect(wrapped('not chosen', 8)).toEqual(['not', 'chosen']);
    expect(wrapped('MMBT2222ALT1G', 8)).toEqual(['MMBT2222', 'ALT1G']);
    expect(wrapped('MMBT2222ALT1G', 5)).toEqual(['MMBT2', '222A…']);
  });

  it('gives the LEDs and their resistor a name each', () => {
    const drawing = drawSchematic(
      stageWith({ load: LOADS[3]!, clamp: null }),
      null,
      DESIGNATORS,
      wide,
    );
    expect(textOf(drawing)).toMatchObject({ 'load-0': '6 LEDs', 'loadResistor-0': '470 Ω ±5 %' });
    expect(drawing.name).toContain('series resistor R33 470\u00a0Ω');
  });

  it('names the circuit with its live values', () => {
    const stage = stageWith({ baseResistor: { valueOhm: 4700, tolerance: 0.05 } });
    const { name } = drawSchematic(stage, null, DESIGNATORS, { layout: 'wide', resistor: 'box' });
    expect(name).toMatch(/NPN.*R30.*4\.7\u00a0kΩ/);
  });

  it('takes the symbols of the trade where no designators are given', () => {
    const drawing = drawSchematic(stageWith(), null, NO_DESIGNATORS, {
      layout: 'wide',
      resistor: 'zigzag',
    });
    const designators = drawing.elements.flatMap((element) =>
      element.kind === 'text' && element.role === 'designator'
        ? [element.runs.map((run) => run.text).join('')]
        : [],
    );
    expect(designators).toEqual(expect.arrayContaining(['RB', 'RBE', 'K', 'D', 'U', 'Q12']));
    expect(drawing.elements).toContainEqual(
      expect.objectContaining({ symbol: 'resistor-zigzag', part: 'baseResistor' }),
    );
  });

  it('gives each part an area that holds its symbol', () => {
    const { parts, elements } = drawSchematic(stageWith(), FIGURES, DESIGNATORS, {
      layout: 'compact',
      resistor: 'box',
    });
    expect(parts.map(({ key }) => key)).toEqual(
      expect.arrayContaining(['supply', 'drive', 'baseResistor', 'shuntResistor', 'load', 'clamp']),
    );
    for (const { key, box } of parts) {
      for (const element of elements) {
        if (element.kind !== 'symbol' || element.part !== key) continue;
        const body = bodyBox(element.symbol, element.at, element.turn);
        expect(body.x).toBeGreaterThanOrEqual(box.x);
        expect(body.y + body.height).toBeLessThanOrEqual(box.y + box.height);
      }
    }
  });

  it('writes a picture that stands alone, with its texts escaped', () => {
    const drawing = drawSchematic(
      stageWith({ transistor: { ...RELAY_DRIVER.transistor, partNumber: 'A<B&C' } }),
      FIGURES,
      DESIGNATORS,
      { layout: 'wide', resistor: 'box' },
    );
    const svg = schematicSvg(
      drawing,
      {
        ink: '#000',
        quiet: '#444',
        voltage: '#165',
        current: '#841',
        selected: '#fdc',
        sansFont: 'Roboto',
        monoFont: 'Roboto',
      },
      'baseResistor',
    );
    expect(svg).toContain('A&lt;B&amp;C');
    expect(svg).toContain('<rect');
    expect(svg).not.toMatch(/NaN|undefined|style=/);
  });
});
