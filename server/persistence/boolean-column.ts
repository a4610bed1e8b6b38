import type { ValueTransformer } from 'typeorm';

/** STRICT tables know no boolean: stored as 0 or 1. */
export const asBoolean: ValueTransformer = {
  to: (value: unknown) => (typeof value === 'boolean' ? Number(value) : value),
  from: (value: unknown) => value === 1,
};
