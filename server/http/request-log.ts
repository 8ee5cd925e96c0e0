import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import { pinoHttp } from 'pino-http';
import type { Log } from '../log.ts';

/** A share link's token is as good as a password: it never reaches the log. */
const withoutToken = (url: string) => url.replace(/(\/shared\/)[^/?]+/i, '$1…');

/** Gives each request its id, answers with it in `x-request-id`, and logs what is not routine. */
export const requestLog = (log: Log): RequestHandler =>
  pinoHttp({
    logger: log,
    genReqId: (_req, res) => {
      const id = randomUUID();
      res.setHeader('x-request-id', id);
      return id;
    },
    customLogLevel: (_req, res, error) => {
      if (error !== undefined || res.statusCode >= 500) return 'error';
      return res.statusCode >= 400 ? 'info' : 'debug';
    },
    serializers: {
      req: (req: { id: unknown; method: string; url: string }) => ({
        id: req.id,
        method: req.method,
        url: withoutToken(req.url),
      }),
      res: (res: { statusCode: number }) => ({ statusCode: res.statusCode }),
    },
  });
