import { readWorkerConfig } from './config.ts';
import { onStopSignal } from './stop-signal.ts';
import { startWorker } from './services.ts';

/** A worker by itself: any number of them, on any machines, take jobs of the database that DATABASE_URL names. */
const worker = await startWorker(readWorkerConfig());
onStopSignal(worker.log, worker.stop);
worker.log.info('Taking jobs');
