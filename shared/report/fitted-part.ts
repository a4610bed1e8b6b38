import type { BomLine, BomUnit } from './bom-note.ts';
import type { LinkedPart, NoteSource } from './bom-note-source.ts';

/** Families in the order of the note. */
export const PART_FAMILIES = ['transistor', 'resistor', 'capacitor', 'clamp', 'load'] as const;
export type PartFamily = (typeof PART_FAMILIES)[number];

/** What purchasing must know of a part; equal ones share a line. */
export type Purchase = Omit<BomLine, 'line' | 'quantity' | 'designators'>;

/** One part of one stage. */
export interface FittedPart {
  readonly family: PartFamily;
  /** null where nobody named it yet. */
  readonly designator: string | null;
  /** How the stage calls it, such as `RB`. */
  readonly place: string;
  readonly source: NoteSource;
  readonly purchase: Purchase;
}

/** A purchase with everything the stage does not say left empty. */
export function purchase(
  fields: Pick<Purchase, 'description' | 'value'> & Partial<Purchase>,
): Purchase {
  return {
    tolerance: null,
    ratings: [],
    package: null,
    partNumber: null,
    approvedSources: [],
    partRevision: null,
    unverified: false,
    ...fields,
  };
}

/**
 * What the library link of a role adds. Load and clamp may be typed by hand: they are the stage's own
 * requirement then. A transistor without a link rests on figures nobody verified.
 */
export function linkFields(source: NoteSource, role: string) {
  const link: LinkedPart | undefined = source.parts.find((part) => part.role === role);
  return {
    partNumber: link?.partNumber ?? null,
    partRevision: link?.revision ?? null,
    unverified: link === undefined ? role === 'transistor' || role === 'preDriver' : !link.verified,
  };
}

/** A single value; null where the stage gives none. */
export function single(value: number | null, unit: BomUnit): BomLine['value'] {
  return value === null ? null : { min: value, max: value, unit };
}

/** Ratings that are known. */
export function ratings(...given: readonly (readonly [number | null, BomUnit])[]) {
  return given.flatMap(([value, unit]) => (value === null ? [] : [{ value, unit }]));
}
