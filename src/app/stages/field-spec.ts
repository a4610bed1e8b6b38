import type { UnitName } from '../../../shared/units/quantity-unit.ts';
import type { PartKey } from '../../../shared/report/schematic/drawing.ts';
import type { EnteredSpan } from '../ui/quantity-span-field.ts';

export const FIELD_GROUPS = [
  'supply',
  'drive',
  'load',
  'transistor',
  'base',
  'preDriver',
  'clamp',
  'switching',
  'stage',
  'limits',
] as const;
export type FieldGroup = (typeof FIELD_GROUPS)[number];

export const GROUP_TITLES: Readonly<Record<FieldGroup, string>> = {
  stage: 'Stage and topology',
  supply: 'Supply & ambient',
  drive: 'Drive',
  load: 'Load',
  transistor: 'Transistor',
  base: 'Base network',
  preDriver: 'Pre-driver',
  clamp: 'Clamp',
  switching: 'Switching',
  limits: 'Own limits',
};

/** What of a stage decides whether a field is there at all. */
export interface StageShape {
  readonly topology: string;
  readonly driveKind: string;
  readonly loadKind: string;
  readonly clampKind: string;
  readonly resetKind: string;
  readonly shuntFitted: boolean;
  readonly preShuntFitted: boolean;
  readonly frequencyHz: number | null;
}

interface FieldCommon {
  readonly group: FieldGroup;
  readonly label: string;
  /** Stands behind the range: `20 °C`, `closed`. */
  readonly note?: string;
  /** Another label in a stage of some shape; null keeps the usual one. */
  readonly labelIn?: (shape: StageShape) => string | null;
  /** Folded under "More" until somebody opens it. */
  readonly advanced?: boolean | ((shape: StageShape) => boolean);
  /** The part on the drawing that this field belongs to. */
  readonly part?: PartKey;
  readonly when?: (shape: StageShape) => boolean;
}

interface Bounds {
  readonly unit: UnitName;
  readonly min?: number;
  readonly max?: number;
}

export interface QuantitySpec extends FieldCommon, Bounds {
  readonly kind: 'quantity';
  readonly optional: boolean;
  /** Whether the arrow keys step along the policy's preferred values. */
  readonly preferred?: boolean;
}

export interface SpanSpec extends FieldCommon, Bounds {
  readonly kind: 'span';
}

export interface TextSpec extends FieldCommon {
  readonly kind: 'text';
  readonly optional: boolean;
  readonly maxLength: number;
}

export interface ChoiceSpec extends FieldCommon {
  readonly kind: 'choice';
  readonly options: readonly (readonly [string, string])[];
}

export interface FlagSpec extends FieldCommon {
  readonly kind: 'flag';
}

export type FieldSpec = QuantitySpec | SpanSpec | TextSpec | ChoiceSpec | FlagSpec;

/** What a control of the kind holds. */
export type ValueOf<S extends FieldSpec> = S extends { kind: 'quantity' }
  ? number | null
  : S extends { kind: 'span' }
    ? EnteredSpan
    : S extends { kind: 'flag' }
      ? boolean
      : string;
