import type { Person, Project } from '#shared/contract/records.ts';
import { canSeeRates, type ProjectRow } from '../../http/project-access.ts';

interface ProjectWithContext {
  readonly project: ProjectRow;
  readonly members: Person[];
  readonly beamCount: number;
  readonly candidateCount: number;
  readonly approvedCount: number;
}

export function presentProject(found: ProjectWithContext, reader: Person): Project {
  const { project, members, beamCount, candidateCount, approvedCount } = found;
  return {
    id: project.id,
    name: project.name,
    number: project.number,
    designBasis: project.designBasis,
    createdAt: project.createdAt.toISOString(),
    beamCount,
    candidateCount,
    approvedCount,
    members,
    priceBook: canSeeRates(reader) ? project.priceBook : null,
  };
}
