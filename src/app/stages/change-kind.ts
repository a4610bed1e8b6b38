import { FRONT_NEEDS, needsOf, transistorSuits } from '../../../shared/stage/topology-needs.ts';
import type { Load } from '../../../shared/stage/load.ts';
import type { StageInput, Topology } from '../../../shared/stage/stage-input.ts';
import type { Draft } from './draft.ts';
import {
  clampFor,
  startingDrive,
  startingLoad,
  startingNetwork,
  startingPreDriver,
  startingTransistor,
} from './sample-stage.ts';

/**
 * The draft in another topology: what still applies stays, a transistor goes where it suits, the rest starts from usual
 * values. From an NPN to two transistors its whole base network goes to the front, and comes back from there.
 */
export function withTopology(draft: Draft, topology: Topology): Draft {
  const { load } = draft.definition;
  const { loads } = needsOf(topology);
  const loaded = loads.includes(load.kind) ? draft : withLoad(draft, loads[0] ?? load.kind);
  return withTransistors(loaded, topology);
}

/** The draft with a load of another kind; the clamp follows. */
export function withLoad(draft: Draft, kind: Load['kind']): Draft {
  const { definition, parts, designators } = draft;
  const load = startingLoad(kind, definition.supplyV);
  const clamp = clampFor(load, definition.clamp);
  const clampKept = clamp === definition.clamp;
  return {
    definition: { ...definition, load, clamp },
    parts: { ...parts, load: null, clamp: clampKept ? parts.clamp : null },
    designators: {
      ...{ ...designators, load: null, loadResistor: null },
      ...(clampKept ? {} : { clamp: null, clampZener: null }),
    },
  };
}

const TWO = 'two-transistor-high-side';
/** Stands for a base resistor left to be sized. */
const SOME_OHM = 4700;

function withTransistors(draft: Draft, topology: Topology): Draft {
  const from = draft.definition.topology;
  if (topology === TWO && from !== TWO) return toTwo(draft);
  const single = from === TWO && needsOf(topology).polarity === 'npn' ? frontAlone(draft) : draft;
  return refitted({ ...single, definition: { ...single.definition, preDriver: null } }, topology);
}

/** A suitable NPN goes to the front with its network, a suitable PNP stays behind. */
function toTwo(draft: Draft): Draft {
  const { definition, parts, designators } = draft;
  const { transistor, baseResistor, shuntResistor } = definition;
  const behind = refitted(draft, TWO);
  const rbOhm = behind.definition.baseResistor.valueOhm ?? SOME_OHM;
  const start = startingPreDriver(behind.definition, rbOhm);
  const front = transistorSuits(transistor, FRONT_NEEDS);
  const valueOhm = baseResistor.valueOhm ?? start.baseResistor.valueOhm;
  const preDriver = front
    ? { transistor, baseResistor: { ...baseResistor, valueOhm }, shuntResistor }
    : start;
  const pre = front
    ? {
        preDriver: null,
        preBaseResistor: designators.baseResistor,
        preShuntResistor: designators.shuntResistor,
        ...{ baseResistor: null, shuntResistor: null },
      }
    : {};
  return {
    definition: { ...behind.definition, preDriver },
    parts: { ...behind.parts, preDriver: front ? parts.transistor : null },
    designators: { ...designators, ...pre },
  };
}

/** The transistor in front as the only one. */
function frontAlone(draft: Draft): Draft {
  const { definition, parts, designators } = draft;
  const { preDriver } = definition;
  if (preDriver === null) return draft;
  return {
    definition: { ...definition, ...preDriver },
    parts: { ...parts, transistor: parts.preDriver, preDriver: null },
    designators: {
      ...designators,
      baseResistor: designators.preBaseResistor,
      shuntResistor: designators.preShuntResistor,
      ...{ preDriver: null, preBaseResistor: null, preShuntResistor: null },
    },
  };
}

/** Transistor, base network and drive as the topology needs them. */
function refitted(draft: Draft, topology: Topology): Draft {
  const { definition, parts } = draft;
  const suits = transistorSuits(definition.transistor, needsOf(topology));
  const driven = drives(definition, topology);
  const drive = driven ? definition.drive : startingDrive(topology);
  const around = { ...definition, topology, drive };
  return {
    ...draft,
    definition: {
      ...around,
      ...(suits ? {} : startingNetwork(around)),
      transistor: suits ? definition.transistor : startingTransistor(topology),
    },
    parts: {
      ...parts,
      transistor: suits ? parts.transistor : null,
      preDriver: topology === TWO ? parts.preDriver : null,
      drive: driven ? parts.drive : null,
    },
  };
}

/** Whether the output that stands there can still drive it: low turns a PNP on, high anything else. */
const drives = ({ topology: from }: StageInput, topology: Topology): boolean =>
  (from === 'high-side-pnp') === (topology === 'high-side-pnp');
