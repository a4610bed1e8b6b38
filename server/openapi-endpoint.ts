import * as z from 'zod';
import { endpoint, type Endpoint } from './http/endpoint.ts';
import { openApiDocument } from './openapi-document.ts';

const readOpenApi = {
  method: 'GET',
  path: '/api/openapi.json',
  summary: 'This document',
  reply: z.record(z.string(), z.unknown()),
} as const;

export function openApiEndpoint(endpoints: readonly Endpoint[]): Endpoint {
  let document: Record<string, unknown> | undefined;
  return endpoint(readOpenApi, 'administrator-or-local', () => {
    document ??= { ...openApiDocument(endpoints) };
    return Promise.resolve({ body: document });
  });
}
