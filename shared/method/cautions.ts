/** A caution as it stands on sheets, documents and the method page. */
export interface Caution {
  readonly id: 'judgement' | 'governed-fields' | 'stored-energy' | 'part-data';
  /** Two or three words for a heading. */
  readonly title: string;
  /** One line for a sheet or the foot of a document. */
  readonly short: string;
  /** The whole of it, for the method page. */
  readonly text: string;
}

/** Stands wherever figures of the engine leave it: stage sheet, check, lock, BOM note, method page. */
export const CAUTIONS: readonly Caution[] = [
  {
    id: 'judgement',
    title: 'Figures and judgement',
    short:
      'Figures replace neither the current data sheet nor measurement nor a qualified judgement.',
    text: 'Every figure here follows from part data and stated rules. It replaces neither the data sheet in its current issue, nor a measurement on the built stage, nor the judgement of a qualified person.',
  },
  {
    id: 'governed-fields',
    title: 'Where standards govern',
    short:
      'Mains, safety functions, medical devices, vehicles: the standards and local codes that apply govern, and a licensed practitioner decides.',
    text: 'Where a stage or its load touches mains, a safety function, a medical device or a vehicle, the standards and local codes that apply there govern, not the limits set here. A licensed practitioner decides.',
  },
  {
    id: 'stored-energy',
    title: 'Stored energy',
    short:
      'Inductive loads store energy: without a clamp the turn-off voltage destroys the transistor.',
    text: 'A coil keeps its current going when the transistor turns off. Without a path for it the collector voltage rises until something breaks down; with one, the load stays on for longer. Terminals of a running coil can give a shock.',
  },
  {
    id: 'part-data',
    title: 'Part data',
    short: 'Part data names its source; what nobody has verified is marked unverified.',
    text: 'Part data that ships with the product says where each figure was read. Until a person has compared it with the maker’s document it is unverified, and says so on every screen and in every export.',
  },
];
