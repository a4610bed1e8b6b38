import { chartLayout } from './chart-layout.ts';
import { axis, series, type BarsModel, type PlotModel } from './chart-model.ts';
import { chartTable } from './chart-table.ts';
import { clipSegment, textWidthPx } from './place-labels.ts';

const PLOT: PlotModel = {
  kind: 'plot',
  name: 'Output characteristics',
  x: axis('VCE', 'V', [0, 24], { exact: true }),
  y: axis('IC', 'A', [0, 0.03], { exact: true }),
  series: [
    series('IB 100 µA', [
      [0, 0],
      [1, 0.018],
      [24, 0.022],
    ]),
    series('load line', [
      [0, 0.024],
      [24, 0],
    ]),
    series('far above', [
      [0, 0.01],
      [24, 0.09],
    ]),
  ],
  points: [{ x: 0.235, y: 0.0238, label: 'operating point', shape: 'square' }],
  rules: [{ axis: 'y', value: 0.028, label: 'limit IC', tone: 'limit' }],
  bands: [{ axis: 'x', from: 2, to: 6, label: 'stage', tone: 'touch' }],
};

const BARS: BarsModel = {
  kind: 'bars',
  name: 'Sensitivity',
  of: 'input',
  value: axis('change of ODF', '1', [-1.5, 1.5]),
  rows: [
    { label: 'Logic rail', value: 1.38 },
    { label: 'Supply', value: -1.34 },
  ],
};

const numbers = (path: string) => path.match(/-?\d+(?:\.\d+)?/g)?.map(Number) ?? [];

describe.each([290, 560, 1100])('a chart laid out %d px wide', (width) => {
  it.each([PLOT, BARS])('keeps every text inside', (model) => {
    const scene = chartLayout(model, width, 240);
    expect(scene.texts.length).toBeGreaterThan(6);
    for (const { x, text, anchor, className } of scene.texts) {
      const mono = className === 'tick' || className === 'figure';
      const wide = textWidthPx(text, mono);
      const left = x - { start: 0, middle: wide / 2, end: wide }[anchor];
      expect({ text, fits: left >= -1 && left + wide <= width + 1 }).toEqual({ text, fits: true });
    }
  });

  it('cuts a curve at the frame instead of letting it run along it', () => {
    const { shapes, plot } = chartLayout(PLOT, width, 240);
    const curves = shapes.filter(({ className }) => className.startsWith('series'));
    expect(curves).toHaveLength(3);
    const ends = numbers(curves[2]!.path);
    expect(ends.at(-1)).toBeCloseTo(plot.top, 1);
    // 0.01 + 0.08·x/24 meets 0.03, the top of the axis, a quarter of the way.
    expect(ends.at(-2)).toBeCloseTo(plot.left + (plot.right - plot.left) / 4, 0);
  });

  it('places no two labels on each other', () => {
    const { texts } = chartLayout(PLOT, width, 240);
    const boxes = texts
      .filter(({ className }) => className.startsWith('label'))
      .map(({ x, y, text, anchor }) => {
        const wide = textWidthPx(text, false);
        const left = x - { start: 0, middle: wide / 2, end: wide }[anchor];
        return { text, left, right: left + wide, top: y - 9, bottom: y + 3 };
      });
    expect(boxes).toHaveLength(6);
    for (const a of boxes) {
      for (const b of boxes) {
        const apart =
          a === b ||
          a.right <= b.left ||
          b.right <= a.left ||
          a.bottom <= b.top ||
          b.bottom <= a.top;
        expect({ a: a.text, b: b.text, apart }).toEqual({ a: a.text, b: b.text, apart: true });
      }
    }
  });
});

describe('chart layout', () => {
  it('draws histogram bins from the axis up and bars from zero to both sides', () => {
    const bins = [
      { from: 0, to: 5, value: 0.1 },
      { from: 5, to: 10, value: 0.3 },
    ];
    const histogram: PlotModel = {
      ...PLOT,
      x: axis('ODF', '1', [0, 10]),
      y: axis('share', '%', [0, 0.3], { exact: true }),
      series: [],
      points: [],
      rules: [],
      bands: [],
      bins,
    };
    const { shapes, plot } = chartLayout(histogram, 400, 240);
    const drawn = shapes.find(({ className }) => className === 'bins')!.path.split('Z');
    expect(numbers(drawn[0]!)[1]).toBeCloseTo(plot.bottom - (plot.bottom - plot.top) / 3, 0);
    expect(numbers(drawn[1]!)[1]).toBeCloseTo(plot.top, 0);

    const bars = chartLayout(BARS, 560, 160).shapes.filter(({ className }) =>
      className.startsWith('bar'),
    );
    expect(bars.map(({ className }) => className)).toEqual(['bar', 'bar negative']);
    expect(numbers(bars[0]!.path)[0]).toBe(numbers(bars[1]!.path)[2]);
  });

  it('breaks a line where a figure is missing', () => {
    const broken = series('gain', [
      [0, 0.001],
      [1, 0.002],
      [2, NaN],
      [3, 0.002],
      [4, 0.003],
    ]);
    const { shapes } = chartLayout({ ...PLOT, series: [broken] }, 400, 240);
    const line = shapes.find(({ className }) => className.startsWith('series'))!;
    expect(line.path.match(/M/g)).toHaveLength(2);
  });

  it('clips a line to a box, and knows when it passes by', () => {
    const box = { left: 0, top: 0, right: 10, bottom: 10 };
    expect(clipSegment({ x: -5, y: 5 }, { x: 15, y: 5 }, box)).toEqual([
      { x: 0, y: 5 },
      { x: 10, y: 5 },
    ]);
    expect(clipSegment({ x: -5, y: 0 }, { x: 0, y: 20 }, box)).toBeNull();
  });
});

describe('chart table', () => {
  it('lists every computed x with the value of each curve there', () => {
    const { columns, rows, marks } = chartTable(PLOT);
    expect(columns).toEqual([
      { label: 'VCE', unit: 'V' },
      { label: 'IB 100 µA', unit: 'mA' },
      { label: 'load line', unit: 'mA' },
      { label: 'far above', unit: 'mA' },
    ]);
    expect(rows.map(({ cells }) => cells)).toEqual([
      ['0.0', '0.0', '24.0', '10.0'],
      ['1.0', '18.0', '23.0', '13.3'],
      ['24.0', '22.0', '0.0', '90.0'],
    ]);
    expect(marks).toEqual([
      { label: 'operating point', x: '0.2\u00a0V', y: '23.8\u00a0mA' },
      { label: 'limit IC', x: '–', y: '28.0\u00a0mA' },
      { label: 'stage', x: '2.0\u00a0V … 6.0\u00a0V', y: '–' },
    ]);
  });

  it('reads printed rows only where they stand', () => {
    const rows = series(
      'rows',
      [
        [1, 0.01],
        [3, 0.02],
      ],
      { joined: false, labelled: null, marker: 'circle' },
    );
    const curve = series('curve', [
      [0, 0],
      [2, 0.02],
    ]);
    const table = chartTable({ ...PLOT, series: [rows, curve] });
    expect(table.rows.map(({ cells }) => cells)).toEqual([
      ['0.0', '–', '0.0'],
      ['1.0', '10.0', '10.0'],
      ['2.0', '–', '20.0'],
      ['3.0', '20.0', '–'],
    ]);
  });

  it('gives bars their sign', () => {
    expect(chartTable(BARS).rows.map(({ cells }) => cells)).toEqual([
      ['Logic rail', '+1.38'],
      ['Supply', '−1.34'],
    ]);
  });
});
