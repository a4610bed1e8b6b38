import type { PartKind } from '../../../shared/parts/part-record.ts';
import type { Confidence } from '../../../shared/parts/provenance.ts';

/** What the kinds of part are called, one and many. */
export const KIND_WORDS: Record<PartKind, { readonly one: string; readonly many: string }> = {
  transistor: { one: 'Transistor', many: 'Transistors' },
  load: { one: 'Load', many: 'Loads' },
  'logic-output': { one: 'Logic output', many: 'Logic outputs' },
  diode: { one: 'Diode', many: 'Diodes' },
};

/** How sure a figure is, in words. */
export const CONFIDENCE_WORDS: Record<Confidence, string> = {
  high: 'read in the maker’s table',
  medium: 'from a related document',
  memory: 'from memory, not confirmed',
};
