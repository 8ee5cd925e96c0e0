import type { Server } from 'node:http';
import { setTimeout as delay } from 'node:timers/promises';
import { buildApp } from './app.ts';
import { readConfig } from './config.ts';
import { startServices, type Services } from './services.ts';
import { onStopSignal } from './stop-signal.ts';

/** Requests in hand get this long to end; with the jobs put back the whole stop stays under the limit of 8 s. */
const FINISH_REQUESTS_MS = 3000;
const CLOSE_IDLE_MS = 50;

async function stop(server: Server, services: Services): Promise<void> {
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  services.endStreams();
  // Closing ends the connections that are idle at that moment only, not those whose answer ends a moment later.
  const closeIdle = setInterval(() => server.closeIdleConnections(), CLOSE_IDLE_MS);
  await Promise.race([closed, delay(FINISH_REQUESTS_MS, undefined, { ref: false })]);
  clearInterval(closeIdle);
  server.closeAllConnections();
  await services.stop();
}

const config = readConfig();
const services = await startServices(config);
const { log } = services.deps;
const server = buildApp(services.deps).listen(config.port, config.host, (error?: Error) => {
  if (error !== undefined) {
    log.fatal({ err: error }, `Port ${config.port} of ${config.host} cannot be listened on`);
    process.exit(1);
  }
  log.info(`Listening on http://${config.host}:${config.port}`);
});

onStopSignal(log, () => stop(server, services));
