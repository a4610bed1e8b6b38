import type { FieldSpec, StageShape } from './field-spec.ts';
import { needed, pair, perhaps } from './field-units.ts';

const pushPull = ({ driveKind }: StageShape) => driveKind === 'push-pull';
const open = ({ driveKind }: StageShape) => driveKind === 'open-collector';
const inReset = ({ resetKind }: StageShape) => resetKind !== '';
const pulledUp = ({ resetKind }: StageShape) => resetKind === 'pull-up';
const highSide = ({ topology }: StageShape) => topology === 'high-side-pnp';
const lowSide = (shape: StageShape) => !highSide(shape);
const drive = { group: 'drive', part: 'drive' } as const;
const more = { ...drive, advanced: true } as const;
const pullUp = { group: 'drive', part: 'pullUp', when: open } as const;

/** The logic output in front of the stage. */
export const DRIVE_FIELDS = {
  'drive/kind': {
    ...drive,
    kind: 'choice',
    label: 'Output',
    options: [
      ['push-pull', 'Push-pull'],
      ['open-collector', 'Open collector'],
    ],
  },
  'drive/railV': pair('volt', {
    ...drive,
    label: 'Logic rail',
    labelIn: ({ topology }) => (topology === 'level-translator' ? 'Logic rail V1' : null),
  }),
  'drive/high/dropV': needed('voltOrZero', {
    ...drive,
    label: 'High drop',
    advanced: highSide,
    when: pushPull,
  }),
  'drive/high/currentA': needed('ampere', {
    ...drive,
    label: 'High test current',
    advanced: true,
    when: pushPull,
  }),
  'drive/high/unloadedDropV': needed('voltOrZero', {
    ...drive,
    label: 'High drop, unloaded',
    advanced: true,
    when: pushPull,
  }),
  'drive/pullUp/valueOhm': needed('ohm', { ...pullUp, label: 'Pull-up', preferred: true }),
  'drive/pullUp/tolerance': needed('tolerance', {
    ...pullUp,
    label: 'Pull-up tolerance',
    advanced: true,
  }),
  'drive/pullUp/ratingW': perhaps('watt', {
    ...pullUp,
    label: 'Pull-up rating',
    advanced: true,
  }),
  'drive/low/levelV': needed('voltOrZero', {
    ...drive,
    label: 'Low level',
    advanced: lowSide,
  }),
  'drive/low/currentA': needed('ampere', { ...more, label: 'Low test current' }),
  'drive/low/unloadedV': perhaps('voltOrZero', { ...more, label: 'Low level, unloaded' }),
  'drive/sourceLimitA': perhaps('ampere', { ...drive, label: 'Source limit', advanced: highSide }),
  'drive/sinkLimitA': perhaps('ampere', { ...drive, label: 'Sink limit', advanced: lowSide }),
  'drive/railTracksSupply': {
    ...more,
    kind: 'flag',
    label: 'Rail is the supply',
    note: 'output on the load’s supply',
  },
  'drive/leakageA': needed('ampereOrZero', { ...more, label: 'Off leakage', when: open }),
  'drive/maximumV': perhaps('volt', {
    ...more,
    label: 'Pin maximum',
    when: open,
  }),
  'drive/groundShiftV': needed('shift', { ...more, label: 'Ground shift' }),
  'drive/port': {
    ...more,
    kind: 'text',
    optional: true,
    maxLength: 20,
    label: 'Port',
    note: 'shared limit',
  },
  'drive/portTotalA': perhaps('ampere', { ...more, label: 'Port limit' }),
  'drive/reset/kind': {
    ...more,
    kind: 'choice',
    label: 'In reset',
    note: 'state of the pin',
    options: [
      ['', 'Not judged'],
      ['driven-low', 'Driven low'],
      ['high-z', 'High impedance'],
      ['pull-up', 'Pulled up'],
    ],
  },
  'drive/reset/leakageA': needed('ampereOrZero', {
    ...more,
    label: 'Reset leakage',
    when: inReset,
  }),
  'drive/reset/pullUpOhm': perhaps('ohm', { ...more, label: 'Reset pull-up', when: pulledUp }),
} as const satisfies Record<string, FieldSpec>;
