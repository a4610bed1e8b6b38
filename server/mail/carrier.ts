import type { Letter } from './letter.ts';

/** Whatever takes a letter out of the house. */
export interface Carrier {
  /** @param id stays the same over all attempts, so that a repeat is known as one */
  carry(id: string, letter: Letter): Promise<void>;
}
