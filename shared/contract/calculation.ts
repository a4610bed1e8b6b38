import * as z from 'zod';
import { Id } from './common-fields.ts';
import type { Route } from './route.ts';

export const downloadCalculation = {
  method: 'GET',
  path: '/api/revisions/:revisionId/calculation/files/pdf',
  summary: 'The calculation sheet of a revision as PDF; NOT RELEASED across it while not locked',
  params: z.strictObject({ revisionId: Id }),
  reply: null,
  file: true,
} as const satisfies Route;
