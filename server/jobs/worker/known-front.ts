import { eq } from 'drizzle-orm';
import type { ChunkResult } from '#shared/sweep/chunk.ts';
import { FrontBuilder } from '#shared/sweep/front.ts';
import { signOf } from '#shared/sweep/tally.ts';
import { pointsOf } from '../../compute/search-by-bounds.ts';
import type { Database } from '../../db/client.ts';
import { runViews } from '../../db/schema/run-views.ts';

type Front = ChunkResult['front'];

/** What an earlier search of the same view had found when it was stopped: every point of it is a section of the space. */
export class KnownFront {
  /** Oriented. */
  readonly front: Front;

  constructor(front: Front) {
    this.front = front;
  }

  /** With what is found by now: the better of both, each section once. */
  joinedWith(found: Front): Front {
    if (this.front.length === 0) return found;
    const joined = new FrontBuilder();
    for (const { x, y, ties, tieCount } of found) joined.addAll(x, y, ties, tieCount);
    const isFoundAgain = (x: number, y: number) => found.some((point) => point.x === x && point.y === y);
    for (const { x, y, ties, tieCount } of this.front)
      if (!isFoundAgain(x, y)) joined.addAll(x, y, ties, tieCount);
    return pointsOf(joined);
  }
}

export async function readKnownFront(db: Database, viewId: string): Promise<KnownFront> {
  const [view] = await db
    .select({ x: runViews.x, y: runViews.y, result: runViews.result })
    .from(runViews)
    .where(eq(runViews.id, viewId));
  if (!view?.result) return new KnownFront([]);
  const [x, y] = [signOf(view.x), signOf(view.y)];
  return new KnownFront(
    view.result.front.map((point) => ({
      x: x * point.x,
      y: y * point.y,
      ties: [...point.ties],
      tieCount: point.tieCount,
    })),
  );
}
