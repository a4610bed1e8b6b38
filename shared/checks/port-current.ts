import { CRITERIA } from './criteria.ts';
import type { Criterion, Evaluation } from './evaluation.ts';
import { leastLimit, marginOf, roundedMargin, statusOf } from './margin.ts';

/** What the stages of one kind ask of the port of the controller that drives them. */
export interface PortLoad {
  /** Name of the port; null where the drive stands on none. */
  readonly port: string | null;
  /** Strong drive current of one of them, A; null where it could not be computed. */
  readonly portCurrentA: number | null;
  /** What the port's pins may carry together, derated, A; null where not stated. */
  readonly portLimitA: number | null;
  readonly quantity: number;
}

/** A port of a project, its pins taken together. */
export interface PortVerdict {
  readonly port: string;
  /** Pins in use. */
  readonly pins: number;
  readonly criterion: Criterion;
}

/** The largest current a stage asks of its pin, A: of two transistors the one in front has the pin. */
export function strongDriveA({ criteria }: Evaluation): number | null {
  const value = (id: string) => criteria.find((criterion) => criterion.id === id)?.value ?? null;
  return value('drive-current') ?? value('pre-drive-current');
}

/**
 * The criterion `port-current` for each port in use, by name: strong drive currents times quantities, added up,
 * against the tightest limit any of the stages states.
 *
 * @param marginalBand of the project's policy
 * @returns status `stated` without a limit, `open` where a current is missing
 */
export function portVerdicts(loads: readonly PortLoad[], marginalBand: number): PortVerdict[] {
  const ports = new Map<string, PortLoad[]>();
  for (const load of loads) {
    if (load.port !== null) ports.set(load.port, [...(ports.get(load.port) ?? []), load]);
  }
  return [...ports]
    .map(([port, on]) => ({
      port,
      pins: on.reduce((sum, { quantity }) => sum + quantity, 0),
      criterion: judged(on, marginalBand),
    }))
    .sort((a, b) => (a.port < b.port ? -1 : 1));
}

function judged(on: readonly PortLoad[], marginalBand: number): Criterion {
  const { relation, unit } = CRITERIA['port-current'];
  const limits = on.flatMap(({ portLimitA }) => portLimitA ?? []);
  const limit = limits.length === 0 ? null : Math.min(...limits);
  const value = on.reduce<number | null>(
    (sum, { portCurrentA, quantity }) =>
      sum === null || portCurrentA === null ? null : sum + portCurrentA * quantity,
    0,
  );
  const known = value !== null && limit !== null;
  const margin = known
    ? roundedMargin(marginOf(1, value, limit, leastLimit(unit)), marginalBand)
    : null;
  const unjudged = limit === null ? 'stated' : 'open';
  const status = margin === null ? unjudged : statusOf(margin, marginalBand);
  return { id: 'port-current', value, limit, relation, unit, margin, status, corner: null };
}
