import { get, type IncomingMessage } from 'node:http';
import type { ViewEvent, ViewProgress } from '#shared/contract/records.ts';
import type { TestOffice } from './office.ts';
import type { SignedIn } from './signed-in.ts';

export interface RunEvent {
  readonly id: number;
  readonly progress: ViewProgress;
}

/** A reader of server-sent events over plain HTTP, as the standard's `EventSource` reads them. */
export interface RunStream {
  readonly events: readonly RunEvent[];
  readonly headers: IncomingMessage['headers'];
  /** Everything received, comments included. */
  readonly raw: () => string;
  /** The first event, past or to come, of which that holds. */
  until: (holds: (event: RunEvent) => boolean) => Promise<RunEvent>;
  /** Resolves when the server ends the stream. */
  readonly ended: Promise<void>;
  close: () => void;
}

export async function followRun(
  office: Pick<TestOffice, 'origin'>,
  reader: SignedIn,
  { runId, lastEventId }: { runId: string; lastEventId?: number },
): Promise<RunStream> {
  const response = await new Promise<IncomingMessage>((resolve, reject) => {
    const headers = {
      cookie: reader.cookie,
      accept: 'text/event-stream',
      ...(lastEventId === undefined ? {} : { 'last-event-id': String(lastEventId) }),
    };
    get(`${office.origin}/api/runs/${runId}/events`, { headers }, resolve).on('error', reject);
  });
  const events: RunEvent[] = [];
  let raw = '';
  let unread = '';
  const waiting = new Set<() => void>();
  const ended = new Promise<void>((resolve) => response.once('close', resolve));
  response.setEncoding('utf8');
  response.on('error', () => undefined);
  response.on('data', (text: string) => {
    raw += text;
    unread += text;
    const blocks = unread.split('\n\n');
    unread = blocks.pop()!;
    for (const block of blocks) {
      const event = parseEvent(block);
      if (event !== undefined) events.push(withResult(event, events));
    }
    for (const check of waiting) check();
  });
  return {
    events,
    headers: response.headers,
    raw: () => raw,
    until: (holds) =>
      new Promise((resolve, reject) => {
        const check = () => {
          const event = events.find(holds);
          if (event === undefined) return;
          waiting.delete(check);
          resolve(event);
        };
        waiting.add(check);
        void ended.then(() => reject(new Error('The stream ended before the event came')));
        check();
      }),
    ended,
    close: () => response.destroy(),
  };
}

/** An event without a result leaves the view's last one in place. */
function withResult({ id, progress }: ParsedEvent, before: readonly RunEvent[]): RunEvent {
  const last = before.findLast((event) => event.progress.viewId === progress.viewId);
  const { result = last?.progress.result ?? null } = progress;
  return { id, progress: { ...progress, result } };
}

interface ParsedEvent {
  readonly id: number;
  readonly progress: ViewEvent;
}

function parseEvent(block: string): ParsedEvent | undefined {
  const fields = new Map(
    block.split('\n').map((line) => {
      const at = line.indexOf(': ');
      return [line.slice(0, at), line.slice(at + 2)] as const;
    }),
  );
  const data = fields.get('data');
  if (fields.get('event') !== 'progress' || data === undefined) return undefined;
  return { id: Number(fields.get('id')), progress: JSON.parse(data) as ViewEvent };
}

export const hasEnded = ({ progress }: RunEvent): boolean =>
  progress.state !== 'queued' && progress.state !== 'running';
