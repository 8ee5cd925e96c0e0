import { pino, type Logger } from 'pino';

export type Log = Logger;

export function createLog(level: string): Log {
  return pino({
    level,
    redact: ['req.headers.cookie', 'req.headers["x-csrf-token"]', 'res.headers["set-cookie"]'],
  });
}
