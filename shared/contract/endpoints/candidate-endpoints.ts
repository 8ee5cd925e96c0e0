import { z } from 'zod';
import {
  candidateSchema,
  commentInputSchema,
  pinInputSchema,
  sheetValueInputSchema,
  sheetValuesSchema,
  transitionInputSchema,
} from '../records.ts';
import { byId } from './endpoint-params.ts';

/** Pinned sections and what checkers write beside their sheets. */
export const candidateEndpoints = {
  listCandidates: {
    method: 'get',
    path: '/projects/:id/candidates',
    params: byId,
    body: null,
    response: z.array(candidateSchema),
    isPublic: false,
  },
  pinCandidate: {
    method: 'post',
    path: '/projects/:id/candidates',
    params: byId,
    body: pinInputSchema,
    response: candidateSchema,
    isPublic: false,
  },
  getCandidate: {
    method: 'get',
    path: '/candidates/:id',
    params: byId,
    body: null,
    response: candidateSchema,
    isPublic: false,
  },
  moveCandidate: {
    method: 'post',
    path: '/candidates/:id/transitions',
    params: byId,
    body: transitionInputSchema,
    response: candidateSchema,
    isPublic: false,
  },
  commentOnCandidate: {
    method: 'post',
    path: '/candidates/:id/comments',
    params: byId,
    body: commentInputSchema,
    response: candidateSchema,
    isPublic: false,
  },

  listSheetValues: {
    method: 'get',
    path: '/candidates/:id/sheet-values',
    params: byId,
    body: null,
    response: sheetValuesSchema,
    isPublic: false,
  },
  setSheetValue: {
    method: 'put',
    path: '/candidates/:id/sheet-values',
    params: byId,
    body: sheetValueInputSchema,
    response: sheetValuesSchema,
    isPublic: false,
  },
} as const;
