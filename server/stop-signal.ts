import type { Log } from './log.ts';

const STOP_LIMIT_MS = 8000;

/** Ends the process in order when it is asked to, and without order when that takes too long. The first request counts. */
export function onStopSignal(log: Log, stop: () => Promise<void>): void {
  let isStopping = false;
  const stopOnce = async (signal: string): Promise<void> => {
    if (isStopping) return;
    isStopping = true;
    log.info(`${signal}: stopping`);
    setTimeout(() => {
      log.error('Stopping took too long; what was left is dropped');
      process.exit(1);
    }, STOP_LIMIT_MS).unref();
    await stop();
    process.exit(0);
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => {
      stopOnce(signal).catch((error: unknown) => {
        log.error({ err: error }, 'The process did not stop in order');
        process.exit(1);
      });
    });
  }
}
