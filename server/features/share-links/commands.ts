import { eq, sql } from 'drizzle-orm';
import type { Database } from '../../db/client.ts';
import { shareLinks } from '../../db/schema/share-links.ts';

/** Long enough for a review by the client, short enough that a forgotten link closes by itself. */
const OPEN_FOR = sql`now() + interval '30 days'`;

export async function createShareLink(
  db: Database,
  link: { projectId: string; createdBy: string },
): Promise<string> {
  const [created] = await db
    .insert(shareLinks)
    .values({ ...link, expiresAt: OPEN_FOR })
    .returning({ id: shareLinks.id });
  return created!.id;
}

export async function revokeShareLink(db: Database, id: string): Promise<void> {
  await db
    .update(shareLinks)
    .set({ revokedAt: sql`coalesce(${shareLinks.revokedAt}, now())` })
    .where(eq(shareLinks.id, id));
}
