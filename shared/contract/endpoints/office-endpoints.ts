import { z } from 'zod';
import { personSchema, sessionSchema, signInSchema } from '../records.ts';
import { nothing } from './endpoint-params.ts';

/** Sessions and the people of the office. */
export const officeEndpoints = {
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
} as const;
