import { isJudgedLoad } from '../stage/collector-path.ts';
import type { StageInput, Topology } from '../stage/stage-input.ts';
import type { Finding, Verdict } from './evaluation.ts';

/** Polarity a topology's output transistor must have; topologies not listed are not judged yet. */
const POLARITY: Partial<Record<Topology, 'npn' | 'pnp'>> = {
  'low-side-npn': 'npn',
  'high-side-pnp': 'pnp',
};

/** Why a stage cannot be run through its corners at all, and the verdict that gives. */
export interface Obstacle {
  readonly verdict: Verdict;
  readonly finding: Finding;
}

/** @returns null where the stage can be judged */
export function obstacleTo(input: StageInput): Obstacle | null {
  const polarity = POLARITY[input.topology];
  if (polarity === undefined || !isJudgedLoad(input)) {
    const what = polarity === undefined ? `topology ${input.topology}` : `load ${input.load.kind}`;
    return {
      verdict: 'open',
      finding: { id: 'not-judged', text: `This version does not judge the ${what} yet.` },
    };
  }
  const { transistor } = input;
  if (transistor.polarity !== polarity) {
    const text = `${transistor.partNumber} is ${transistor.polarity.toUpperCase()}, but ${input.topology} needs ${polarity.toUpperCase()}.`;
    return { verdict: 'fail', finding: { id: 'polarity', text } };
  }
  return null;
}
