import type { Load } from '../stage/load.ts';
import type { StageInput, Topology } from '../stage/stage-input.ts';
import type { Finding, Verdict } from './evaluation.ts';

interface TopologyNeeds {
  readonly polarity: 'npn' | 'pnp';
  readonly loads: readonly Load['kind'][];
}

/** What a topology's output transistor must be and what it can drive; topologies not listed are not judged yet. */
const NEEDS: Partial<Record<Topology, TopologyNeeds>> = {
  'low-side-npn': {
    polarity: 'npn',
    loads: ['coil', 'resistor', 'led-string', 'lamp', 'logic-input'],
  },
  'high-side-pnp': { polarity: 'pnp', loads: ['coil', 'resistor', 'led-string', 'lamp'] },
  'two-transistor-high-side': {
    polarity: 'pnp',
    loads: ['coil', 'resistor', 'led-string', 'lamp'],
  },
  'low-side-darlington': {
    polarity: 'npn',
    loads: ['coil', 'resistor', 'led-string', 'lamp', 'logic-input'],
  },
  'low-side-pre-biased': {
    polarity: 'npn',
    loads: ['coil', 'resistor', 'led-string', 'lamp', 'logic-input'],
  },
  'level-translator': { polarity: 'npn', loads: ['logic-input'] },
};

/** Why a stage cannot be run through its corners at all, and the verdict that gives. */
export interface Obstacle {
  readonly verdict: Verdict;
  readonly finding: Finding;
}

/** @returns null where the stage can be judged */
export function obstacleTo(input: StageInput): Obstacle | null {
  const needs = NEEDS[input.topology];
  const { transistor, topology, load } = input;
  if (needs === undefined) {
    return notJudged(`This version does not judge the topology ${topology} yet.`);
  }
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
