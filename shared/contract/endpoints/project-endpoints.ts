import { z } from 'zod';
import { priceBookSchema, savedDesignBasisSchema } from '../design-basis.ts';
import {
  beamInputSchema,
  beamSchema,
  evaluateInputSchema,
  evaluateOutputSchema,
  membersInputSchema,
  projectInputSchema,
  projectSchema,
} from '../records.ts';
import { byId, nothing } from './endpoint-params.ts';

/** Projects, their beams, and a section judged on a project’s basis. */
export const projectEndpoints = {
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
    body: savedDesignBasisSchema,
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

  evaluate: {
    method: 'post',
    path: '/projects/:id/evaluations',
    params: byId,
    body: evaluateInputSchema,
    response: evaluateOutputSchema,
    isPublic: false,
  },
} as const;
