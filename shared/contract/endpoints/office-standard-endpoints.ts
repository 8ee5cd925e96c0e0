import { z } from 'zod';
import { officeStandardInputSchema, officeStandardSchema } from '../office-standard.ts';
import { byId, nothing } from './endpoint-params.ts';

/** What the office builds: bar list, mixes, increments, usual ranges. */
export const officeStandardEndpoints = {
  listOfficeStandards: {
    method: 'get',
    path: '/office-standards',
    params: nothing,
    body: null,
    response: z.array(officeStandardSchema),
    isPublic: false,
  },
  createOfficeStandard: {
    method: 'post',
    path: '/office-standards',
    params: nothing,
    body: officeStandardInputSchema,
    response: officeStandardSchema,
    isPublic: false,
  },
  updateOfficeStandard: {
    method: 'put',
    path: '/office-standards/:id',
    params: byId,
    body: officeStandardInputSchema,
    response: officeStandardSchema,
    isPublic: false,
  },
  deleteOfficeStandard: {
    method: 'delete',
    path: '/office-standards/:id',
    params: byId,
    body: null,
    response: nothing,
    isPublic: false,
  },
} as const;
