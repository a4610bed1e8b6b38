import { listStages } from '../../../shared/contract/stage.ts';
import type { StageQuery } from './stage-list-store.ts';

const fields = listStages.query.shape;

/** Query parameters of the stages table; null takes one away. */
export type StageFilter = Partial<Record<keyof typeof fields, string | number | null>>;

/**
 * What the address asks for. A parameter somebody mistyped is left out rather than refused: the page shows what it
 * can.
 */
export function stageQuery(
  given: Partial<Record<keyof typeof fields, string | undefined>>,
): StageQuery {
  const kept = Object.entries(given).flatMap(([key, value]) => {
    const parsed = fields[key as keyof typeof fields].safeParse(value);
    return value !== undefined && value !== '' && parsed.success ? [[key, parsed.data]] : [];
  });
  return Object.fromEntries(kept) as StageQuery;
}
