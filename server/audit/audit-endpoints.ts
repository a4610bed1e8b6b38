import { listAudit, verifyAudit } from '../../shared/contract/audit.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { AuditService } from './audit-service.ts';

export function auditEndpoints({ audit }: { readonly audit: AuditService }): Endpoint[] {
  return [
    endpoint(listAudit, 'administrator', async (call) => ({ body: await audit.list(call.query) })),

    endpoint(verifyAudit, 'administrator', async () => {
      const { faults, ...rest } = await audit.verify();
      return { body: { ...rest, faults: [...faults] } };
    }),
  ];
}
