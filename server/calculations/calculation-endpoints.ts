import { downloadCalculation } from '../../shared/contract/calculation.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { Services } from '../services.ts';
import { CalculationService } from './calculation-service.ts';

export function calculationEndpoints({ database }: Pick<Services, 'database'>): Endpoint[] {
  const calculations = new CalculationService(database);
  return [
    endpoint(downloadCalculation, { project: 'member' }, async (call) => ({
      body: await calculations.file(call, call.params.revisionId),
    })),
  ];
}
