import { availableParallelism } from 'node:os';
import { z } from 'zod';

const environmentSchema = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
  DATABASE_URL: z.string({ error: 'DATABASE_URL names no database' }).min(1),
  /** Signs session cookies and share links. */
  SESSION_SECRET: z
    .string({ error: 'SESSION_SECRET is missing' })
    .min(32, 'SESSION_SECRET is shorter than 32 characters'),
  HOST: z.string().default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65_535).default(3000),
  /** The project's folder: dist/client is below it. */
  APP_ROOT: z.string().default(process.cwd()),
  COMPUTE_THREADS: z.coerce.number().int().min(1).max(64).default(Math.max(1, availableParallelism())),
  LOG_LEVEL: z.enum(['silent', 'error', 'warn', 'info', 'debug']).optional(),
  /** Requests from one address within a minute; an office may share one address. */
  API_REQUESTS_PER_MINUTE: z.coerce.number().int().min(1).default(3000),
});

export interface Config {
  readonly isProduction: boolean;
  readonly databaseUrl: string;
  readonly sessionSecret: string;
  readonly host: string;
  readonly port: number;
  readonly appRoot: string;
  readonly computeThreads: number;
  readonly logLevel: 'silent' | 'error' | 'warn' | 'info' | 'debug';
  readonly apiRequestsPerMinute: number;
  /** Work factor of bcrypt: 2^cost rounds. */
  readonly passwordCost: number;
}

/** The one reader of the environment. Throws with every problem named when the service cannot run on it. */
export function readConfig(environment: NodeJS.ProcessEnv = process.env): Config {
  const parsed = environmentSchema.safeParse(environment);
  if (!parsed.success) {
    throw new Error(`The environment is not usable:\n${z.prettifyError(parsed.error)}`);
  }
  const values = parsed.data;
  const isTest = values.NODE_ENV === 'test';
  return {
    isProduction: values.NODE_ENV === 'production',
    databaseUrl: values.DATABASE_URL,
    sessionSecret: values.SESSION_SECRET,
    host: values.HOST,
    port: values.PORT,
    appRoot: values.APP_ROOT,
    computeThreads: values.COMPUTE_THREADS,
    logLevel: values.LOG_LEVEL ?? (isTest ? 'silent' : 'info'),
    apiRequestsPerMinute: values.API_REQUESTS_PER_MINUTE,
    // 12 takes about a quarter of a second a guess. Tests sign in hundreds of times and use the least there is.
    passwordCost: isTest ? 4 : 12,
  };
}
