import type { RequestHandler } from 'express';
import { collectDefaultMetrics, Counter, Gauge, Histogram, Registry } from 'prom-client';
import type { Deps } from '../deps.ts';
import { forbidden } from '../errors.ts';
import { listWorkers, readQueue } from '../jobs/queue-status.ts';
import { readRunningLoad } from '../jobs/running-load.ts';
import { isLoopback } from './loopback.ts';
import { requireSignedInPerson } from './signed-in-person.ts';

/** Seconds; a request beside a sweep should stay within the fifth. */
const REQUEST_BUCKETS = [0.002, 0.005, 0.01, 0.02, 0.05, 0.1, 0.25, 1, 5];
const SHARD_BUCKETS = [0.05, 0.1, 0.25, 0.5, 1, 2, 5, 15, 60];

/** Nobody's id: of the load only the office's part is asked. */
const NOBODY = '00000000-0000-0000-0000-000000000000';

/**
 * Figures of the service for Prometheus. Those of this process are counted here; queue and workers, of all processes, are
 * read from the database when they are asked for.
 */
export class Metrics {
  readonly #registry = new Registry();
  readonly #requests: Histogram<'method' | 'status'>;

  constructor(deps: Pick<Deps, 'db' | 'tally' | 'config'>) {
    const registers = [this.#registry];
    collectDefaultMetrics({ register: this.#registry });
    this.#requests = new Histogram({
      name: 'fairweight_http_request_seconds',
      help: 'Time to the end of an answer, streams left out',
      labelNames: ['method', 'status'],
      buckets: REQUEST_BUCKETS,
      registers,
    });
    this.#registerWork(deps);
    this.#registerOffice(deps);
  }

  /** Times every request but the streams, which last as long as a page is open. */
  readonly time: RequestHandler = (req, res, next) => {
    const startedAt = process.hrtime.bigint();
    res.once('finish', () => {
      if (String(res.getHeader('content-type')).startsWith('text/event-stream')) return;
      const seconds = Number(process.hrtime.bigint() - startedAt) / 1e9;
      this.#requests.observe({ method: req.method, status: String(res.statusCode) }, seconds);
    });
    next();
  };

  async write(): Promise<{ readonly contentType: string; readonly text: string }> {
    return { contentType: this.#registry.contentType, text: await this.#registry.metrics() };
  }

  /** What the built-in worker has done. */
  #registerWork({ tally }: Pick<Deps, 'tally'>): void {
    const registers = [this.#registry];
    const shards = new Histogram({
      name: 'fairweight_shard_seconds',
      help: 'Time the built-in worker took for a shard',
      buckets: SHARD_BUCKETS,
      registers,
    });
    tally.onShard((tookMs) => shards.observe(tookMs / 1000));
    new Counter({
      name: 'fairweight_sections_total',
      help: 'Sections the built-in worker has evaluated',
      registers,
      collect() {
        this.reset();
        this.inc(tally.sections);
      },
    });
  }

  /** What the database knows: of all processes. */
  #registerOffice({ db, config }: Pick<Deps, 'db' | 'config'>): void {
    const registers = [this.#registry];
    new Gauge({
      name: 'fairweight_jobs',
      help: 'Jobs of the queue',
      labelNames: ['kind', 'state'],
      registers,
      async collect() {
        for (const { kind, waiting, running, failed } of await readQueue(db)) {
          this.set({ kind, state: 'waiting' }, waiting);
          this.set({ kind, state: 'running' }, running);
          this.set({ kind, state: 'failed' }, failed);
        }
      },
    });
    new Gauge({
      name: 'fairweight_worker_sections_per_second',
      help: 'Rate of each worker that lives, over the last seconds',
      labelNames: ['worker', 'host'],
      registers,
      async collect() {
        this.reset();
        for (const { id, host, end, sectionsPerSecond } of await listWorkers(db))
          if (end === null) this.set({ worker: id, host }, sectionsPerSecond);
      },
    });
    new Gauge({
      name: 'fairweight_running_sections',
      help: 'Sections of all runs that are not evaluated yet',
      registers,
      async collect() {
        const { office } = await readRunningLoad(db, NOBODY, config.runningLimits);
        this.set(office.sections);
      },
    });
  }
}

/**
 * Answers a program on this machine, as a collector is, which has no session, and an admin. Nobody else: the figures tell
 * how busy the office is and what it runs on. A request that a proxy handed on comes from loopback too and does not count.
 */
export const metricsHandler =
  (metrics: Metrics, { db }: Pick<Deps, 'db'>): RequestHandler =>
  async (req, res) => {
    if (!isLoopback(req)) {
      const { role } = await requireSignedInPerson(db, req);
      if (role !== 'admin') throw forbidden(`Your role (${role}) may not read the metrics`);
    }
    const { contentType, text } = await metrics.write();
    res.set('content-type', contentType).send(text);
  };
