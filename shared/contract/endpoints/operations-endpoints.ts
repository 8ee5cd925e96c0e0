import { operationsSchema } from '../operations.ts';
import { nothing } from './endpoint-params.ts';

/** What the operator of the service looks at. */
export const operationsEndpoints = {
  getOperations: {
    method: 'get',
    path: '/operations',
    params: nothing,
    body: null,
    response: operationsSchema,
    isPublic: false,
  },
} as const;
