import { and, desc, eq, gt, isNull, sql } from 'drizzle-orm';
import type { ShareLink } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { people } from '../../db/schema/people.ts';
import { projects } from '../../db/schema/projects.ts';
import { shareLinks } from '../../db/schema/share-links.ts';
import type { ProjectRow } from '../../http/project-access.ts';
import { createShareToken } from './token.ts';

const isOpen = and(isNull(shareLinks.revokedAt), gt(shareLinks.expiresAt, sql`now()`));

/** The links that still open, newest first. */
export async function listShareLinks(db: Database, projectId: string, secret: string): Promise<ShareLink[]> {
  const rows = await db
    .select({ link: shareLinks, createdBy: people.name })
    .from(shareLinks)
    .innerJoin(people, eq(people.id, shareLinks.createdBy))
    .where(and(eq(shareLinks.projectId, projectId), isOpen))
    .orderBy(desc(shareLinks.createdAt), desc(shareLinks.id));
  return rows.map(({ link, createdBy }) => ({
    id: link.id,
    token: createShareToken(link.id, secret),
    createdBy,
    createdAt: link.createdAt.toISOString(),
    expiresAt: link.expiresAt.toISOString(),
  }));
}

export async function findProjectOfOpenLink(db: Database, linkId: string): Promise<ProjectRow | undefined> {
  const [found] = await db
    .select({ project: projects })
    .from(shareLinks)
    .innerJoin(projects, eq(projects.id, shareLinks.projectId))
    .where(and(eq(shareLinks.id, linkId), isOpen));
  return found?.project;
}
