import type { Law } from './law.ts';
import { CONDITION_LAWS } from './laws/conditions.ts';
import { CRITERION_LAWS } from './laws/criteria.ts';
import { OFF_LAWS } from './laws/off-and-turn-off.ts';
import { SWITCHING_LAWS } from './laws/switching.ts';
import { TRANSISTOR_LAWS } from './laws/transistor.ts';

const ALL = {
  ...CONDITION_LAWS,
  ...TRANSISTOR_LAWS,
  ...CRITERION_LAWS,
  ...OFF_LAWS,
  ...SWITCHING_LAWS,
};
export type LawId = keyof typeof ALL;

/** Every law of the calculation: the method page and the calculation sheet take it from here. */
export const LAWS: Readonly<Record<LawId, Law>> = ALL;
