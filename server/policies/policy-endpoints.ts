import { listPolicies } from '../../shared/contract/project.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { Database } from '../persistence/database.ts';
import { PolicyEntity } from './policy-entity.ts';

export function policyEndpoints({ database }: { readonly database: Database }): Endpoint[] {
  return [
    endpoint(listPolicies, 'signed-in', async () => ({
      body: {
        policies: await database.read((manager) =>
          manager.find(PolicyEntity, { order: { name: 'ASC', version: 'DESC' } }),
        ),
      },
    })),
  ];
}
