import { z } from 'zod';
import { designBasisSchema, priceBookSchema } from './design-basis.ts';
import { idSchema } from './numbers.ts';
import {
  beamInputSchema,
  beamSchema,
  candidateSchema,
  commentInputSchema,
  evaluateInputSchema,
  evaluateOutputSchema,
  membersInputSchema,
  personSchema,
  pinInputSchema,
  projectInputSchema,
  projectSchema,
  runSchema,
  sessionSchema,
  shareLinkSchema,
  sharedShortlistSchema,
  sheetValueInputSchema,
  sheetValuesSchema,
  signInSchema,
  sweepInputSchema,
  sweepSchema,
  transitionInputSchema,
  viewProgressSchema,
} from './records.ts';
import { viewSchema } from './sweep-definition.ts';

const nothing = z.object({});
const byId = z.object({ id: idSchema });

/**
 * The table of endpoints: one source for the server's routes, the client's calls and the OpenAPI document.
 * Paths are below /api; `:name` segments are the keys of `params`. Bodies and answers are JSON in SI units.
 */
export const endpoints = {
  getSession: {
    method: 'get',
    path: '/session',
    params: nothing,
    body: null,
    response: sessionSchema,
    isPublic: true,
  },
  signIn: {
    method: 'post',
    path: '/session',
    params: nothing,
    body: signInSchema,
    response: sessionSchema,
    isPublic: true,
  },
  signOut: {
    method: 'delete',
    path: '/session',
    params: nothing,
    body: null,
    response: sessionSchema,
    isPublic: true,
  },

  listPeople: {
    method: 'get',
    path: '/people',
    params: nothing,
    body: null,
    response: z.array(personSchema),
    isPublic: false,
  },

  listProjects: {
    method: 'get',
    path: '/projects',
    params: nothing,
    body: null,
    response: z.array(projectSchema),
    isPublic: false,
  },
  createProject: {
    method: 'post',
    path: '/projects',
    params: nothing,
    body: projectInputSchema,
    response: projectSchema,
    isPublic: false,
  },
  getProject: {
    method: 'get',
    path: '/projects/:id',
    params: byId,
    body: null,
    response: projectSchema,
    isPublic: false,
  },
  updateProject: {
    method: 'patch',
    path: '/projects/:id',
    params: byId,
    body: projectInputSchema.pick({ name: true, number: true }),
    response: projectSchema,
    isPublic: false,
  },
  setDesignBasis: {
    method: 'put',
    path: '/projects/:id/design-basis',
    params: byId,
    body: designBasisSchema,
    response: projectSchema,
    isPublic: false,
  },
  setPriceBook: {
    method: 'put',
    path: '/projects/:id/price-book',
    params: byId,
    body: priceBookSchema,
    response: projectSchema,
    isPublic: false,
  },
  setMembers: {
    method: 'put',
    path: '/projects/:id/members',
    params: byId,
    body: membersInputSchema,
    response: projectSchema,
    isPublic: false,
  },

  listBeams: {
    method: 'get',
    path: '/projects/:id/beams',
    params: byId,
    body: null,
    response: z.array(beamSchema),
    isPublic: false,
  },
  createBeam: {
    method: 'post',
    path: '/projects/:id/beams',
    params: byId,
    body: beamInputSchema,
    response: beamSchema,
    isPublic: false,
  },
  updateBeam: {
    method: 'put',
    path: '/beams/:id',
    params: byId,
    body: beamInputSchema,
    response: beamSchema,
    isPublic: false,
  },
  deleteBeam: {
    method: 'delete',
    path: '/beams/:id',
    params: byId,
    body: null,
    response: nothing,
    isPublic: false,
  },

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
  /** Finds the view, or queues its computation from the run's frozen inputs. */
  openView: {
    method: 'post',
    path: '/runs/:id/views',
    params: byId,
    body: viewSchema,
    response: viewProgressSchema,
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

  evaluate: {
    method: 'post',
    path: '/projects/:id/evaluations',
    params: byId,
    body: evaluateInputSchema,
    response: evaluateOutputSchema,
    isPublic: false,
  },

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

export type EndpointName = keyof typeof endpoints;
type Endpoint<N extends EndpointName> = (typeof endpoints)[N];
export type ParamsOf<N extends EndpointName> = z.infer<Endpoint<N>['params']>;
export type BodyOf<N extends EndpointName> = Endpoint<N>['body'] extends z.ZodType
  ? z.infer<Endpoint<N>['body']>
  : undefined;
export type ResponseOf<N extends EndpointName> = z.infer<Endpoint<N>['response']>;

/** The stream of a run: server-sent events named `progress`, each one ViewProgress as JSON, with an increasing id. */
export const RUN_EVENTS_PATH = '/runs/:id/events';

/** A candidate's calculation sheet on paper; the query `paper` is one of PAPERS, A4 without it. */
export const SHEET_PDF_PATH = '/candidates/:id/sheet.pdf';
export const PAPERS = ['a4', 'letter'] as const;
export type Paper = (typeof PAPERS)[number];
