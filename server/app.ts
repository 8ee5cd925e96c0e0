import compression from 'compression';
import express, { Router, type Express, type Request, type Response } from 'express';
import type { Deps } from './deps.ts';
import { notFound } from './errors.ts';
import { registerBeamRoutes } from './features/beams/routes.ts';
import { registerCandidateRoutes } from './features/candidates/routes.ts';
import { listSharedCandidates } from './features/candidates/shared-candidates.ts';
import { registerEvaluationRoutes } from './features/evaluations/routes.ts';
import { registerOfficeStandardRoutes } from './features/office-standards/routes.ts';
import { registerOperationsRoutes } from './features/operations/routes.ts';
import { registerPeopleRoutes } from './features/people/routes.ts';
import { registerProjectRoutes } from './features/projects/routes.ts';
import { registerRunRoutes } from './features/runs/routes.ts';
import { registerSavedViewRoutes } from './features/saved-views/routes.ts';
import { registerSessionRoutes } from './features/session/routes.ts';
import { registerShareLinkRoutes } from './features/share-links/routes.ts';
import { registerSweepRoutes } from './features/sweeps/routes.ts';
import { errorHandler } from './http/error-handler.ts';
import { health } from './http/health.ts';
import { Metrics, metricsHandler } from './http/metrics.ts';
import { createOpenApiDocument } from './http/openapi.ts';
import { limitRequests } from './http/rate-limit.ts';
import { requestLog } from './http/request-log.ts';
import { securityHeaders } from './http/security-headers.ts';
import { sessionMiddleware } from './http/session.ts';
import { staticClient } from './http/static-client.ts';

/** A saved sweep with every axis a full list is about 200 kB. */
const LARGEST_BODY = '1mb';

// Compression would hold events back until its buffer is full.
const isCompressible = (req: Request, res: Response) =>
  !String(res.getHeader('content-type')).startsWith('text/event-stream') && compression.filter(req, res);

function buildApi(deps: Deps, metrics: Metrics): Router {
  const api = Router();
  api.use((_req, res, next) => {
    res.set('cache-control', 'no-store');
    next();
  });
  api.get('/health', health(deps.pool));
  api.use(limitRequests(deps.config.apiRequestsPerMinute));
  const openApi = createOpenApiDocument();
  api.get('/openapi.json', (_req, res) => void res.json(openApi));
  api.use(sessionMiddleware(deps.config, deps.sessionStore));
  api.get('/metrics', metricsHandler(metrics, deps));
  api.use(express.json({ limit: LARGEST_BODY }));
  registerSessionRoutes(api, deps);
  registerPeopleRoutes(api, deps);
  registerOfficeStandardRoutes(api, deps);
  registerProjectRoutes(api, deps);
  registerBeamRoutes(api, deps);
  registerSweepRoutes(api, deps);
  registerRunRoutes(api, deps);
  registerSavedViewRoutes(api, deps);
  registerEvaluationRoutes(api, deps);
  registerCandidateRoutes(api, deps);
  registerOperationsRoutes(api, deps);
  registerShareLinkRoutes(api, deps, listSharedCandidates);
  api.use(() => {
    throw notFound('This address');
  });
  return api;
}

/** The whole HTTP side, not listening yet. */
export function buildApp(deps: Deps): Express {
  const app = express();
  app.disable('x-powered-by');
  app.set('etag', false);
  app.set('trust proxy', false);
  app.set('query parser', 'simple');
  const metrics = new Metrics(deps);
  app.use(requestLog(deps.log), securityHeaders(), compression({ filter: isCompressible }));
  app.use('/api', metrics.time, buildApi(deps, metrics));
  app.use(staticClient(deps.config.appRoot));
  app.use(() => {
    throw notFound('This page');
  });
  app.use(errorHandler(deps.log));
  return app;
}
