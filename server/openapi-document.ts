import {
  OpenAPIRegistry,
  OpenApiGeneratorV31,
  type RouteConfig,
} from '@asteasolutions/zod-to-openapi';
import type * as z from 'zod';
import { Problem } from '../shared/contract/problem.ts';
import type { Endpoint } from './http/endpoint.ts';

type ObjectSchema = z.ZodObject;

/** The API as an OpenAPI 3.1 document, made from the schemas that also parse each request and reply. */
export function openApiDocument(endpoints: readonly Endpoint[]): object {
  const registry = new OpenAPIRegistry();
  for (const item of endpoints) registry.registerPath(pathOf(item));
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: { title: 'Sinkwell', version: '1' },
  });
}

const FILE = {
  'application/octet-stream': { schema: { type: 'string', format: 'binary' } },
} as const;

function pathOf({ route, access }: Endpoint): RouteConfig {
  const status = route.status ?? (route.reply === null && route.file !== true ? 204 : 200);
  const etag = {
    ETag: { description: 'Version of the resource', schema: { type: 'string' as const } },
  };
  return {
    method: route.method.toLowerCase() as RouteConfig['method'],
    path: route.path.replace(/:(\w+)/g, '{$1}'),
    summary: route.summary,
    description: `Access: ${typeof access === 'string' ? access : JSON.stringify(access)}`,
    request: {
      ...(route.params && { params: route.params as ObjectSchema }),
      ...(route.query && { query: route.query as ObjectSchema }),
      ...(route.body && { body: { content: { 'application/json': { schema: route.body } } } }),
    },
    responses: {
      [status]: {
        description: 'Done',
        ...(route.guarded === true && { headers: etag }),
        ...(route.reply && { content: { 'application/json': { schema: route.reply } } }),
        ...(route.file === true && { content: FILE }),
      },
      default: {
        description: 'Refused',
        content: { 'application/problem+json': { schema: Problem } },
      },
    },
    ...(route.guarded === true && {
      parameters: [
        {
          ...{ name: 'If-Match', in: 'header', required: true, schema: { type: 'string' } },
          description: 'The ETag that was read',
        },
      ],
    }),
  };
}
