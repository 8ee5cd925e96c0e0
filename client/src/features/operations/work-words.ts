import type { QueueKind, WorkerProcess } from '#shared/contract/operations.ts';
import { formatDuration, formatNumber } from '#shared/print/format-quantity.ts';
import type { StateLabel } from '#client/src/lib/state-labels.ts';

/** Longer without a heartbeat than this, and something is the matter. */
const SILENT_MS = 2500;

/** How a worker is: at work, waiting for some, not heard of lately, ended. */
export function workerLabel({ end, silentMs, sectionsPerSecond }: WorkerProcess): StateLabel {
  if (end === 'lost') return { word: 'Lost', mark: 'cross', tone: 'fails' };
  if (end === 'stopped') return { word: 'Stopped', mark: 'struck', tone: 'muted' };
  if (silentMs > SILENT_MS) return { word: 'Silent', mark: 'dashed', tone: 'near' };
  return sectionsPerSecond > 0
    ? { word: 'Working', mark: 'half', tone: 'meets' }
    : { word: 'Waiting', mark: 'ring', tone: 'ink' };
}

export const workerKindText = ({ kind }: WorkerProcess): string =>
  kind === 'service' ? 'Built into the service' : 'Worker';

export const QUEUE_KIND_TEXT: Readonly<Record<QueueKind['kind'], string>> = {
  'small-run': 'Small runs',
  shard: 'Shards of large runs',
  bounds: 'Searches by bounds',
  merge: 'Joining of shards',
};

/** Sections a second, in millions. */
export const rateText = (perSecond: number): string =>
  perSecond === 0 ? '0' : formatNumber(perSecond / 1e6, 3, true);

export const agoText = (ms: number | null): string => (ms === null ? '' : formatDuration(ms));
