import * as z from 'zod';
import type { Route } from './route.ts';

export const SearchHit = z.object({
  kind: z.enum(['project', 'stage', 'part', 'bom-note']),
  /** Path of the page inside the application. */
  link: z.string(),
  title: z.string(),
  detail: z.string(),
});
export type SearchHit = z.infer<typeof SearchHit>;

export const search = {
  method: 'GET',
  path: '/api/search',
  summary: 'Stages, projects, parts and notes by name',
  query: z.strictObject({ text: z.string().trim().min(1).max(100) }),
  reply: z.object({ hits: z.array(SearchHit).max(20) }),
} as const satisfies Route;
