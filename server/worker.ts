import { readWorkerConfig } from './config.ts';
import { isSchemaBehind } from './db/database-error.ts';
import { onStopSignal } from './stop-signal.ts';
import { startWorker } from './services.ts';

/** A worker by itself: any number of them, on any machines, take jobs of the database that DATABASE_URL names. */
const worker = await startWorker(readWorkerConfig()).catch((error: unknown) => {
  if (!isSchemaBehind(error)) throw error;
  console.error(
    'The database has no tables for this version: start the service on it once (npm start), then the worker.',
  );
  process.exit(1);
});
onStopSignal(worker.log, worker.stop);
worker.log.info('Taking jobs');
