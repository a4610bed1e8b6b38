import type { PortVerdict } from '../checks/port-current.ts';
import { formatPercent, formatQuantity } from '../units/engineering-notation.ts';

/** `Port PB: 47.3 mA of 80 mA over 12 pins, margin 41 %` */
export function portSentence({ port, pins, criterion }: PortVerdict): string {
  const { value, limit, margin } = criterion;
  const amount =
    value === null ? 'current not known' : formatQuantity(value, 'A', { digits: 3, pad: true });
  const allowed = limit === null ? ', no limit stated' : ` of ${formatQuantity(limit, 'A')}`;
  const over = pins === 1 ? 'over one pin' : `over ${pins} pins`;
  const left = margin === null ? '' : `, margin ${formatPercent(margin, { digits: 2 })}`;
  return `Port ${port}: ${amount}${allowed} ${over}${left}`;
}
