import type { PartLinks } from '../../../shared/contract/revision.ts';
import { deriveClamp } from '../../../shared/parts/derive-clamp.ts';
import { deriveDrive, drivePoints } from '../../../shared/parts/derive-drive.ts';
import { deriveLoad } from '../../../shared/parts/derive-load.ts';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import { refused, type Derived } from '../../../shared/parts/derived.ts';
import type { PartRole } from '../../../shared/parts/part-fit.ts';
import type { PartRecord } from '../../../shared/parts/part-record.ts';
import { clampFor } from './sample-stage.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';

/** Keys of the choices made about a record; '' leaves one open. */
export type Choice = Readonly<Record<string, string>>;

const chosen = (choice: Choice, key: string): string | null =>
  choice[key] === undefined || choice[key] === '' ? null : choice[key];

/**
 * The stage with a part of the library in one of its places; everything the record does not say stays.
 *
 * @returns the stage, or in a sentence why the record cannot stand there
 */
export function applyPart(
  stage: StageInput,
  role: PartRole,
  record: PartRecord,
  choice: Choice,
): Derived<StageInput> {
  if (role === 'transistor' && record.kind === 'transistor') {
    return fitted(
      deriveTransistor(record, { group: chosen(choice, 'group'), maker: chosen(choice, 'maker') }),
      (transistor) => ({ ...stage, transistor }),
    );
  }
  const { preDriver } = stage;
  if (role === 'preDriver' && record.kind === 'transistor' && preDriver !== null) {
    return fitted(
      deriveTransistor(record, { group: chosen(choice, 'group'), maker: chosen(choice, 'maker') }),
      (transistor) => ({ ...stage, preDriver: { ...preDriver, transistor } }),
    );
  }
  if (role === 'load' && record.kind === 'load') {
    const coil = Number(choice['coil'] ?? 0);
    return fitted(deriveLoad(record, { coil, contacts: chosen(choice, 'contacts') }), (load) => ({
      ...stage,
      load,
      clamp: clampFor(load, stage.clamp),
    }));
  }
  if (role === 'drive' && record.kind === 'logic-output') {
    const point = Number(choice['point'] ?? drivePoints(record)[0] ?? 0);
    return fitted(deriveDrive(record, point), (levels) => ({
      ...stage,
      drive: {
        ...stage.drive,
        ...levels,
        pullUp:
          levels.kind === 'open-collector'
            ? (stage.drive.pullUp ?? { valueOhm: 4700, tolerance: 0.05, ratingW: null })
            : stage.drive.pullUp,
      },
    }));
  }
  if (role === 'clamp' && record.kind === 'diode') {
    return fitted(deriveClamp(record, loadCurrentA(stage)), (clamp) => ({ ...stage, clamp }));
  }
  return refused('This part does not belong here.');
}

/** What the clamp takes over at turn-off: the load's current at the highest supply. */
function loadCurrentA({ load, supplyV }: StageInput): number {
  return load.kind === 'coil' || load.kind === 'resistor'
    ? supplyV.max / (load.resistanceOhm * (1 - load.tolerance))
    : 0;
}

function fitted<T>(derived: Derived<T>, put: (data: T) => unknown): Derived<StageInput> {
  if (!derived.ok) return derived;
  const parsed = StageInput.safeParse(put(derived.data));
  if (parsed.success) return { ok: true, data: parsed.data, remarks: derived.remarks };
  const issue = parsed.error.issues[0];
  return refused(
    `The stage does not take it: ${issue?.path.join('.') ?? ''} ${issue?.message ?? ''}.`,
  );
}

/** The links of a draft with one of them set. */
export const linked = (
  parts: PartLinks,
  role: PartRole,
  partRevisionId: string,
  choice: Choice,
): PartLinks => ({ ...parts, [role]: { partRevisionId, choice } });
