import type { FieldSpec, StageShape } from './field-spec.ts';
import { pair, perhaps, needed } from './field-units.ts';

const kinds =
  (...named: readonly string[]) =>
  ({ clampKind }: StageShape) =>
    named.includes(clampKind);
const clamp = { group: 'clamp', part: 'clamp' } as const;
const zener = kinds('diode-zener', 'zener-across-transistor', 'tvs-across-transistor');
const diode = kinds('diode', 'diode-zener');
const clampable = ({ loadKind, clampKind }: StageShape) =>
  loadKind === 'coil' || clampKind !== 'none';
const fitted = ({ clampKind }: StageShape) => clampKind !== 'none';

/** What takes the coil's energy at turn-off. */
export const CLAMP_FIELDS = {
  'clamp/kind': {
    ...clamp,
    when: clampable,
    kind: 'choice',
    label: 'Kind',
    note: 'and where it sits',
    options: [
      ['none', 'None'],
      ['diode', 'Diode'],
      ['diode-zener', 'Diode + zener'],
      ['zener-across-transistor', 'Zener across transistor'],
      ['tvs-across-transistor', 'TVS across transistor'],
    ],
  },
  'clamp/forwardV': needed('volt', {
    ...clamp,
    label: 'Forward voltage',
    advanced: true,
    when: diode,
  }),
  'clamp/zenerV': pair('volt', {
    ...clamp,
    label: 'Zener voltage',
    note: 'TVS: clamping',
    when: zener,
  }),
  'clamp/standOffV': needed('volt', {
    ...clamp,
    label: 'Stand-off',
    when: kinds('tvs-across-transistor'),
  }),
  'clamp/currentRatingA': perhaps('ampere', {
    ...clamp,
    label: 'Current rating',
    advanced: true,
    when: fitted,
  }),
  'clamp/reverseV': perhaps('volt', {
    ...clamp,
    label: 'Reverse rating',
    advanced: true,
    when: diode,
  }),
  'clamp/powerRatingW': perhaps('watt', {
    ...clamp,
    label: 'Power rating',
    advanced: true,
    when: fitted,
  }),
} as const satisfies Record<string, FieldSpec>;
