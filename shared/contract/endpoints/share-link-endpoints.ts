import { z } from 'zod';
import { shareLinkSchema, sharedShortlistSchema } from '../records.ts';
import { byId, nothing } from './endpoint-params.ts';

/** The shortlist for whoever has its link. */
export const shareLinkEndpoints = {
  listShareLinks: {
    method: 'get',
    path: '/projects/:id/share-links',
    params: byId,
    body: null,
    response: z.array(shareLinkSchema),
    isPublic: false,
  },
  createShareLink: {
    method: 'post',
    path: '/projects/:id/share-links',
    params: byId,
    body: nothing,
    response: shareLinkSchema,
    isPublic: false,
  },
  revokeShareLink: {
    method: 'delete',
    path: '/share-links/:id',
    params: byId,
    body: null,
    response: nothing,
    isPublic: false,
  },
  getSharedShortlist: {
    method: 'get',
    path: '/shared/:token',
    params: z.object({ token: z.string().min(20).max(100) }),
    body: null,
    response: sharedShortlistSchema,
    isPublic: true,
  },
} as const;
