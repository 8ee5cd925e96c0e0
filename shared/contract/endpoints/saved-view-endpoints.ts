import { z } from 'zod';
import { savedViewInputSchema, savedViewSchema } from '../saved-view.ts';
import { byId, nothing } from './endpoint-params.ts';

/** Named ways of looking at the runs of a sweep, shared in the project. */
export const savedViewEndpoints = {
  listSavedViews: {
    method: 'get',
    path: '/projects/:id/saved-views',
    params: byId,
    body: null,
    response: z.array(savedViewSchema),
    isPublic: false,
  },
  createSavedView: {
    method: 'post',
    path: '/sweeps/:id/saved-views',
    params: byId,
    body: savedViewInputSchema,
    response: savedViewSchema,
    isPublic: false,
  },
  updateSavedView: {
    method: 'put',
    path: '/saved-views/:id',
    params: byId,
    body: savedViewInputSchema,
    response: savedViewSchema,
    isPublic: false,
  },
  deleteSavedView: {
    method: 'delete',
    path: '/saved-views/:id',
    params: byId,
    body: null,
    response: nothing,
    isPublic: false,
  },
} as const;
