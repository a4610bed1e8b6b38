import { search } from '../../shared/contract/search.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { Database } from '../persistence/database.ts';
import { findByText } from './search-service.ts';

export function searchEndpoints({ database }: { readonly database: Database }): Endpoint[] {
  return [
    endpoint(search, 'signed-in', async ({ actor, query }) => ({
      body: { hits: await database.read((manager) => findByText(manager, actor, query.text)) },
    })),
  ];
}
