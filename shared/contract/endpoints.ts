import type { z } from 'zod';
import { candidateEndpoints } from './endpoints/candidate-endpoints.ts';
import { officeEndpoints } from './endpoints/office-endpoints.ts';
import { officeStandardEndpoints } from './endpoints/office-standard-endpoints.ts';
import { operationsEndpoints } from './endpoints/operations-endpoints.ts';
import { projectEndpoints } from './endpoints/project-endpoints.ts';
import { runEndpoints } from './endpoints/run-endpoints.ts';
import { savedViewEndpoints } from './endpoints/saved-view-endpoints.ts';
import { shareLinkEndpoints } from './endpoints/share-link-endpoints.ts';
import { sweepEndpoints } from './endpoints/sweep-endpoints.ts';

/**
 * The table of endpoints: one source for the server's routes, the client's calls and the OpenAPI document.
 * Paths are below /api; `:name` segments are the keys of `params`. Bodies and answers are JSON in SI units.
 */
export const endpoints = {
  ...officeEndpoints,
  ...officeStandardEndpoints,
  ...projectEndpoints,
  ...sweepEndpoints,
  ...runEndpoints,
  ...savedViewEndpoints,
  ...candidateEndpoints,
  ...shareLinkEndpoints,
  ...operationsEndpoints,
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
