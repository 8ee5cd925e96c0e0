import { availableParallelism } from 'node:os';
import { z } from 'zod';

const workerSchema = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
  DATABASE_URL: z.string({ error: 'DATABASE_URL names no database' }).min(1),
  COMPUTE_THREADS: z.coerce.number().int().min(1).max(64).default(Math.max(1, availableParallelism())),
  LOG_LEVEL: z.enum(['silent', 'error', 'warn', 'info', 'debug']).optional(),
});

const environmentSchema = workerSchema.extend({
  /** Signs session cookies and share links. */
  SESSION_SECRET: z
    .string({ error: 'SESSION_SECRET is missing' })
    .min(32, 'SESSION_SECRET is shorter than 32 characters'),
  HOST: z.string().default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65_535).default(3000),
  /** The project's folder: dist/client is below it. */
  APP_ROOT: z.string().default(process.cwd()),
  /** Requests from one address within a minute; an office may share one address. */
  API_REQUESTS_PER_MINUTE: z.coerce.number().int().min(1).default(3000),
  /** Work factor of bcrypt; 12 takes about a quarter of a second a guess. Tests sign in hundreds of times. */
  PASSWORD_COST: z.coerce.number().int().min(4).max(16).optional(),
  /** Whether the service computes too, or leaves that to workers of their own. */
  BUILT_IN_WORKER: z.enum(['on', 'off']).default('on'),
  /** Sections that one person, and the whole office, may have under way: five and twenty of the largest runs. */
  RUNNING_SECTIONS_PER_PERSON: z.coerce.number().int().min(1).default(1_000_000_000),
  RUNNING_SECTIONS_PER_OFFICE: z.coerce.number().int().min(1).default(4_000_000_000),
});

/** What a worker by itself needs to know. */
export interface WorkerConfig {
  readonly databaseUrl: string;
  readonly computeThreads: number;
  readonly logLevel: 'silent' | 'error' | 'warn' | 'info' | 'debug';
}

/** Sections that may be under way at once. */
export interface RunningLimits {
  readonly person: number;
  readonly office: number;
}

export interface Config extends WorkerConfig {
  readonly isProduction: boolean;
  readonly sessionSecret: string;
  readonly host: string;
  readonly port: number;
  readonly appRoot: string;
  readonly apiRequestsPerMinute: number;
  readonly hasBuiltInWorker: boolean;
  readonly runningLimits: RunningLimits;
  /** Work factor of bcrypt: 2^cost rounds. */
  readonly passwordCost: number;
}

/** The one reader of the environment. Throws with every problem named when the service cannot run on it. */
export function readConfig(environment: NodeJS.ProcessEnv = process.env): Config {
  const values = parse(environmentSchema, environment);
  return {
    ...workerConfigOf(values),
    isProduction: values.NODE_ENV === 'production',
    sessionSecret: values.SESSION_SECRET,
    host: values.HOST,
    port: values.PORT,
    appRoot: values.APP_ROOT,
    apiRequestsPerMinute: values.API_REQUESTS_PER_MINUTE,
    hasBuiltInWorker: values.BUILT_IN_WORKER === 'on',
    runningLimits: {
      person: values.RUNNING_SECTIONS_PER_PERSON,
      office: values.RUNNING_SECTIONS_PER_OFFICE,
    },
    passwordCost: values.PASSWORD_COST ?? (values.NODE_ENV === 'test' ? 4 : 12),
  };
}

/** The part of it that a worker needs. */
export const readWorkerConfig = (environment: NodeJS.ProcessEnv = process.env): WorkerConfig =>
  workerConfigOf(parse(workerSchema, environment));

function parse<T extends z.ZodType>(schema: T, environment: NodeJS.ProcessEnv): z.infer<T> {
  const parsed = schema.safeParse(environment);
  if (!parsed.success) {
    throw new Error(`The environment is not usable:\n${z.prettifyError(parsed.error)}`);
  }
  return parsed.data;
}

const workerConfigOf = (values: z.infer<typeof workerSchema>): WorkerConfig => ({
  databaseUrl: values.DATABASE_URL,
  computeThreads: values.COMPUTE_THREADS,
  logLevel: values.LOG_LEVEL ?? (values.NODE_ENV === 'test' ? 'silent' : 'info'),
});
