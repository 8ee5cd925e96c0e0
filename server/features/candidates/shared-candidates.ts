import type { SharedShortlist } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { presentSharedCandidate } from './present.ts';
import { listCandidates } from './queries.ts';

/** A project's candidates as a link shows them: without rates, comments or who moved them. */
export async function listSharedCandidates(
  db: Database,
  projectId: string,
): Promise<SharedShortlist['candidates']> {
  const records = await listCandidates(db, projectId);
  return records.map((record) => presentSharedCandidate(record));
}
