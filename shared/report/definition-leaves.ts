import type { StageInput } from '../stage/stage-input.ts';
import { unitOfPath, type DefinitionLeaf, type LeafValue } from './definition-leaf.ts';
import { DEFINITION_WORDS, TRANSISTOR_WORDS } from './definition-words.ts';
import { transistorRowLeaves } from './transistor-row-leaves.ts';

/** Every value a definition holds, in the order of the stage file, without what is not fitted or not given. */
export function definitionLeaves(definition: StageInput): DefinitionLeaf[] {
  const { transistor, preDriver, ...circuit } = definition;
  const { transistor: preTransistor, ...preResistors } = preDriver ?? { transistor: null };
  return [
    ...circuitLeaves(circuit),
    ...(preDriver === null ? [] : circuitLeaves({ preDriver: preResistors })),
    ...transistorLeaves(transistor, 'transistor', ''),
    ...(preTransistor === null
      ? []
      : transistorLeaves(preTransistor, 'preDriver.transistor', 'Pre-driver ')),
  ];
}

function circuitLeaves(circuit: object): DefinitionLeaf[] {
  return scalars(circuit, '')
    .filter(([path]) => path !== 'format')
    .map(([path, value]) => leaf(path, DEFINITION_WORDS[path] ?? path, value));
}

function transistorLeaves(
  transistor: StageInput['transistor'],
  at: string,
  prefix: string,
): DefinitionLeaf[] {
  const scalar = scalars(transistor, '').map(([path, value]) =>
    leaf(`${at}.${path}`, prefix + (TRANSISTOR_WORDS[path] ?? path), value),
  );
  return [...scalar, ...transistorRowLeaves(transistor, at, prefix)];
}

function leaf(path: string, label: string, value: LeafValue): DefinitionLeaf {
  return { path, label, unit: typeof value === 'number' ? unitOfPath(path) : null, value };
}

/** Depth first; lists are left to who knows what their rows mean. */
function scalars(node: object, at: string): [path: string, value: LeafValue][] {
  return Object.entries(node).flatMap(([key, value]: [string, unknown]) => {
    const path = at === '' ? key : `${at}.${key}`;
    if (value === null || value === undefined || Array.isArray(value)) return [];
    if (typeof value === 'object') return scalars(value, path);
    return [[path, value as LeafValue] as [string, LeafValue]];
  });
}
