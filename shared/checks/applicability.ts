import type { StageInput } from '../stage/stage-input.ts';
import { needsOf } from '../stage/topology-needs.ts';
import type { Finding, Verdict } from './evaluation.ts';

/** Why a stage cannot be run through its corners at all, and the verdict that gives. */
export interface Obstacle {
  readonly verdict: Verdict;
  readonly finding: Finding;
}

/** @returns null where the stage can be judged */
export function obstacleTo(input: StageInput): Obstacle | null {
  const needs = needsOf(input.topology);
  const { transistor, topology, load } = input;
  if (!needs.loads.includes(load.kind)) {
    return notJudged(`A load of kind ${load.kind} is not judged in the topology ${topology}.`);
  }
  if (transistor.polarity !== needs.polarity) {
    const text = `${transistor.partNumber} is ${transistor.polarity.toUpperCase()}, but ${topology} needs ${needs.polarity.toUpperCase()}.`;
    return { verdict: 'fail', finding: { id: 'polarity', text } };
  }
  const front = input.preDriver?.transistor;
  if (topology === 'two-transistor-high-side' && front?.polarity === 'pnp') {
    const text = `${front.partNumber} is PNP, but the transistor in front must be NPN.`;
    return { verdict: 'fail', finding: { id: 'polarity', text } };
  }
  return null;
}

function notJudged(text: string): Obstacle {
  return { verdict: 'open', finding: { id: 'not-judged', text } };
}
