import { randomUUID } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { ViewProgress } from '#shared/contract/records.ts';
import { createPartQueue } from '#client/src/features/run/part-queue.ts';

const part = (viewId: string, evaluated: number, state: ViewProgress['state'] = 'running'): ViewProgress => ({
  viewId,
  sequence: evaluated,
  view: { x: 'steelKgPerM', y: 'depthMm' },
  state,
  evaluated,
  feasible: 0,
  sectionCount: 100,
  search: null,
  elapsedMs: 1,
  result: null,
  message: null,
});

const view = randomUUID();
const other = randomUUID();

describe('the queue before a run’s page', () => {
  beforeEach(() => void vi.useFakeTimers());
  afterEach(() => void vi.useRealTimers());

  const listen = () => {
    const taken: number[] = [];
    return { taken, queue: createPartQueue(({ evaluated }) => taken.push(evaluated)) };
  };

  it('lets an idle page have the latest part of each view and skips those before', () => {
    const { taken, queue } = listen();
    for (const next of [part(view, 10), part(other, 15), part(view, 20)]) queue.add(next);
    expect(taken).toEqual([]);
    vi.runAllTimers();
    expect(taken).toEqual([20, 15]);
    queue.add(part(view, 30));
    vi.runAllTimers();
    expect(taken).toEqual([20, 15, 30]);
  });

  it.each(['finished', 'cancelled', 'failed'] as const)(
    'takes a view that is %s at once, and no part after it',
    (state) => {
      const { taken, queue } = listen();
      queue.add(part(view, 90));
      queue.add(part(view, 100, state));
      expect(taken).toEqual([100]);
      vi.runAllTimers();
      expect(taken).toEqual([100]);
    },
  );

  it('takes nothing once its page is left', () => {
    const { taken, queue } = listen();
    queue.add(part(view, 10));
    queue.close();
    vi.runAllTimers();
    expect(taken).toEqual([]);
  });
});
