import type { FittedResistor } from '../stage/drive.ts';
import type { Load } from '../stage/load.ts';
import type { StageInput } from '../stage/stage-input.ts';
import type { TransistorData } from '../stage/transistor-data.ts';
import type { NoteSource, PartPlace } from './bom-note-source.ts';
import { clampParts } from './clamp-parts.ts';
import {
  type FittedPart,
  linkFields,
  purchase,
  type Purchase,
  ratings,
  single,
} from './fitted-part.ts';

/** Every part a stage puts on the board; the logic output in front is not one of them. */
export function fittedParts(source: NoteSource): FittedPart[] {
  return [
    ...transistors(source),
    ...resistors(source),
    ...capacitors(source),
    ...clampParts(source),
    ...loads(source),
  ];
}

/** A transistor in front is fitted where the topology has one, whatever the file carries. */
const frontOf = ({ topology, preDriver }: StageInput) =>
  topology === 'two-transistor-high-side' ? preDriver : null;

function transistors(source: NoteSource): FittedPart[] {
  const { definition, designators } = source;
  const { transistor, reference } = definition;
  const preDriver = frontOf(definition);
  const common = { family: 'transistor', source } as const;
  const main: FittedPart = {
    ...common,
    place: 'transistor',
    designator: reference,
    purchase: { ...transistorPurchase(transistor), ...transistorLink(source, 'transistor') },
  };
  if (preDriver === null) return [main];
  const front: FittedPart = {
    ...common,
    place: 'pre-driver',
    designator: designators.preDriver,
    purchase: {
      ...transistorPurchase(preDriver.transistor),
      ...transistorLink(source, 'preDriver'),
    },
  };
  return [main, front];
}

function transistorPurchase(data: TransistorData): Purchase {
  const kind = data.darlington ? ' Darlington' : data.internal === null ? '' : ' pre-biased';
  return purchase({
    description: `Transistor, ${data.polarity.toUpperCase()}${kind}`,
    value: single(data.limits.vceoV, 'V'),
    ratings: ratings([data.limits.icA, 'A']),
    package: data.package,
    partNumber: data.partNumber,
  });
}

/** The part number is the definition's own. */
function transistorLink(source: NoteSource, role: 'transistor' | 'preDriver') {
  const { partRevision, unverified } = linkFields(source, role);
  return { partRevision, unverified };
}

type Resistor = Omit<FittedResistor, 'valueOhm'> & { valueOhm: number | null };

function resistors(source: NoteSource): FittedPart[] {
  const { baseResistor, shuntResistor, drive, load } = source.definition;
  const preDriver = frontOf(source.definition);
  const valueOhm = baseResistor.valueOhm ?? source.evaluation.baseResistorOhm;
  const collector: Resistor | null =
    load.kind === 'logic-input' ? { ...load, valueOhm: load.pullUpOhm } : null;
  const series: Resistor | null =
    load.kind === 'led-string'
      ? { valueOhm: load.resistanceOhm, tolerance: load.tolerance, ratingW: null }
      : null;
  const places: readonly [PartPlace, string, Resistor | null | undefined][] = [
    // 0 is a wire: a pre-biased part does without.
    ['baseResistor', 'RB', valueOhm === 0 ? null : { ...baseResistor, valueOhm }],
    ['shuntResistor', 'RBE', shuntResistor],
    ['pullUp', 'pull-up', drive.pullUp],
    ['preBaseResistor', 'RB of the pre-driver', preDriver?.baseResistor],
    ['preShuntResistor', 'RBE of the pre-driver', preDriver?.shuntResistor],
    ['load', 'collector resistor', collector],
    ['loadResistor', 'series resistor of the LEDs', series],
  ];
  return places.flatMap(([key, place, resistor]) =>
    resistor
      ? [
          {
            family: 'resistor',
            place,
            designator: source.designators[key],
            source,
            purchase: purchase({
              description: 'Resistor',
              value: single(resistor.valueOhm, 'Ohm'),
              tolerance: resistor.tolerance,
              ratings: ratings([resistor.ratingW, 'W']),
            }),
          },
        ]
      : [],
  );
}

function capacitors(source: NoteSource): FittedPart[] {
  const farads = source.definition.speedUpCapacitorF;
  if (farads === null) return [];
  return [
    {
      family: 'capacitor',
      place: 'speed-up capacitor',
      designator: source.designators.speedUpCapacitor,
      source,
      purchase: purchase({ description: 'Capacitor, speed-up', value: single(farads, 'F') }),
    },
  ];
}

/** A logic input is no part of the stage; its collector resistor is, and stands with the resistors. */
function loads(source: NoteSource): FittedPart[] {
  const bought = loadPurchase(source.definition.load);
  if (bought === null) return [];
  return [
    {
      family: 'load',
      place: 'load',
      designator: source.designators.load,
      source,
      purchase: { ...bought, ...linkFields(source, 'load') },
    },
  ];
}

function loadPurchase(load: Load): Purchase | null {
  switch (load.kind) {
    case 'coil':
      return purchase({
        description: 'Coil (relay, valve)',
        value: single(load.resistanceOhm, 'Ohm'),
        tolerance: load.tolerance,
        ratings: ratings([load.referenceDegC, '°C']),
      });
    case 'resistor':
      return purchase({
        description: 'Load, resistive',
        value: single(load.resistanceOhm, 'Ohm'),
        tolerance: load.tolerance,
      });
    case 'led-string':
      return purchase({
        description: load.count === 1 ? 'LED' : `LED, string of ${load.count}`,
        value: { ...load.forwardV, unit: 'V' },
        ratings: ratings([load.maximumA, 'A']),
      });
    case 'lamp':
      return purchase({
        description: 'Lamp, filament',
        value: single(load.nominalV, 'V'),
        ratings: ratings([load.currentA, 'A']),
      });
    case 'logic-input':
      return null;
  }
}
