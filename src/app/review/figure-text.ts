import type { Criterion } from '../../../shared/checks/evaluation.ts';
import { formatNumber, formatQuantity } from '../../../shared/units/engineering-notation.ts';

type Judged = Pick<Criterion, 'value' | 'limit' | 'relation' | 'unit' | 'margin'>;

/** Value, limit and margin of a criterion as the review pages write them. */
export interface FigureText {
  readonly value: string;
  /** With its relation, `≥ 20.76 V`; null where none is set. */
  readonly limit: string | null;
  /** Per cent without the sign; empty where there is none. */
  readonly margin: string;
}

const CLOSE = 0.1;

/** Three digits; one more where value and limit lie so close that three would hide how far apart they are. */
export function figureText({ value, limit, relation, unit, margin }: Judged): FigureText {
  const close = margin !== null && Math.abs(margin) < CLOSE;
  const digits = close ? 4 : 3;
  const sign = relation === '>=' ? '≥' : '≤';
  return {
    value: formatQuantity(value, unit, { pad: true, digits }),
    limit: limit === null ? null : `${sign}\u00a0${formatQuantity(limit, unit, { digits })}`,
    margin: margin === null ? '' : formatNumber(margin * 100, { digits: close ? 2 : 3 }),
  };
}
