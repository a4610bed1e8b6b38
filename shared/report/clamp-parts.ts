import type { NoteSource } from './bom-note-source.ts';
import {
  type FittedPart,
  linkFields,
  purchase,
  type Purchase,
  ratings,
  single,
} from './fitted-part.ts';

/**
 * What takes the coil's energy: one part, or diode and Zener in series. Where the stage has both, the
 * library link of the clamp is the diode's.
 */
export function clampParts(source: NoteSource): FittedPart[] {
  const link = linkFields(source, 'clamp');
  switch (source.definition.clamp.kind) {
    case 'none':
      return [];
    case 'diode':
      return [part(source, 'clamp', 'clamp diode', { ...diode(source), ...link })];
    case 'diode-zener':
      return [
        part(source, 'clamp', 'clamp diode', { ...diode(source), ...link }),
        part(source, 'clampZener', 'clamp Zener', zener(source)),
      ];
    case 'zener-across-transistor':
      return [part(source, 'clamp', 'clamp Zener', { ...zener(source), ...link })];
    case 'tvs-across-transistor':
      return [part(source, 'clamp', 'clamp suppressor', { ...suppressor(source), ...link })];
  }
}

function part(
  source: NoteSource,
  key: 'clamp' | 'clampZener',
  place: string,
  bought: Purchase,
): FittedPart {
  const designator = source.designators[key];
  return { family: 'clamp', designator, place, source, purchase: bought };
}

function diode({ definition: { clamp } }: NoteSource): Purchase {
  return purchase({
    description: 'Diode, coil clamp',
    value: single(clamp.reverseV, 'V'),
    ratings: ratings([clamp.currentRatingA, 'A']),
  });
}

function zener({ definition: { clamp } }: NoteSource): Purchase {
  return purchase({
    description: 'Zener diode, coil clamp',
    value: clamp.zenerV === null ? null : { ...clamp.zenerV, unit: 'V' },
    ratings: ratings([clamp.powerRatingW, 'W']),
  });
}

/** Value is the stand-off voltage; the clamping voltage stands with the ratings. */
function suppressor({ definition: { clamp } }: NoteSource): Purchase {
  return purchase({
    description: 'TVS diode, coil clamp',
    value: single(clamp.standOffV, 'V'),
    ratings: ratings([clamp.zenerV?.max ?? null, 'V'], [clamp.powerRatingW, 'W']),
  });
}
