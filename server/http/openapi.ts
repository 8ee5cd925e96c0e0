import { z } from 'zod';
import { createDocument, type ZodOpenApiOperationObject, type ZodOpenApiPathsObject } from 'zod-openapi';
import {
  endpoints,
  PAPERS,
  RUN_EVENTS_PATH,
  SHEET_PDF_PATH,
  type EndpointName,
} from '#shared/contract/endpoints.ts';
import {
  byIdAndFormat,
  SECTIONS_FILE_PATH,
  sectionsFileQuerySchema,
  TAKEOFF_FILE_PATH,
  takeoffFileQuerySchema,
} from '#shared/contract/endpoints/file-endpoints.ts';
import { errorBodySchema } from '#shared/contract/errors.ts';
import { idSchema } from '#shared/contract/numbers.ts';
import { viewProgressSchema } from '#shared/contract/records.ts';

const errorAnswer = {
  description: 'A refusal, with every issue and its path',
  content: { 'application/json': { schema: errorBodySchema } },
};

const openApiPath = (path: string) => path.replace(/:(\w+)/g, '{$1}');

function describe(name: EndpointName): ZodOpenApiOperationObject {
  const { params, body, response, isPublic, method } = endpoints[name];
  return {
    operationId: name,
    ...(Object.keys(params.shape).length === 0 ? {} : { requestParams: { path: params } }),
    ...(body === null
      ? {}
      : { requestBody: { required: true, content: { 'application/json': { schema: body } } } }),
    security: [{ ...(isPublic ? {} : { session: [] }), ...(method === 'get' ? {} : { csrf: [] }) }],
    responses: {
      '200': { description: 'Done', content: { 'application/json': { schema: response } } },
      default: errorAnswer,
    },
  };
}

const runEvents: ZodOpenApiOperationObject = {
  operationId: 'runEvents',
  description: 'Server-sent events named `progress`, each one the state of a view, with an increasing id.',
  requestParams: { path: z.object({ id: idSchema }) },
  security: [{ session: [] }],
  responses: {
    '200': { description: 'The stream', content: { 'text/event-stream': { schema: viewProgressSchema } } },
    default: errorAnswer,
  },
};

const sheetPdf: ZodOpenApiOperationObject = {
  operationId: 'sheetPdf',
  description: 'The calculation sheet of a candidate as a PDF, with what the reader is shown of it.',
  requestParams: {
    path: z.object({ id: idSchema }),
    query: z.object({ paper: z.enum(PAPERS).optional() }),
  },
  security: [{ session: [] }],
  responses: {
    '200': {
      description: 'The file',
      content: { 'application/pdf': { schema: { type: 'string', format: 'binary' } } },
    },
    default: errorAnswer,
  },
};

const tableFile = (
  operationId: string,
  description: string,
  query: typeof sectionsFileQuerySchema | typeof takeoffFileQuerySchema,
): ZodOpenApiOperationObject => ({
  operationId,
  description,
  requestParams: { path: byIdAndFormat, query },
  security: [{ session: [] }],
  responses: {
    '200': {
      description: 'The file, in the units of the project',
      content: {
        'text/csv': { schema: { type: 'string' } },
        'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet': {
          schema: { type: 'string', format: 'binary' },
        },
      },
    },
    default: errorAnswer,
  },
});

const tableFiles = {
  [SECTIONS_FILE_PATH]: tableFile(
    'sectionsFile',
    'Sections of a run as a table, with what the reader is shown of them.',
    sectionsFileQuerySchema,
  ),
  [TAKEOFF_FILE_PATH]: tableFile(
    'takeoffFile',
    'Takeoff of pinned sections; as XLSX a workbook that recalculates.',
    takeoffFileQuerySchema,
  ),
};

function describePaths(): ZodOpenApiPathsObject {
  const paths: ZodOpenApiPathsObject = {
    [openApiPath(RUN_EVENTS_PATH)]: { get: runEvents },
    [openApiPath(SHEET_PDF_PATH)]: { get: sheetPdf },
  };
  for (const [path, get] of Object.entries(tableFiles)) paths[openApiPath(path)] = { get };
  for (const name of Object.keys(endpoints) as EndpointName[]) {
    const path = openApiPath(endpoints[name].path);
    paths[path] = { ...paths[path], [endpoints[name].method]: describe(name) };
  }
  return paths;
}

/** The contract as an OpenAPI document. Quantities are SI throughout: N, mm, MPa, kg, N·mm. */
export const createOpenApiDocument = () =>
  createDocument(
    {
      openapi: '3.1.0',
      info: {
        title: 'Fairweight',
        version: '1',
        description: 'Quantities are SI throughout: N, mm, MPa, kg, N·mm. Times are ISO 8601 in UTC.',
      },
      servers: [{ url: '/api' }],
      paths: describePaths(),
      components: {
        securitySchemes: {
          session: { type: 'apiKey', in: 'cookie', name: 'fairweight.sid' },
          csrf: { type: 'apiKey', in: 'header', name: 'x-csrf-token' },
        },
      },
    },
    {
      // The engine's own outputs are typed in shared/engine and shared/sweep and not re-described here.
      allowEmptySchema: { custom: true },
      override: ({ jsonSchema, zodSchema }) => {
        if (zodSchema._zod.def.type === 'custom') jsonSchema.type = 'object';
      },
    },
  );
