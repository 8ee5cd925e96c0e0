import { z } from 'zod';
import { idSchema } from '../numbers.ts';
import { runningLoadSchema } from '../operations.ts';
import { rankingInputSchema, rankingSchema } from '../ranking.ts';
import { evaluateOutputSchema, runSchema, viewProgressSchema } from '../records.ts';
import { openedViewSchema } from '../sweep-definition.ts';
import { byId, nothing } from './endpoint-params.ts';

/** Executions of a sweep and the views of their results. */
export const runEndpoints = {
  startRun: {
    method: 'post',
    path: '/sweeps/:id/runs',
    params: byId,
    body: nothing,
    response: runSchema,
    isPublic: false,
  },
  getRun: {
    method: 'get',
    path: '/runs/:id',
    params: byId,
    body: null,
    response: runSchema,
    isPublic: false,
  },
  cancelRun: {
    method: 'post',
    path: '/runs/:id/cancel',
    params: byId,
    body: nothing,
    response: runSchema,
    isPublic: false,
  },
  /** Takes a cancelled or failed run up again from what it has done. */
  resumeRun: {
    method: 'post',
    path: '/runs/:id/resume',
    params: byId,
    body: nothing,
    response: runSchema,
    isPublic: false,
  },
  getRunningLoad: {
    method: 'get',
    path: '/running-load',
    params: nothing,
    body: null,
    response: runningLoadSchema,
    isPublic: false,
  },
  /** Finds the view, or queues its computation from the run's frozen inputs. */
  openView: {
    method: 'post',
    path: '/runs/:id/views',
    params: byId,
    body: openedViewSchema,
    response: viewProgressSchema,
    isPublic: false,
  },
  /** Ranks the run's sections at other rates; kept nowhere. */
  rankRun: {
    method: 'post',
    path: '/runs/:id/rankings',
    params: byId,
    body: rankingInputSchema,
    response: rankingSchema,
    isPublic: false,
  },
  getView: {
    method: 'get',
    path: '/runs/:id/views/:viewId',
    params: byId.extend({ viewId: idSchema }),
    body: null,
    response: viewProgressSchema,
    isPublic: false,
  },
  getSection: {
    method: 'get',
    path: '/runs/:id/sections/:index',
    params: byId.extend({ index: z.coerce.number().int().min(0) }),
    body: null,
    response: evaluateOutputSchema,
    isPublic: false,
  },
} as const;
