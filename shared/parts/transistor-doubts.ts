import { outside, type Doubt } from './doubt.ts';
import { thermalDoubts } from './thermal-doubts.ts';
import type { TransistorRecord } from './transistor-record.ts';

/** What single transistors and Darlingtons have, in SI; common practice, with room on both sides. */
const USUAL = {
  single: { vbeV: [0.4, 3], vceSatV: [0.01, 2.5], gain: [5, 2000], forcedBeta: [2, 100] },
  darlington: { vbeV: [0.8, 5], vceSatV: [0.4, 5], gain: [100, 2e5], forcedBeta: [20, 5000] },
} as const;
const LEAST_CURRENT_SHARE = 1e-6;
const LEAKAGE_SHARE = 1e-3;

/** What looks slipped in a transistor record. */
export function transistorDoubts(record: TransistorRecord): Doubt[] {
  const isDarlington = record.family === 'darlington' || record.family === 'darlington-array';
  const usual = isDarlington ? USUAL.darlington : USUAL.single;
  return [
    ...ratingDoubts(record),
    ...thermalDoubts(record),
    ...rowCurrentDoubts(record),
    ...record.gain.flatMap((row, index) =>
      (['min', 'typ', 'max'] as const).flatMap((key) =>
        outside(`gain.${index}.${key}`, row[key], usual.gain, '1'),
      ),
    ),
    ...record.saturation.flatMap((row, index) => [
      ...outside(`saturation.${index}.typV`, row.typV, usual.vceSatV, 'V'),
      ...outside(`saturation.${index}.maxV`, row.maxV, usual.vceSatV, 'V'),
      ...outside(`saturation.${index}.ibA`, row.icA / row.ibA, usual.forcedBeta, '1'),
    ]),
    ...record.baseEmitter.flatMap((row, index) =>
      (['minV', 'typV', 'maxV'] as const).flatMap((key) =>
        outside(`baseEmitter.${index}.${key}`, row[key], usual.vbeV, 'V'),
      ),
    ),
    ...leakageDoubts(record),
    ...record.switching.flatMap((row, index) =>
      (['tdSec', 'trSec', 'tsSec', 'tfSec'] as const).flatMap((key) =>
        outside(`switching.${index}.${key}`, row[key], [1e-10, 1e-4], 's'),
      ),
    ),
    ...outside('vbeOnTempcoVPerK', record.vbeOnTempcoVPerK, [-0.006, 0], 'V/K'),
    ...outside('vbeSatTempcoVPerK', record.vbeSatTempcoVPerK, [-0.006, 0], 'V/K'),
  ];
}

function ratingDoubts({ limits }: TransistorRecord): Doubt[] {
  const smaller = [
    ['vcboV', 'vceoV', 'VCBO lies below VCEO.'],
    ['icPeakA', 'icA', 'ICM lies below IC.'],
    ['ibPeakA', 'ibA', 'IBM lies below IB.'],
    ['powerCaseW', 'powerW', 'Ptot at TC lies below Ptot at TA.'],
  ] as const;
  return [
    ...smaller.flatMap(([large, small, message]) => {
      const [upper, lower] = [limits[large], limits[small]];
      const slipped = upper !== null && lower !== null && upper < lower;
      return slipped ? [{ path: `limits.${large}`, message }] : [];
    }),
    ...outside('limits.veboV', limits.veboV, [2, 30], 'V'),
    ...outside('limits.tjMaxDegC', limits.tjMaxDegC, [85, 250], '°C'),
  ];
}

/** Rows measured above the rating, or far below it, have slipped in IC. */
function rowCurrentDoubts(record: TransistorRecord): Doubt[] {
  const { icA, icPeakA, ioA } = record.limits;
  const rated = icPeakA ?? icA ?? ioA;
  if (rated === null) return [];
  const usual = [rated * LEAST_CURRENT_SHARE, rated] as const;
  return (['gain', 'saturation', 'baseEmitter'] as const).flatMap((list) =>
    record[list].flatMap((row, index) => outside(`${list}.${index}.icA`, row.icA, usual, 'A')),
  );
}

/** Collector leakage grows with temperature and stays a small share of the rated current. */
function leakageDoubts({ leakage, limits }: TransistorRecord): Doubt[] {
  const rated = limits.icA ?? limits.ioA;
  return leakage.flatMap((row, index) => {
    const path = `leakage.${index}.maxA`;
    const isCooler = (other: typeof row) =>
      other.symbol === row.symbol && other.tempDegC < row.tempDegC && other.source === row.source;
    const shrinks = leakage.some((other) => isCooler(other) && other.maxA > row.maxA);
    const large = rated !== null && row.symbol !== 'IEBO' && row.maxA > rated * LEAKAGE_SHARE;
    return [
      shrinks ? { path, message: 'The leakage is smaller than at a lower temperature.' } : [],
      large
        ? { path, message: 'The leakage is more than a thousandth of IC. Check the unit.' }
        : [],
    ].flat();
  });
}
