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
import { schematicSvg } from '../../../../shared/report/schematic/schematic-svg.ts';
import { drawSchematic } from '../../../../shared/report/schematic/schematic.ts';
import { placed, SYMBOLS } from '../../../../shared/report/schematic/symbols.ts';
import { textBox } from '../../../../shared/report/schematic/text-box.ts';
import type { StageFile } from '../../../../shared/stage/stage-input.ts';
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

const cases: Case[] = (['low-side-npn', 'high-side-pnp'] as const).flatMap((topology) =>
  (['wide', 'compact'] as const).flatMap((layout) =>
    LOADS.flatMap((load) =>
      CLAMPS.flatMap((clamp) =>
        [RELAY_DRIVER.drive, PULL_UP_DRIVE].flatMap((drive) =>
          ([RELAY_DRIVER.shuntResistor, null] as const).flatMap((shuntResistor) =>
            [null, 1e-10].flatMap((speedUpCapacitorF) =>
              [DESIGNATORS, NO_DESIGNATORS].map((designators) => {
                const transistor = {
                  ...RELAY_DRIVER.transistor,
                  partNumber: clamp === null ? '2N3904' : 'MMBT2222ALT1G',
                  polarity: topology === 'low-side-npn' ? ('npn' as const) : ('pnp' as const),
                };
                const stage = stageWith({
                  topology,
                  load,
                  clamp,
                  drive,
                  shuntResistor,
                  speedUpCapacitorF,
                  transistor,
                });
                const drawing = drawSchematic(stage, FIGURES, designators, {
                  layout,
                  resistor: 'box',
                })!;
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
    expect(cases).toHaveLength(2 * 2 * 4 * 5 * 2 * 2 * 2 * 2);
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
    })!;
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

  it('names the circuit with its live values', () => {
    const stage = stageWith({ baseResistor: { valueOhm: 4700, tolerance: 0.05 } });
    const { name } = drawSchematic(stage, null, DESIGNATORS, { layout: 'wide', resistor: 'box' })!;
    expect(name).toMatch(/NPN.*R30.*4\.7\u00a0kΩ/);
  });

  it('takes the symbols of the trade where no designators are given', () => {
    const drawing = drawSchematic(stageWith(), null, NO_DESIGNATORS, {
      layout: 'wide',
      resistor: 'zigzag',
    })!;
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

  it('draws nothing for a topology without a drawing', () => {
    const stage = stageWith({
      topology: 'low-side-darlington',
      transistor: { ...RELAY_DRIVER.transistor, darlington: true },
    });
    expect(drawSchematic(stage, null, DESIGNATORS, { layout: 'wide', resistor: 'box' })).toBeNull();
  });

  it('gives each part an area that holds its symbol', () => {
    const { parts, elements } = drawSchematic(stageWith(), FIGURES, DESIGNATORS, {
      layout: 'compact',
      resistor: 'box',
    })!;
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
    )!;
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
