import { z } from 'zod';
import { sweepInputSchema, sweepSchema } from '../records.ts';
import { byId, nothing } from './endpoint-params.ts';

/** Saved design spaces. */
export const sweepEndpoints = {
  listSweeps: {
    method: 'get',
    path: '/projects/:id/sweeps',
    params: byId,
    body: null,
    response: z.array(sweepSchema),
    isPublic: false,
  },
  createSweep: {
    method: 'post',
    path: '/beams/:id/sweeps',
    params: byId,
    body: sweepInputSchema,
    response: sweepSchema,
    isPublic: false,
  },
  getSweep: {
    method: 'get',
    path: '/sweeps/:id',
    params: byId,
    body: null,
    response: sweepSchema,
    isPublic: false,
  },
  updateSweep: {
    method: 'put',
    path: '/sweeps/:id',
    params: byId,
    body: sweepInputSchema,
    response: sweepSchema,
    isPublic: false,
  },
  deleteSweep: {
    method: 'delete',
    path: '/sweeps/:id',
    params: byId,
    body: null,
    response: nothing,
    isPublic: false,
  },
} as const;
