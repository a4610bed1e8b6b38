import type { MergedLine } from './bom-note-lines.ts';
import { listed, numbered } from './word-lists.ts';

/**
 * Which clamp line goes with which coil line. Coils that share the same clamps are named together; a coil
 * without any clamp is named by its stage.
 */
export function clampCautions(lines: readonly MergedLine[]): string[] {
  const coils = lines.filter(isCoilLine);
  if (coils.length === 0) return [];
  const groups = new Map<string, { clamps: number[]; coils: number[] }>();
  for (const coil of coils) {
    const clamps = clampLinesOf(coil, lines);
    const group = groups.get(clamps.join()) ?? { clamps, coils: [] };
    group.coils.push(coil.line.line);
    groups.set(clamps.join(), group);
  }
  const fitted = [...groups.values()].filter(({ clamps }) => clamps.length > 0).map(fitTogether);
  return [...(fitted.length === 0 ? ['Coils store energy.'] : fitted), ...unclamped(coils)];
}

function clampLinesOf(coil: MergedLine, lines: readonly MergedLine[]): number[] {
  const stages = new Set(coil.parts.map(({ source }) => source));
  return lines
    .filter(({ parts }) => parts.some((part) => part.family === 'clamp' && stages.has(part.source)))
    .map(({ line }) => line.line);
}

function isCoilLine({ parts: [part] }: MergedLine): boolean {
  return part.family === 'load' && part.source.definition.load.kind === 'coil';
}

function fitTogether({ clamps, coils }: { clamps: number[]; coils: number[] }): string {
  const [only] = clamps;
  const where = `wherever ${numbered('line', coils, 'or').replace('lines', 'line')} is`;
  return clamps.length === 1 && only !== undefined
    ? `Coils store energy: line ${only} must be fitted ${where}.`
    : `Coils store energy: the clamp of each stage, from ${numbered('line', clamps)}, must be fitted ${where}.`;
}

function unclamped(coils: readonly MergedLine[]): string[] {
  const bare = coils
    .flatMap(({ parts }) => parts)
    .filter((part) => part.source.definition.clamp.kind === 'none')
    .map((part) => part.source.definition.reference);
  if (bare.length === 0) return [];
  return [`No clamp is fitted at ${listed(bare)}: the transistor takes the coil’s energy.`];
}
