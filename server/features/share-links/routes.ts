import { eq } from 'drizzle-orm';
import type { Router } from 'express';
import type { SharedShortlist } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { shareLinks } from '../../db/schema/share-links.ts';
import type { Deps } from '../../deps.ts';
import { notFound } from '../../errors.ts';
import { bind } from '../../http/bind.ts';
import { requireReadableProject, requireRole } from '../../http/project-access.ts';
import { createShareLink, revokeShareLink } from './commands.ts';
import { isShared, SHARE } from './policy.ts';
import { findProjectOfOpenLink, listShareLinks } from './queries.ts';
import { findShareLinkId } from './token.ts';

/** Handed in by app.ts from the candidates' feature: a project's candidates as an outsider may see them, no rates. */
export type ListSharedCandidates = (
  db: Database,
  projectId: string,
) => Promise<SharedShortlist['candidates']>;

export function registerShareLinkRoutes(
  router: Router,
  deps: Deps,
  listSharedCandidates: ListSharedCandidates,
): void {
  const { db } = deps;
  const secret = deps.config.sessionSecret;

  bind(router, deps, 'listShareLinks', async ({ person, params: { id } }) => {
    await requireReadableProject(db, person, { projectId: id, what: 'Project' });
    requireRole(person, SHARE, 'share the shortlist');
    return listShareLinks(db, id, secret);
  });

  bind(router, deps, 'createShareLink', async ({ person, params: { id } }) => {
    await requireReadableProject(db, person, { projectId: id, what: 'Project' });
    requireRole(person, SHARE, 'share the shortlist');
    const linkId = await createShareLink(db, { projectId: id, createdBy: person.id });
    const links = await listShareLinks(db, id, secret);
    const link = links.find((candidate) => candidate.id === linkId);
    if (link === undefined) throw notFound('Share link');
    return link;
  });

  bind(router, deps, 'revokeShareLink', async ({ person, params: { id } }) => {
    const [link] = await db.select().from(shareLinks).where(eq(shareLinks.id, id));
    if (link === undefined) throw notFound('Share link');
    await requireReadableProject(db, person, { projectId: link.projectId, what: 'Share link' });
    requireRole(person, SHARE, 'end shared links');
    await revokeShareLink(db, id);
    return {};
  });

  bind(router, deps, 'getSharedShortlist', async ({ params: { token } }) => {
    const linkId = findShareLinkId(token, secret);
    const project = linkId === undefined ? undefined : await findProjectOfOpenLink(db, linkId);
    if (project === undefined) throw notFound('A shortlist behind this link');
    const candidates = await listSharedCandidates(db, project.id);
    return {
      projectName: project.name,
      projectNumber: project.number,
      units: project.designBasis.units,
      candidates: candidates.filter(({ state }) => isShared(state)),
    };
  });
}
