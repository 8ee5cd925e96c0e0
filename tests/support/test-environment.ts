/** The settings of a service in tests, on that database. */
export const testEnvironment = (databaseUrl: string): NodeJS.ProcessEnv => ({
  NODE_ENV: 'test',
  DATABASE_URL: databaseUrl,
  SESSION_SECRET: 'a secret of the tests, long enough to be one',
  COMPUTE_THREADS: '2',
  API_REQUESTS_PER_MINUTE: '1000000',
});
