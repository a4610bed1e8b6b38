import { type CornerSpace, cornerNamed } from '../stage/corners.ts';
import {
  CRITERIA,
  criterionIds,
  criterionNumber,
  type CriterionId,
  ownCriterionIds,
} from './criteria.ts';
import type { Criterion, Unit } from './evaluation.ts';
import { FigureBoard, UNSET } from './figure-board.ts';
import { evenMargin, leastLimit, marginOf, roundedMargin, statusOf } from './margin.ts';

/** Corners whose margins differ by less than this count as equally bad; the first is reported. */
const SAME = 1e-9;

/** Of figures that no corner moves. */
export const NO_CORNER = -1;

const IDS = criterionIds();
/** Those of a transistor in front are judged under their own names. */
const OWN_COUNT = ownCriterionIds().length;

/** What caps or replaces the status a margin alone would give. */
export type Standing =
  'judged' | 'at-best-marginal' | 'at-best-open' | 'open-if-missed' | 'unknown' | 'stated';

/**
 * The worst figure of every criterion over the corners of a stage. Typed arrays, filled in place: reading a
 * corner costs a comparison per criterion. A criterion takes part once `note` or `stand` names it.
 */
export class WorstCases extends FigureBoard {
  private readonly keys = new Float64Array(IDS.length).fill(Infinity);
  private readonly value = new Float64Array(IDS.length).fill(NaN);
  private readonly limit = new Float64Array(IDS.length).fill(NaN);
  private readonly corner = new Int32Array(IDS.length).fill(NO_CORNER);
  private readonly used = new Uint8Array(IDS.length);
  /** 1 for a ≤ criterion, −1 for a ≥ one. */
  private readonly sign = Float64Array.from(IDS, (id) => (CRITERIA[id].relation === '<=' ? 1 : -1));
  private readonly least = Float64Array.from(IDS, (id) => leastLimit(CRITERIA[id].unit));
  private readonly units: Unit[] = IDS.map((id) => CRITERIA[id].unit);
  private readonly standings = new Map<number, Standing>();

  /** Forgets all figures and standings. */
  reset(): void {
    this.limits.fill(UNSET);
    this.keys.fill(Infinity);
    this.value.fill(NaN);
    this.limit.fill(NaN);
    this.corner.fill(NO_CORNER);
    this.used.fill(0);
    this.standings.clear();
  }

  /** Takes in what was noted since the last call as the figures of a corner; −1 for figures that no corner moves. */
  take(corner: number): void {
    for (let k = 0; k < OWN_COUNT; k++) if (this.limits[k] !== UNSET) this.takeOne(k, corner);
  }

  noteAt(k: number, value: number, limit: number, corner: number): void {
    this.note(k, value, limit);
    this.takeOne(k, corner);
  }

  private takeOne(k: number, corner: number): void {
    const sign = this.sign[k] ?? 1;
    const value = this.figures[k] ?? NaN;
    const limit = this.limits[k] ?? NaN;
    this.limits[k] = UNSET;
    // A limit of NaN leaves the figure itself to be compared.
    const key = Number.isNaN(limit)
      ? -sign * value
      : marginOf(sign, value, limit, this.least[k] ?? 0);
    const before = this.keys[k] ?? Infinity;
    this.used[k] = 1;
    if (key < before - SAME * Math.min(1e12, Math.max(1, Math.abs(key))) || before === Infinity) {
      this.keys[k] = key;
      this.value[k] = value;
      this.limit[k] = limit;
      this.corner[k] = corner;
    }
  }

  /** Says what a criterion's status may be besides what its margin gives. */
  stand(id: CriterionId, standing: Standing): void {
    this.used[criterionNumber(id)] = 1;
    this.standings.set(criterionNumber(id), standing);
  }

  /** Whether a figure or a standing of the criterion has come in. */
  takesPart(id: CriterionId): boolean {
    return this.used[criterionNumber(id)] === 1;
  }

  standing(id: CriterionId): Standing {
    return this.standings.get(criterionNumber(id)) ?? 'judged';
  }

  measureIn(id: CriterionId, unit: Unit): void {
    this.units[criterionNumber(id)] = unit;
    this.least[criterionNumber(id)] = leastLimit(unit);
  }

  /** The largest or smallest figure kept so far; NaN where none. */
  worst(id: CriterionId): number {
    return this.value[criterionNumber(id)] ?? NaN;
  }

  /** Smallest margin kept so far, on the scale of `evenMargin`; without a limit the extreme figure itself never counts. */
  key(id: CriterionId): number {
    const k = criterionNumber(id);
    if (Number.isNaN(this.limit[k])) return Infinity;
    return evenMargin(this.sign[k] ?? 1, this.keys[k] ?? Infinity);
  }

  /** All criteria that took part, in the order of the table. */
  criteria(corners: CornerSpace, band: number): Criterion[] {
    return IDS.filter((_, k) => this.used[k] === 1).map((id) => this.criterion(id, corners, band));
  }

  private criterion(id: CriterionId, corners: CornerSpace, band: number): Criterion {
    const k = criterionNumber(id);
    const { relation } = CRITERIA[id];
    const standing = this.standings.get(k) ?? 'judged';
    const value = this.value[k] ?? NaN;
    const limit = this.limit[k] ?? NaN;
    const corner = this.corner[k] ?? NO_CORNER;
    const known = standing !== 'unknown';
    const judged = known && standing !== 'stated' && !Number.isNaN(limit);
    const margin = roundedMargin(this.keys[k] ?? NaN, band);
    return {
      id,
      value: known ? finite(value) : null,
      limit: standing === 'stated' ? null : finite(limit),
      relation,
      unit: this.units[k] ?? CRITERIA[id].unit,
      margin: judged ? finite(margin) : null,
      status: status(standing, judged ? margin : NaN, band),
      corner: known && corner !== NO_CORNER ? cornerNamed(corners, corner) : null,
    };
  }
}

function finite(value: number): number | null {
  return Number.isFinite(value) ? value + 0 : null; // + 0: no minus zero in a result
}

function status(standing: Standing, margin: number, band: number): Criterion['status'] {
  if (standing === 'unknown') return 'open';
  if (standing === 'stated' || Number.isNaN(margin)) {
    return standing === 'at-best-open' ? 'open' : 'stated';
  }
  const plain = statusOf(margin, band);
  if (plain === 'fail') return standing === 'open-if-missed' ? 'open' : plain;
  if (standing === 'at-best-open') return 'open';
  return standing === 'at-best-marginal' ? 'marginal' : plain;
}
