import canonicalize from 'canonicalize';
import { deriveTransistor } from '../../shared/parts/derive-transistor.ts';
import type { PartRecord } from '../../shared/parts/part-record.ts';
import type { TransistorData } from '../../shared/stage/transistor-data.ts';

/**
 * Whether a stage's transistor figures are still those of the library record they claim to come from. A link whose
 * figures were edited by hand must not lend them the record's verification.
 *
 * @param choice gain group, package and maker as linked; an empty one leaves it open
 */
export function isFromLibrary(
  record: PartRecord,
  choice: Readonly<Record<string, string>>,
  data: TransistorData,
): boolean {
  if (record.kind !== 'transistor') return false;
  const open = (key: string) => (choice[key] === '' ? null : (choice[key] ?? null));
  const derived = deriveTransistor(record, {
    group: open('group'),
    package: open('package'),
    maker: open('maker'),
  });
  return derived.ok && canonicalize(derived.data) === canonicalize(data);
}
